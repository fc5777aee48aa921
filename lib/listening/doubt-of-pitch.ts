import type { BandFit } from './fit-band'
import { lowRateGain, LOW_RATE_STEP } from './low-rate'
import { WIDEST_PAIR_HZ } from './pair-of-partials'
import { neighboursOf } from './pitch-among-neighbours'
import type { FittedPitch } from './pitch-of-fit'
import { warbleErrorHz } from './pitch-of-fit'

/** A look's pitch, its length and the noise of its fit, variance of a low-rate sample. */
export type Look = { pitch: FittedPitch; windowS: number; noiseVariance: number }

export type Doubt = {
  /** How far the pitch may be off beside its own error, Hz. */
  spreadHz: number
  /** Whether every look that is long enough heard the same warble. */
  warbleStands: boolean
}

/** How much further off than the looks are from each other a pitch may be. */
const LOOKS_TELL = 1.5
/** Noise that lies low, as most does, holds so many times more where the pitch is than its mean over all frequencies. */
const LOW_NOISE = 6
/** What is left over the noise is a room's: unseen under the pitch's own width it moves the pitch by this part of it. */
const UNSEEN = 0.2
/** A ring shorter than a room's, s for 60 dB, can hide a room in its own partials: this part of its width then, noise or not. */
const SHORTER_THAN_ROOM_S = 0.4
const HIDDEN = 0.1
/** Looks agree on a warble within this share of it, beside so many of their own standard deviations. */
const WARBLE_SHARE = 0.1
const WARBLE_DEVIATIONS = 2
/** A look with fewer beats in it says nothing of them. */
const FEWEST_BEATS = 1
/** A neighbour that falls so many times faster cannot have been the pair's second. */
const CANNOT_PAIR = 3

/**
 * How far a pitch is to be doubted: by how much the other looks at the ring differ from it beyond what the quiet before the strike
 * lets expect, and by how much it would move if a partial beside it were its pair, or if its pair were another's.
 * @param quietVariance noise of a low-rate sample while nothing sounds
 */
export function doubtOfPitch(
  pitch: FittedPitch,
  fit: BandFit,
  looks: readonly Look[],
  rateHz: number,
  quietVariance: number,
): Doubt {
  const asNoise = (noiseVariance: number) => Math.min(1, (LOW_NOISE * quietVariance) / noiseVariance)
  const beyond = looks.map(({ pitch: { pitchHz, standardErrorHz }, noiseVariance }) => {
    const byChance = standardErrorHz ** 2 * asNoise(noiseVariance)
    return Math.sqrt(Math.max(0, (pitchHz - pitch.pitchHz) ** 2 - byChance))
  })
  const { warble } = pitch
  const warbleStands = warble !== null && looks.every((look) => hears(look, warble.differenceHz))
  const pair = pitch.partials.length > 1 && !warbleStands ? pitch.pitchHz - (pitch.partials[0]?.frequencyHz ?? 0) : 0
  const halfWidthHz = ((fit.parameters[0] ?? 0) * rateHz) / (2 * Math.PI)
  const spreadHz = Math.hypot(
    LOOKS_TELL * Math.max(0, ...beyond),
    pair,
    shiftByNeighbours(pitch, fit, rateHz),
    halfWidthHz * Math.max(UNSEEN * (1 - asNoise(fit.noiseVariance)), pitch.t60S < SHORTER_THAN_ROOM_S ? HIDDEN : 0),
  )
  return { spreadHz, warbleStands }
}

function hears({ pitch: { warble }, windowS }: Look, differenceHz: number): boolean {
  if (differenceHz * windowS < FEWEST_BEATS) return true
  if (warble === null) return false
  const bar = WARBLE_SHARE * differenceHz + WARBLE_DEVIATIONS * warbleErrorHz(warble)
  return Math.abs(warble.differenceHz - differenceHz) < bar
}

/** How far the mean by amplitude would lie from the pitch with the neighbours counted that are near enough to be its pair. */
function shiftByNeighbours({ pitchHz, partials }: FittedPitch, fit: BandFit, rateHz: number): number {
  const own = partials.reduce((sum, { amplitude }) => sum + amplitude, 0)
  let [sum, weighted] = [own, 0]
  for (const { decay, angle, amplitude } of neighboursOf(fit)) {
    const apartHz = (angle * rateHz) / (2 * Math.PI) - pitchHz
    if (Math.abs(apartHz) > WIDEST_PAIR_HZ || decay > CANNOT_PAIR * (fit.parameters[0] ?? 0)) continue
    const gain = lowRateGain(decay / LOW_RATE_STEP, angle / LOW_RATE_STEP)
    const size = Math.hypot(amplitude.re, amplitude.im) / Math.hypot(gain.re, gain.im)
    sum += size
    weighted += size * apartHz
  }
  return weighted / sum
}
