import type { BandFit } from './fit-band'
import { lowRateGain, LOW_RATE_STEP } from './low-rate'
import type { Complex } from './partial-shape'
import type { HeardPartial, TapWarble } from './tap-report'

/** T60 = ln(1000)·τ = 6.9078 τ (J. O. Smith, Mathematics of the DFT). */
export const T60_PER_TAU = Math.log(1000)

export type FittedPitch = {
  pitchHz: number
  standardErrorHz: number
  t60S: number
  t60StandardErrorS: number
  partials: HeardPartial[]
  warble: TapWarble | null
}

/** A second partial fainter than this beside the first is not heard as warble. */
const FAINTEST_PARTNER = 0.06
/** Standard deviations either way that hold 95 %. */
const NINETEEN_IN_TWENTY = 1.96

/** One standard deviation of a warble, Hz. */
export function warbleErrorHz({ differenceHz, highHz }: TapWarble): number {
  return (highHz - differenceHz) / NINETEEN_IN_TWENTY
}

/**
 * What a band fit says in Hz and seconds.
 * @param rateHz rate of the fitted samples
 * @param sinceStrikeS from the strike to the first fitted sample
 * @param windowS length of what was fitted
 */
export function pitchOfFit(fit: BandFit, rateHz: number, sinceStrikeS: number, windowS: number): FittedPitch {
  const n = fit.parameters.length + 2 * fit.amplitudes.length
  const free = fit.parameters.length
  const hz = rateHz / (2 * Math.PI)
  const p = (i: number) => fit.parameters[i] ?? 0
  const voice = (decay: number, angle: number, amplitude: Complex) => {
    const gain = lowRateGain(decay / LOW_RATE_STEP, angle / LOW_RATE_STEP)
    const scale = Math.exp(decay * rateHz * sinceStrikeS) / Math.hypot(gain.re, gain.im)
    return {
      frequencyHz: angle * hz,
      t60S: T60_PER_TAU / (decay * rateHz),
      amplitude: Math.hypot(amplitude.re, amplitude.im) * scale,
      scale,
    }
  }
  const none: Complex = { re: 0, im: 0 }
  const [a = none, b = none] = fit.amplitudes
  const spread = (gradient: Float64Array) => Math.sqrt(Math.max(0, quadratic(fit.covariance, gradient, n)))
  const along = (...parts: [index: number, slope: number][]) => {
    const gradient = new Float64Array(n)
    for (const [index, slope] of parts) gradient[index] = slope
    return gradient
  }
  const t60Error = (decayIndex: number) =>
    (T60_PER_TAU / (p(decayIndex) ** 2 * rateHz)) * spread(along([decayIndex, 1]))

  if (fit.kind === 'one' || fit.kind === 'glide') {
    const only = voice(p(0), p(1), a)
    const standardErrorHz = spread(along([1, hz]))
    const { frequencyHz, t60S, amplitude } = only
    return {
      pitchHz: frequencyHz,
      standardErrorHz,
      t60S,
      t60StandardErrorS: t60Error(0),
      partials: [{ frequencyHz, standardErrorHz, amplitude, t60S }],
      warble: null,
    }
  }

  const shared = fit.kind === 'envelope'
  const first = shared ? voice(p(0), p(1) + p(2) / 2, a) : voice(p(0), p(1), a)
  const second = shared ? voice(p(0), p(1) - p(2) / 2, b) : voice(p(2), p(3), b)
  const firstSlope: [number, number][] = shared
    ? [
        [1, hz],
        [2, hz / 2],
      ]
    : [[1, hz]]
  const secondSlope: [number, number][] = shared
    ? [
        [1, hz],
        [2, -hz / 2],
      ]
    : [[3, hz]]
  const one = { ...first, slope: firstSlope, decayIndex: 0 }
  const other = { ...second, slope: secondSlope, decayIndex: shared ? 0 : 2 }
  const heard = first.amplitude >= second.amplitude ? ([one, other] as const) : ([other, one] as const)
  const [strong, weak] = heard
  const partials = heard.map(({ frequencyHz, t60S, amplitude, slope }) => ({
    frequencyHz,
    standardErrorHz: spread(along(...slope)),
    amplitude,
    t60S,
  }))
  // Mean weighted by amplitude at the strike; its slopes to angles and to each amplitude's two parts.
  const sum = first.amplitude + second.amplitude
  const pitchHz = (first.amplitude * first.frequencyHz + second.amplitude * second.frequencyHz) / sum
  const gradient = new Float64Array(n)
  const add = (index: number, slope: number) => {
    gradient[index] = (gradient[index] ?? 0) + slope
  }
  for (const [voiceOf, slope, amplitude, at] of [
    [first, firstSlope, a, free],
    [second, secondSlope, b, free + 2],
  ] as const) {
    for (const [index, by] of slope) add(index, (by * voiceOf.amplitude) / sum)
    const size = Math.hypot(amplitude.re, amplitude.im) || 1
    const byAmplitude = ((voiceOf.frequencyHz - pitchHz) / sum) * voiceOf.scale
    add(at, (byAmplitude * amplitude.re) / size)
    add(at + 1, (byAmplitude * amplitude.im) / size)
  }
  const differenceHz = Math.abs(first.frequencyHz - second.frequencyHz)
  const differenceError = spread(shared ? along([2, hz]) : along([1, hz], [3, -hz]))
  return {
    pitchHz,
    standardErrorHz: spread(gradient),
    t60S: strong.t60S,
    t60StandardErrorS: t60Error(strong.decayIndex),
    partials,
    warble:
      weak.amplitude < FAINTEST_PARTNER * strong.amplitude
        ? null
        : {
            differenceHz,
            lowHz: Math.max(0, differenceHz - NINETEEN_IN_TWENTY * differenceError),
            highHz: differenceHz + NINETEEN_IN_TWENTY * differenceError,
            from: differenceHz * windowS < 2 ? 'envelope' : 'partials',
          },
  }
}

function quadratic(matrix: Float64Array, v: Float64Array, n: number): number {
  let sum = 0
  for (let i = 0; i < n; i++) for (let j = 0; j < n; j++) sum += (v[i] ?? 0) * (v[j] ?? 0) * (matrix[i * n + j] ?? 0)
  return sum
}
