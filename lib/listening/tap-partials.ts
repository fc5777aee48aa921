import { besselJ, besselJZero } from '@/lib/acoustics/bessel-j'
import { within } from './tap-within'

/** In air at 20 °C; a few degrees move the fading by nothing that is heard. */
const SOUND_M_PER_S = 343.2

/** One shape of a head as it sounds: m diameters and n circles stand still, the rim counted. */
export type HeadMode = {
  m: number
  n: number
  /** Middle of the pair for m > 0. */
  hz: number
  /** Time in s to fall by 60 dB. */
  decayT60S: number
  /** Distance in Hz between the two of the pair; 0 when the head is even, and always for m = 0. */
  splitHz: number
  /** Angle in rad at which the higher of the pair is loudest. */
  axisRad: number
  /** Share of the amplitude that is left, 0 to 1: a fingertip or a damped head takes the rest. */
  share: number
}

/** Where the stick lands and where the microphone hears from: radius as a share of the head's, 0 centre to 1 rim. */
export type HeadPlace = { radiusShare: number; angleRad: number }

/** A head as it sounds when struck. */
export type StruckHead = { radiusM: number; modes: readonly HeadMode[] }

export type Strike = {
  stick: HeadPlace
  /** `heightM`: how far above the head. */
  microphone: HeadPlace & { heightM: number }
  /** How long the stick stays on the film, s. Longer is darker. */
  contactS: number
}

/** One damped sinusoid, as heard once the stick has left: amplitude·10^(−3t/T60)·sin(2π·hz·t + phase), t from the strike. */
export type TapPartial = { m: number; n: number; hz: number; decayT60S: number; amplitude: number; phaseRad: number }

/**
 * The partials that a strike raises, amplitudes beside each other only (`makeTap` scales them).
 * Each shape is struck by its own height at the stick, heard by its height at the microphone, over its mean square:
 * φ(stick)·φ(microphone)/⟨φ²⟩, φ = J_m(j_mn·r/a)·cos m(θ − axis) for the higher of a pair and sin for the lower. That is an impulse's
 * velocity in the film, which close to the head is what the microphone hears: there the pressure is ρ·ω·v/κ, and ω/κ is nearly one speed
 * for all shapes. It fades with height as e^(−κz), κ² = (j_mn/a)² − (ω/c)², faster the finer the shape. The contact is a raised-cosine
 * push; its transform dulls and delays each partial. All derived; leaves out the rim's end of the near field, what radiates far off, and the shell.
 * @throws RangeError a place off the head, a microphone more than 1 m above it, a contact over 20 ms
 */
export function tapPartials(head: StruckHead, strike: Strike): TapPartial[] {
  for (const { radiusShare, angleRad } of [strike.stick, strike.microphone]) {
    within('radiusShare', radiusShare, 0, 1)
    within('angleRad', angleRad, -1e3, 1e3)
  }
  within('heightM', strike.microphone.heightM, 0, 1)
  within('contactS', strike.contactS, 0, 0.02)
  return head.modes.flatMap((mode) => partialsOf(mode, head.radiusM, strike)).filter(({ amplitude }) => amplitude !== 0)
}

function partialsOf(mode: HeadMode, radiusM: number, { stick, microphone, contactS }: Strike): TapPartial[] {
  const zero = besselJZero(mode.m, mode.n)
  const meanSquare = besselJ(mode.m + 1, zero) ** 2 * (mode.m === 0 ? 1 : 0.5)
  const radial =
    (mode.share * besselJ(mode.m, zero * stick.radiusShare) * besselJ(mode.m, zero * microphone.radiusShare)) /
    meanSquare
  const fading = Math.sqrt(Math.max(0, (zero / radiusM) ** 2 - ((2 * Math.PI * mode.hz) / SOUND_M_PER_S) ** 2))
  const heard = radial * Math.exp(-fading * microphone.heightM)
  const partial = (hz: number, around: number): TapPartial => {
    const push = contactTransform(hz, mode.decayT60S, contactS)
    const signed = heard * around * push.gain
    return {
      m: mode.m,
      n: mode.n,
      hz,
      decayT60S: mode.decayT60S,
      amplitude: Math.abs(signed),
      phaseRad: push.phaseRad + (signed < 0 ? Math.PI : 0),
    }
  }
  if (mode.m === 0) return [partial(mode.hz, 1)]
  const [atStick, atMicrophone] = [stick, microphone].map(({ angleRad }) => mode.m * (angleRad - mode.axisRad)) as [
    number,
    number,
  ]
  return [
    partial(mode.hz + mode.splitHz / 2, Math.cos(atStick) * Math.cos(atMicrophone)),
    partial(mode.hz - mode.splitHz / 2, Math.sin(atStick) * Math.sin(atMicrophone)),
  ]
}

/**
 * What a raised-cosine push of unit area does to a damped sinusoid: ∫ p(u)·e^(−su) du over the contact, s = −decay + iω.
 * In closed form e^(−sτ/2)·(sinh x/x)·1/(1 + (x/π)²), x = sτ/2.
 */
function contactTransform(hz: number, decayT60S: number, contactS: number): { gain: number; phaseRad: number } {
  if (contactS === 0) return { gain: 1, phaseRad: 0 }
  const re = (-Math.LN10 * 3 * contactS) / (2 * decayT60S)
  const im = Math.PI * hz * contactS
  // (1 − e^(−2x))/2x, which is e^(−x)·sinh x/x
  const shrunk = Math.exp(-2 * re)
  const [topRe, topIm] = [1 - shrunk * Math.cos(2 * im), shrunk * Math.sin(2 * im)]
  const lowRe = 2 * (re + (re ** 3 - 3 * re * im ** 2) / Math.PI ** 2)
  const lowIm = 2 * (im + (3 * re ** 2 * im - im ** 3) / Math.PI ** 2)
  const lowSquare = lowRe ** 2 + lowIm ** 2
  const [gainRe, gainIm] = [(topRe * lowRe + topIm * lowIm) / lowSquare, (topIm * lowRe - topRe * lowIm) / lowSquare]
  return { gain: Math.hypot(gainRe, gainIm), phaseRad: Math.atan2(gainIm, gainRe) }
}
