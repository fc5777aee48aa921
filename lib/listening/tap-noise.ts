import FFT from 'fft.js'
import type { TapRandom } from './tap-random'
import { within } from './tap-within'

export type NoiseColour = 'white' | 'pink'

/**
 * Gaussian noise of root mean square exactly 1 over its length: white, or pink (power falls 3 dB an octave, shaped in the spectrum,
 * nothing below 10 Hz).
 * @throws RangeError fewer than 2 samples
 */
export function tapNoise(colour: NoiseColour, count: number, sampleRateHz: number, random: TapRandom): Float64Array {
  if (!(Number.isInteger(count) && count >= 2))
    throw new RangeError(`count is ${count}: at least 2 samples are needed.`)
  const noise = colour === 'white' ? white(count, random) : pink(count, sampleRateHz, random)
  const rms = Math.sqrt(noise.reduce((sum, value) => sum + value * value, 0) / count)
  return noise.map((value) => value / rms)
}

function white(count: number, random: TapRandom): Float64Array {
  return Float64Array.from({ length: count }, () => random.normal())
}

function pink(count: number, sampleRateHz: number, random: TapRandom): Float64Array {
  const size = 2 ** Math.ceil(Math.log2(count))
  const fft = new FFT(size)
  const spectrum = fft.createComplexArray()
  // A real signal's spectrum is its own mirror; the package completes the upper half.
  for (let bin = 1; bin < size / 2; bin++) {
    const hz = (bin * sampleRateHz) / size
    const height = hz < 10 ? 0 : 1 / Math.sqrt(hz)
    spectrum[2 * bin] = height * random.normal()
    spectrum[2 * bin + 1] = height * random.normal()
  }
  fft.completeSpectrum(spectrum)
  const signal = fft.createComplexArray()
  fft.inverseTransform(signal, spectrum)
  return Float64Array.from({ length: count }, (_, i) => signal[2 * i] ?? 0)
}

/** Strength of the mains and its harmonics, from memory of what unbalanced leads pick up. */
const HUM_HARMONICS = [1, 0.4, 0.5, 0.15, 0.25]

/** Mains hum of root mean square 1: `mainsHz` (50 or 60) and four harmonics at chance phases. @throws RangeError mains outside 45 to 65 Hz */
export function mainsHum(mainsHz: number, count: number, sampleRateHz: number, random: TapRandom): Float64Array {
  within('mainsHz', mainsHz, 45, 65)
  const power = HUM_HARMONICS.reduce((sum, height) => sum + height ** 2 / 2, 0)
  const waves = HUM_HARMONICS.map((height, i) => ({
    height: height / Math.sqrt(power),
    turn: (2 * Math.PI * mainsHz * (i + 1)) / sampleRateHz,
    phase: 2 * Math.PI * random.uniform(),
  }))
  return Float64Array.from({ length: count }, (_, i) =>
    waves.reduce((sum, { height, turn, phase }) => sum + height * Math.sin(turn * i + phase), 0),
  )
}
