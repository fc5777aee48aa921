import { requireQuantity, requireWhole } from './require-quantity'

/** A pitch as the trade writes it: `semitone` counts like MIDI (A4 = 69), `cents` is what is over or under it. */
export type Note = { semitone: number; cents: number }

/** A4 = 440 Hz: ISO 16:1975. */
export const STANDARD_REFERENCE_HZ = 440
export const MIN_REFERENCE_HZ = 415
export const MAX_REFERENCE_HZ = 466

const A4_SEMITONE = 69

function requireReferenceHz(referenceHz: number): number {
  return requireQuantity('referenceHz', referenceHz, { min: MIN_REFERENCE_HZ, max: MAX_REFERENCE_HZ, unit: 'Hz' })
}

function requireHz(field: string, hz: number): number {
  return requireQuantity(field, hz, { min: 1, max: 20_000, unit: 'Hz' })
}

/**
 * Frequency in Hz of a note: f = ref·2^((p − 69)/12), with p the semitone and its cents.
 * @param referenceHz the party's A4, 415 to 466 Hz
 * @throws AcousticsError semitone not a whole number 0 to 127, cents outside ±1200, reference outside its range
 * Source: equal temperament; reference ISO 16:1975.
 */
export function noteFrequencyHz(note: Note, referenceHz: number = STANDARD_REFERENCE_HZ): number {
  requireWhole('semitone', note.semitone, { min: 0, max: 127, unit: '' })
  requireQuantity('cents', note.cents, { min: -1200, max: 1200, unit: 'cents' })
  return requireReferenceHz(referenceHz) * 2 ** ((note.semitone + note.cents / 100 - A4_SEMITONE) / 12)
}

/**
 * The note nearest to a frequency; cents in [−50, 50), unrounded.
 * @throws AcousticsError frequency outside 1 to 20 000 Hz, reference outside its range
 */
export function nearestNote(frequencyHz: number, referenceHz: number = STANDARD_REFERENCE_HZ): Note {
  const pitch = A4_SEMITONE + 12 * Math.log2(requireHz('frequencyHz', frequencyHz) / requireReferenceHz(referenceHz))
  const semitone = Math.round(pitch)
  return { semitone, cents: (pitch - semitone) * 100 }
}

/**
 * Cents from one frequency up to another: 1200·log2(to/from), negative when `toHz` is lower.
 * @throws AcousticsError either frequency outside 1 to 20 000 Hz
 */
export function centsBetween(fromHz: number, toHz: number): number {
  return 1200 * Math.log2(requireHz('toHz', toHz) / requireHz('fromHz', fromHz))
}

/** A frequency moved by cents, at most ten octaves: f·2^(cents/1200). @throws AcousticsError */
export function shiftByCents(frequencyHz: number, cents: number): number {
  requireQuantity('cents', cents, { min: -12_000, max: 12_000, unit: 'cents' })
  return requireHz('frequencyHz', frequencyHz) * 2 ** (cents / 1200)
}

/**
 * Beats a second heard between two steady pitches: |f1 − f2|, in Hz.
 * @throws AcousticsError either frequency outside 1 to 20 000 Hz
 */
export function beatsPerSecond(firstHz: number, secondHz: number): number {
  return Math.abs(requireHz('firstHz', firstHz) - requireHz('secondHz', secondHz))
}
