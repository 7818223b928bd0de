import type { Design } from '../design';
import { centre } from '../schema/value';
import type { EarphoneCircuit } from './loads';

/** The earphone with transformer, return resistor and bypass, as plain numbers. */
export function earphoneCircuit({ earphone, transformer, returnResistor, bypass }: Design): EarphoneCircuit {
  const ceramic = earphone.kind === 'ceramic';
  return {
    kind: earphone.kind,
    c: ceramic ? centre(earphone.c) : 0,
    rDc: centre(earphone.rDc),
    r: ceramic ? 0 : centre(earphone.r),
    x: ceramic ? 0 : centre(earphone.x),
    transformer:
      transformer === undefined
        ? null
        : {
            ratio: centre(transformer.ratio),
            primaryR: centre(transformer.primaryR),
            primaryL: transformer.primaryL === undefined ? Infinity : centre(transformer.primaryL),
            lossDb: centre(transformer.loss),
          },
    returnResistor: returnResistor === undefined ? null : centre(returnResistor),
    bypass: bypass === undefined ? null : centre(bypass),
  };
}
