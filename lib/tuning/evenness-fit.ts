export type FitPoint = {
  /** Clockwise from the badge, radians. */
  seenRad: number
  value: number
  /** 1 for a reading fully trusted, towards 0 for a doubtful one: its variance is noise²/weight. */
  weight: number
}

/** Which directions of cos 2(θ − θ0) the lugs tell apart: both, or only high at lug 1 from high a quarter round (four even lugs). */
export type TwoFoldPhases = 'both' | 'one'

export type TwoFoldFit = {
  mean: number
  /** Half the way from the low pair to the high pair, in the unit of the values. */
  amplitude: number
  /** Direction of the high pair, 0 to π, clockwise from the badge. */
  highRad: number
  /** Standard error of the amplitude along it, and the largest in any direction, for a noise of 1 on a fully trusted value. */
  unitError: number
  largestUnitError: number
  unitErrorOfMean: number
  /** Σ weight·residual², and how many values are left over to judge it by. */
  squares: number
  degrees: number
}

/** Directions count as told apart while none is more than this many times as uncertain (variance) as with evenly spread lugs. */
const SPREAD_LIMIT = 6

/** What lugs at these angles tell when all of them are read. */
export function twoFoldPhases(lugsRad: readonly number[]): TwoFoldPhases {
  const points = lugsRad.map((seenRad) => ({ seenRad, value: 0, weight: 1 }))
  return fitTwoFold(points, 'both') === null ? 'one' : 'both'
}

/**
 * Weighted least squares of value = mean + amplitude·cos 2(θ − θ0). Null when the points are too few to leave one over to judge
 * by, or stand so that directions cannot be told apart. With one phase, the high pair is at the first point or a quarter round from it.
 */
export function fitTwoFold(points: readonly FitPoint[], phases: TwoFoldPhases): TwoFoldFit | null {
  const zeroRad = points[0]?.seenRad ?? 0
  const rows = points.map(({ seenRad }) => {
    const twice = 2 * (seenRad - zeroRad)
    return phases === 'both' ? [1, Math.cos(twice), Math.sin(twice)] : [1, Math.cos(twice)]
  })
  const unknowns = phases === 'both' ? 3 : 2
  if (points.length <= unknowns) return null
  const weighed = (a: number, of: (i: number) => number) =>
    points.reduce((sum, { weight }, i) => sum + weight * (rows[i]?.[a] ?? 0) * of(i), 0)
  const all = Array.from({ length: unknowns }, (_, a) => a)
  const inverse = inverted(all.map((a) => all.map((b) => weighed(a, (i) => rows[i]?.[b] ?? 0))))
  if (inverse === null) return null

  const [vCos, vSin, both] = [inverse[1]?.[1] ?? 0, inverse[2]?.[2] ?? 0, inverse[1]?.[2] ?? 0]
  const largest = (vCos + vSin) / 2 + Math.hypot((vCos - vSin) / 2, both)
  const weights = points.reduce((sum, { weight }) => sum + weight, 0)
  if (largest * weights > SPREAD_LIMIT * 2) return null

  const right = all.map((a) => weighed(a, (i) => points[i]?.value ?? 0))
  const answer = inverse.map((row) => dot(row, right))
  const [mean = 0, cos = 0, sin = 0] = answer
  const amplitude = Math.hypot(cos, sin)
  const along = amplitude === 0 ? largest : (cos ** 2 * vCos + 2 * cos * sin * both + sin ** 2 * vSin) / amplitude ** 2
  return {
    ...{ mean, amplitude, highRad: withinHalfTurn(zeroRad + Math.atan2(sin, cos) / 2) },
    ...{
      unitError: Math.sqrt(along),
      largestUnitError: Math.sqrt(largest),
      unitErrorOfMean: Math.sqrt(inverse[0]?.[0] ?? 0),
    },
    squares: points.reduce((sum, { value, weight }, i) => sum + weight * (value - dot(rows[i] ?? [], answer)) ** 2, 0),
    degrees: points.length - unknowns,
  }
}

/** Inverse by Gauss–Jordan with pivoting; null when the matrix is singular to rounding. */
function inverted(matrix: readonly (readonly number[])[]): number[][] | null {
  const size = matrix.length
  const work = matrix.map((row, i) => [...row, ...row.map((_, j) => (i === j ? 1 : 0))])
  for (let column = 0; column < size; column++) {
    const rest = work.slice(column)
    const pivot = rest.reduce(
      (best, row) => (Math.abs(row[column] ?? 0) > Math.abs(best[column] ?? 0) ? row : best),
      rest[0] ?? [],
    )
    const size0 = pivot[column] ?? 0
    if (!(Math.abs(size0) > 1e-9)) return null
    const unit = pivot.map((value) => value / size0)
    work.splice(work.indexOf(pivot), 1)
    work.splice(column, 0, unit)
    work.forEach((row, i) => {
      const factor = row[column] ?? 0
      if (i !== column) work[i] = row.map((value, j) => value - factor * (unit[j] ?? 0))
    })
  }
  return work.map((row) => row.slice(size))
}

function dot(a: readonly number[], b: readonly number[]): number {
  return a.reduce((sum, value, i) => sum + value * (b[i] ?? 0), 0)
}

function withinHalfTurn(angleRad: number): number {
  const wrapped = ((angleRad % Math.PI) + Math.PI) % Math.PI
  return Math.PI - wrapped < 1e-9 ? 0 : wrapped
}
