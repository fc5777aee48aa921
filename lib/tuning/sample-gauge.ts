import type { GaugeHead, GaugePair, GaugeProfile } from './gauge-profile'
import { tapOfTensionHz } from './gauge-tension'

/** Heads and dials of no particular make: for the tests of gauges and of what is built on them. */
export const sampleHead = (
  diameterIn: number,
  depthIn: number,
  plyMils: readonly number[],
  coatingGPerM2 = 0,
): GaugeHead => ({ diameterIn, depthIn, plyMils, coatingGPerM2 })

export const tom12 = sampleHead(12, 8, [10])
export const floorTom16 = sampleHead(16, 16, [7, 7])
export const snare14 = sampleHead(14, 5.5, [10], 40)
export const kick22 = sampleHead(22, 18, [7, 7])

/**
 * A plunger on a spring against a film: the film's push grows with its tension, so the dial closes in on its end,
 * r = 100·T/(T + 850 N/m) (derived; the constant is set so that a medium-high 12 in tom reads 75, common practice).
 */
export const springDial = (tensionNPerM: number) => (100 * tensionNPerM) / (tensionNPerM + 850)

/** What a dial shows on a head at a tension, paired with the tap that the head sounds then. */
export function samplePair(
  head: GaugeHead,
  tensionNPerM: number,
  more: { dial?: (tensionNPerM: number) => number; error?: number } = {},
): GaugePair {
  const { dial = springDial, error = 0 } = more
  return {
    ...head,
    reading: dial(tensionNPerM) + error,
    tapHz: tapOfTensionHz(head, tensionNPerM, null),
    temperatureC: null,
  }
}

export const hundred = { min: 0, max: 100, step: 1 }

/** Ten pairs on four heads with a hand's errors, none over a unit. */
export const sampleGauge: GaugeProfile = {
  name: 'Brass gauge',
  scale: hundred,
  pairs: [
    samplePair(kick22, 950, { error: 0.4 }),
    samplePair(kick22, 1250, { error: -0.5 }),
    samplePair(floorTom16, 1300, { error: 0.6 }),
    samplePair(floorTom16, 1750, { error: -0.2 }),
    samplePair(tom12, 1600, { error: -0.7 }),
    samplePair(tom12, 2100, { error: 0.3 }),
    samplePair(tom12, 2800, { error: 0.1 }),
    samplePair(snare14, 3100, { error: -0.3 }),
    samplePair(snare14, 3900, { error: 0.5 }),
    samplePair(snare14, 4600, { error: -0.4 }),
  ],
}
