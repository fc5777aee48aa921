import { requireQuantity } from '@/lib/acoustics/require-quantity'

/**
 * How the toms of a kit are stepped from an anchor. Data, not code: a party keeps its own.
 * `fixed-interval`: so many semitones per inch of diameter, larger lower. `equal-tension`: every tom's batter at the anchor's
 * film tension, whatever note that makes.
 */
export type NoteTemplate = {
  id: string
  name: string
  steps: { kind: 'fixed-interval'; semitonesPerInch: number } | { kind: 'equal-tension' }
  /** Resonant over batter head, cents, −1200 to 1200. */
  resonantCents: number
  /**
   * Where the kick may lie below the lowest tom, in semitones; the one nearest the middle of the kick's range is taken. With
   * none, or without toms, the kick goes to the middle of its range.
   */
  kickBelowLowestTom: readonly number[]
}

/** A fourth, a fifth or an octave under the lowest tom: common practice for the kick. */
const KICK_INTERVALS = [5, 7, 12] as const

/** The templates a party starts with (common practice; a fourth for 2 in is 5 semitones for 2 in). */
export const NOTE_TEMPLATES: readonly NoteTemplate[] = [
  {
    ...{ id: 'fourths', name: 'Fourths', steps: { kind: 'fixed-interval', semitonesPerInch: 2.5 } },
    ...{ resonantCents: 0, kickBelowLowestTom: KICK_INTERVALS },
  },
  {
    ...{ id: 'thirds', name: 'Major thirds', steps: { kind: 'fixed-interval', semitonesPerInch: 2 } },
    ...{ resonantCents: 0, kickBelowLowestTom: KICK_INTERVALS },
  },
  {
    ...{ id: 'equal-feel', name: 'Equal feel', steps: { kind: 'equal-tension' } },
    ...{ resonantCents: 0, kickBelowLowestTom: KICK_INTERVALS },
  },
]

/**
 * Semitones from one diameter to another under a fixed-interval template: negative when the second is larger, rounded to
 * whole semitones (a half goes to the smaller step). Diameters in nominal inches.
 * @throws AcousticsError
 */
export function templateInterval(fromDiameterIn: number, toDiameterIn: number, semitonesPerInch: number): number {
  const inches = { min: 4, max: 31, unit: 'in' }
  requireQuantity('diameterIn', fromDiameterIn, inches)
  requireQuantity('diameterIn', toDiameterIn, inches)
  requireQuantity('semitonesPerInch', semitonesPerInch, { min: 0, max: 12, unit: 'semitones' })
  const exact = (fromDiameterIn - toDiameterIn) * semitonesPerInch
  // Rounding the size and not the signed value keeps the way down equal to the way up. 2.5 is taken as 2.
  const size = Math.ceil(Math.abs(exact) - 0.5)
  return size === 0 ? 0 : Math.sign(exact) * size
}
