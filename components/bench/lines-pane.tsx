'use client';

import type { ReactNode } from 'react';
import { PartLabel } from '@/components/devices/part-label';
import { Disclosure } from '@/components/ui/disclosure';
import { type Finding, fieldOf, stopsIn } from '@/services/kits/rules';
import type { LineView } from '@/services/kits/schemas';
import { type PartKind, type PartView, type Place, partKinds } from '@/services/parts/schemas';
import { AddLine } from './add-line';
import {
  AerialFields,
  AssumptionFields,
  type CircuitFieldsProps,
  CouplingField,
  DetectorPlaceField,
  WindingFields,
} from './circuit-fields';
import { LineRow } from './line-row';
import { KindPicture } from './part-picture';
import { emptyPlaces, placeGroups } from './places';
import { StationFields } from './station-fields';
import type { VersionSnapshot, VersionStore } from './version-store';

export interface LinesPaneProps {
  snapshot: VersionSnapshot;
  findings: readonly Finding[];
  /** Sentences of the engine by setting. */
  errors: Readonly<Record<string, string>>;
  /** Absent where the version is frozen: then nothing can be changed. */
  store?: VersionStore | undefined;
  onAdd: (place: Place, part: PartView) => void;
  onRemove: (line: LineView) => void;
}

/** The bill of materials by place, with the settings of the circuit that belong to each. */
export function LinesPane({ snapshot, findings, errors, store, onAdd, onRemove }: LinesPaneProps) {
  const { circuit, lines } = snapshot;
  const empty = emptyPlaces(lines, circuit);
  const fields: CircuitFieldsProps | null = store ? { circuit, onChange: store.changeCircuit, errors } : null;
  return (
    <div className="grid gap-6">
      {placeGroups.map(({ title, places }) => {
        const own = lines.filter((line) => places.includes(line.place));
        const lacks = empty.filter(({ place }) => places.includes(place));
        if (own.length === 0 && lacks.length === 0 && !fields) return null;
        return (
          <section key={title} aria-label={title}>
            <h2 className="mb-2 flex items-center gap-3 text-caption font-semibold text-ink2 after:h-px after:flex-1 after:bg-rule">
              {title}
            </h2>
            <ul className="grid gap-1.5">
              {own.map((line) => (
                <LineRow
                  key={line.id}
                  line={line}
                  cause={causeOf(line, findings)}
                  {...(store && {
                    onChange: (change) => store.changeLine(line.id, change),
                    onRemove: () => onRemove(line),
                  })}
                />
              ))}
              {lacks.map(({ place, words }) => (
                <li key={words}>
                  <PartLabel
                    reference="?"
                    drawing={<KindPicture kind={kindAt(place)} />}
                    name={words}
                    detail={store ? 'Add a line for it' : ''}
                    look="empty"
                  />
                </li>
              ))}
            </ul>
            {store && (
              <div className="pt-1">
                <AddLine places={places} onAdd={onAdd} />
              </div>
            )}
            {fields && <div className="pt-2">{settingsOf(title, fields)}</div>}
          </section>
        );
      })}
    </div>
  );
}

function settingsOf(title: string, fields: CircuitFieldsProps): ReactNode {
  switch (title) {
    case 'Tuning':
      return <WindingFields {...fields} />;
    case 'Coupling':
      return <CouplingField {...fields} />;
    case 'Detector':
      return <DetectorPlaceField {...fields} />;
    case 'Aerial and earth':
      return (
        <>
          <AerialFields {...fields} />
          <Disclosure look="row" summary="Stray, field and stations">
            <div className="grid gap-5">
              <AssumptionFields {...fields} />
              <StationFields circuit={fields.circuit} onChange={fields.onChange} />
            </div>
          </Disclosure>
        </>
      );
    default:
      return null;
  }
}

const kindAt = (place: Place): PartKind => {
  const [kind] = Object.entries(partKinds).find(([, entry]) => entry.places.includes(place)) ?? [];
  return (kind as PartKind | undefined) ?? 'hardware'; // a key of the table it was found in
};

/** The sentence of the stop that points at this line, if one does. */
function causeOf(line: LineView, findings: readonly Finding[]): string | null {
  const stop = stopsIn(findings).find(({ path }) => {
    const field = fieldOf(path);
    if (field.kind === 'line') return field.reference === line.reference;
    return field.kind === 'place' && field.place === line.place;
  });
  return stop ? stop.message : null;
}
