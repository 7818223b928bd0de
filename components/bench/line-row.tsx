'use client';

import { useId, useState } from 'react';
import { PartLabel } from '@/components/devices/part-label';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import { QuantityStepper } from '@/components/ui/quantity-stepper';
import { quantityWords } from '@/services/kits/rules';
import type { LineView } from '@/services/kits/schemas';
import { PartChoice } from './add-line';
import { otherPart } from './find-parts';
import { PartPicture } from './part-picture';
import { partWords } from './part-words';
import { QuantityField } from './quantity-field';
import type { LineChange } from './version-store';

export interface LineRowProps {
  line: LineView;
  /** Why this line stops the version, or null. */
  cause: string | null;
  /** Absent where the version is frozen. */
  onChange?: ((change: LineChange) => void) | undefined;
  onRemove?: (() => void) | undefined;
}

/** One line of the bill of materials as a part label; pressed, its fields open under it. */
export function LineRow({ line, cause, onChange, onRemove }: LineRowProps) {
  const [isOpen, setOpen] = useState(false);
  const paneId = useId();
  const { part } = line;
  if (!part) return null;
  const words = partWords(part.values);
  const isOne = part.unit === 'each' && (line.quantity === 1 || words.value === undefined);
  const amount = isOne ? null : quantityWords(line.quantity, part.unit);
  const detail = cause ?? [amount, words.detail, line.retired && 'retired'].filter((one) => one).join(', ');
  return (
    <li>
      <div className="relative">
        <PartLabel
          reference={line.reference}
          drawing={<PartPicture values={part.values} />}
          name={part.name}
          detail={detail}
          value={words.value ?? (part.unit === 'each' ? String(line.quantity) : undefined)}
          unit={words.value === undefined ? (part.unit === 'each' ? 'each' : undefined) : words.unit}
          tolerance={words.tolerance}
          look={cause !== null ? 'stops' : isOpen ? 'chosen' : 'plain'}
        />
        {onChange && (
          <button
            type="button"
            aria-expanded={isOpen}
            aria-controls={paneId}
            aria-label={`Change line ${line.reference}, ${part.name}`}
            className="absolute inset-0 rounded-label"
            onClick={() => setOpen(!isOpen)}
          />
        )}
      </div>
      {isOpen && onChange && onRemove && (
        <div id={paneId} className="mt-1 mb-2 grid gap-4 rounded-label border border-rule bg-card p-4">
          <PartChoice
            place={line.place}
            label="Another part in its place"
            onChoose={(next) =>
              onChange({
                ...otherPart(next),
                ...(next.unit !== part.unit && { quantity: next.unit === 'each' ? 1 : 1000 }),
              })
            }
          />
          <div className="flex flex-wrap items-end gap-x-5 gap-y-3">
            <Amount line={line} unit={part.unit} onChange={(quantity) => onChange({ quantity })} />
            <NoteField value={line.note} onChange={(note) => onChange({ note })} />
          </div>
          <div className="flex flex-wrap gap-3">
            <Button size="small" onClick={() => setOpen(false)}>
              Done
            </Button>
            <Button size="small" variant="danger" icon="bin" onClick={onRemove}>
              {`Remove ${line.reference}`}
            </Button>
          </div>
        </div>
      )}
    </li>
  );
}

function Amount({
  line,
  unit,
  onChange,
}: {
  line: LineView;
  unit: 'each' | 'metre' | 'gram';
  onChange: (quantity: number) => void;
}) {
  if (unit === 'each') {
    return (
      <div>
        <span aria-hidden className="mb-1 block font-bold">
          Pieces
        </span>
        <QuantityStepper
          size="desk"
          label={`Pieces of ${line.reference}`}
          min={1}
          max={999}
          value={line.quantity}
          onChange={onChange}
        />
      </div>
    );
  }
  const check = (value: number) => (value * 1000 >= 1 && value <= 1000 ? null : 'Give 0.001 to 1000.');
  return (
    <QuantityField
      label={unit === 'metre' ? 'Length to cut' : 'Weight'}
      unit={unit === 'metre' ? 'm' : 'g'}
      value={line.quantity / 1000}
      onChange={(value) => onChange(Math.round(value * 1000))}
      check={check}
      frameClassName="w-40"
    />
  );
}

function NoteField({ value, onChange }: { value: string; onChange: (note: string) => void }) {
  return (
    <TextField
      label="Note to the packer"
      optional
      maxLength={200}
      defaultValue={value}
      onBlur={(event) => event.target.value !== value && onChange(event.target.value)}
      frameClassName="min-w-48 flex-1"
    />
  );
}
