import { detectorFacts } from './detector/facts';
import { earphoneCircuit } from './earphone/facts';
import { directLoad, OPEN } from './earphone/loads';
import { decibel } from './numeric/exp-log';
import { planOf } from './network/plan';
import { responseAt, tuneTo } from './network/point';
import { parseDesign } from './parse';
import { loadAt } from './soundings';
import type { Hertz } from './units';

/**
 * Response of the set tuned to each setting, at each frequency: detector volts in decibel relative to the strongest
 * point of all curves. One array a setting.
 * @throws InvalidInput with every issue of the design
 */
export function responseCurves(input: unknown, settings: readonly Hertz[], f: readonly Hertz[]): Float64Array[] {
  const design = parseDesign(input);
  const plan = planOf(design);
  const { diode } = detectorFacts(design);
  const dcLoad = directLoad(earphoneCircuit(design)) ?? OPEN;
  let strongest = 0;
  const curves = settings.map((setting) => {
    plan.fill(plan.nominal);
    loadAt(plan, diode, dcLoad, setting);
    const response = responseAt(plan, tuneTo(plan, setting).c);
    const curve = Float64Array.from(f, response);
    for (const volts of curve) if (volts > strongest) strongest = volts;
    return curve;
  });
  for (const curve of curves)
    for (let i = 0; i < curve.length; i += 1) curve[i] = decibel((curve[i] ?? NaN) / strongest);
  return curves;
}
