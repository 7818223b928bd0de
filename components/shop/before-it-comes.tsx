import type { OrderView } from '@/services/orders/schemas';
import { SvgDrawing } from '@/templates/drawings/as-svg';
import { type PartFamily, partDrawing } from '@/templates/drawings/part-drawing';

/** What the buyer can look for meanwhile, by what the ordered sets want. */
export function BeforeItComes({ order }: { order: OrderView }) {
  const sets = order.lines.flatMap((line) => line.set ?? []);
  const metres = Math.max(0, ...sets.map((set) => set.aerialMetres));
  const rows: { drawing: PartFamily; title: string; text: string }[] = [];
  if (metres > 0) {
    rows.push({
      drawing: 'aerial',
      title: `Find a spot for ${metres} m of wire`,
      text: 'As high and clear as you can, away from power lines',
    });
  }
  if (sets.some((set) => set.earth)) {
    rows.push({
      drawing: 'earth',
      title: 'Find a good earth',
      text: 'A rod in damp ground; never a gas pipe or a socket',
    });
  }
  rows.push({
    drawing: 'tool',
    title: 'A flat screwdriver, fine sandpaper',
    text: 'To clean the enamel off wire ends',
  });
  return (
    <section aria-labelledby="before">
      <h2 id="before" className="mb-2 font-display text-section">
        Before it comes
      </h2>
      <ul>
        {rows.map(({ drawing, title, text }) => (
          <li key={title} className="flex items-center gap-4 border-t border-rule py-2.5">
            <SvgDrawing drawing={partDrawing(drawing)} width={50} className="shrink-0" />
            <div>
              <b className="block">{title}</b>
              <span className="text-caption text-ink2">{text}</span>
            </div>
          </li>
        ))}
      </ul>
    </section>
  );
}
