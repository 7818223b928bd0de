import { dialLabels } from '../../receiver/capacitors/dial';
import { gang, type GangLaw, type GangShape } from '../../receiver/capacitors/gang';
import { colours, parseCode, threeDigit, toleranceOf } from '../../receiver/capacitors/marks';
import { disc, plates, rect, sleeve } from '../../receiver/capacitors/plates';
import { nearest, SERIES, type SeriesName } from '../../receiver/capacitors/preferred';
import {
  bandspread,
  frequencyRatio,
  inductanceForLowEnd,
  largestStray,
  padderTrimmer,
} from '../../receiver/capacitors/tuning';
import { resonance } from '../../receiver/coils/self-capacitance';
import { TWO_PI } from '../../receiver/units';
import type { Inputs, Quantities } from './inputs';

const LAWS: readonly GangLaw[] = ['capacitance', 'wavelength', 'frequency'];
const NAMES: readonly SeriesName[] = ['E6', 'E12', 'E24', 'E48', 'E96'];

function series(i: Inputs): SeriesName {
  const name = NAMES.find((each) => each === i.text('series'));
  if (name === undefined) throw new TypeError('The case names no series.');
  return name;
}

function shape(i: Inputs): GangShape {
  const law = LAWS.find((each) => each === i.text('law'));
  if (law === undefined) throw new TypeError('The case names no law.');
  return { law, min: i.number('min'), max: i.number('max'), turn: i.number('turn'), lawStray: i.number('lawStray', 0) };
}

function needed(i: Inputs): number {
  const w = TWO_PI * i.number('frequency');
  return 1 / (w * w * i.number('inductance')) - i.number('stray');
}

function padded(i: Inputs): number {
  const range = {
    min: i.number('min'),
    max: i.number('max'),
    totalMin: i.number('totalMin'),
    totalMax: i.number('totalMax'),
  };
  const { padder, trimmer } = padderTrimmer(range);
  return i.text('which') === 'padder' ? padder : trimmer;
}

export const capacitorQuantities: Quantities = {
  gang_capacitance: (i) => gang(shape(i)).at(i.number('angle')),
  dial_angle: (i) => gang(shape(i)).angleOf(needed(i)),
  dial_label_count: (i) =>
    dialLabels({
      ...shape(i),
      stray: i.number('stray'),
      inductance: i.number('inductance'),
      lo: i.number('lo'),
      hi: i.number('hi'),
      radius: i.number('radius'),
      width: i.number('width'),
      gap: i.number('gap'),
      ranks: i.numbers('ranks'),
    }).length,
  plate_capacitance: (i) => plates({ area: i.number('area'), layers: i.pairs('layers') }),
  plate_stack_capacitance: (i) =>
    plates({ area: i.number('area'), layers: i.pairs('layers'), faces: i.number('faces') }),
  disc_capacitance: (i) => disc(i.number('radius'), i.number('gap')),
  rect_capacitance: (i) => rect(i.number('width'), i.number('height'), i.number('gap')),
  sleeve_capacitance: (i) =>
    sleeve({ overlap: i.number('overlap'), innerRadius: i.number('innerRadius'), layers: i.pairs('layers') }),
  e_series_nearest: (i) => nearest(series(i), i.number('value')),
  e_series_value: (i) => SERIES[series(i)][i.number('index')],
  resistor_from_colours: (i) => colours(i.texts('bands')).value,
  tolerance_from_colours: (i) => colours(i.texts('bands')).tolerance,
  rkm_value: (i) => parseCode(i.text('code'), i.text('kind') === 'capacitance' ? 'capacitance' : 'resistance'),
  capacitor_three_digit: (i) => threeDigit(i.text('code')),
  tolerance_letter: (i) => toleranceOf(i.text('letter')),
  resonance_frequency: (i) => resonance(i.number('inductance'), i.number('capacitance')),
  frequency_ratio: (i) => frequencyRatio(i.number('min'), i.number('max'), i.number('stray')),
  largest_stray: (i) => largestStray(i.number('lo'), i.number('hi'), i.number('min'), i.number('max')),
  inductance_for_low_end: (i) => inductanceForLowEnd(i.number('lo'), i.number('max'), i.number('stray')),
  padder_trimmer: padded,
  bandspread_trimmer: (i) =>
    bandspread({ lo: i.number('lo'), hi: i.number('hi'), min: i.number('min'), max: i.number('max') }),
};
