import type { DampedPartial } from './damped-partial'
import type { Band, BandFit } from './fit-band'
import { BandFitter } from './fit-band'
import { LOW_RATE_STEP } from './low-rate'
import type { PitchAmongNeighbours } from './pitch-among-neighbours'
import { withoutPartials } from './pitch-among-neighbours'
import { ringSpectrum } from './ring-spectrum'

/** Stretches of the ring that are looked at again, in the pitch's own decay times after the first look's beginning. */
const LATER_TAUS = [0.6, 1.2]
const EARLY_TAUS = 1.5
/** None is shorter, s. */
const SHORTEST_EARLY_S = 0.1
const SHORTEST_S = 0.06
/** Numbers in the band beyond those that are fitted, at least. */
const SPARE = 3

/** The first look: samples `from` to `until`, and the decay time of the pitch in samples. */
export type FirstLook = {
  samples: Float32Array
  rateHz: number
  from: number
  until: number
  tau: number
  size: number
  fitted: PitchAmongNeighbours
}

/** The same fit to another stretch, samples `from` to `until`. */
export type OtherLook = { from: number; until: number; fit: BandFit }

/**
 * What was fitted to the whole ring fitted again to its beginning alone and twice without it. Where the model is all that sounds, the
 * fits agree; a room, whose own partials rise and fall beside the drum's, makes each lean another way.
 */
export function lookAgain({ samples, rateHz, from, until, tau, size, fitted }: FirstLook): OtherLook[] {
  const sampleRateHz = rateHz * LOW_RATE_STEP
  const early = Math.max(Math.round(SHORTEST_EARLY_S * sampleRateHz), Math.round(EARLY_TAUS * tau))
  const later = LATER_TAUS.map((taus) => Math.round((taus * tau) / LOW_RATE_STEP) * LOW_RATE_STEP)
  const stretches = [{ from, until: Math.min(until, from + early) }, ...later.map((by) => ({ from: from + by, until }))]
  return stretches.flatMap((stretch) => {
    if (stretch.until - stretch.from < SHORTEST_S * sampleRateHz) return []
    const spectrum = ringSpectrum(samples, stretch.from, stretch.until)
    const by = (stretch.from - from) / LOW_RATE_STEP
    const aside = fitted.aside.map((partial) => rungOn(partial, by))
    const share = spectrum.size / size
    const band: Band = {
      first: Math.max(1, Math.floor(fitted.band.first * share)),
      last: Math.ceil(fitted.band.last * share),
    }
    const fitter = new BandFitter(withoutPartials(spectrum, rateHz, aside), band)
    const start = startAfter(fitted.fit, by)
    if (fitter.freedom < start.length + 2 * fitted.fit.amplitudes.length + SPARE) return []
    const fit = fitter.fit(fitted.fit.kind, start)
    return fit === null ? [] : [{ ...stretch, fit }]
  })
}

/** The parameters as they are `by` low-rate samples later: only a glide's way is shorter then. */
function startAfter({ kind, parameters }: BandFit, by: number): Float64Array {
  const start = Float64Array.from(parameters)
  if (kind === 'glide') start[2] = (start[2] ?? 0) * Math.exp(-2 * (start[0] ?? 0) * by)
  return start
}

function rungOn({ decay, angle, amplitude }: DampedPartial, by: number): DampedPartial {
  const size = Math.exp(-decay * by)
  const re = size * Math.cos(angle * by)
  const im = size * Math.sin(angle * by)
  return {
    decay,
    angle,
    amplitude: { re: amplitude.re * re - amplitude.im * im, im: amplitude.re * im + amplitude.im * re },
  }
}
