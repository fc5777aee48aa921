import type { BandFit } from './fit-band'

/** How far apart two partials may lie and still be one mode's pair, Hz. */
export const WIDEST_PAIR_HZ = 14
/** The second of a pair falls at most so many times as fast as the first: both are one shape on one film. A room's own partials, or a note
 * under a fingertip, mostly do not. */
const MOST_DECAY_RATIO = 1.7
/** Two that nearly cancel are no pair: their amplitudes together over that of the one partial that they replace. */
const MOST_TOGETHER = 4

type Ringing = { decay: number; angle: number }

/** Whether a partial may make a pair with the pitch: near it, and not falling much faster. */
export function couldPair(pitch: Ringing, other: Ringing, rateHz: number): boolean {
  const apartHz = (Math.abs(pitch.angle - other.angle) * rateHz) / (2 * Math.PI)
  return apartHz <= WIDEST_PAIR_HZ && other.decay < MOST_DECAY_RATIO * pitch.decay
}

/** Whether a fit of two is a pair; a fit of one is not asked. `one` is the plain fit to the same sound. */
export function isPair(fit: BandFit, one: BandFit, rateHz: number): boolean {
  if (fit.kind !== 'two' && fit.kind !== 'envelope') return true
  const [d1 = 0, w1 = 0, third = 0, w2 = 0] = fit.parameters
  const [a, b] =
    fit.kind === 'envelope'
      ? [
          { decay: d1, angle: w1 + third / 2 },
          { decay: d1, angle: w1 - third / 2 },
        ]
      : [
          { decay: d1, angle: w1 },
          { decay: third, angle: w2 },
        ]
  const size = (of: BandFit, voice: number) => Math.hypot(of.amplitudes[voice]?.re ?? 0, of.amplitudes[voice]?.im ?? 0)
  return (
    couldPair(a, b, rateHz) && couldPair(b, a, rateHz) && size(fit, 0) + size(fit, 1) < MOST_TOGETHER * size(one, 0)
  )
}
