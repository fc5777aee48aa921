import type { DampedPartial } from './damped-partial'
import { addPartial } from './damped-partial'
import type { FoundPartial } from './find-partials'
import { findPartials, fitOne, HIGHEST_HZ } from './find-partials'
import { LOW_RATE_STEP, lowRate } from './low-rate'
import type { PitchFits } from './pitch-models'
import { fitPitchModels, WIDEST_PAIR_HZ } from './pitch-models'
import type { FittedPitch } from './pitch-of-fit'
import { pitchOfFit } from './pitch-of-fit'
import { spectrumOf } from './spectrum'
import type { Spectrum } from './spectrum'
import type { TapGlide, TapReading, TapRefusalKind } from './tap-report'

export type StrikeToHear = {
  samples: Float32Array
  sampleRateHz: number
  /** Index of the strike. */
  strikeAt: number
  expect: { expectHz?: number; expectWithinCents?: number }
}

export type HeardStrike = Omit<TapReading, 'outcome' | 'note' | 'centsFromTarget' | 'onsetS'>

/** As much of the ring as is ever used, s. */
export const LONGEST_RING_S = 1.2
const SHORTEST_RING_S = 0.06
const FIRST_SKIP_S = 0.004
/** A pitch is told by the ring down to e^−7 of it; what comes after is noise. */
const RING_TAUS = 7
const SHORTEST_WINDOW_S = 0.15
/** Two pitches this near in height cannot be told apart by strength, dB. */
const EQUAL_DB = 1.5

/** The pitch of one strike, or why none is named. */
export function hearStrike(strike: StrikeToHear): HeardStrike | TapRefusalKind {
  const { samples, sampleRateHz, strikeAt, expect } = strike
  const rateHz = sampleRateHz / LOW_RATE_STEP
  const end = Math.min(samples.length, strikeAt + Math.round(LONGEST_RING_S * sampleRateHz))
  if ((end - strikeAt) / sampleRateHz < SHORTEST_RING_S) return 'too-short'

  const first = listen(samples, strikeAt, end, FIRST_SKIP_S, sampleRateHz)
  const found = findPartials(first.spectrum, rateHz).partials
  const chosen = choose(found, rateHz, expect)
  if (typeof chosen === 'string') return chosen

  // Once the decay is known: begin as early and end as soon as it allows.
  const tauS = 1 / (chosen.decay * rateHz)
  const skipS = Math.min(0.02, Math.max(0.002, 0.1 * tauS))
  const ringS = Math.max(SHORTEST_WINDOW_S, skipS + RING_TAUS * tauS)
  const until = Math.min(end, strikeAt + Math.round(ringS * sampleRateHz))
  const second = listen(samples, strikeAt, until, skipS, sampleRateHz)
  const { spectrum, companion } = alone(second.spectrum, found, chosen, rateHz)
  const fits = fitPitchModels(spectrum, rateHz, chosen, companion)
  if (fits === null) return 'unclear'

  const windowS = (until - strikeAt) / sampleRateHz - skipS
  const pitch = pitchOfFit(fits.best, rateHz, skipS, windowS)
  const noise = Math.sqrt(noiseVariance(fits))
  const snrDb = 20 * Math.log10(Math.hypot(...pitch.partials.map(({ amplitude }) => amplitude)) / (Math.SQRT2 * noise))
  return {
    ...pitch,
    confidence: confidenceOf(pitch, fits),
    glide: glideOf(fits, rateHz),
    snrDb,
    heardForS: (until - strikeAt) / sampleRateHz,
  }
}

function listen(
  samples: Float32Array,
  strikeAt: number,
  end: number,
  skipS: number,
  sampleRateHz: number,
): { spectrum: Spectrum } {
  const low = lowRate(samples, strikeAt + Math.round(skipS * sampleRateHz), end)
  let size = 1024
  while (size < low.length) size *= 2
  return { spectrum: spectrumOf(low, size) }
}

/** The partial that is the tap's pitch. */
function choose(
  found: FoundPartial[],
  rateHz: number,
  { expectHz, expectWithinCents = 500 }: StrikeToHear['expect'],
): FoundPartial | TapRefusalKind {
  const hz = (partial: DampedPartial) => (partial.angle * rateHz) / (2 * Math.PI)
  const near =
    expectHz === undefined
      ? found
      : found.filter((partial) => Math.abs(1200 * Math.log2(hz(partial) / expectHz)) <= expectWithinCents)
  const [first, ...others] = near
  if (first === undefined) return found.length === 0 ? 'too-noisy' : 'unclear'
  const rival = others.find((other) => Math.abs(hz(other) - hz(first)) > WIDEST_PAIR_HZ)
  if (rival !== undefined && 20 * Math.log10(first.height / rival.height) < EQUAL_DB) return 'unclear'
  return first
}

/** The spectrum with everything but the chosen partial and its near companions taken out. */
function alone(
  spectrum: Spectrum,
  found: FoundPartial[],
  chosen: FoundPartial,
  rateHz: number,
): { spectrum: Spectrum; companion: DampedPartial | null } {
  const binHz = rateHz / spectrum.size
  const reach = Math.ceil((HIGHEST_HZ + 100) / binHz)
  const far = (partial: DampedPartial) =>
    (Math.abs(partial.angle - chosen.angle) * rateHz) / (2 * Math.PI) > WIDEST_PAIR_HZ
  const others = found.filter(far)
  const companion = found.find((partial) => partial !== chosen && !far(partial)) ?? null
  // Strongest first, each with those before it taken out, the chosen one's own skirt too.
  const rest: Spectrum = { ...spectrum, re: Float64Array.from(spectrum.re), im: Float64Array.from(spectrum.im) }
  const kept: DampedPartial[] = []
  for (const partial of found) {
    const fit = fitOne(rest, partial, binHz)
    if (fit === null) continue
    addPartial(rest, fit, -1, reach)
    if (!others.includes(partial)) kept.push(fit)
  }
  for (const fit of kept) addPartial(rest, fit, 1, reach)
  return { spectrum: rest, companion }
}

/** Variance of the noise a sample at the full rate, taken as as strong at all frequencies as in the pitch's band. */
function noiseVariance({ best }: PitchFits): number {
  return best.noiseVariance * LOW_RATE_STEP
}

function glideOf({ best }: PitchFits, rateHz: number): TapGlide | null {
  if (best.kind !== 'glide') return null
  const [decay = 0, angle = 0, gamma = 0] = best.parameters
  const settledHz = (angle * rateHz) / (2 * Math.PI)
  const overHz = (gamma * decay * rateHz) / Math.PI
  const cents = 1200 * Math.log2(Math.max(0.5, 1 + overHz / settledHz))
  return { cents, settledHz }
}

function confidenceOf(pitch: FittedPitch, { best }: PitchFits): number {
  const errorCents = (1200 / Math.LN2) * (pitch.standardErrorHz / pitch.pitchHz)
  const unexplained = best.residual / best.energy
  return 1 / (1 + errorCents / 10) / (1 + 4 * unexplained)
}
