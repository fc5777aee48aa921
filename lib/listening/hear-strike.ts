import { lookAgain } from './look-again'
import { doubtOfPitch } from './doubt-of-pitch'
import { ringSpectrum } from './ring-spectrum'
import { chooseTapPartial, isNearTarget } from './choose-tap-partial'
import { clippedUntil } from './clipped-until'
import { findPartials } from './find-partials'
import { glidingPitch } from './gliding-pitch'
import { LOW_RATE_STEP } from './low-rate'
import type { BandFit } from './fit-band'
import { fitPitchAmongNeighbours } from './pitch-among-neighbours'
import type { FittedPitch } from './pitch-of-fit'
import { pitchOfFit, T60_PER_TAU } from './pitch-of-fit'
import { hasSecondStrike } from './second-strike'
import type { TapGlide, TapReading, TapRefusalKind } from './tap-report'
import { isDense, isHarmonic, LEAST_LOW_SHARE, lowShare } from './tap-signs'

export type StrikeToHear = {
  samples: Float32Array
  sampleRateHz: number
  /** Index of the strike. */
  strikeAt: number
  /** Mean square of a sample while nothing sounds. */
  quiet: number
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
/** Decays that a head can have, s for 60 dB; what rings longer is held, what is shorter is a knock. */
const SHORTEST_T60_S = 0.075
const LONGEST_T60_S = 2.7
/** Fewer periods than this in the decay are a thump, not a pitch. */
const FEWEST_PERIODS = 5.5
/** What decays slower than this is mains hum or another steady sound, s. */
const STEADY_T60_S = 6
/** Of the pitch's band, power: over the first a glide is looked for, over the second the sound is no ringing head. */
const GLIDE_UNEXPLAINED = 0.02
/** A pitch that still falls by more than this after 50 ms is on its way throughout: where it dwells is its pitch, cents. */
const WIDE_GLIDE_CENTS = 60
const MOST_UNEXPLAINED = 0.25
/** A pitch less sure than this is not named, cents. */
const MOST_ERROR_CENTS = 25
/** Good taps read 0.68 and more down to 12 dB of pink noise; syllables, footsteps and rings cut off read less than this. */
const LEAST_CONFIDENCE = 0.6
/** Nor is a pitch named on which the looks at a ring agree no better, cents. */
const MOST_DOUBT_CENTS = 15

/** The pitch of one strike, or why none is named. */
export function hearStrike(strike: StrikeToHear): HeardStrike | TapRefusalKind {
  const { samples, sampleRateHz, strikeAt, quiet, expect } = strike
  const end = Math.min(samples.length, strikeAt + Math.round(LONGEST_RING_S * sampleRateHz))
  const unclippedFrom = clippedUntil(samples, sampleRateHz, strikeAt, end)
  if (unclippedFrom === null) return 'clipped'
  if ((end - unclippedFrom) / sampleRateHz < SHORTEST_RING_S) return 'too-short'
  if (hasSecondStrike(samples, sampleRateHz, strikeAt, end)) return 'double-hit'
  const share = lowShare({ samples, sampleRateHz, strikeAt, end, quiet })
  if (share !== null && share < LEAST_LOW_SHARE) return 'not-a-tap'

  const moving = gliding(strike, end)
  if (moving !== null && (moving.glide?.cents ?? 0) > WIDE_GLIDE_CENTS) return moving

  const rateHz = sampleRateHz / LOW_RATE_STEP
  const firstFrom = Math.max(unclippedFrom, strikeAt + Math.round(FIRST_SKIP_S * sampleRateHz))
  const found = findPartials(ringSpectrum(samples, firstFrom, end), rateHz).partials
  const ringing = found.filter(({ decay }) => T60_PER_TAU / (decay * rateHz) < STEADY_T60_S)
  if (ringing.length === 0 && found.length > 0) return 'not-a-tap'
  // A pitch on its way looks like many partials side by side.
  if (isHarmonic(ringing) || isDense(found)) return moving ?? 'not-a-tap'
  const chosen = chooseTapPartial(ringing, rateHz, expect)
  if (typeof chosen === 'string') return moving ?? chosen

  // Once the decay is known: begin as early and end as soon as it allows.
  const tauS = 1 / (chosen.decay * rateHz)
  const skip = Math.round(Math.min(0.02, Math.max(0.002, 0.1 * tauS)) * sampleRateHz)
  const from = Math.max(unclippedFrom, strikeAt + skip)
  const ring = Math.round(Math.max(SHORTEST_WINDOW_S, RING_TAUS * tauS) * sampleRateHz)
  const until = Math.min(end, from + ring)
  const spectrum = ringSpectrum(samples, from, until)
  const fitted = fitPitchAmongNeighbours(spectrum, rateHz, found, chosen)
  if (fitted === null) return 'unclear'
  const { fit } = fitted
  const unexplained = fit.residual / fit.energy
  if (moving !== null && unexplained > GLIDE_UNEXPLAINED) return moving
  const sinceStrikeS = (from - strikeAt) / sampleRateHz
  const pitch = pitchOfFit(fit, rateHz, sinceStrikeS, (until - from) / sampleRateHz)
  const refused = refusalOf(pitch, unexplained, share)
  if (refused !== null) return refused
  if (confidenceOf(pitch, unexplained) < LEAST_CONFIDENCE) return 'unclear'

  const first = { samples, rateHz, from, until, tau: tauS * sampleRateHz, size: spectrum.size, fitted }
  const looks = lookAgain(first).map((look) => {
    const windowS = (look.until - look.from) / sampleRateHz
    return {
      pitch: pitchOfFit(look.fit, rateHz, (look.from - strikeAt) / sampleRateHz, windowS),
      windowS,
      noiseVariance: look.fit.noiseVariance,
    }
  })
  const doubt = doubtOfPitch(pitch, fit, looks, rateHz, quiet / LOW_RATE_STEP)
  const standardErrorHz = Math.hypot(pitch.standardErrorHz, doubt.spreadHz)
  const doubted = { ...pitch, standardErrorHz, warble: doubt.warbleStands ? pitch.warble : null }
  if (errorCents(doubted) > MOST_DOUBT_CENTS) return 'unclear'
  return {
    ...doubted,
    confidence: confidenceOf(doubted, unexplained),
    glide: glideOf(fit, rateHz, sinceStrikeS),
    snrDb: snrDb(pitch, fit.noiseVariance * LOW_RATE_STEP),
    heardForS: (until - strikeAt) / sampleRateHz,
  }
}

function gliding({ samples, sampleRateHz, strikeAt, quiet, expect }: StrikeToHear, end: number): HeardStrike | null {
  const heard = glidingPitch(samples, sampleRateHz, strikeAt, end)
  if (heard === null || !isNearTarget(heard.pitchHz, expect)) return null
  const { pitchHz, standardErrorHz, t60S, amplitude, glide } = heard
  return {
    pitchHz,
    standardErrorHz,
    t60S,
    t60StandardErrorS: 0.2 * t60S,
    partials: [{ frequencyHz: pitchHz, standardErrorHz, amplitude, t60S }],
    warble: null,
    glide,
    confidence: 1 / (1 + errorCents(heard) / 10),
    snrDb: 20 * Math.log10(amplitude / Math.sqrt(2 * quiet + 1e-12)),
    heardForS: (end - strikeAt) / sampleRateHz,
  }
}

function refusalOf(pitch: FittedPitch, unexplained: number, share: number | null): TapRefusalKind | null {
  if (unexplained > MOST_UNEXPLAINED) return share === null ? 'too-noisy' : 'not-a-tap'
  if (pitch.t60S > LONGEST_T60_S || pitch.t60S < SHORTEST_T60_S) return 'not-a-tap'
  if (pitch.t60S * pitch.pitchHz < FEWEST_PERIODS) return 'not-a-tap'
  if (errorCents(pitch) > MOST_ERROR_CENTS) return 'too-noisy'
  return null
}

function glideOf(fit: BandFit, rateHz: number, sinceStrikeS: number): TapGlide | null {
  if (fit.kind !== 'glide') return null
  const [decay = 0, angle = 0, gamma = 0] = fit.parameters
  const settledHz = (angle * rateHz) / (2 * Math.PI)
  // At the strike; it has faded with the energy since.
  const overHz = ((gamma * decay * rateHz) / Math.PI) * Math.exp(2 * decay * rateHz * sinceStrikeS)
  return { cents: 1200 * Math.log2(Math.max(0.5, 1 + overHz / settledHz)), settledHz }
}

/** Power of the partials at the strike over the noise's. */
function snrDb({ partials }: FittedPitch, noiseVariance: number): number {
  const power = partials.reduce((sum, { amplitude }) => sum + amplitude ** 2 / 2, 0)
  return 10 * Math.log10(power / noiseVariance)
}

function errorCents({ standardErrorHz, pitchHz }: { standardErrorHz: number; pitchHz: number }): number {
  return ((1200 / Math.LN2) * standardErrorHz) / pitchHz
}

function confidenceOf(pitch: FittedPitch, unexplained: number): number {
  return 1 / (1 + errorCents(pitch) / 10) / (1 + 4 * unexplained)
}
