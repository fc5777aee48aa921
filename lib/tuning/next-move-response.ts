import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { requireQuantity } from '@/lib/acoustics/require-quantity'
import type { ReadingBasis } from './head-state'
import { HAND_ERROR, HOOP_PRIORS } from './hoop-learning'
import type { HoopLearning, LogNormal } from './hoop-learning'
import { HOOP_LIMITS, lugResponse } from './lug-response'
import type { Hypothesis } from './next-move-belief'

/** What is known of how a head answers to turns, before this log. */
export type KnownResponse = Pick<HoopLearning, 'hoop' | 'gain'>

/** Quantile of the standard normal that holds nine in ten between its two sides. */
const NINE_IN_TEN = 1.645
/** A Gaussian stands for the gain's log-normal; past this spread it would reach below nothing. */
const GAIN_SPREAD_AT_MOST = 0.45
const TAP_GAIN = HOOP_PRIORS.tap.gain

/**
 * The gain to start from, reading units a whole round of turns, and its relative spread: learned, or the prior; a gauge of known
 * slope takes the taps' prior.
 * @throws AcousticsError naming `learned`
 */
export function startingGain(
  basis: ReadingBasis,
  learned: KnownResponse | null,
  gaugeUnitsPerCent: number | null,
): { value: number; spread: number } {
  const prior =
    basis === 'gauge' && gaugeUnitsPerCent !== null
      ? { median: TAP_GAIN.median * gaugeUnitsPerCent, spread: TAP_GAIN.spread }
      : HOOP_PRIORS[basis].gain
  const { median, spread } = learned === null ? prior : logNormal(learned.gain)
  return { value: median, spread: Math.max(0.03, Math.min(GAIN_SPREAD_AT_MOST, spread)) }
}

function logNormal({ value, low, high }: KnownResponse['gain']): LogNormal {
  for (const figure of [value, low, high]) requireQuantity('learned', figure, { min: 1e-9, max: 1e9, unit: '' })
  if (low > high) throw new AcousticsError('learned', `What was learned lies from ${low} to ${high}: upside down.`)
  return { median: value, spread: Math.max(0.01, Math.log(high / low) / (2 * NINE_IN_TEN)) }
}

/** Hoop parameters tried, as deviations of the logarithm from what is known. */
const HOOP_STEPS = [-1.6, -0.8, 0, 0.8, 1.6]
/** Share of an even turn that a side turn makes where the edge holds the film (k = 1 leaks). */
const SIDE_LEAK = 0.25
/** Chances that the edge holds, and that rods or edge do as they please (friction, a sticking rod); from memory. */
const CHANCES = { leak: 0.05, restless: 0.06 }

/**
 * The ways a head may answer: hoops round the known one, and for each the model as it is, with a side leak, and as a head that
 * hardly follows it (turns half lost, lugs moving by themselves).
 * @param unit what counts as a small step of the readings: one deviation of a good reading
 * @throws AcousticsError naming `learned`
 */
export function waysToAnswer(
  lugs: number,
  basis: ReadingBasis,
  learned: KnownResponse | null,
  unit: number,
): Hypothesis[] {
  const { median, spread } = learned === null ? HOOP_PRIORS[basis].hoop : logNormal(learned.hoop)
  const chances = HOOP_STEPS.map((step) => Math.exp(-0.5 * step ** 2))
  const total = chances.reduce((sum, chance) => sum + chance, 0)
  return HOOP_STEPS.flatMap((step, i) => {
    const hoop = Math.min(HOOP_LIMITS.max, Math.max(HOOP_LIMITS.min, median * Math.exp(step * spread)))
    const { shares } = lugResponse({ lugs, basis, hoop })
    const leaking = shares.map(
      (share, places) => share + (2 / lugs) * SIDE_LEAK * Math.cos((2 * Math.PI * places) / lugs),
    )
    const chance = chances[i]! / total
    const steady = { handError: HAND_ERROR, lostTurns: 0.004, restlessness: 0.15 * unit, restless: false }
    return [
      { ...steady, shares, weight: chance * (1 - CHANCES.leak - CHANCES.restless) },
      { ...steady, shares: leaking, weight: chance * CHANCES.leak },
      {
        shares,
        handError: 0.45,
        lostTurns: 0.03,
        restlessness: 0.9 * unit,
        restless: true,
        weight: chance * CHANCES.restless,
      },
    ]
  })
}
