import type { Note } from '@/lib/acoustics/note'

/** One partial of the tap, a damped sinusoid. */
export type HeardPartial = {
  /** Hz */
  frequencyHz: number
  /** One standard deviation of it, Hz, from what the fit leaves over. */
  standardErrorHz: number
  /** Amplitude at the strike, full scale 1. */
  amplitude: number
  /** Time for 60 dB of decay, seconds: 6.9078 τ. */
  t60S: number
}

/** Slow beats of two partials of one mode, as the ear hears them. */
export type TapWarble = {
  /** Beats a second: how far the two partials lie apart, Hz. */
  differenceHz: number
  /** 95 % interval, Hz. */
  lowHz: number
  highHz: number
  /** Two partials that the window resolves, or the envelope of two too close for it (Δf·T < 2). */
  from: 'partials' | 'envelope'
}

/** A hard hit stretches the film and reads high until it has calmed. */
export type TapGlide = {
  /** How far the pitch fell while it was listened to, cents. */
  cents: number
  /** The pitch it settles on, Hz. */
  settledHz: number
}

export type TapReading = {
  outcome: 'heard'
  /**
   * Pitch of the tap, Hz. With one partial: its frequency. With a close pair: their mean weighted by amplitude at the
   * strike, which is the frequency at which the pair sets off together and what a tap near a lug follows round the head,
   * p̄ + (Δ/2)·cos 2θ. With a glide: the middle of what rings from 50 to 650 ms.
   */
  pitchHz: number
  /** One standard deviation of it, Hz: noise, and how far looks at parts of the ring differ, as they do in a room. */
  standardErrorHz: number
  /** The nearest note at the reference asked for. */
  note: Note
  /** Cents from the target to the pitch; null when no target was given. */
  centsFromTarget: number | null
  /** 0 to 1: 1 is a clean tap with one plain pitch; under 0.5 it is worth tapping again. */
  confidence: number
  /** Decay of the pitch partial, seconds: 6.9078 τ (J. O. Smith, Mathematics of the DFT). */
  t60S: number
  t60StandardErrorS: number
  /** The pitch's own partial, or the close pair of them, strongest first. */
  partials: HeardPartial[]
  /** Null when one partial says all that was heard, or when not every part of the ring tells the same warble. */
  warble: TapWarble | null
  /** Null when the pitch stands still. */
  glide: TapGlide | null
  /** Power of the pitch partials at the strike over the noise's, whole band, dB. */
  snrDb: number
  /** Where the strike begins in the samples given, seconds. */
  onsetS: number
  /** How much sound after the strike the analysis used, seconds. */
  heardForS: number
}

/**
 * Why no pitch is named. `silent`: nothing over the floor. `clipped`: the microphone overran. `too-short`: the sound ends before
 * the pitch can be told. `double-hit`: two strikes in one ring. `not-a-tap`: speech, a held tone, a cymbal, a rattle. `too-noisy`:
 * the pitch drowns. `unclear`: two pitches compete, none lies near the target, or parts of the ring
 * tell different pitches.
 */
export type TapRefusalKind = 'silent' | 'clipped' | 'too-short' | 'double-hit' | 'not-a-tap' | 'too-noisy' | 'unclear'

export type TapRefusal = {
  outcome: 'refused'
  kind: TapRefusalKind
  /** Where the strike begins, seconds; null when none was found. */
  onsetS: number | null
}

export type TapReport = TapReading | TapRefusal

export type TapOptions = {
  /** The pitch looked for, Hz: the strongest partial near it is taken. Without it the strongest low partial. */
  expectHz?: number
  /** How far from `expectHz` is still near it, cents either way; 500 unless told. */
  expectWithinCents?: number
  /** The party's A4, Hz, for the note. */
  referenceHz?: number
}
