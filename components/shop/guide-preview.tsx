import { Disclosure } from '@/components/ui/disclosure';
import type { KitPage } from '@/services/catalogue/schemas';

/** The guide of exactly this version: its steps, the first of them in full. */
export function GuidePreview({ kit }: { kit: KitPage }) {
  const { guide } = kit;
  return (
    <section aria-labelledby="guide">
      <h2 id="guide" className="mb-2 font-display text-section">
        The guide, step by step
      </h2>
      {guide.intro !== '' && <p className="max-w-measure">{guide.intro}</p>}
      <ol className="mt-3 border-t border-rule">
        {guide.steps.map((step, index) => (
          <li key={`${index} ${step.title}`}>
            <Disclosure look="row" isOpen={index === 0} summary={`${index + 1}. ${step.title}`}>
              <p className="max-w-measure whitespace-pre-line">{step.text}</p>
              {step.uses.length > 0 && <p className="mt-2 text-caption text-ink2">Uses {step.uses.join(', ')}.</p>}
              {step.check !== '' && (
                <p className="mt-2 max-w-measure">
                  <b>Before you go on:</b> {step.check}
                </p>
              )}
            </Disclosure>
          </li>
        ))}
      </ol>
    </section>
  );
}
