/**
 * Corrections by 1, 2, 3 … lugs: each time the lug is added that leaves the least sum of squares once all chosen are solved
 * together (order-recursive least squares: orthogonal matching pursuit). Turns lug by lug, tighter positive.
 */
export function sparseCorrections({
  off,
  shares,
  gain,
  frozen,
}: {
  /** Deviation of each lug, reading units. */
  off: Float64Array
  /** Change of the reading d places on from a turned lug, over `gain`. */
  shares: readonly number[]
  /** Reading units a turn. */
  gain: number
  /** Lugs (0-based) that may not be turned. */
  frozen: ReadonlySet<number>
}): number[][] {
  const lugs = off.length
  const found: number[][] = []
  const chosen: number[] = []
  const basis: Float64Array[] = []
  const columns = Array.from({ length: lugs }, (_, from) =>
    Float64Array.from({ length: lugs }, (__, to) => gain * shares[(to - from + lugs) % lugs]!),
  )
  const remainders = columns.map((column) => Float64Array.from(column))
  const left = Float64Array.from(off)
  while (chosen.length < lugs) {
    let best = -1
    let bestDrop = 1e-6
    for (let lug = 0; lug < lugs; lug++) {
      if (frozen.has(lug) || chosen.includes(lug)) continue
      const length = dot(remainders[lug]!, remainders[lug]!)
      if (length < 0.01 * dot(columns[lug]!, columns[lug]!)) continue
      const drop = dot(remainders[lug]!, left) ** 2 / length
      if (drop > bestDrop) {
        bestDrop = drop
        best = lug
      }
    }
    if (best < 0) break
    const unit = Float64Array.from(
      remainders[best]!,
      (value) => value / Math.sqrt(dot(remainders[best]!, remainders[best]!)),
    )
    chosen.push(best)
    basis.push(unit)
    subtract(left, unit)
    for (const remainder of remainders) subtract(remainder, unit)
    const turns = Array.from({ length: lugs }, () => 0)
    solve(chosen, columns, basis, off).forEach((turn, k) => {
      turns[chosen[k]!] = turn
    })
    found.push(turns)
  }
  return found
}

/** Least squares on the chosen columns by back substitution through their orthogonal basis: turns that cancel `off`. */
function solve(
  chosen: readonly number[],
  columns: readonly Float64Array[],
  basis: readonly Float64Array[],
  off: Float64Array,
): number[] {
  const turns = chosen.map(() => 0)
  for (let row = chosen.length - 1; row >= 0; row--) {
    let wanted = -dot(basis[row]!, off)
    for (let k = row + 1; k < chosen.length; k++) wanted -= dot(basis[row]!, columns[chosen[k]!]!) * turns[k]!
    turns[row] = wanted / dot(basis[row]!, columns[chosen[row]!]!)
  }
  return turns
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0
  for (let i = 0; i < a.length; i++) sum += a[i]! * b[i]!
  return sum
}

/** Takes from `of` its part along the unit vector. */
function subtract(of: Float64Array, unit: Float64Array): void {
  const along = dot(of, unit)
  for (let i = 0; i < of.length; i++) of[i]! -= along * unit[i]!
}
