import { requirePitchHz, requireQuantity } from '@/lib/acoustics/require-quantity'
import { amountOf, axisOf, pooledNoise, readPoints } from './evenness'
import type { Amount, Axis, LugValue, ReadPoint, Refusal } from './evenness'
import { fitTwoFold, twoFoldPhases } from './evenness-fit'
import type { TwoFoldFit, TwoFoldPhases } from './evenness-fit'

export type TapEvenness =
  | Refusal
  | {
      kind: 'read'
      /** Hz. */
      mean: number
      standardErrorOfMean: number
      /** Split of the (1,1) pair, Hz: heard as so many beats a second. With one phase, what the lugs can show of it: it may be more. */
      warble: Amount
      phases: TwoFoldPhases
      /** Null while the warble could as well be none. */
      axis: Axis | null
      /** What mean and warble leave over, root mean square for each value left over, Hz. */
      residual: number
    }

/** Noise of one tap read off by ear or by a phone, cents (from memory). */
export const TAP_NOISE_CENTS = 4

const CENTS = { min: -2400, max: 2400, unit: 'cents' }

/** Contradictory: left-over squares that the noise makes once in a hundred times (normal quantile, one side). */
const CONTRADICTION_QUANTILE = 2.326

/**
 * Evenness by taps: p(θ) = p̄ + (Δ/2)·cos 2(θ − θ0) + rest, by weighted least squares, p in Hz. Taps see the (1,1) pair, so the
 * mean and the two-fold part only; the rest is reading error, and a rest far beyond `noiseCents` means contradictory readings.
 * @param zeroHz with values in cents: the pitch they count from
 * @throws AcousticsError naming `lugs`, `seenRad`, `value`, `trust`, `zeroHz` or `noiseCents`
 */
export function tapEvenness({
  lugs,
  zeroHz,
  noiseCents = TAP_NOISE_CENTS,
}: {
  lugs: readonly LugValue[]
  zeroHz?: number
  noiseCents?: number
}): TapEvenness {
  requireQuantity('noiseCents', noiseCents, { min: 0.01, max: 200, unit: 'cents' })
  if (zeroHz !== undefined) requirePitchHz('zeroHz', zeroHz)
  const points = readPoints(lugs, (value) =>
    zeroHz === undefined
      ? requirePitchHz('value', value)
      : zeroHz * 2 ** (requireQuantity('value', value, CENTS) / 1200),
  )
  const phases = twoFoldPhases(lugs.map(({ seenRad }) => seenRad))
  const fit = fitTwoFold(points, phases)
  if (fit === null) return { kind: 'not-enough', read: points.map(({ lug }) => lug) }
  const noiseHz = (fit.mean * noiseCents * Math.LN2) / 1200
  if (contradicts(fit, noiseHz)) {
    const [residual, expected] = [Math.sqrt(fit.squares / fit.degrees), noiseHz]
    return { kind: 'not-sure', residual, expected, again: suspects(points, phases, fit) }
  }
  const judged = pooledNoise(fit, noiseHz)
  return {
    kind: 'read',
    mean: fit.mean,
    standardErrorOfMean: fit.unitErrorOfMean * judged.noise,
    warble: amountOf(fit, judged, 2),
    phases,
    axis: axisOf(fit, judged, lugs),
    residual: Math.sqrt(fit.squares / fit.degrees),
  }
}

/** By Wilson and Hilferty's cube root, within a hundredth of χ² at one degree of freedom and better above. */
function contradicts({ squares, degrees }: TwoFoldFit, noise: number): boolean {
  const ninth = 2 / (9 * degrees)
  return squares / noise ** 2 > degrees * (1 - ninth + CONTRADICTION_QUANTILE * Math.sqrt(ninth)) ** 3
}

/** Lugs without which the rest agrees best; two facing lugs of six cannot be told apart, so both are named. Empty when that cannot be tried. */
function suspects(points: readonly ReadPoint[], phases: TwoFoldPhases, all: TwoFoldFit): number[] {
  const without = points.flatMap((left) => {
    const fit = fitTwoFold(
      points.filter((point) => point !== left),
      phases,
    )
    return fit === null ? [] : [{ lug: left.lug, squares: fit.squares }]
  })
  const least = Math.min(...without.map(({ squares }) => squares))
  return without.filter(({ squares }) => squares <= least + 1e-6 * all.squares).map(({ lug }) => lug)
}
