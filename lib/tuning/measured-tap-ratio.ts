import { TAP_RATIO_LIMITS } from '@/lib/acoustics/tap-ratio-limits'

/** A pitch heard several times: their middle and half of its 95 % interval, Hz. */
export type MeasuredPitch = { readonly count: number; readonly medianHz: number; readonly halfHz: number }

/**
 * Batter tap over the drum's note with half of its 95 % interval, or why it is not known: `too-few` of either was heard; they `differ`
 * too much; no drum has such a ratio (`impossible`: one of the two was another partial, or the heads were moved between).
 */
export type MeasuredTapRatio =
  | { readonly outcome: 'measured'; readonly ratio: number; readonly half: number }
  | { readonly outcome: 'unsure'; readonly why: 'too-few' | 'differ' | 'impossible' }

/** Under three taps a median leaves nothing out. */
const FEWEST_OF_EACH = 3
/** The model itself lies within about 2 % of real drums (Rossing 1982, published): less sure than that, a measurement is no gain. */
const MOST_HALF_SHARE = 0.02

/** The errors of the two pitches are independent, so their shares add as squares. */
export function measuredTapRatio(tap: MeasuredPitch | null, note: MeasuredPitch | null): MeasuredTapRatio {
  if (!tap || !note || ![tap, note].every(({ count }) => Number.isInteger(count) && count >= FEWEST_OF_EACH))
    return { outcome: 'unsure', why: 'too-few' }
  // Two pitches under nothing would make a ratio that looks right.
  const ratio = note.medianHz > 0 ? tap.medianHz / note.medianHz : Number.NaN
  if (!(ratio >= TAP_RATIO_LIMITS.min && ratio <= TAP_RATIO_LIMITS.max)) return { outcome: 'unsure', why: 'impossible' }
  const share = Math.hypot(tap.halfHz / tap.medianHz, note.halfHz / note.medianHz)
  return Math.min(tap.halfHz, note.halfHz) >= 0 && share <= MOST_HALF_SHARE
    ? { outcome: 'measured', ratio, half: ratio * share }
    : { outcome: 'unsure', why: 'differ' }
}

/** "1.744", or "1.74" where the third place is not known. */
export function tapRatioWords({ ratio, half }: { readonly ratio: number; readonly half: number }): string {
  return ratio.toFixed(half < 0.01 ? 3 : 2)
}

/** "± 0.003": half of the interval, never under the last place that is shown. */
export function tapRatioErrorWords({ half }: { readonly half: number }): string {
  return half < 0.01 ? `± ${Math.max(half, 0.001).toFixed(3)}` : `± ${half.toFixed(2)}`
}

const UNSURE: Record<Extract<MeasuredTapRatio, { outcome: 'unsure' }>['why'], string> = {
  'too-few': `Hear both: the note ${FEWEST_OF_EACH} times and the tap ${FEWEST_OF_EACH} times or more.`,
  differ:
    'Not sure: the pitches heard differ too much among themselves. Strike softer, or even the head first, and hear more of them.',
  impossible: `Not sure: no drum’s tap is that far from its note (${TAP_RATIO_LIMITS.min} to ${TAP_RATIO_LIMITS.max} times). One of the two was another pitch: forget it and hear it again.`,
}

/** Why no ratio is named and what to do, in plain words. */
export function unsureRatioWords(why: keyof typeof UNSURE): string {
  return UNSURE[why]
}
