import type { Band, BandFit } from './fit-band'
import { BandFitter } from './fit-band'
import { couldPair } from './pair-of-partials'
import { T60_PER_TAU } from './pitch-of-fit'
import type { Spectrum } from './spectrum'

/** How much a partial that nobody found must gain, twice the log likelihood, to be believed. */
const BELIEVED = 20
/** What it may be, s for 60 dB: a note under a fingertip, or a shape that rings. */
const DECAYS_T60_S = [0.08, 0.4]

/**
 * One more partial beside those of a fit: where what is left in the band, smoothed over the width that its decay would have, stands
 * highest. What could make a pair with the pitch is left to the pitch's own models. Null when fitting it with all the others gains no more
 * than chance.
 */
export function findHiddenPartial(spectrum: Spectrum, band: Band, rateHz: number, fit: BandFit): BandFit | null {
  const fitter = new BandFitter(spectrum, band)
  const rest = fitter.restAt(fit.kind, fit.parameters)
  if (rest === null) return null
  const power = Float64Array.from(
    { length: rest.length / 2 },
    (_, i) => (rest[2 * i] ?? 0) ** 2 + (rest[2 * i + 1] ?? 0) ** 2,
  )
  let best: { start: Float64Array; residual: number } | null = null
  const pitch = { decay: fit.parameters[0] ?? 0, angle: fit.parameters[1] ?? 0 }
  for (const t60S of DECAYS_T60_S) {
    const decay = T60_PER_TAU / (t60S * rateHz)
    const angleOf = (bin: number) => (2 * Math.PI * (band.first + bin)) / spectrum.size
    const half = Math.max(1, Math.round((decay * spectrum.size) / (2 * Math.PI)))
    const bin = band.first + highest(power, half, (at) => !couldPair(pitch, { decay, angle: angleOf(at) }, rateHz))
    const start = Float64Array.from([...fit.parameters, decay, (2 * Math.PI * bin) / spectrum.size])
    const residual = fitter.residualAt(fit.kind, start)
    if (residual !== null && (best === null || residual < best.residual)) best = { start, residual }
  }
  if (best === null) return null
  const more = fitter.fit(fit.kind, best.start)
  if (more === null || fitter.freedom * Math.log(fit.residual / more.residual) < BELIEVED) return null
  const [decay = 0, angle = 0] = more.parameters.slice(-2)
  return couldPair({ decay: more.parameters[0] ?? 0, angle: more.parameters[1] ?? 0 }, { decay, angle }, rateHz)
    ? null
    : more
}

/** Where the mean power over `half` bins either way is highest, of those allowed. */
function highest(power: Float64Array, half: number, isAllowed: (bin: number) => boolean): number {
  let [best, most] = [0, 0]
  for (let i = 0; i < power.length; i++) {
    let sum = 0
    let count = 0
    for (let j = Math.max(0, i - half); j <= Math.min(power.length - 1, i + half); j++) {
      sum += power[j] ?? 0
      count++
    }
    if (sum / count > most && isAllowed(i)) [best, most] = [i, sum / count]
  }
  return best
}
