'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import { Sign } from '@/components/ui/sign';
import { grams } from '@/services/packing/rules';
import type { BoxView } from '@/services/packing/schemas';

export interface WeighFormProps {
  box: BoxView;
  isBusy: boolean;
  onWeigh: (milligrams: number) => Promise<boolean>;
}

/** The scale's reading in grams, beside what the box should weigh; outside the limits it is asked for again. */
export function WeighForm({ box, isBusy, onWeigh }: WeighFormProps) {
  const [typed, setTyped] = useState('');
  const [error, setError] = useState<string | undefined>(undefined);
  const { mass } = box;

  async function send() {
    const milligrams = readGrams(typed);
    if (milligrams === null) {
      setError('Type what the scale shows, in grams, like 834.5.');
      return;
    }
    setError(undefined);
    if (await onWeigh(milligrams)) setTyped('');
  }

  return (
    <li className="grid gap-2 rounded-panel bg-card px-4 py-3 text-ink [--focus:var(--enamel)]">
      <span className="flex items-start gap-3">
        <Sign kind={mass.weighed === null ? 'waiting' : mass.fits ? 'clears' : 'stops'} size={28} />
        <span>
          <b className="block">
            {mass.weighed === null ? 'Weigh the box' : mass.fits ? 'The mass is right' : 'Weigh it again'}
          </b>
          {mass.sentence}
        </span>
      </span>
      <form
        onSubmit={(event) => {
          event.preventDefault();
          void send();
        }}
        className="flex flex-wrap items-end gap-3"
      >
        <TextField
          label="On the scale"
          size="floor"
          unit="g"
          figures
          inputMode="decimal"
          value={typed}
          onChange={(event) => setTyped(event.target.value)}
          error={error}
          hint={`${grams(mass.low)} to ${grams(mass.high)} g`}
          frameClassName="flex-1"
        />
        <Button type="submit" size="floor" icon="scales" pending={isBusy}>
          Take the reading
        </Button>
      </form>
    </li>
  );
}

/** Grams as a scale shows them, comma or point; null where it is no number. */
function readGrams(text: string): number | null {
  const plain = text.trim().replace(',', '.');
  if (!/^\d{1,6}(\.\d{1,3})?$/.test(plain)) return null;
  const milligrams = Math.round(Number(plain) * 1000);
  return milligrams > 0 ? milligrams : null;
}
