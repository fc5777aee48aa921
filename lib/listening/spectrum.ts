import FFT from 'fft.js'

/** Bins 0 to size/2 of a discrete Fourier transform, X_k = Σ x_n·e^{−2πi·kn/size}. */
export type Spectrum = {
  re: Float64Array
  im: Float64Array
  /** Length of the transform; the sound is filled up with zeros to it. */
  size: number
  /** How many samples of sound went in. */
  count: number
}

type Plan = { fft: FFT; padded: number[]; out: number[] }

const plans = new Map<number, Plan>()

/** Spectrum of at most `size` samples. @param size a power of two, no less than the number of samples */
export function spectrumOf(sound: ArrayLike<number>, size: number): Spectrum {
  const { fft, padded, out } = planOf(size)
  for (let i = 0; i < size; i++) padded[i] = sound[i] ?? 0
  fft.realTransform(out, padded)
  const half = size / 2 + 1
  const re = new Float64Array(half)
  const im = new Float64Array(half)
  for (let k = 0; k < half; k++) {
    re[k] = out[2 * k] ?? 0
    im[k] = out[2 * k + 1] ?? 0
  }
  return { re, im, size, count: sound.length }
}

/** The transform and its arrays are made once a size; nothing is kept in them from one sound to the next. */
function planOf(size: number): Plan {
  let plan = plans.get(size)
  if (plan === undefined) {
    const fft = new FFT(size)
    plan = { fft, padded: new Array<number>(size).fill(0), out: fft.createComplexArray() }
    plans.set(size, plan)
  }
  return plan
}

/**
 * Where a peak lies between the bins, from the levels (dB) of the highest bin and its two neighbours: the parabola through
 * them has its top p bins to the right of the middle one, p = ½(α − γ)/(α − 2β + γ), −½ to ½.
 * Source: J. O. Smith, Spectral Audio Signal Processing 5.7.
 */
export function peakOffset(leftDb: number, middleDb: number, rightDb: number): number {
  const curve = leftDb - 2 * middleDb + rightDb
  return curve === 0 ? 0 : (0.5 * (leftDb - rightDb)) / curve
}
