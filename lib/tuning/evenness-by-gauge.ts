import { requirePitchHz, requireQuantity } from '@/lib/acoustics/require-quantity'
import { amountOf, axisOf, pooledNoise, readPoints } from './evenness'
import type { Amount, Axis, JudgedNoise, LugValue, ReadPoint, Refusal } from './evenness'
import { fitTwoFold, twoFoldPhases } from './evenness-fit'
import type { TwoFoldFit, TwoFoldPhases } from './evenness-fit'
import { warbleHz } from './warble'

/** One Fourier part of gauge readings: k highs and k lows round the head, in gauge units. `highRad` is its first high, 0 to 2π/k. */
export type Part = { k: number; amplitude: number; highRad: number; standardError: number }

export type GaugeEvenness =
  | Extract<Refusal, { kind: 'not-enough' }>
  | {
      kind: 'read'
      /** Gauge units, as everything here but `film`. */
      mean: number
      standardErrorOfMean: number
      twoFold: Amount
      phases: TwoFoldPhases
      axis: Axis | null
      /** Every part from k = 1 on, when every lug was read and they are evenly spaced; else null. */
      parts: Part[] | null
      /** More k = 1 than the noise explains: a film in balance has none. Friction on the edge, a bent hoop, or a wrong reading. */
      oneSided: boolean
      /** Only with a calibrated gauge. ε is without unit; the warble in Hz. */
      film: { meanNPerM: number; unevenness: Amount; warble: Amount } | null
    }

/** Noise of one gauge reading, units (from memory). */
export const GAUGE_NOISE = 0.35

/**
 * Evenness by the gauge. Its numbers are relative: film tension, ε = (2/(N·T̄))·|Σ T_i·e^{−2iθ_i}| and the warble (ε/2)·f11 come
 * only with `film`, a calibrated gauge's tension for a reading (null outside what was calibrated) and the head's tap pitch f11.
 * With four evenly spaced lugs the sum counts its one phase twice, so half of it is taken (least squares does so by itself).
 * A gauge shows every pattern, so what the two-fold part leaves over is not held against the readings.
 * @throws AcousticsError naming `lugs`, `seenRad`, `value`, `trust`, `noise` or `tapHz`
 */
export function gaugeEvenness({
  lugs,
  noise = GAUGE_NOISE,
  film,
}: {
  lugs: readonly LugValue[]
  noise?: number
  film?: { tensionAt: (reading: number) => number | null; tapHz: number }
}): GaugeEvenness {
  requireQuantity('noise', noise, { min: 0.001, max: 100, unit: '' })
  const points = readPoints(lugs, (value) => requireQuantity('value', value, { min: 0, max: 1000, unit: '' }))
  const phases = twoFoldPhases(lugs.map(({ seenRad }) => seenRad))
  const fit = fitTwoFold(points, phases)
  if (fit === null) return { kind: 'not-enough', read: points.map(({ lug }) => lug) }
  const parts = fourierParts(lugs, points, noise)
  // A full round keeps the patterns apart; with gaps the others leak into the two-fold part, so they count as noise.
  const judgedAt = (at: TwoFoldFit, stated: number) =>
    parts === null ? pooledNoise(at, stated) : { noise: stated, degrees: Number.POSITIVE_INFINITY }
  const judged = judgedAt(fit, noise)
  const one = parts?.find(({ k }) => k === 1)
  return {
    kind: 'read',
    mean: fit.mean,
    standardErrorOfMean: fit.unitErrorOfMean * judged.noise,
    twoFold: amountOf(fit, judged, 1),
    phases,
    axis: axisOf(fit, judged, lugs),
    parts,
    // Once in a hundred times noise alone does so: −2·ln 0.01 is the square of the radius, in standard errors.
    oneSided: one !== undefined && (one.amplitude / one.standardError) ** 2 > -2 * Math.log(0.01),
    film: film === undefined ? null : filmEvenness({ points, phases, noise, judgedAt, ...film }),
  }
}

function filmEvenness({
  points,
  phases,
  noise,
  judgedAt,
  tensionAt,
  tapHz,
}: {
  points: readonly ReadPoint[]
  phases: TwoFoldPhases
  noise: number
  judgedAt: (fit: TwoFoldFit, stated: number) => JudgedNoise
  tensionAt: (reading: number) => number | null
  tapHz: number
}): { meanNPerM: number; unevenness: Amount; warble: Amount } | null {
  requirePitchHz('tapHz', tapHz)
  const tensions = points.map((point) => ({ ...point, value: tensionAt(point.value) }))
  const known = tensions.flatMap(({ value, ...point }) =>
    value !== null && value > 0 && Number.isFinite(value) ? [{ ...point, value }] : [],
  )
  const fit = known.length < points.length ? null : fitTwoFold(known, phases)
  if (fit === null) return null
  const meanReading = points.reduce((sum, { value }) => sum + value, 0) / points.length
  const [above, below] = [tensionAt(meanReading + noise), tensionAt(meanReading - noise)]
  if (above === null || below === null) return null
  const judged = judgedAt(fit, Math.abs(above - below) / 2)
  return {
    meanNPerM: fit.mean,
    unevenness: amountOf(fit, judged, 1 / fit.mean),
    warble: amountOf(fit, judged, warbleHz(1, tapHz) / fit.mean),
  }
}

/** The discrete Fourier transform of a full round of evenly spaced lugs. */
function fourierParts(lugs: readonly LugValue[], points: readonly ReadPoint[], noise: number): Part[] | null {
  const count = lugs.length
  const first = lugs[0]?.seenRad ?? 0
  const evenly = lugs.every(({ seenRad }, i) => Math.abs(seenRad - first - (2 * Math.PI * i) / count) < 0.035)
  if (points.length < count || !evenly || points.some(({ weight }) => weight < 1)) return null
  return Array.from({ length: Math.floor(count / 2) }, (_, i) => {
    const k = i + 1
    const alone = 2 * k === count
    const sum = (wave: (angle: number) => number) =>
      ((alone ? 1 : 2) / count) *
      points.reduce((total, { value }, n) => total + value * wave((k * (2 * Math.PI * n)) / count), 0)
    const [cos, sin] = [sum(Math.cos), alone ? 0 : sum(Math.sin)]
    const turn = (2 * Math.PI) / k
    return {
      k,
      amplitude: Math.hypot(cos, sin),
      highRad: (((first + Math.atan2(sin, cos) / k) % turn) + turn) % turn,
      standardError: noise * Math.sqrt((alone ? 1 : 2) / count),
    }
  })
}
