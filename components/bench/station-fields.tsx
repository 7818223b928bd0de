'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import type { Circuit } from '@/services/kits/schemas';
import { showQuantity } from '@/services/quantity';
import { QuantityField } from './quantity-field';

type Station = Circuit['place']['stations'][number];

/** Stations that the rail pins, and that the set must tell apart where they are strong. */
export function StationFields({ circuit, onChange }: { circuit: Circuit; onChange: (circuit: Circuit) => void }) {
  const { place } = circuit;
  const [name, setName] = useState('');
  const [f, setF] = useState<number | null>(null);
  const [count, setCount] = useState(0);
  const [sentence, setSentence] = useState<string | undefined>();
  const set = (stations: Station[]) => onChange({ ...circuit, place: { ...place, stations } });

  function add() {
    if (name.trim() === '' || f === null) {
      setSentence('Give the station a name and its frequency.');
      return;
    }
    set([...place.stations, { name: name.trim(), f, field: place.field }]);
    setSentence(undefined);
    setName('');
    setF(null);
    setCount(count + 1);
  }

  return (
    <div className="grid gap-3">
      {place.stations.length > 0 && (
        <ul>
          {place.stations.map((station) => (
            <li
              key={`${station.name} ${station.f}`}
              className="flex min-h-target items-center gap-3 border-b border-rule"
            >
              <b className="flex-1">{station.name}</b>
              <span className="font-figures">{showQuantity(station.f, 'kHz')}</span>
              <Button
                size="small"
                variant="quiet"
                aria-label={`Remove the station ${station.name}`}
                onClick={() => set(place.stations.filter((one) => one !== station))}
              >
                Remove
              </Button>
            </li>
          ))}
        </ul>
      )}
      <div className="grid grid-cols-[minmax(0,1fr)_8.5rem_auto] items-end gap-3">
        <TextField
          label="Station"
          maxLength={40}
          value={name}
          onChange={(event) => setName(event.target.value)}
          error={sentence}
        />
        <QuantityField
          key={count}
          label="Frequency"
          unit="kHz"
          value={f}
          onChange={setF}
          check={(value) => (value >= 1e5 && value <= 3e7 ? null : '100 to 30 000 kHz.')}
        />
        <Button onClick={add}>Add</Button>
      </div>
    </div>
  );
}
