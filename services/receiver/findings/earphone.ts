import type { Figures } from '../figures';
import { fieldAt } from '../audio';
import { shownFrequency, shownPercent, shownQuantity, type Found } from './finding';

export function earphoneShare({ audioFigures, phone, rules }: Figures): Found[] {
  const ceramic = phone.kind === 'ceramic';
  const share = ceramic ? audioFigures.voltageShare : audioFigures.powerShare;
  const [stop, note] = ceramic ? [rules.voltageStop, rules.voltageNote] : [rules.powerStop, rules.powerNote];
  if (share === null || share >= note) return [];
  const what = ceramic ? 'audio voltage' : 'available audio power';
  const message = `The earphone takes ${shownPercent(share, share < 0.01 ? 2 : 1)} of the ${what}.`;
  const stops = share < stop;
  return [
    {
      code: 'PHONE-Z',
      severity: stops ? 'stop' : 'note',
      path: 'earphone',
      value: share,
      limit: stops ? stop : note,
      unit: '1',
      message,
    },
  ];
}

export function directPath({ phone, rules }: Figures): Found[] {
  if (phone.kind !== 'ceramic' || phone.transformer !== null) return [];
  const back = phone.returnResistor;
  if (back !== null && back >= rules.returnMin && back <= rules.returnMax) return [];
  const message =
    back === null
      ? 'The detector has no path for direct current: the sound stops.'
      : `The return resistor of ${shownQuantity(back, 'Ω')} is outside ${shownQuantity(rules.returnMin, 'Ω')} to ${shownQuantity(rules.returnMax, 'Ω')}.`;
  const limit = back !== null && back > rules.returnMax ? rules.returnMax : rules.returnMin;
  return [{ code: 'PHONE-DC', severity: 'stop', path: 'returnResistor', value: back, limit, unit: 'ohm', message }];
}

export function lowpass({ audioFigures, phone, rules }: Figures): Found[] {
  const { corner } = audioFigures;
  if (phone.kind !== 'ceramic' || corner === null || corner >= rules.lowpassNote) return [];
  const stops = corner < rules.lowpassStop;
  const message = `Speech sounds dull: the corner lies at ${Math.round(corner)} Hz.`;
  const limit = stops ? rules.lowpassStop : rules.lowpassNote;
  return [
    {
      code: 'PHONE-LOWPASS',
      severity: stops ? 'stop' : 'note',
      path: 'earphone',
      value: corner,
      limit,
      unit: 'Hz',
      message,
    },
  ];
}

export function damping({ soundings: [, middle], rules }: Figures): Found[] {
  const ratio = middle.q / middle.qUnloaded;
  if (!(ratio < rules.damping)) return [];
  const message = `Detector and earphone damp the tuned circuit: its Q falls from ${middle.qUnloaded.toFixed(0)} to ${middle.q.toFixed(0)} at ${shownFrequency(middle.f)}.`;
  return [
    { code: 'PHONE-DAMP', severity: 'note', path: 'earphone', value: ratio, limit: rules.damping, unit: '1', message },
  ];
}

export function level({ audioFigures, design, rules }: Figures): Found[] {
  const { level: decibels } = audioFigures;
  if (decibels === null || decibels >= rules.levelInfo) return [];
  const weak = decibels < rules.levelNote;
  const field = fieldAt(design);
  const where = decibels >= 0 ? 'above' : 'below';
  const message = `At ${shownQuantity(field, 'V/m')} speech is ${Math.abs(decibels).toFixed(0)} dB ${where} threshold.`;
  const limit = weak ? rules.levelNote : rules.levelInfo;
  return [
    {
      code: 'PHONE-LEVEL',
      severity: weak ? 'note' : 'info',
      path: 'place.field',
      value: decibels,
      limit,
      unit: 'dB',
      message,
    },
  ];
}
