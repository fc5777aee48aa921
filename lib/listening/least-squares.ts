import { solveSymmetric } from './solve-symmetric'

/**
 * Products of every two columns after each is scaled to length one, row by row, and the lengths they had: an empty column counts as
 * one long.
 */
export function gramOf(columns: Float64Array[]): { gram: Float64Array; scale: Float64Array } {
  const n = columns.length
  const gram = new Float64Array(n * n)
  const scale = new Float64Array(n)
  for (let i = 0; i < n; i++) {
    for (let j = 0; j <= i; j++) {
      const a = columns[i] ?? scale
      const b = columns[j] ?? scale
      let sum = 0
      for (let r = 0; r < a.length; r++) sum += (a[r] ?? 0) * (b[r] ?? 0)
      gram[i * n + j] = sum
      gram[j * n + i] = sum
    }
  }
  for (let i = 0; i < n; i++) scale[i] = Math.sqrt(gram[i * n + i] ?? 0) || 1
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < n; j++) gram[i * n + j] = (gram[i * n + j] ?? 0) / ((scale[i] ?? 1) * (scale[j] ?? 1))
  }
  return { gram, scale }
}

/**
 * How much of each column makes up the data best, in the sense of least squares; null when the columns cannot be told apart.
 * Columns are scaled to length one first; `damping` is added to the diagonal then.
 */
export function leastSquares(columns: Float64Array[], data: Float64Array, damping: number): Float64Array | null {
  const n = columns.length
  const { gram, scale } = gramOf(columns)
  for (let i = 0; i < n; i++) gram[i * n + i] = (gram[i * n + i] ?? 0) + damping
  const right = new Float64Array(n)
  columns.forEach((column, i) => {
    let sum = 0
    for (let r = 0; r < data.length; r++) sum += (column[r] ?? 0) * (data[r] ?? 0)
    right[i] = sum / (scale[i] ?? 1)
  })
  const solved = solveSymmetric(gram, n, [right])?.[0]
  return solved?.map((value, i) => value / (scale[i] ?? 1)) ?? null
}
