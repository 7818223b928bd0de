'use client';

import { Disclosure } from '@/components/ui/disclosure';
import { Select } from '@/components/ui/select';
import type { Circuit } from '@/services/kits/schemas';
import { QuantityField } from './quantity-field';
import { SliderField } from './slider-field';

export interface CircuitFieldsProps {
  circuit: Circuit;
  onChange: (circuit: Circuit) => void;
  /** Sentences of the engine by the setting they are about. */
  errors: Readonly<Record<string, string>>;
}

const within = (min: number, max: number, sentence: string) => (value: number) =>
  value >= min && value <= max ? null : sentence;

/** Turns on a slider, and folded under it pitch, tolerance and taps. */
export function WindingFields({ circuit, onChange, errors }: CircuitFieldsProps) {
  const { winding } = circuit;
  const set = (change: Partial<Circuit['winding']>) => onChange({ ...circuit, winding: { ...winding, ...change } });
  const tap = within(1, winding.turns - 1, `A tap lies below the top, at turn 1 to ${winding.turns - 1}.`);
  return (
    <div className="grid gap-1">
      <SliderField
        label="Turns"
        name="Turns"
        unit=""
        value={winding.turns}
        min={10}
        max={Math.max(160, winding.turns)}
        step={1}
        whole
        onChange={(turns) => turns >= 1 && turns <= 1000 && set({ turns })}
        error={errors['turns']}
      />
      <Disclosure look="row" summary="Pitch, taps and tolerance of the winding">
        <div className="grid gap-4 sm:grid-cols-2">
          <QuantityField
            label="Pitch"
            unit="mm"
            hint="Turn to turn. Empty: wound close by hand."
            value={winding.pitch}
            onChange={(pitch) => set({ pitch })}
            onEmpty={() => set({ pitch: null })}
            check={within(0.00003, 0.05, 'A pitch is 0.03 to 50 mm.')}
            error={errors['pitch']}
          />
          <QuantityField
            label="Winding tolerance"
            unit="%"
            hint="Of the wound inductance, normal."
            value={winding.tolerance}
            onChange={(tolerance) => set({ tolerance })}
            check={within(0.0001, 0.5, 'Between 0.01 and 50 %.')}
            error={errors['tolerance']}
          />
          <QuantityField
            label="Aerial tap"
            unit=""
            whole
            hint="Turn from the earth end."
            value={winding.aerialTap}
            onChange={(aerialTap) => set({ aerialTap })}
            onEmpty={() => set({ aerialTap: null })}
            check={tap}
            error={errors['aerialTap']}
          />
          <QuantityField
            label="Detector tap"
            unit=""
            whole
            hint="Turn from the earth end."
            value={winding.detectorTap}
            onChange={(detectorTap) => set({ detectorTap })}
            onEmpty={() => set({ detectorTap: null })}
            check={tap}
            error={errors['detectorTap']}
          />
        </div>
      </Disclosure>
    </div>
  );
}

const couplings = [
  { value: 'series-c', label: 'Through a capacitor' },
  { value: 'aerial-tap', label: 'At a tap of the coil' },
  { value: 'direct', label: 'Direct, at the top of the coil' },
] as const;

export function CouplingField({ circuit, onChange }: CircuitFieldsProps) {
  return (
    <Select
      label="How the aerial is joined"
      value={circuit.coupling}
      options={couplings}
      onChange={(event) => {
        const found = couplings.find(({ value }) => value === event.target.value);
        if (!found) return;
        const { winding } = circuit;
        // A tap a quarter up is a start that can be heard; the number is there to be changed.
        const aerialTap =
          found.value === 'aerial-tap'
            ? (winding.aerialTap ?? Math.max(1, Math.round(winding.turns / 4)))
            : winding.aerialTap;
        onChange({ ...circuit, coupling: found.value, winding: { ...winding, aerialTap } });
      }}
    />
  );
}

export function DetectorPlaceField({ circuit, onChange }: CircuitFieldsProps) {
  return (
    <Select
      label="Where the detector sits"
      value={circuit.detectorAt}
      options={[
        { value: 'top', label: 'At the top of the coil' },
        { value: 'tap', label: 'At a tap of the coil' },
      ]}
      onChange={(event) => {
        const detectorAt = event.target.value === 'tap' ? 'tap' : 'top';
        const { winding } = circuit;
        const detectorTap =
          detectorAt === 'tap'
            ? (winding.detectorTap ?? Math.max(1, Math.round(winding.turns / 2)))
            : winding.detectorTap;
        onChange({ ...circuit, detectorAt, winding: { ...winding, detectorTap } });
      }}
    />
  );
}

