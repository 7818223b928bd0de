import type { BoxItem } from '@/services/catalogue/schemas';
import { silhouetteOf } from '@/services/parts/schemas';
import { SvgDrawing } from '@/templates/drawings/as-svg';
import { partDrawing } from '@/templates/drawings/part-drawing';
import { partDetail } from './words';

/** What is in the box, part by part, under the references that the guide uses. */
export function BoxList({ box, letter, number }: { box: readonly BoxItem[]; number: number; letter: string }) {
  return (
    <section aria-labelledby="in-the-box">
      <h2 id="in-the-box" className="mb-3 font-display text-section">
        In the box
      </h2>
      <ul className="grid gap-x-7 sm:grid-cols-2">
        {box.map((item) => (
          <li key={item.reference} className="flex items-center gap-3 border-t border-rule py-2.5">
            <span className="w-8 shrink-0 font-figures text-head text-ink2">{item.reference}</span>
            <SvgDrawing drawing={partDrawing(silhouetteOf(item.values))} width={50} className="shrink-0" />
            <span className="min-w-0 leading-5">
              <b className="block">{item.name}</b>
              <span className="text-caption text-ink2">{partDetail(item)}</span>
            </span>
          </li>
        ))}
        {!box.some((item) => item.values.kind === 'print') && (
          <li className="flex items-center gap-3 border-t border-rule py-2.5">
            <span className="w-8 shrink-0" />
            <SvgDrawing drawing={partDrawing('guide')} width={50} className="shrink-0" />
            <span className="min-w-0 leading-5">
              <b className="block">Printed build guide</b>
              <span className="text-caption text-ink2">
                for version {number}&#8239;{letter}
              </span>
            </span>
          </li>
        )}
      </ul>
    </section>
  );
}
