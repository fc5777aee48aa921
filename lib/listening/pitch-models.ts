import { bandRound } from './find-partials'
import type { Band, BandFit } from './fit-band'
import { BandFitter } from './fit-band'
import { isPair } from './pair-of-partials'
import type { ModelKind } from './partial-shape'
import type { Spectrum } from './spectrum'

/** Half the width of the band about the pitch, Hz, at least: it holds the pair. */
const BAND_HZ = 20
/** Splits that are tried, Hz. */
const SPLITS_HZ = [0.5, 1, 1.6, 2.4, 3.4, 4.6, 6, 8, 10, 12]
/** Glides that are tried, rad of phase in all. */
const GLIDE_STARTS = [-0.3, -0.1, 0.05, 0.1, 0.2, 0.35, 0.6, 1, 1.7, 3]
/** Fewer independent numbers than this in the band say nothing about a pair or a glide. */
const LEAST_FREEDOM = 16
/** How much a richer model must gain, twice the log likelihood, to be tried and to be believed. */
const WORTH_TRYING = 6
const BELIEVED_GLIDE = 12
const BELIEVED_PAIR = 20
/** Decays of a pair's partials are told apart when that gains this much. */
const BELIEVED_DECAYS = 8

export type Guess = { decay: number; angle: number }

export type PitchFits = {
  one: BandFit
  glide: BandFit | null
  pair: BandFit | null
  /** The one that the sound bears out. */
  best: BandFit
}

/**
 * One damped sinusoid, one whose pitch glides, and a close pair, fitted to the band round the tap's pitch. A richer model is believed
 * when it gains more, freedom·ln(residual ratio), than chance gives.
 * @param companion the strongest other partial that could be its pair
 * @returns null when not even one holds
 */
export function fitPitchModels(
  spectrum: Spectrum,
  rateHz: number,
  target: Guess,
  companion: Guess | null,
): PitchFits | null {
  const band = pitchBand(spectrum, rateHz, target)
  const fitter = new BandFitter(spectrum, band)
  const one = fitter.fit('one', Float64Array.of(target.decay, target.angle))
  if (one === null) return null
  const gain = (residual: number) => one.freedom * Math.log(one.residual / residual)
  if (one.freedom < LEAST_FREEDOM) return { one, glide: null, pair: null, best: one }

  const glide = tryStarts(fitter, 'glide', glideStarts(one), gain)
  const believable = (fit: BandFit | null) => (fit !== null && isPair(fit, one, rateHz) ? fit : null)
  const left = (2 * Math.PI * (band.first + highestRest(fitter, one))) / spectrum.size
  let pair = believable(tryStarts(fitter, 'envelope', envelopeStarts(one, left, rateHz), gain))
  const apart = believable(tryStarts(fitter, 'two', twoStarts(one, left, pair, companion), gain))
  if (apart !== null && (pair === null || gain(apart.residual) - gain(pair.residual) > BELIEVED_DECAYS)) pair = apart

  let best = one
  let bar = BELIEVED_PAIR
  if (glide !== null && gain(glide.residual) > BELIEVED_GLIDE) {
    best = glide
    bar = Math.max(bar, gain(glide.residual) + BELIEVED_PAIR / 2)
  }
  if (pair !== null && gain(pair.residual) > bar) best = pair
  return { one, glide, pair, best }
}

/** The band round the pitch alone. */
export function pitchBand({ size }: Spectrum, rateHz: number, target: Guess): Band {
  return bandRound(target, size, rateHz / size, BAND_HZ)
}

/** The fit from the start that leaves least, when it promises anything at all. */
function tryStarts(
  fitter: BandFitter,
  kind: ModelKind,
  starts: Float64Array[],
  gain: (residual: number) => number,
): BandFit | null {
  let best: { start: Float64Array; residual: number } | null = null
  for (const start of starts) {
    const residual = fitter.residualAt(kind, start)
    if (residual !== null && (best === null || residual < best.residual)) best = { start, residual }
  }
  return best !== null && gain(best.residual) > WORTH_TRYING ? fitter.fit(kind, best.start) : null
}

function glideStarts({ parameters: [d = 0, w = 0] }: BandFit): Float64Array[] {
  // The one partial stands where its energy does, where half the glide is over.
  return GLIDE_STARTS.map((gamma) => Float64Array.of(d, w - 0.5 * d * gamma, gamma))
}

/** Bin of the band, counted from its first, where the one partial leaves most. */
function highestRest(fitter: BandFitter, one: BandFit): number {
  const rest = fitter.restAt('one', one.parameters) ?? new Float64Array(0)
  let [best, most] = [0, 0]
  for (let i = 0; i < rest.length; i += 2) {
    const power = (rest[i] ?? 0) ** 2 + (rest[i + 1] ?? 0) ** 2
    if (power > most) [best, most] = [i / 2, power]
  }
  return best
}

/** Splits about the one partial, and that between it and the angle where it leaves most. */
function envelopeStarts({ parameters: [d = 0, w = 0] }: BandFit, left: number, rateHz: number): Float64Array[] {
  const even = SPLITS_HZ.flatMap((hz) => {
    const split = (2 * Math.PI * hz) / rateHz
    return [-0.4, 0, 0.4].map((off) => Float64Array.of(0.9 * d, w + off * split, split))
  })
  return [...even, Float64Array.of(d, (w + left) / 2, w - left)]
}

function twoStarts(
  { parameters: [d = 0, w = 0] }: BandFit,
  left: number,
  pair: BandFit | null,
  companion: Guess | null,
): Float64Array[] {
  const starts = [Float64Array.of(d, w, d, left)]
  if (pair !== null) {
    const [decay = d, middle = w, split = 0] = pair.parameters
    starts.push(Float64Array.of(decay, middle + split / 2, decay, middle - split / 2))
  }
  if (companion !== null) starts.push(Float64Array.of(d, w, companion.decay, companion.angle))
  return starts
}
