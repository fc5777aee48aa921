import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { requireQuantity } from '@/lib/acoustics/require-quantity'
import type { FitPoint, TwoFoldFit } from './evenness-fit'
import { requireLugs } from './lug-order'

/** What was read at one lug. */
export type LugValue = {
  lug: number
  /** Clockwise from the badge as seen facing the head, radians, rising from lug to lug (`FacedLug.seenRad`). */
  seenRad: number
  /** Null when the lug was not read. */
  value: number | null
  /** 1 unless said: how far the reading is trusted, 0 (as if not read) to 1. */
  trust?: number
}

/** A figure that cannot be negative, with its standard error and the interval that holds it 19 times in 20 or more often. */
export type Amount = { value: number; standardError: number; low: number; high: number }

/** The facing pair that is high and the pair across it. A lug counts when it is the nearest to the axis, or as good as. */
export type Axis = { highRad: number; standardErrorRad: number; highLugs: number[]; lowLugs: number[] }

export type Refusal =
  /** Too few lugs read, or only ones that cannot tell the directions apart. `read` are those read. */
  | { kind: 'not-enough'; read: number[] }
  /** The readings contradict one another: no film in balance sounds so. `again`: the lugs to read again. */
  | { kind: 'not-sure'; residual: number; expected: number; again: number[] }

/** A reading that counts. */
export type ReadPoint = FitPoint & { lug: number }

/** The lugs that were read and are trusted, each value through `valueOf`. @throws AcousticsError naming `lugs`, `seenRad` or `trust` */
export function readPoints(lugs: readonly LugValue[], valueOf: (value: number) => number): ReadPoint[] {
  requireLugs(lugs.length)
  lugs.forEach(({ seenRad }, i) => {
    const before = lugs[i - 1]?.seenRad ?? Number.NEGATIVE_INFINITY
    if (!Number.isFinite(seenRad) || seenRad <= before || seenRad - (lugs[0]?.seenRad ?? 0) >= 2 * Math.PI) {
      throw new AcousticsError('seenRad', 'Lug angles must be finite, rise from lug to lug and lie within one turn.')
    }
  })
  return lugs.flatMap(({ lug, seenRad, value, trust = 1 }) => {
    const weight = requireQuantity('trust', trust, { min: 0, max: 1, unit: '' })
    return value === null || weight === 0 ? [] : [{ lug, seenRad, value: valueOf(value), weight }]
  })
}

/** Noise of one fully trusted value, and how many values it was judged by; infinite when it is simply stated. */
export type JudgedNoise = { noise: number; degrees: number }

/** The stated noise counts as much as this many left-over readings when the noise of this head is judged. */
const NOISE_DEGREES = 8

/** Noise judged by what was stated and by what the fit leaves over, pooled. */
export function pooledNoise({ squares, degrees }: TwoFoldFit, stated: number): JudgedNoise {
  const pooled = NOISE_DEGREES + degrees
  return { noise: Math.sqrt((NOISE_DEGREES * stated ** 2 + squares) / pooled), degrees: pooled }
}

/**
 * Radius, in standard errors, of the circle about a fitted (cos, sin) pair that holds the true one 19 times in 20: √(2F), F the
 * quantile of Fisher's distribution with 2 and ν degrees, which has the closed form (ν/2)·(0.05^{−2/ν} − 1), and −ln 0.05 for ν = ∞.
 */
function radius95(degrees: number): number {
  return Math.sqrt(2 * (Number.isFinite(degrees) ? (degrees / 2) * (0.05 ** (-2 / degrees) - 1) : -Math.log(0.05)))
}

/** The two-fold amplitude times `factor`, with its interval. Noise alone makes some: a value whose `low` is 0 may be none at all. */
export function amountOf(fit: TwoFoldFit, { noise, degrees }: JudgedNoise, factor: number): Amount {
  const reach = radius95(degrees) * fit.largestUnitError * noise
  return {
    value: fit.amplitude * factor,
    standardError: fit.unitError * noise * factor,
    low: Math.max(0, fit.amplitude - reach) * factor,
    high: (fit.amplitude + reach) * factor,
  }
}

/** The axis of the two-fold part, or null while its amplitude could as well be none. */
export function axisOf(fit: TwoFoldFit, judged: JudgedNoise, lugs: readonly LugValue[]): Axis | null {
  if (amountOf(fit, judged, 1).low === 0) return null
  return {
    highRad: fit.highRad,
    standardErrorRad: (fit.largestUnitError * judged.noise) / (2 * fit.amplitude),
    highLugs: lugsAt(fit.highRad, lugs),
    lowLugs: lugsAt(fit.highRad + Math.PI / 2, lugs),
  }
}

/** The lug nearest to either end of a line through the centre, and its neighbour when that is as near within a fifth. */
function lugsAt(lineRad: number, lugs: readonly LugValue[]): number[] {
  const near = [0, Math.PI].flatMap((end) => {
    const away = lugs.map(({ lug, seenRad }) => ({
      lug,
      rad: Math.abs(Math.atan2(Math.sin(seenRad - lineRad - end), Math.cos(seenRad - lineRad - end))),
    }))
    const least = Math.min(...away.map(({ rad }) => rad))
    return away.filter(({ rad }) => rad <= least * 1.2 + 1e-6).map(({ lug }) => lug)
  })
  return [...new Set(near)].sort((a, b) => a - b)
}
