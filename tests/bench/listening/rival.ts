import detectPitch from 'detect-pitch'
import pitchfinder from 'pitchfinder'
import { PitchDetector } from 'pitchy'

/**
 * What a general-purpose package is given of a tap: the samples from `skipS` after the strike, `count` of them, band-passed first round the
 * target (`octaves` wide) where that helps it.
 */
export type Window = { skipS: number; count: number; octaves: number | null }

export type Rival = {
  name: string
  window: Window
  /** Pitch in Hz, or null when it says that there is none. */
  pitchHz(windowed: Float32Array, sampleRateHz: number): number | null
}

const named = (hz: number | null) => (hz !== null && Number.isFinite(hz) && hz > 0 ? hz : null)

const detectors = new Map<number, PitchDetector<Float32Array>>()
function mcLeod(count: number): PitchDetector<Float32Array> {
  const made = detectors.get(count) ?? PitchDetector.forFloat32Array(count)
  detectors.set(count, made)
  return made
}

/**
 * General-purpose pitch packages, each with the window it does best with on these taps: of starts 20, 50 and 100 ms after the strike, 2048
 * to 16 384 samples (8192 or 4096 where the time grows with the square), as recorded or band-passed to a quarter, half or whole octave round the
 * target, the one with the lowest median error at 20 and 30 dB on other taps than the benchmark's. As recorded none of them names the
 * tap: shapes that stand in no simple ratio have no common period. YIN is given its window scaled up to 10 000, since
 * its first step adds 1 to a sum that then must be larger. Of pitchfinder's other detectors this one does best.
 */
export const rivals: readonly Rival[] = [
  {
    name: 'pitchy 4.1.0 (McLeod)',
    window: { skipS: 0.05, count: 16_384, octaves: 0.25 },
    pitchHz: (windowed, sampleRateHz) => named(mcLeod(windowed.length).findPitch(windowed, sampleRateHz)[0]),
  },
  {
    name: 'pitchfinder 2.3.4 (YIN)',
    window: { skipS: 0.1, count: 8192, octaves: 0.25 },
    pitchHz: (windowed, sampleRateHz) => named(pitchfinder.YIN({ sampleRate: sampleRateHz })(scaledUp(windowed))),
  },
  {
    name: 'pitchfinder 2.3.4 (MacLeod)',
    window: { skipS: 0.05, count: 4096, octaves: 0.25 },
    pitchHz: (windowed, sampleRateHz) =>
      named(pitchfinder.Macleod({ sampleRate: sampleRateHz, bufferSize: windowed.length })(windowed).freq),
  },
  {
    name: 'detect-pitch 1.1.0',
    window: { skipS: 0.02, count: 16_384, octaves: 0.25 },
    pitchHz: (windowed, sampleRateHz) => {
      const period = detectPitch(windowed)
      return period > 0 ? named(sampleRateHz / period) : null
    },
  },
]

function scaledUp(windowed: Float32Array): Float32Array {
  const loudest = windowed.reduce((most, value) => Math.max(most, Math.abs(value)), 1e-12)
  return windowed.map((value) => (10_000 * value) / loudest)
}

/** The stretch of a tap that the window says, or less where the samples end. */
export function windowOf(
  tap: { samples: Float32Array; strikeAt: number; sampleRateHz: number },
  targetHz: number,
  { skipS, count, octaves }: Window,
): Float32Array {
  const passed =
    octaves === null
      ? tap.samples
      : bandPass(bandPass(tap.samples, targetHz / tap.sampleRateHz, octaves), targetHz / tap.sampleRateHz, octaves)
  const from = tap.strikeAt + Math.round(skipS * tap.sampleRateHz)
  return passed.slice(from, from + count)
}

/** Second-order band-pass by the bilinear transform, run forwards; `centre` is a share of the rate. */
function bandPass(samples: Float32Array, centre: number, octaves: number): Float32Array {
  const turn = 2 * Math.PI * centre
  const alpha = Math.sin(turn) * Math.sinh((Math.LN2 / 2) * octaves * (turn / Math.sin(turn)))
  const b = alpha / (1 + alpha)
  const a1 = (-2 * Math.cos(turn)) / (1 + alpha)
  const a2 = (1 - alpha) / (1 + alpha)
  let [x1, x2, y1, y2] = [0, 0, 0, 0]
  return samples.map((x) => {
    const y = b * (x - x2) - a1 * y1 - a2 * y2
    ;[x2, x1, y2, y1] = [x1, x, y1, y]
    return y
  })
}
