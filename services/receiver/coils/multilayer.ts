import { positive } from '../invalid-input';
import type { Henry, Metre } from '../units';
import { WHEELER } from './nagaoka';
import { loopsInductance, type Loops } from './loops';

export interface MultilayerShape {
  innerDiameter: Metre;
  length: Metre;
  layers: number;
  turnsPerLayer: number;
  layerPitch: Metre;
  wireBare: Metre;
  highFrequency?: boolean | undefined;
}

function layerLoops(shape: MultilayerShape): Loops {
  const { innerDiameter, length, layers, turnsPerLayer, layerPitch, wireBare, highFrequency = true } = shape;
  const radius = new Float64Array(layers * turnsPerLayer);
  const height = new Float64Array(layers * turnsPerLayer);
  for (let layer = 0; layer < layers; layer += 1) {
    for (let turn = 0; turn < turnsPerLayer; turn += 1) {
      radius[layer * turnsPerLayer + turn] = innerDiameter / 2 + layerPitch * (layer + 0.5);
      height[layer * turnsPerLayer + turn] = (length / turnsPerLayer) * (turn + 0.5);
    }
  }
  return { radius, height, wireBare, highFrequency };
}

/** Inductance of turns `from` to `to`, counted layer by layer from the innermost. */
export function multilayerRange(shape: MultilayerShape, from: number, to: number): Henry {
  return loopsInductance(layerLoops(shape), from, to);
}

/**
 * Inductance of an even multilayer winding: sum over all loops. Error: 1e-9 against the same sum with Carlson's integrals;
 * a scramble winding differs by 6 % (common practice).
 * @see coils-and-capacitors.md B3
 */
export function multilayer(shape: MultilayerShape): Henry {
  positive('innerDiameter', shape.innerDiameter);
  positive('length', shape.length);
  return multilayerRange(shape, 0, shape.layers * shape.turnsPerLayer);
}

/** Quick check, +-4 %. */
export function multilayerWheeler(turns: number, meanRadius: Metre, length: Metre, depth: Metre): Henry {
  return (0.8 * WHEELER * meanRadius * meanRadius * turns * turns) / (6 * meanRadius + 9 * length + 10 * depth);
}
