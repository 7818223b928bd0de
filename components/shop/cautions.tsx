import { Sign } from '@/components/ui/sign';
import type { KitPage } from '@/services/catalogue/schemas';

/** Every caution in full; the same words stand in the guide and on the certificate. */
export function Cautions({ kit }: { kit: KitPage }) {
  return (
    <section aria-labelledby="cautions" className="mt-10 border-t-2 border-ink pt-4">
      <h2 id="cautions" className="font-display text-section">
        Before you put up a wire
      </h2>
      <p className="mt-1 max-w-measure font-semibold">{kit.cautionNote}</p>
      <ul className="mt-4 grid gap-x-10 gap-y-5 sm:grid-cols-2 lg:grid-cols-3">
        {kit.cautions.map(({ code, title, text }) => (
          <li key={code} className="flex gap-3">
            <Sign kind="note" size={20} className="mt-0.5" />
            <div>
              <h3 className="font-bold">{title}</h3>
              <p className="text-table">{text}</p>
            </div>
          </li>
        ))}
      </ul>
    </section>
  );
}
