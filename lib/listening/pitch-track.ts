/** One look at a pitch on its way. */
export type TrackPoint = { atS: number; hz: number; amplitude: number }

const WINDOW_S = 0.08
const STEP_S = 0.02
/** Turn over this long gives the frequency. */
const APART_S = 0.01

/**
 * Frequency and height of what lies near `aboutHz` (some 25 Hz either way), every 20 ms: turned down by `aboutHz`, smoothed by a Hann
 * window of 80 ms, frequency by the phase's advance over 20 ms.
 * @param low samples at `rateHz`
 */
export function pitchTrack(low: Float64Array, rateHz: number, aboutHz: number): TrackPoint[] {
  const half = Math.round((WINDOW_S * rateHz) / 2)
  const apart = Math.round(APART_S * rateHz)
  const window = Float64Array.from(
    { length: 2 * half },
    (_, i) => Math.sin((Math.PI * (i + 0.5)) / (2 * half)) ** 2 / half,
  )
  const turn = (2 * Math.PI * aboutHz) / rateHz
  const at = (middle: number) => {
    let re = 0
    let im = 0
    for (let i = 0; i < 2 * half; i++) {
      const n = middle - half + i
      const value = (low[n] ?? 0) * (window[i] ?? 0)
      re += value * Math.cos(turn * n)
      im -= value * Math.sin(turn * n)
    }
    return { re, im }
  }
  const points: TrackPoint[] = []
  const step = Math.round(STEP_S * rateHz)
  for (let middle = half + apart; middle + half + apart < low.length; middle += step) {
    const before = at(middle - apart)
    const after = at(middle + apart)
    const advance = Math.atan2(after.im * before.re - after.re * before.im, after.re * before.re + after.im * before.im)
    points.push({
      atS: middle / rateHz,
      hz: aboutHz + (advance * rateHz) / (4 * Math.PI * apart),
      amplitude: 2 * Math.sqrt(Math.hypot(before.re, before.im) * Math.hypot(after.re, after.im)),
    })
  }
  return points
}
