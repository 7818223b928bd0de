import { SvgDrawing } from '@/templates/drawings/as-svg';
import { type PartFamily, partDrawing } from '@/templates/drawings/part-drawing';

const steps: readonly { drawing: PartFamily; title: string; text: string }[] = [
  {
    drawing: 'vanes',
    title: 'Worked out first',
    text: 'We work out the reach with every part at its worst tolerance, not at its label value, and then for thousands of tried boxes.',
  },
  {
    drawing: 'knob',
    title: 'Then checked',
    text: 'Somebody who did not draw it reads every finding. A set that misses its band, or starves its earphone, is held.',
  },
  {
    drawing: 'guide',
    title: 'Then released',
    text: 'Your box and your printed guide carry the same version. Otherwise the box cannot be closed.',
  },
];

export function HowChecked() {
  return (
    <section aria-label="How kits are checked" className="mt-8 grid border-t-2 border-ink md:grid-cols-3">
      {steps.map(({ drawing, title, text }) => (
        <div key={title} className="border-rule py-5 max-md:border-b md:px-6 md:first:pl-0 md:not-first:border-l">
          <SvgDrawing drawing={partDrawing(drawing)} width={60} />
          <h3 className="mt-2 font-display text-panel">{title}</h3>
          <p className="mt-1 max-w-measure">{text}</p>
        </div>
      ))}
    </section>
  );
}
