import { wireLength } from '../receiver';
import type { Verdict } from '../receiver';
import { valuesAt } from '../kits/rules';
import type { VersionContent } from '../kits/schemas';
import { refused } from '../problem';
import { printable } from './rules';
import type { Gate, GuideView, PrintWinding } from './schemas';

/** A hand-wound coil of the right wire reads within this share of the computed resistance; a meter's leads add the rest. */
const resistanceSpread = 0.1;

interface Coil {
  winding: PrintWinding;
  rows: GuideView['windingRows'];
  taps: GuideView['tapRows'];
  gate: Gate | null;
}

/** The winding of a version in figures a builder can measure: turns, lengths of wire, millimetres, ohms. */
export function coilView(content: VersionContent, verdict: Verdict): Coil {
  const former = valuesAt(content, 'tuning coil', 'coil-former');
  const wire = valuesAt(content, 'tuning coil', 'wire');
  if (!former || !wire) throw refused('This version has no coil to wind, so no guide can be made of it.');
  const { winding, coupling, detectorAt } = content.circuit;
  const wireLine = content.lines.find((line) => line.place === 'tuning coil' && line.part?.values.kind === 'wire');
  // The same pitch as the engine's: by hand a turn takes 3 % more than the wire is thick.
  const pitch = winding.pitch ?? 1.03 * wire.overall;
  const metresTo = (turns: number, loops: number) =>
    wireLength({ turns, diameter: former.outerDiameter.nominal + wire.overall, pitch, leads: lead, taps: loops });

  const taps = [
    ...(coupling === 'aerial-tap' && winding.aerialTap !== null
      ? [{ turn: winding.aerialTap, label: 'aerial tap', goesTo: 'aerial terminal' }]
      : []),
    ...(detectorAt === 'tap' && winding.detectorTap !== null
      ? [{ turn: winding.detectorTap, label: 'detector tap', goesTo: 'detector' }]
      : []),
  ].sort((a, b) => a.turn - b.turn);
  const length = verdict.coil.length ?? winding.turns * pitch;
  const resistance = verdict.coil.rDc;
  const gate = resistance === null ? null : ohms(resistance);

  return {
    winding: {
      former: {
        form: 'tube',
        diameterMm: millimetres(former.outerDiameter.nominal),
        lengthMm: millimetres(former.length),
        windingMm: millimetres(length),
      },
      turns: winding.turns,
      taps: taps.map(({ turn, label }) => ({ turn, label })),
      startGoesTo: 'earth',
      endGoesTo: 'capacitor',
    },
    rows: [
      {
        what: 'Former',
        value: `${millimetres(former.outerDiameter.nominal)} mm across, ${millimetres(former.length)} mm long`,
      },
      { what: 'Wire', value: `${printable(wireLine?.part?.name ?? '')}, ${(wire.bare * 1000).toFixed(2)} mm bare` },
      { what: 'Wire in the box', value: `${((wireLine?.quantity ?? 0) / 1000).toFixed(1)} m` },
      { what: 'Turns', value: String(winding.turns) },
      {
        what: 'From turn to turn',
        value:
          winding.pitch === null
            ? `side by side, about ${(pitch * 1000).toFixed(2)} mm`
            : `${(pitch * 1000).toFixed(2)} mm`,
      },
      { what: 'Winding length', value: `${millimetres(length)} mm` },
      { what: 'Wire used, with both ends', value: `${metresTo(winding.turns, taps.length).toFixed(2)} m` },
      ...(gate ? [{ what: 'Start to end on a meter', value: `${gate.low} to ${gate.high} Ω` }] : []),
    ],
    taps: [
      { point: 'Start', turns: '0', wire: `${(lead / 2).toFixed(2)} m`, goesTo: 'earth terminal' },
      ...taps.map((tap, index) => ({
        point: tap.label === 'aerial tap' ? 'Aerial tap' : 'Detector tap',
        turns: String(tap.turn),
        wire: `${(metresTo(tap.turn, index) - lead / 2).toFixed(2)} m`,
        goesTo: tap.goesTo,
      })),
      {
        point: 'End',
        turns: String(winding.turns),
        wire: `${metresTo(winding.turns, taps.length).toFixed(2)} m`,
        goesTo: 'capacitor',
      },
    ],
    gate,
  };
}

/** Both ends together, metres: 15 cm are left at each (the same in the parts line of the wire). */
const lead = 0.3;

const millimetres = (metres: number) => Math.round(metres * 10_000) / 10;

/** One decimal below ten ohms; whole ohms above, where a meter shows no more. */
function ohms(resistance: number): Gate {
  const decimals = resistance < 10 ? 1 : 0;
  return {
    low: (resistance * (1 - resistanceSpread)).toFixed(decimals),
    high: (resistance * (1 + resistanceSpread)).toFixed(decimals),
    unit: 'Ω',
  };
}
