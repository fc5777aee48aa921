import { highPass } from './high-pass'
import { loudnessCurve, STEP } from './strike-onset'

/** A strike's click lies above this; the ring of the pitch does not. */
const CLICK_HZ = 1200
/** The first strike's own clatter is over by then, s. */
const CLATTER_S = 0.025
/** What a second strike must rise over: everything from 16 to 4 ms before it. A beat of 14 Hz does not rise so fast. */
const LOOK_BACK = 12
const GAP = 3
const CLICK_RISE = 8
const SOUND_RISE = 3
/** A second click fainter than this beside the first is no strike (power). */
const FAINTEST_CLICK = 0.004
const FAINTEST_SOUND = 0.05
/** And it stands so many times over what is there in the quietest quarter. */
const OVER_FLOOR = 8
/** Steps that are taken together. */
const TOGETHER = 3

/**
 * Whether a second strike falls into the ring of the first: a jump of the sound above 1.2 kHz, or of all of it, that no
 * ringing head makes.
 * @param strikeAt index of the first strike
 */
export function hasSecondStrike(samples: Float32Array, sampleRateHz: number, strikeAt: number, end: number): boolean {
  const lead = Math.max(0, strikeAt - Math.round(0.02 * sampleRateHz))
  const clicks = loudnessCurve(highPass(samples, lead, end, sampleRateHz, CLICK_HZ))
  const sound = loudnessCurve(samples, lead, end)
  const first = Math.floor((strikeAt - lead) / STEP)
  const after = first + Math.ceil((CLATTER_S * sampleRateHz) / STEP)
  return (
    jumps(clicks, first, after, CLICK_RISE, FAINTEST_CLICK) || jumps(sound, first, after, SOUND_RISE, FAINTEST_SOUND)
  )
}

function jumps(curve: Float64Array, first: number, after: number, rise: number, faintest: number): boolean {
  let loudest = 0
  for (let i = first; i < after; i++) loudest = Math.max(loudest, curve[i] ?? 0)
  const floor = middle(curve)
  for (let i = after; i < curve.length - TOGETHER; i++) {
    let here = 0
    for (let j = 0; j < TOGETHER; j++) here += (curve[i + j] ?? 0) / TOGETHER
    if (here < faintest * loudest || here < OVER_FLOOR * floor) continue
    let before = 0
    for (let j = Math.max(0, i - GAP - LOOK_BACK); j < i - GAP; j++) before = Math.max(before, curve[j] ?? 0)
    if (here > rise * before) return true
  }
  return false
}

function middle(curve: Float64Array): number {
  const sorted = Float64Array.from(curve).sort()
  return sorted[sorted.length >> 2] ?? 0
}
