/** Every eighth sample is kept: 5512.5 or 6000 a second, room for all that can be a drum's pitch. */
export const LOW_RATE_STEP = 8
const TAPS = 48
const CUTOFF_PER_STEP = 0.5
const KAISER_BETA = 6

const kernel = lowPass()

/**
 * The sound below about 1.2 kHz at an eighth of its rate, from `from` (included) to `to` (not): a Kaiser-windowed sinc of 48
 * taps, wholly inside the stretch, so that nothing from before `from` leaks in and a damped sinusoid stays one
 * (times {@link lowRateGain}). What folds back under 1 kHz lies 55 dB down or more.
 */
export function lowRate(samples: Float32Array, from: number, to: number): Float64Array {
  const count = Math.max(0, Math.floor((to - from - TAPS) / LOW_RATE_STEP) + 1)
  const low = new Float64Array(count)
  for (let i = 0; i < count; i++) {
    const start = from + i * LOW_RATE_STEP
    let sum = 0
    for (let j = 0; j < TAPS; j++) sum += (kernel[j] ?? 0) * (samples[start + j] ?? 0)
    low[i] = sum
  }
  return low
}

/** What {@link lowRate} makes of e^{(−decay + i·angle)·n}, n in samples at the full rate: its amplitude and turn at `from`. */
export function lowRateGain(decayPerSample: number, anglePerSample: number): { re: number; im: number } {
  let re = 0
  let im = 0
  for (let j = 0; j < TAPS; j++) {
    const size = (kernel[j] ?? 0) * Math.exp(-decayPerSample * j)
    re += size * Math.cos(anglePerSample * j)
    im += size * Math.sin(anglePerSample * j)
  }
  return { re, im }
}

function lowPass(): Float64Array {
  const h = new Float64Array(TAPS)
  let sum = 0
  for (let j = 0; j < TAPS; j++) {
    const x = ((j - (TAPS - 1) / 2) * CUTOFF_PER_STEP * 2) / LOW_RATE_STEP
    const across = (2 * j) / (TAPS - 1) - 1
    const value = (Math.sin(Math.PI * x) / (Math.PI * x)) * besselI0(KAISER_BETA * Math.sqrt(1 - across * across))
    h[j] = value
    sum += value
  }
  return h.map((value) => value / sum)
}

function besselI0(x: number): number {
  let term = 1
  let sum = 1
  for (let k = 1; term > 1e-12 * sum; k++) {
    term *= (x / (2 * k)) ** 2
    sum += term
  }
  return sum
}
