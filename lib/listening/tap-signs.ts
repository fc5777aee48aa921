import type { FoundPartial } from './find-partials'
import { MOST_PARTIALS } from './find-partials'
import { LOW_RATE_STEP, lowRate } from './low-rate'

/** The ring that is weighed, s after the strike. */
const FROM_S = 0.01
const TO_S = 0.2
/** A drum's ring lies low: less than this of it under 1.2 kHz is a cymbal, wires, a clap or a hiss. */
export const LEAST_LOW_SHARE = 0.3
const LEAST_OVER_QUIET = 0.3

type Ring = { samples: Float32Array; sampleRateHz: number; strikeAt: number; end: number; quiet: number }

/**
 * Share of the ring's power below some 1.2 kHz, 0 to 1, with the quiet (mean square a sample, taken as white) left out of both. Null when the ring
 * hardly stands over the quiet.
 */
export function lowShare({ samples, sampleRateHz, strikeAt, end, quiet }: Ring): number | null {
  const from = strikeAt + Math.round(FROM_S * sampleRateHz)
  const to = Math.min(end, strikeAt + Math.round(TO_S * sampleRateHz))
  let all = 0
  for (let i = from; i < to; i++) all += (samples[i] ?? 0) ** 2
  let under = 0
  for (const value of lowRate(samples, from, to)) under += value ** 2 * LOW_RATE_STEP
  const noise = (to - from) * quiet
  if (all - noise < LEAST_OVER_QUIET * all) return null
  return Math.min(1, Math.max(0, (under - noise / LOW_RATE_STEP) / (all - noise)))
}

const HARMONICS = [2, 3, 4, 5, 6]
const HARMONIC_SHARE = 0.003
const MANY_HARMONICS = 2
const FAINTEST_HARMONIC = 0.05

/** Whether the partials stand at whole multiples of one, as a voice's or a string's do and a head's do not. */
export function isHarmonic(partials: readonly FoundPartial[]): boolean {
  const highest = Math.max(...partials.map(({ height }) => height))
  const heard = partials.filter(({ height }) => height > FAINTEST_HARMONIC * highest)
  return heard.some((root) => {
    const on = HARMONICS.filter((k) =>
      heard.some(({ angle }) => Math.abs(angle / (k * root.angle) - 1) < HARMONIC_SHARE),
    )
    return on.length >= MANY_HARMONICS
  })
}

/** Of a head's partials the seventh is faint beside the first; a cymbal's or a chord's is not. */
const DENSE_SHARE = 0.35

/** Whether partial stands beside partial with no few that lead. @param partials highest first */
export function isDense(partials: readonly FoundPartial[]): boolean {
  const last = partials[MOST_PARTIALS - 1]
  return last !== undefined && last.height > DENSE_SHARE * (partials[0]?.height ?? 0)
}
