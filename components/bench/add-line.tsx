'use client';

import { useDeferredValue, useState } from 'react';
import { usePartSearch } from '@/components/queries';
import { Button } from '@/components/ui/button';
import { Combobox } from '@/components/ui/combobox';
import type { PartView, Place } from '@/services/parts/schemas';
import { partWords } from './part-words';
import { PartPicture } from './part-picture';

export interface PartChoiceProps {
  place: Place;
  label: string;
  labelHidden?: boolean;
  onChoose: (part: PartView) => void;
  error?: string | undefined;
}

/** Looks for a part by code or name among those that may stand in this place. */
export function PartChoice({ place, label, labelHidden = false, onChoose, error }: PartChoiceProps) {
  const [q, setQ] = useState('');
  const search = usePartSearch(place, useDeferredValue(q));
  const parts = search.data?.parts ?? [];
  return (
    <Combobox
      label={label}
      labelHidden={labelHidden}
      placeholder="Code or name"
      options={parts.map(optionOf)}
      value={null}
      onSearch={setQ}
      onChange={(id) => {
        const part = parts.find((one) => one.id === id);
        if (part) onChoose(part);
      }}
      error={search.isError ? 'The list of parts did not come. Type again in a moment.' : error}
      empty={search.isPending ? 'Fetching the parts' : `No part for this place matches "${q}". Add it under Parts.`}
    />
  );
}

function optionOf(part: PartView) {
  const { value, unit, detail } = partWords(part.values);
  return {
    id: part.id,
    text: `${part.code} ${part.name}`,
    detail: `${detail === '' ? '' : `${detail}; `}${part.stock.available} ${part.unit === 'each' ? '' : part.unit === 'metre' ? 'mm ' : 'mg '}in store`,
    drawing: <PartPicture values={part.values} width={40} />,
    ...(value !== undefined && {
      aside: (
        <span className="whitespace-nowrap">
          <span className="font-figures font-semibold">{value}</span>{' '}
          <span className="text-head text-ink2">{unit}</span>
        </span>
      ),
    }),
  };
}

/** Before anything is typed: a list closes when the page scrolls under it. One function, so that it runs once. */
const bringIntoSight = (box: HTMLElement | null) => box?.scrollIntoView({ block: 'nearest' });

/** The foot of a group: press, then look for the part. */
export function AddLine({
  places,
  onAdd,
}: {
  places: readonly Place[];
  onAdd: (place: Place, part: PartView) => void;
}) {
  const [isOpen, setOpen] = useState(false);
  const [place, setPlace] = useState<Place | null>(null);
  const chosen = place ?? (places.length === 1 ? places[0] : undefined);
  if (!isOpen) {
    return (
      <Button size="small" variant="quiet" icon="plus" onClick={() => setOpen(true)}>
        Add a line
      </Button>
    );
  }
  return (
    <div
      ref={bringIntoSight}
      className="grid scroll-mb-60 gap-3 rounded-label border-1.5 border-dashed border-edge p-3"
    >
      {places.length > 1 && (
        <div role="group" aria-label="Place of the line" className="flex flex-wrap gap-2">
          {places.map((one) => (
            <Button
              key={one}
              size="small"
              aria-pressed={one === chosen}
              className={one === chosen ? 'border-enamel bg-enamel-wash' : ''}
              onClick={() => setPlace(one)}
            >
              {one}
            </Button>
          ))}
        </div>
      )}
      {chosen && (
        <PartChoice
          key={chosen}
          place={chosen}
          label={`Part for the ${chosen}`}
          onChoose={(part) => {
            onAdd(chosen, part);
            setOpen(false);
            setPlace(null);
          }}
        />
      )}
      <div>
        <Button size="small" variant="quiet" onClick={() => setOpen(false)}>
          Not now
        </Button>
      </div>
    </div>
  );
}
