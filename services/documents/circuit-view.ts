import type { FrozenLine, VersionContent } from '../kits/schemas';
import type { Place } from '../parts/schemas';
import { valueOf } from './part-names';
import type { PrintCircuit } from './schemas';

/** The circuit of a version with its references and values, as the drawing takes it. */
export function circuitView(content: VersionContent): PrintCircuit {
  const { circuit, lines } = content;
  const at = (place: Place) => labelOf(lines.find((line) => line.place === place && line.part));
  const coil = lines.find((line) => line.place === 'tuning coil' && line.part?.values.kind === 'coil-former');
  const tuning = lines.find((line) => line.place === 'tuning capacitor' && line.part);
  const coupling = at('coupling capacitor');
  const along = circuit.aerial.vertical + circuit.aerial.horizontal;

  return {
    aerial: `aerial, ${along} m`,
    earth: circuit.earth.kind === 'none' ? 'counterpoise' : 'earth',
    coupling:
      circuit.coupling === 'series-c' && coupling
        ? { kind: 'series-c', label: coupling }
        : circuit.coupling === 'aerial-tap' && circuit.winding.aerialTap !== null
          ? { kind: 'aerial-tap', label: `turn ${circuit.winding.aerialTap}` }
          : { kind: 'direct' },
    coil: { ref: coil?.reference ?? '', value: turnsOf(content) },
    tuning: {
      kind: tuning?.part?.values.kind === 'foil-capacitor' ? 'foil' : 'capacitor',
      label: labelOf(tuning) ?? { ref: '', value: '' },
    },
    padder: null,
    trimmer: null,
    detectorAt: circuit.detectorAt,
    detector: at('detector') ?? { ref: '', value: '' },
    returnResistor: at('return resistor'),
    bypass: at('bypass capacitor'),
    transformer: at('transformer'),
    earphone: at('earphone') ?? { ref: '', value: '' },
  };
}

const labelOf = (line: FrozenLine | undefined) =>
  line?.part ? { ref: line.reference, value: valueOf(line.part.values) } : null;

/** "66 turns", and where the detector's wire leaves them. */
function turnsOf({ circuit }: VersionContent): string {
  const { winding, detectorAt } = circuit;
  const tap = detectorAt === 'tap' && winding.detectorTap !== null ? `, tap ${winding.detectorTap}` : '';
  return `${winding.turns} turns${tap}`;
}
