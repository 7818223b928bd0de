import type { Figures } from '../figures';
import { risesInside } from '../coverage/reach';
import { uncoveredCarrier } from '../coverage/carriers';
import { partName } from './part-name';
import { shownFrequency, shownPercent, type Found } from './finding';

export function lowMissed({ margins, rules }: Figures): boolean {
  return margins.lo < rules.guardNominal;
}

export function highMissed({ margins, rules }: Figures): boolean {
  return margins.hi < rules.guardNominal;
}

function bothClear(figures: Figures): boolean {
  return !lowMissed(figures) && !highMissed(figures);
}

export function bandLow(figures: Figures): Found[] {
  if (!lowMissed(figures)) return [];
  const { margins, reach, design, rules } = figures;
  const message = `The lowest tuned frequency is ${shownFrequency(reach.nominal.lo)}; the band starts at ${shownFrequency(design.band.lo)}.`;
  return [
    {
      code: 'BAND-LOW',
      severity: 'stop',
      path: 'band.lo',
      value: margins.lo,
      limit: rules.guardNominal,
      unit: '1',
      message,
    },
  ];
}

export function bandHigh(figures: Figures): Found[] {
  if (!highMissed(figures)) return [];
  const { margins, reach, design, rules } = figures;
  const message = `The highest tuned frequency is ${shownFrequency(reach.nominal.hi)}; the band ends at ${shownFrequency(design.band.hi)}.`;
  return [
    {
      code: 'BAND-HIGH',
      severity: 'stop',
      path: 'band.hi',
      value: margins.hi,
      limit: rules.guardNominal,
      unit: '1',
      message,
    },
  ];
}

/** Pessimistic corners: a note, at an end whose nominal value clears; the stop for spread is BAND-YIELD. */
export function bandCorner(figures: Figures): Found[] {
  const { cornerMargins, rules } = figures;
  const low = !lowMissed(figures) && cornerMargins.lo < rules.guardCorner;
  const high = !highMissed(figures) && cornerMargins.hi < rules.guardCorner;
  if (!low && !high) return [];
  const atLow = low && (!high || cornerMargins.lo <= cornerMargins.hi);
  const miss = (margin: number): string => shownPercent(rules.guardCorner - margin, 2);
  const both = low && high;
  const end = atLow ? 'the low end' : 'the high end';
  const value = atLow ? cornerMargins.lo : cornerMargins.hi;
  const message = both
    ? `In the worst combination of parts the low end misses by ${miss(cornerMargins.lo)} and the high end by ${miss(cornerMargins.hi)}.`
    : `In the worst combination of parts ${end} misses by ${miss(value)}.`;
  const path = atLow ? 'band.lo' : 'band.hi';
  return [{ code: 'BAND-CORNER', severity: 'note', path, value, limit: rules.guardCorner, unit: '1', message }];
}

export function bandGap(figures: Figures): Found[] {
  if (!bothClear(figures)) return [];
  const f = uncoveredCarrier(figures.plan, figures.reach.nominal);
  if (f === null) return [];
  const message = `${shownFrequency(f)} cannot be tuned although both ends can.`;
  return [{ code: 'BAND-GAP', severity: 'stop', path: 'tuning', value: f, limit: null, unit: 'Hz', message }];
}

export function bandYield(figures: Figures): Found[] {
  const { share, rules, plan, limits } = figures;
  if (share === null || plan.values.spread().length === 0 || !bothClear(figures)) return [];
  if (share.low >= rules.yieldTarget) return [];
  const covered = shownPercent(share.covered / share.boxes, 2);
  const message = `Of ${share.boxes} simulated boxes ${covered} cover the band; at least ${shownPercent(share.low, 2)} is sure, ${shownPercent(rules.yieldTarget, 0)} is asked.`;
  const path = limits[0]?.path ?? 'band';
  return [
    { code: 'BAND-YIELD', severity: 'stop', path, value: share.low, limit: rules.yieldTarget, unit: '1', message },
  ];
}

export function bandAerial(figures: Figures): Found[] {
  if (!bothClear(figures)) return [];
  const { reach, design } = figures;
  const misses = (key: 'aerialHalf' | 'aerialDouble'): number =>
    Math.max(reach[key].lo - design.band.lo, design.band.hi - reach[key].hi);
  const short = misses('aerialHalf');
  const long = misses('aerialDouble');
  if (short <= 0 && long <= 0) return [];
  const key = short >= long ? 'aerialHalf' : 'aerialDouble';
  const ends = reach[key];
  const word = key === 'aerialHalf' ? 'short' : 'long';
  const message = `With a ${word} aerial the reach is ${shownFrequency(ends.lo)} to ${shownFrequency(ends.hi)}, less than the band.`;
  const low = ends.lo - design.band.lo >= design.band.hi - ends.hi;
  return [
    {
      code: 'BAND-AERIAL',
      severity: 'note',
      path: 'aerial',
      value: low ? ends.lo : ends.hi,
      limit: low ? design.band.lo : design.band.hi,
      unit: 'Hz',
      message,
    },
  ];
}

export function aerialResonance({ plan, points }: Figures): Found[] {
  const f = risesInside(plan, points);
  if (f === null) return [];
  const message = `The aerial circuit itself resonates near ${shownFrequency(f)}; tuning there is double.`;
  return [{ code: 'AERIAL-RES', severity: 'note', path: 'coupling', value: f, limit: null, unit: 'Hz', message }];
}

/** Parts that decide the reach and were never measured. */
export function dataNone({ limits, rules, plan }: Figures): Found[] {
  const found = new Map<string, number>();
  for (const { path, share } of limits) found.set(path, Math.max(share, found.get(path) ?? 0));
  return plan.values.entries.flatMap(({ path, lotSize }) => {
    const share = found.get(path) ?? 0;
    if (lotSize !== null || share <= rules.dataShare) return [];
    const rod = path.startsWith('coil.') && plan.design.coil.kind === 'rod';
    const message = rod
      ? `The ${partName(path)} decides ${shownPercent(share, 0)} of the reach's spread and was never measured: measure one coil on this rod.`
      : `The ${partName(path)} decides ${shownPercent(share, 0)} of the reach's spread and was never measured.`;
    return [
      { code: 'DATA-NONE', severity: 'note', path, value: share, limit: rules.dataShare, unit: '1', message },
    ] satisfies Found[];
  });
}

export function lotSmall({ plan, rules }: Figures): Found[] {
  return plan.values.entries.flatMap(({ path, lotSize }) => {
    if (lotSize === null || lotSize >= rules.lotSmall) return [];
    const count = lotSize === 1 ? 'Only one sample' : `Only ${lotSize} samples`;
    const message = `${count} of the lot behind the ${partName(path)} ${lotSize === 1 ? 'was' : 'were'} measured.`;
    return [
      { code: 'LOT-SMALL', severity: 'info', path, value: lotSize, limit: rules.lotSmall, unit: '1', message },
    ] satisfies Found[];
  });
}
