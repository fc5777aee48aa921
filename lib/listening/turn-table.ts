const tables = new Map<number, { cos: Float64Array; sin: Float64Array }>()

/** e^{−2πi·j/size} for j from 0 to size − 1. @param size length of a transform */
export function turnTable(size: number): { cos: Float64Array; sin: Float64Array } {
  let table = tables.get(size)
  if (table === undefined) {
    const angle = (j: number) => (-2 * Math.PI * j) / size
    table = {
      cos: Float64Array.from({ length: size }, (_, j) => Math.cos(angle(j))),
      sin: Float64Array.from({ length: size }, (_, j) => Math.sin(angle(j))),
    }
    tables.set(size, table)
  }
  return table
}
