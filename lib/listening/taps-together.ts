import type { TapReading } from './tap-report'
import { within } from './tap-within'

/** Several taps of one pitch, taken as one reading. */
export type TapsTogether = {
  count: number
  /** Hz */
  medianHz: number
  lowestHz: number
  highestHz: number
  /** Half of the 95 % interval of the median, Hz. */
  halfHz: number
}

/** Student's t, two-sided 95 %, for 1 to 10 degrees of freedom (published: any table of it). More taps are held to the last. */
const STUDENT_T = [12.706, 4.303, 3.182, 2.776, 2.571, 2.447, 2.365, 2.306, 2.262, 2.228] as const
const NORMAL_95 = 1.96
/** The median's error over the mean's, normal scatter: √(π/2) for many taps, less for few (published). */
const MEDIAN_OVER_MEAN = 1.2533

/**
 * The median of several taps, where they lie, and how far it can be trusted. The scatter is that between the taps, or what each tap's own
 * fit leaves open when that is more: two taps that agree by luck are not sure for it. One tap knows its own error only. Null without taps.
 * @throws RangeError a pitch outside 1 to 24 000 Hz, an error under 0
 */
export function tapsTogether(taps: readonly Pick<TapReading, 'pitchHz' | 'standardErrorHz'>[]): TapsTogether | null {
  const count = taps.length
  const sorted = taps.map(({ pitchHz }) => within('pitchHz', pitchHz, 1, 24_000)).sort((a, b) => a - b)
  const [lowestHz, highestHz] = [sorted[0], sorted.at(-1)]
  if (lowestHz === undefined || highestHz === undefined) return null
  const own = Math.sqrt(
    mean(taps.map(({ standardErrorHz }) => within('standardErrorHz', standardErrorHz, 0, 24_000) ** 2)),
  )
  const medianHz = mean([sorted[Math.floor((count - 1) / 2)] ?? lowestHz, sorted[Math.floor(count / 2)] ?? lowestHz])
  return { count, medianHz, lowestHz, highestHz, halfHz: count === 1 ? NORMAL_95 * own : halfOf(sorted, own) }
}

/** Further apart than this, taps of one head are not of one pitch, cents: a quarter tone, more than an uneven head's lugs. */
const ONE_PITCH_CENTS = 50

/** Whether they are of one pitch; if not, some were another partial or the head was moved between, and their median means nothing. */
export function tapsAgree({ lowestHz, highestHz }: TapsTogether): boolean {
  return 1200 * Math.log2(highestHz / lowestHz) <= ONE_PITCH_CENTS
}

function halfOf(pitchesHz: readonly number[], ownErrorHz: number): number {
  const middle = mean(pitchesHz)
  const freedom = pitchesHz.length - 1
  const scatter = Math.sqrt(pitchesHz.reduce((sum, hz) => sum + (hz - middle) ** 2, 0) / freedom)
  const t = STUDENT_T[Math.min(freedom, STUDENT_T.length) - 1] ?? STUDENT_T[0]
  return (t * MEDIAN_OVER_MEAN * Math.max(scatter, ownErrorHz)) / Math.sqrt(pitchesHz.length)
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length
}
