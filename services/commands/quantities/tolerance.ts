import { resonance } from '../../receiver/coils/self-capacitance';
import { clopperPearson, howeFactor, oneSidedFactor, twoSidedFactor, wilson } from '../../receiver/numeric/quantiles';
import { advance, mulberry32 } from '../../receiver/numeric/random';
import type { Inputs, Quantities } from './inputs';

function corner(i: Inputs, sign: 1 | -1): number {
  return resonance(i.number('l_h') * (1 + sign * i.number('l_tol')), i.number('c_f') * (1 + sign * i.number('c_tol')));
}

/** Half the root of the sum of squares: f goes with the root of L and of C. */
function rss(i: Inputs): number {
  return Math.sqrt(i.number('l_tol') * i.number('l_tol') + i.number('c_tol') * i.number('c_tol')) / 2;
}

function draw(i: Inputs): number {
  let state = i.number('seed') >>> 0;
  for (let n = 0; n < i.number('draw'); n += 1) state = advance(state);
  return mulberry32(state);
}

export const toleranceQuantities: Quantities = {
  lc_frequency_corner_low: (i) => corner(i, 1),
  lc_frequency_corner_high: (i) => corner(i, -1),
  lc_frequency_rss_relative: rss,
  variance_share: (i) => {
    const own = i.number(i.text('part') === 'c' ? 'c_tol' : 'l_tol');
    return (own * own) / (4 * rss(i) * rss(i));
  },
  clopper_pearson_low: (i) => clopperPearson(i.number('k'), i.number('n'), i.number('confidence')).low,
  clopper_pearson_high: (i) => clopperPearson(i.number('k'), i.number('n'), i.number('confidence')).high,
  wilson_low: (i) => wilson(i.number('k'), i.number('n'), i.number('confidence')).low,
  k_one_sided: (i) => oneSidedFactor(i.number('n'), i.number('coverage'), i.number('confidence')),
  k_two_sided: (i) =>
    i.text('method') === 'howe'
      ? howeFactor(i.number('n'), i.number('coverage'), i.number('confidence'))
      : twoSidedFactor(i.number('n'), i.number('coverage'), i.number('confidence')),
  mulberry32_uint32: draw,
};
