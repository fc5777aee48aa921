/** A sample this near the loudest counts as flat against the top. */
const FLAT_SHARE = 0.9995
/** A sound that only touches its loudest value has fewer flat samples than this; at full scale every one counts. */
const TOUCHING = 12
const FULL_SCALE = 0.999
/** Clipping that is over so soon after the strike can be waited out, s, if it held no more than this share of the beginning. */
const WAITED_OUT_S = 0.06
const BEGINNING_S = 0.05
const MOST_SHARE = 0.1

/**
 * Where flat tops end after a strike: the index to listen from, `strikeAt` when there are none, null when the sound is
 * clipped beyond waiting. The level of the flat tops does not matter: a pre-amplifier may overrun below full scale.
 */
export function clippedUntil(
  samples: Float32Array,
  sampleRateHz: number,
  strikeAt: number,
  end: number,
): number | null {
  let peak = 0
  for (let i = strikeAt; i < end; i++) peak = Math.max(peak, Math.abs(samples[i] ?? 0))
  const beginning = Math.round(BEGINNING_S * sampleRateHz)
  let flat = 0
  let early = 0
  let last = strikeAt
  for (let i = strikeAt; i < end; i++) {
    if (Math.abs(samples[i] ?? 0) < FLAT_SHARE * peak) continue
    flat++
    last = i
    if (i < strikeAt + beginning) early++
  }
  if (flat < (peak >= FULL_SCALE ? 2 : TOUCHING)) return strikeAt
  if (last - strikeAt > WAITED_OUT_S * sampleRateHz || early > MOST_SHARE * beginning) return null
  return last + 1
}
