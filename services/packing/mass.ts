import { lineMass } from '../kits/rules';
import type { VersionContent } from '../kits/schemas';
import { grams, lowerFirst } from './rules';
import type { MassView } from './schemas';

/** A guide of six A4 sheets, 80 g/m2 at 0.0624 m2 each, for versions whose lines name no print. */
const guideMilligrams = 30_000;

/** What the closed box should weigh: every line of the version, prints included. */
export function expectedMass(content: Pick<VersionContent, 'lines'>): number {
  const hasPrint = content.lines.some((line) => line.part?.values.kind === 'print');
  const lines = content.lines.reduce((sum, line) => sum + lineMass(line), 0);
  return lines + (hasPrint ? 0 : guideMilligrams);
}

/** Two per cent or two grams, whichever is more: a missing coil or earphone shows, a missing washer does not (kit-trade e.4). */
export function massLimits(expected: number): { low: number; high: number } {
  const spare = Math.max(Math.round(expected * 0.02), 2000);
  return { low: expected - spare, high: expected + spare };
}

/** What the scale's reading says, and whether the lid may close on it. */
export function weighing(expected: number, weighed: number | null, content: Pick<VersionContent, 'lines'>): MassView {
  const { low, high } = massLimits(expected);
  const range = `${grams(low)} to ${grams(high)} g`;
  const view = { expected, low, high, weighed };
  if (weighed === null) return { ...view, fits: false, sentence: `Not weighed yet. It should read ${range}.` };
  if (weighed >= low && weighed <= high) {
    return { ...view, fits: true, sentence: `${grams(weighed)} g is right: it should read ${range}.` };
  }
  const off = Math.abs(weighed - expected);
  const like = partOfMass(content, off);
  const hint = like === '' ? '' : ` That is about one ${like}.`;
  const what = weighed < low ? `${grams(off)} g is missing.` : `${grams(off)} g is too much.`;
  return {
    ...view,
    fits: false,
    sentence: `${what}${hint} Look into the box, then weigh it again; it should read ${range}.`,
  };
}

/** The part whose one piece comes nearest to a difference in mass, when it comes within a tenth. */
function partOfMass({ lines }: Pick<VersionContent, 'lines'>, milligrams: number): string {
  let best = { name: '', off: milligrams / 10 };
  for (const line of lines) {
    if (!line.part) continue;
    const one = line.part.unit === 'each' ? line.part.massMilligrams : lineMass(line);
    const off = Math.abs(one - milligrams);
    if (off < best.off) best = { name: lowerFirst(line.part.name), off };
  }
  return best.name;
}
