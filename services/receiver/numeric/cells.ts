/** Reads a cell of a typed array in a numeric loop. An index outside gives NaN, which no comparison lets through. */
export function at(cells: Float64Array, index: number): number {
  return cells[index] ?? NaN;
}
