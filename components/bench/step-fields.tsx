'use client';

import { Button } from '@/components/ui/button';
import { TextArea, TextField } from '@/components/ui/field';
import type { GuideStep } from '@/services/kits/schemas';

export interface StepFieldsProps {
  number: number;
  count: number;
  step: GuideStep;
  references: readonly { reference: string; name: string }[];
  canChange: boolean;
  onChange: (step: GuideStep) => void;
  onMove: (by: -1 | 1) => void;
  onRemove: () => void;
}

/** One step of the guide: title, words, the lines it uses, and what to see before going on. */
export function StepFields(props: StepFieldsProps) {
  const { number, count, step, references, canChange, onChange, onMove, onRemove } = props;
  const toggle = (reference: string) =>
    onChange({
      ...step,
      uses: step.uses.includes(reference) ? step.uses.filter((one) => one !== reference) : [...step.uses, reference],
    });
  return (
    <fieldset className="grid gap-3 rounded-panel border border-rule bg-paper p-4">
      <legend className="px-1 font-display text-panel">{`Step ${number}`}</legend>
      <TextField
        label="Title"
        maxLength={80}
        readOnly={!canChange}
        value={step.title}
        onChange={(event) => onChange({ ...step, title: event.target.value })}
      />
      <TextArea
        label="What to do"
        rows={4}
        maxLength={1200}
        readOnly={!canChange}
        value={step.text}
        onChange={(event) => onChange({ ...step, text: event.target.value })}
      />
      <div role="group" aria-label={`Lines that step ${number} uses`}>
        <p className="mb-1 font-bold">Lines it uses</p>
        {references.length === 0 && <p className="text-caption text-ink2">The version has no lines yet.</p>}
        <div className="flex flex-wrap gap-2">
          {references.map(({ reference, name }) => {
            const isUsed = step.uses.includes(reference);
            return (
              <button
                key={reference}
                type="button"
                aria-pressed={isUsed}
                aria-label={`${reference}, ${name}`}
                title={name}
                disabled={!canChange}
                onClick={() => toggle(reference)}
                className={`min-h-target min-w-12 rounded-tag border-1.5 px-2.5 font-figures font-semibold ${isUsed ? 'border-enamel bg-enamel-wash text-ink' : 'border-edge bg-card text-ink2'}`}
              >
                {reference}
              </button>
            );
          })}
        </div>
      </div>
      <TextField
        label="What to see or measure before going on"
        optional
        maxLength={300}
        readOnly={!canChange}
        value={step.check}
        onChange={(event) => onChange({ ...step, check: event.target.value })}
      />
      {canChange && (
        <div className="flex flex-wrap gap-3">
          {number > 1 && (
            <Button size="small" icon="up" aria-label={`Move step ${number} up`} onClick={() => onMove(-1)}>
              Up
            </Button>
          )}
          {number < count && (
            <Button size="small" icon="down" aria-label={`Move step ${number} down`} onClick={() => onMove(1)}>
              Down
            </Button>
          )}
          <Button size="small" variant="danger" icon="bin" className="ml-auto" onClick={onRemove}>
            {`Remove step ${number}`}
          </Button>
        </div>
      )}
    </fieldset>
  );
}
