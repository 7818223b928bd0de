const NAMES: readonly (readonly [RegExp, string])[] = [
  [/^coil\.l$/, "coil's inductance"],
  [/^coil\.sections/, "coil's section inductance"],
  [/^coil\.formerDiameter$/, "former's diameter"],
  [/^coil\.wire\.bare$/, "wire's bare diameter"],
  [/^coil\.wire\.overall$/, "wire's overall diameter"],
  [/^coil\.pitch$/, "winding's pitch"],
  [/^coil\.cSelf$/, "coil's self-capacitance"],
  [/^coil\.(q|r)$/, "coil's loss"],
  [/^coil\.lFactor$/, "coil's inductance"],
  [/^coil\.muInitial$/, "rod's permeability"],
  [/^coil\.al$/, "rod coil's inductance for one turn"],
  [/^coil\./, "coil's geometry"],
  [/^tuning\.(c\.)?min$/, "tuning element's smallest value"],
  [/^tuning\.(c\.)?max$/, "tuning element's largest value"],
  [/^tuning\.(c\.)?layers/, "foil's dielectric"],
  [/^tuning\.c$/, 'fixed capacitor'],
  [/^tuning\./, 'tuning capacitor'],
  [/^coupling\.c$/, 'coupling capacitor'],
  [/^coupling\./, 'primary'],
  [/^aerial\./, 'aerial'],
  [/^earth\./, 'earth'],
  [/^stray$/, 'stray capacitance'],
  [/^padder$/, 'padder'],
  [/^trimmer$/, 'trimmer'],
  [/^detector\./, 'detector'],
  [/^temperature$/, 'temperature'],
];

/** What a person calls the part behind a path of the design. */
export function partName(path: string): string {
  return NAMES.find(([pattern]) => pattern.test(path))?.[1] ?? path;
}
