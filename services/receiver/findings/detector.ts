import type { Figures } from '../figures';
import { shownPercent, type Found } from './finding';

/** A tester's reading says something only of an unmeasured junction. */
function screened({ detector }: Figures): number | null {
  return detector.reading === null || detector.measured || detector.contact ? null : detector.reading;
}

export function detectorUnsuited(figures: Figures): Found[] {
  const { audioFigures, rules } = figures;
  const { relative } = audioFigures;
  const reading = screened(figures);
  if (relative !== null && relative < rules.detectorStop) {
    const message = `This detector gives next to nothing without a battery: ${shownPercent(relative)} of a germanium diode in this set.`;
    return [
      {
        code: 'DET-UNSUIT',
        severity: 'stop',
        path: 'detector',
        value: relative,
        limit: rules.detectorStop,
        unit: '1',
        message,
      },
    ];
  }
  if (reading === null || reading <= rules.forwardStop) return [];
  const message = `This detector gives next to nothing without a battery: its forward voltage at 1 mA is ${reading.toFixed(2)} V.`;
  return [
    {
      code: 'DET-UNSUIT',
      severity: 'stop',
      path: 'detector.vf1mA',
      value: reading,
      limit: rules.forwardStop,
      unit: 'V',
      message,
    },
  ];
}

export function detectorWeak(figures: Figures): Found[] {
  if (detectorUnsuited(figures).length > 0) return [];
  const { audioFigures, rules } = figures;
  const { relative } = audioFigures;
  const reading = screened(figures);
  if (relative !== null && relative < rules.detectorNote) {
    const message = `Weaker than a germanium diode: ${shownPercent(relative, 0)} of its audio voltage in this set.`;
    return [
      {
        code: 'DET-WEAK',
        severity: 'note',
        path: 'detector',
        value: relative,
        limit: rules.detectorNote,
        unit: '1',
        message,
      },
    ];
  }
  if (reading === null || reading < rules.forwardNote) return [];
  const message = `Weaker than a germanium diode: its forward voltage at 1 mA is ${reading.toFixed(2)} V.`;
  return [
    {
      code: 'DET-WEAK',
      severity: 'note',
      path: 'detector.vf1mA',
      value: reading,
      limit: rules.forwardNote,
      unit: 'V',
      message,
    },
  ];
}

export function detectorData({ detector }: Figures): Found[] {
  if (detector.measured) return [];
  const severity = detector.contact ? 'stop' : 'note';
  const message = detector.contact
    ? 'There is no measurement of this detector, and every contact differs.'
    : 'There is no measurement of this detector.';
  return [{ code: 'DET-DATA', severity, path: 'detector.measured', value: null, limit: null, unit: '', message }];
}
