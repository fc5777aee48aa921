import { SECONDS_A_MOVE, SECONDS_A_READING, TOLERANCE, deviations } from './game'
import type { Against } from './game'
import type { TrueDrum } from './true-drum'

export type BestPossible = { keyMoves: number; seconds: number }

/**
 * What nobody can beat on this drum: the fewest lugs that make it even when its true state and response are known and the hand is
 * exact, and one pass of readings. Every set of lugs is tried, smallest first; whether turns of a set can bring all deviations
 * within the tolerance is a Chebyshev fit, decided by Lawson's reweighting (C. L. Lawson, 1961; published), whose weighted
 * residuals bound the best fit from below and whose largest residual bounds it from above. Null when no turns make it even.
 */
export function bestPossible(drum: TrueDrum, against: Against): BestPossible | null {
  const { lugs, response } = drum
  const off = deviations(drum.readings(), against)
  const columns = response.map((_, from) => {
    const column = response.map((row) => row[from] ?? 0)
    const level = against === 'mean' ? column.reduce((sum, value) => sum + value, 0) / lugs : 0
    return column.map((value) => value - level)
  })
  for (let keyMoves = 0; keyMoves <= lugs; keyMoves++) {
    for (const chosen of setsOf(lugs, keyMoves)) {
      if (
        canBeEven(
          off,
          chosen.map((lug) => columns[lug] ?? []),
        )
      ) {
        return { keyMoves, seconds: lugs * SECONDS_A_READING + keyMoves * SECONDS_A_MOVE }
      }
    }
  }
  return null
}

function* setsOf(lugs: number, size: number, from = 0): Generator<number[]> {
  if (size === 0) {
    yield []
    return
  }
  for (let lug = from; lug <= lugs - size; lug++)
    for (const rest of setsOf(lugs, size - 1, lug + 1)) yield [lug, ...rest]
}

const LAWSON_ROUNDS = 60

/** Whether some combination of the columns brings every deviation within the tolerance; undecided fits count as yes, which keeps the bound low. */
function canBeEven(off: readonly number[], columns: readonly (readonly number[])[]): boolean {
  let weights = off.map(() => 1 / off.length)
  for (let round = 0; round < LAWSON_ROUNDS; round++) {
    const left = weightedResidual(off, columns, weights)
    const sizes = left.map(Math.abs)
    if (Math.max(...sizes) <= TOLERANCE) return true
    const first = sizes.reduce((sum, size, i) => sum + (weights[i] ?? 0) * size, 0)
    const second = sizes.reduce((sum, size, i) => sum + (weights[i] ?? 0) * size * size, 0)
    if (first > 0 && second / first > TOLERANCE) return false
    const raw = weights.map((weight, i) => weight * (sizes[i] ?? 0))
    const total = raw.reduce((sum, weight) => sum + weight, 0)
    weights = raw.map((weight) => weight / total)
  }
  return true
}

/** Residual of weighted least squares, by Gram–Schmidt in the weights' inner product. */
function weightedResidual(
  off: readonly number[],
  columns: readonly (readonly number[])[],
  weights: readonly number[],
): number[] {
  const inner = (a: readonly number[], b: readonly number[]) =>
    a.reduce((sum, value, i) => sum + (weights[i] ?? 0) * value * (b[i] ?? 0), 0)
  const without = (of: readonly number[], unit: readonly number[]) => {
    const along = inner(of, unit)
    return of.map((value, i) => value - along * (unit[i] ?? 0))
  }
  const basis: number[][] = []
  let left = [...off]
  for (const column of columns) {
    const rest = basis.reduce<number[]>(without, [...column])
    const length = Math.sqrt(inner(rest, rest))
    if (length < 1e-6 * Math.sqrt(inner(column, column)) || length === 0) continue
    const unit = rest.map((value) => value / length)
    basis.push(unit)
    left = without(left, unit)
  }
  return left
}
