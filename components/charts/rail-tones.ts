/** Class names of one look of the rail. */
export type RailTone = Record<
  | 'ground'
  | 'axis'
  | 'worst'
  | 'nominal'
  | 'chance'
  | 'chanceLine'
  | 'bracket'
  | 'hatch'
  | 'shortEdge'
  | 'pin'
  | 'pinHollow'
  | 'ring'
  | 'text'
  | 'text2'
  | 'band'
  | 'short',
  string
>;

export const railTones: Record<'paper' | 'plate' | 'print', RailTone> = {
  paper: {
    ground: 'fill-card',
    axis: 'stroke-edge',
    worst: 'fill-enamel',
    nominal: 'fill-enamel-wash stroke-enamel',
    chance: 'fill-enamel-wash',
    chanceLine: 'stroke-enamel',
    bracket: 'stroke-copper',
    hatch: 'stroke-crimson',
    shortEdge: 'stroke-crimson',
    pin: 'stroke-ink fill-ink',
    pinHollow: 'stroke-ink fill-none',
    ring: 'stroke-copper',
    text: 'fill-ink',
    text2: 'fill-ink2',
    band: 'fill-copper-ink',
    short: 'fill-crimson',
  },
  plate: {
    ground: 'fill-plate-deep',
    axis: 'stroke-on-deep2/60',
    worst: 'fill-[#f5efe2]',
    nominal: 'fill-[#f5efe2]/20 stroke-[#f5efe2]',
    chance: 'fill-[#d7dcfa]/22',
    chanceLine: 'stroke-on-deep2',
    bracket: 'stroke-on-enamel-copper',
    hatch: 'stroke-on-enamel-copper',
    shortEdge: 'stroke-on-enamel-copper',
    pin: 'stroke-[#f5efe2] fill-[#f5efe2]',
    pinHollow: 'stroke-[#f5efe2] fill-none',
    ring: 'stroke-on-enamel-copper',
    text: 'fill-on-enamel',
    text2: 'fill-on-deep2',
    band: 'fill-on-enamel-copper',
    short: 'fill-on-enamel',
  },
  print: {
    ground: 'fill-sheet',
    axis: 'stroke-[#888]',
    worst: 'fill-sheet-ink',
    nominal: 'fill-sheet stroke-sheet-ink',
    chance: 'fill-[#ddd]',
    chanceLine: 'stroke-sheet-ink',
    bracket: 'stroke-sheet-ink',
    hatch: 'stroke-sheet-ink',
    shortEdge: 'stroke-sheet-ink',
    pin: 'stroke-sheet-ink fill-sheet-ink',
    pinHollow: 'stroke-sheet-ink fill-none',
    ring: 'stroke-sheet-ink',
    text: 'fill-sheet-ink',
    text2: 'fill-[#333]',
    band: 'fill-sheet-ink',
    short: 'fill-sheet-ink',
  },
};
