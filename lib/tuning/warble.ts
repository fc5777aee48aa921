import { requirePitchHz, requireQuantity } from '@/lib/acoustics/require-quantity'
import { requireLugs } from './lug-order'

const UNEVENNESS = { min: 0, max: 1, unit: '' }

/**
 * Split of the (1,1) pair in Hz, heard as warble, beats a second: Δf = (ε/2)·f11, exact to first order for edge tension
 * T0·(1 + ε·cos 2θ) of a film in balance (derived; a tension that only changes from place to place, out of balance, would
 * give 0.148 ε, wrongly). Only k = 2m splits the pair (m,1), so no other pattern is heard here.
 * @throws AcousticsError ε outside 0 to 1, tap pitch outside 10 to 5000 Hz
 */
export function warbleHz(unevenness: number, tapHz: number): number {
  return (requireQuantity('unevenness', unevenness, UNEVENNESS) / 2) * requirePitchHz('tapHz', tapHz)
}

/** Two-fold unevenness ε of the film tension that makes a warble: the inverse of `warbleHz`. @throws AcousticsError */
export function unevennessOfWarble(warble: number, tapHz: number): number {
  requirePitchHz('tapHz', tapHz)
  return requireQuantity('unevenness', (2 * warble) / tapHz, UNEVENNESS)
}

/** What tap pitches at the lugs of a head can show and what they cannot. */
export type TapView = {
  lugs: number
  /** Directions of the high pair that the lugs tell apart. With four evenly spaced ones: high at lugs 1 and 3, or at 2 and 4, no other. */
  twoFold: 'every-direction' | 'on-the-lugs-only'
  /** Patterns (highs round the head) that a gauge at these lugs shows and taps do not. */
  hidden: number[]
}

/**
 * What taps with a finger on the centre can show: they sound the (1,1) pair, so the mean and k = 2. k = 1, a side shift, is in no
 * film in balance: a greased edge turns it into a shift that stretches nothing. k = 3 (high, low, high … of six lugs) and above leave
 * the pair alone. Four evenly spaced lugs stand on the waist of a pair that is high between them, so that one cannot be seen at all.
 * @throws AcousticsError lugs not a whole number 4 to 12
 */
export function observableFromTaps(lugs: number): TapView {
  requireLugs(lugs)
  return {
    lugs,
    twoFold: lugs === 4 ? 'on-the-lugs-only' : 'every-direction',
    hidden: Array.from({ length: Math.floor(lugs / 2) - 2 }, (_, i) => i + 3),
  }
}
