import type { GuideStepView, GuideView } from '@/services/documents/schemas';
import { SvgDrawing } from '@/templates/drawings/as-svg';
import { circuitDrawing } from '@/templates/drawings/circuit-drawing';
import { windingDrawing } from '@/templates/drawings/winding-drawing';
import { PartPicture } from './part-picture';

/** One step of the guide's page: what it needs, its drawing, its words and its check. */
export function GuideStep({ step, of, guide }: { step: GuideStepView; of: number; guide: GuideView }) {
  return (
    <li className="grid gap-3">
      <h3 className="font-display text-panel">
        Step {step.number} of {of}: {step.title}
      </h3>
      {step.uses.length > 0 && (
        <p className="rounded-control border-1.5 border-ink px-4 py-2">
          <b>You need</b>{' '}
          {step.uses
            .map((part) => `${part.reference}, ${part.name}${part.amount === '1' ? '' : ` (${part.amount})`}`)
            .join('; ')}
        </p>
      )}
      <StepPicture step={step} guide={guide} />
      <p className="max-w-measure">{step.text}</p>
      {step.check !== '' && (
        <div className="rounded-panel border-2 border-ink p-4">
          <h4 className="font-bold">Check before you go on</h4>
          <p className="max-w-measure">{step.check}</p>
          {step.gate && (
            <p className="mt-1">
              It should read{' '}
              <span className="font-figures font-semibold">
                {step.gate.low} to {step.gate.high} {step.gate.unit}
              </span>
              .
            </p>
          )}
        </div>
      )}
    </li>
  );
}

function StepPicture({ step, guide }: { step: GuideStepView; guide: GuideView }) {
  if (step.drawing === 'winding') return <SvgDrawing drawing={windingDrawing(guide.winding)} className="max-w-2xl" />;
  if (step.drawing === 'circuit') return <SvgDrawing drawing={circuitDrawing(guide.circuit)} className="max-w-3xl" />;
  return (
    <div className="flex flex-wrap gap-6">
      {step.uses.map((part) => (
        <span key={part.reference} className="grid justify-items-center font-bold">
          <PartPicture family={part.family} width={140} />
          {part.reference}
        </span>
      ))}
    </div>
  );
}
