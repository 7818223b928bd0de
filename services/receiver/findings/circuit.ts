import { decibel } from '../numeric/exp-log';
import { brent } from '../numeric/roots';
import { capacitanceNeeded, voltagePerField } from '../network/solve';
import { planOf } from '../network/plan';
import { responseAt, tuneTo } from '../network/point';
import { centre } from '../schema/value';
import { loadAt } from '../soundings';
import type { Figures } from '../figures';
import type { Hertz } from '../units';
import { shownFrequency, type Found } from './finding';

export function adjacentChannel({ soundings: [, middle], rules }: Figures): Found[] {
  const { adjacent } = middle;
  if (!Number.isFinite(adjacent)) return [];
  const severity = adjacent > rules.adjacentNote ? 'note' : 'info';
  const message =
    adjacent <= 0
      ? `A station one channel away is only ${Math.abs(adjacent).toFixed(1)} dB down.`
      : `A station one channel away comes out ${adjacent.toFixed(1)} dB stronger.`;
  return [{ code: 'SEL-ADJ', severity, path: 'coil', value: adjacent, limit: rules.adjacentNote, unit: 'dB', message }];
}

/** Ordered pairs of stations where the other is within 6 dB after the circuit. @see evaluate.md rule 10 */
export function strongStations(figures: Figures): Found[] {
  const { design, plan, rules, reach, detector, dcLoad } = figures;
  const stations = design.place?.stations ?? [];
  const found: Found[] = [];
  const { circuit } = plan;
  const kept = circuit.loadG;
  stations.forEach((wanted, index) => {
    if (wanted.f < reach.nominal.lo || wanted.f > reach.nominal.hi) return;
    loadAt(plan, detector.diode, dcLoad, wanted.f);
    const { c } = tuneTo(plan, wanted.f);
    const response = responseAt(plan, c);
    const here = response(wanted.f) * centre(wanted.field);
    stations.forEach((other, otherIndex) => {
      if (otherIndex === index) return;
      const value = decibel((response(other.f) * centre(other.field)) / here);
      if (!(value > rules.strongStation)) return;
      const message = `${other.name} is heard with ${wanted.name}: ${Math.abs(value).toFixed(1)} dB ${value > 0 ? 'stronger' : 'weaker'} after the circuit.`;
      found.push({
        code: 'SEL-STRONG',
        severity: 'note',
        path: `place.stations.${index}`,
        value,
        limit: rules.strongStation,
        unit: 'dB',
        message,
      });
    });
  });
  circuit.loadG = kept;
  plan.fill(plan.nominal);
  return found;
}

export function loadedQ({ soundings, rules }: Figures): Found[] {
  const worst = soundings.reduce((a, b) => (b.q < a.q ? b : a));
  if (!(worst.q < rules.loadedQ)) return [];
  const message = `The circuit is too heavily loaded: its Q is ${worst.q.toFixed(1)} at ${shownFrequency(worst.f)}, ${rules.loadedQ} is asked.`;
  return [{ code: 'Q-LOW', severity: 'note', path: 'coil', value: worst.q, limit: rules.loadedQ, unit: '1', message }];
}

export function selfResonance({ coil, design, rules }: Figures): Found[] {
  const f = coil.selfResonance;
  if (f === null || f >= rules.selfResonanceSpan * design.band.hi) return [];
  const stops = f <= design.band.hi;
  const message = `The coil resonates by itself at ${shownFrequency(f)}${stops ? ', inside or below the band' : ', close above the band'}.`;
  const limit = stops ? design.band.hi : rules.selfResonanceSpan * design.band.hi;
  return [{ code: 'COIL-SRF', severity: stops ? 'stop' : 'note', path: 'coil', value: f, limit, unit: 'Hz', message }];
}

export function noEarth(figures: Figures): Found[] {
  const { design, detector, dcLoad, soundings } = figures;
  if (design.earth.kind !== 'none') return [];
  const [, middle] = soundings;
  const grounded = planOf({ ...design, earth: { kind: 'resistance', r: 50 } });
  grounded.fill(grounded.nominal);
  loadAt(grounded, detector.diode, dcLoad, middle.f);
  const setting = tuneTo(grounded, middle.f);
  const withEarth = voltagePerField(grounded.circuit, middle.f, setting.c);
  const drop = decibel(withEarth / middle.gain);
  const f = movedTo(figures, middle.f, setting);
  const tuning = f === null ? '' : `, and tuning moves from ${shownFrequency(middle.f)} to ${shownFrequency(f)}`;
  const message = `No earth: the level ${drop >= 0 ? 'drops' : 'rises'} by ${Math.abs(drop).toFixed(1)} dB${tuning}.`;
  return [{ code: 'EARTH-NONE', severity: 'note', path: 'earth', value: drop, limit: null, unit: 'dB', message }];
}

/** Where the set stands without an earth at the setting that tunes it to f with one. */
function movedTo({ plan }: Figures, f: Hertz, setting: { position: number | null; c: number }): Hertz | null {
  if (setting.position !== null) plan.moveTo(plan.nominal, setting.position);
  const over = (at: Hertz): number => capacitanceNeeded(plan.circuit, at) - setting.c;
  const low = 0.5 * f;
  const high = 2 * f;
  const moved = over(low) > 0 !== over(high) > 0 ? brent(over, low, high) : null;
  plan.fill(plan.nominal);
  return moved;
}

export function shortFormer({ coil, design, rules }: Figures): Found[] {
  if (design.coil.kind !== 'solenoid' || design.coil.formerLength === undefined || coil.length === null) return [];
  const former = centre(design.coil.formerLength);
  const need = coil.length + 2 * rules.formerMargin;
  if (need <= former) return [];
  const message = `The winding takes ${(coil.length * 1000).toFixed(1)} mm and ${(rules.formerMargin * 1000).toFixed(0)} mm at each end; the former is ${(former * 1000).toFixed(1)} mm long.`;
  return [
    {
      code: 'FORMER-SHORT',
      severity: 'stop',
      path: 'coil.formerLength',
      value: need,
      limit: former,
      unit: 'm',
      message,
    },
  ];
}
