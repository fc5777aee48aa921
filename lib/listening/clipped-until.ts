/** Samples this near the loudest one may be flat against the top. */
const FLAT_SHARE = 0.9995
/** At full scale they are. Below it only so many in a row that do not move, as no ringing makes them. */
const FULL_SCALE = 0.999
const LEAST_IN_A_ROW = 6
const STANDING_SHARE = 1e-5
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
  const top = FLAT_SHARE * peak
  const needed = peak >= FULL_SCALE ? 1 : LEAST_IN_A_ROW
  let early = 0
  let last = strikeAt - 1
  for (let i = strikeAt; i < end;) {
    const level = Math.abs(samples[i] ?? 0)
    let run = i + 1
    while (run < end && Math.abs(Math.abs(samples[run] ?? 0) - level) <= STANDING_SHARE * peak) run++
    if (level >= top && run - i >= needed) {
      last = run - 1
      early += Math.max(0, Math.min(run, strikeAt + beginning) - i)
    }
    i = run
  }
  if (last - strikeAt > WAITED_OUT_S * sampleRateHz || early > MOST_SHARE * beginning) return null
  return last + 1
}
