import { place, shownKHz, type Axis } from '@/templates/drawings/reach-axis';

/** The set tuned to one frequency. */
export type ResponseSetting = {
  /** Station or dial mark; without one the frequency names it. */
  name?: string | undefined;
  /** Tuned to, hertz. */
  f: number;
  /** Width between the −3 dB points, hertz; null where there are none. */
  width: number | null;
  /** Hertz and dB, relative to the strongest peak of all settings. */
  curve: { f: readonly number[]; db: readonly number[] };
};

/** Levels under this are drawn at the floor, dB. */
export const FLOOR_DB = -24;
export const DB_LINES = [0, -6, -12, -18, -24] as const;

/** Heights of the plot, pixels. */
export const PLOT = { height: 176, top: 18, floor: 152, scale: 170 } as const;

export function levelAt(db: number): number {
  const held = Math.max(FLOOR_DB, Math.min(0, db));
  return round(PLOT.top + (held / FLOOR_DB) * (PLOT.floor - PLOT.top));
}

/** A polyline in a box 1000 wide. Points outside the axis are left out. */
export function curvePath(axis: Axis, curve: ResponseSetting['curve']): string {
  const points = curve.f.flatMap((f, index) => {
    const db = curve.db[index];
    return db === undefined || !Number.isFinite(db) || f < axis.lo || f > axis.hi
      ? []
      : [`${round(place(axis, f) * 1000)} ${levelAt(db)}`];
  });
  return points.length > 1 ? `M${points.join('L')}` : '';
}

/** The level at the setting's own frequency: where its label stands. */
export function peakOf(setting: ResponseSetting): number {
  const { f, db } = setting.curve;
  let best = FLOOR_DB;
  let nearest = Infinity;
  f.forEach((at, index) => {
    const distance = Math.abs(at - setting.f);
    if (distance < nearest) {
      nearest = distance;
      best = db[index] ?? FLOOR_DB;
    }
  });
  return best;
}

export function settingWords({ name, f, width }: ResponseSetting): string {
  const said = name === undefined ? `${shownKHz(f)} kHz` : `${name}, ${shownKHz(f)} kHz`;
  return width === null ? said : `${said}: ${shownKHz(width)} kHz wide`;
}

export function responseSentence(settings: readonly ResponseSetting[], chosen: number | undefined): string {
  if (settings.length === 0) return 'No response: the set tunes nothing.';
  const [first] = settings;
  const shown = settings.find((setting) => setting.f === chosen) ?? first;
  const count = settings.length === 1 ? 'one dial setting' : `${settings.length} dial settings`;
  return `Response at ${count}, in decibels relative to the strongest.${shown ? ` ${settingWords(shown)}.` : ''}`;
}

const round = (value: number) => Math.round(value * 100) / 100;
