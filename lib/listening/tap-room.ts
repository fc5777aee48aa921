import type { TapRandom } from './tap-random'
import { within } from './tap-within'

/** A room round the drum: `share` is how loud its first reflections and its tail are beside the drum itself, 0 to 1. */
export type TapRoom = { reverbT60S: number; share: number }

const REFLECTIONS = 6
const [FIRST_REFLECTION_S, LAST_REFLECTION_S] = [0.003, 0.03]
/** Schroeder's loop and all-pass delays. */
const LOOPS_S = [0.0297, 0.0371, 0.0411, 0.0437]
const ALL_PASSES_S = [0.005, 0.0017]
const ALL_PASS_GAIN = 0.7

/**
 * The signal with a room added: a few early reflections at chance delays (3 to 30 ms, falling with delay, either sign) and a tail that
 * falls by 60 dB in `reverbT60S`, made by four loops and two all-passes.
 * @throws RangeError T60 outside 0.05 to 10 s, share outside 0 to 1
 * Source: M. R. Schroeder, Natural Sounding Artificial Reverberation, J. Audio Eng. Soc. 10(3), 1962.
 */
export function addRoom(dry: Float64Array, sampleRateHz: number, room: TapRoom, random: TapRandom): Float64Array {
  within('reverbT60S', room.reverbT60S, 0.05, 10)
  within('share', room.share, 0, 1)
  const delayed = (seconds: number) => Math.max(1, Math.round(seconds * sampleRateHz))

  const wet = new Float64Array(dry.length)
  for (let reflection = 0; reflection < REFLECTIONS; reflection++) {
    const delayS = FIRST_REFLECTION_S + (LAST_REFLECTION_S - FIRST_REFLECTION_S) * random.uniform()
    const gain = (random.uniform() < 0.5 ? -1 : 1) * (FIRST_REFLECTION_S / delayS)
    const delay = delayed(delayS)
    for (let i = delay; i < wet.length; i++) wet[i] = at(wet, i) + gain * at(dry, i - delay)
  }

  let tail = new Float64Array(dry.length)
  for (const loopS of LOOPS_S) {
    const delay = delayed(loopS)
    const gain = 10 ** ((-3 * loopS) / room.reverbT60S)
    const loop = new Float64Array(dry.length)
    for (let i = delay; i < loop.length; i++) {
      loop[i] = at(dry, i - delay) + gain * at(loop, i - delay)
      tail[i] = at(tail, i) + at(loop, i) / LOOPS_S.length
    }
  }
  for (const allPassS of ALL_PASSES_S) {
    const delay = delayed(allPassS)
    const through = new Float64Array(dry.length)
    for (let i = 0; i < through.length; i++) {
      through[i] = -ALL_PASS_GAIN * at(tail, i) + at(tail, i - delay) + ALL_PASS_GAIN * at(through, i - delay)
    }
    tail = through
  }
  return dry.map((value, i) => value + room.share * (at(wet, i) + at(tail, i)))
}

function at(signal: Float64Array, i: number): number {
  return signal[i] ?? 0
}
