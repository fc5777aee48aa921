import type { StartingGauge } from './gauge-prediction'
import type { GaugeScale } from './gauge-profile'

/** A reading as it is read off: to half a division of the dial. */
export function readingWords(reading: number, { step }: GaugeScale): string {
  const half = step / 2
  // Ten digits drop what binary fractions add to a division such as 0.1.
  return String(Number((Math.round(reading / half) * half).toPrecision(10)))
}

/** A starting reading: "72", or "under 54" and "over 88" where the head lies outside what the gauge was calibrated on. */
export function startingWords({ reading, outside }: StartingGauge, scale: GaugeScale): string {
  const figure = readingWords(reading, scale)
  return outside === null ? figure : `${outside} ${figure}`
}

/** The interval beside it: "70–74"; null outside the calibrated range, where none is known. */
export function startingBounds({ low, high, outside }: StartingGauge, scale: GaugeScale): string | null {
  return outside === null ? `${readingWords(low, scale)}–${readingWords(high, scale)}` : null
}

/** Why a figure outside the calibrated range is only a bound. */
export const outsideWords = {
  under: 'Looser than any head this gauge was calibrated on: it reads less than this, how much less is not known.',
  over: 'Tighter than any head this gauge was calibrated on: it reads more than this, how much more is not known.',
} as const
