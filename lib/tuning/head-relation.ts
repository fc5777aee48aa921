import { centsBetween, shiftByCents } from '@/lib/acoustics/note'
import { requireQuantity } from '@/lib/acoustics/require-quantity'

/** Starting points for the relation between heads, in cents of the resonant over the batter head (common practice). */
export const HEAD_RELATIONS = [
  { id: 'matched', resonantCents: 0, means: 'Both heads at one pitch: the fullest, longest note.' },
  { id: 'resonant-higher', resonantCents: 300, means: 'Resonant head a minor third higher: shorter, more focused.' },
  { id: 'resonant-lower', resonantCents: -200, means: 'Resonant head a tone lower: deeper, drier, falling in pitch.' },
] as const

/**
 * Pitch of the resonant head in Hz for a batter pitch and a relation in cents (positive: resonant higher). Each head taken
 * alone, the other damped; how the two pull each other's pitch about on one shell is left out.
 * @throws AcousticsError relation outside ±1200 cents
 */
export function resonantTargetHz(batterHz: number, resonantCents: number): number {
  requireQuantity('resonantCents', resonantCents, { min: -1200, max: 1200, unit: 'cents' })
  return shiftByCents(batterHz, resonantCents)
}

/** Relation in cents of a resonant head over its batter head, each heard alone: the inverse of `resonantTargetHz`. @throws AcousticsError */
export function headRelationCents(batterHz: number, resonantHz: number): number {
  return centsBetween(batterHz, resonantHz)
}