/** What is taken for granted of the buyer's aerial and earth. */
export function AerialFields({ circuit, onChange, errors }: CircuitFieldsProps) {
  const { aerial, earth } = circuit;
  const set = (change: Partial<Circuit['aerial']>) => onChange({ ...circuit, aerial: { ...aerial, ...change } });
  return (
    <div className="grid gap-4">
      <SliderField
        label="Riser, up to the wire"
        name="Riser of the aerial"
        unit="m"
        value={aerial.vertical}
        min={1}
        max={20}
        step={0.5}
        onChange={(vertical) => vertical >= 0.5 && vertical <= 100 && set({ vertical })}
        error={errors['vertical']}
      />
      <SliderField
        label="Level part"
        name="Level part of the aerial"
        unit="m"
        value={aerial.horizontal}
        min={0}
        max={40}
        step={0.5}
        onChange={(horizontal) => (horizontal === 0 || horizontal >= 0.5) && horizontal <= 100 && set({ horizontal })}
        error={errors['horizontal']}
      />
      <div className="grid gap-4 sm:grid-cols-2">
        <Select
          label="Earth"
          value={earth.kind}
          options={[
            { value: 'resistance', label: 'Rod or clip' },
            { value: 'none', label: 'None' },
          ]}
          onChange={(event) =>
            onChange({
              ...circuit,
              earth:
                event.target.value === 'none'
                  ? { kind: 'none' }
                  : { kind: 'resistance', r: { nominal: 50, tol: 1, dist: 'log-uniform' } },
            })
          }
        />
        {earth.kind === 'resistance' && (
          <QuantityField
            label="Earth resistance"
            unit="Ω"
            value={earth.r.nominal}
            onChange={(nominal) => onChange({ ...circuit, earth: { kind: 'resistance', r: { ...earth.r, nominal } } })}
            check={within(0, 2000, 'An earth is at most 2 kΩ.')}
            error={errors['earth']}
          />
        )}
        <QuantityField
          label="Site factor"
          unit=""
          hint="House and trees near the wire: 0.9 to 1.3."
          value={aerial.siteFactor.nominal}
          onChange={(nominal) => set({ siteFactor: { ...aerial.siteFactor, nominal } })}
          check={within(0.5, 2, 'The site factor lies between 0.5 and 2.')}
          error={errors['siteFactor']}
        />
        <SpreadField
          label="Site factor, tolerance"
          tol={aerial.siteFactor.tol}
          onChange={(tol) => set({ siteFactor: withTol(aerial.siteFactor, tol) })}
        />
      </div>
    </div>
  );
}

/** Stray capacitance and the field at the listener's place. */
export function AssumptionFields({ circuit, onChange, errors }: CircuitFieldsProps) {
  const { stray, place } = circuit;
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <QuantityField
        label="Stray capacitance"
        unit="pF"
        hint="Wiring and terminals across the coil."
        value={stray.nominal}
        onChange={(nominal) => onChange({ ...circuit, stray: { ...stray, nominal } })}
        check={within(0, 1e-9, 'Stray capacitance is at most 1 nF.')}
        error={errors['stray']}
      />
      <SpreadField
        label="Stray, tolerance"
        tol={stray.tol}
        onChange={(tol) => onChange({ ...circuit, stray: withTol(stray, tol) })}
      />
      <QuantityField
        label="Field at the place"
        unit="mV/m"
        hint="For the loudness: 10 mV/m is a strong station."
        value={place.field}
        onChange={(field) => onChange({ ...circuit, place: { ...place, field } })}
        check={within(1e-6, 100, 'A field lies between 0.001 and 100 000 mV/m.')}
        error={errors['field']}
      />
    </div>
  );
}

function SpreadField({
  label,
  tol,
  onChange,
}: {
  label: string;
  tol: number | undefined;
  onChange: (tol: number | undefined) => void;
}) {
  return (
    <QuantityField
      label={label}
      unit="%"
      hint="Empty: taken as exact."
      value={tol ?? null}
      onChange={onChange}
      onEmpty={() => onChange(undefined)}
      check={within(0.0001, 3, 'Between 0.01 and 300 %.')}
    />
  );
}

type Spread = Circuit['stray'];

function withTol({ nominal, dist }: Spread, tol: number | undefined): Spread {
  return tol === undefined ? { nominal } : { nominal, tol, ...(dist && { dist }) };
}
