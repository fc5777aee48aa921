import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { requireQuantity, requireWhole } from '@/lib/acoustics/require-quantity'

/**
 * What a template asks from each tom down to the next larger one.
 * `per-inch`: so many semitones an inch of diameter, 0 to 12.
 * `per-pair`: semitones of each pair of neighbours from the smallest tom down, 0 to 24 each; the last goes on for further pairs.
 * `equal-feel`: whatever one film tension makes. `free`: nothing.
 */
export type TemplateSteps =
  | { kind: 'per-inch'; semitonesPerInch: number }
  | { kind: 'per-pair'; semitones: readonly number[] }
  | { kind: 'equal-feel' }
  | { kind: 'free' }

/** How the notes of a kit are laid out. Data, not code: a party keeps its own. */
export type NoteTemplate = {
  id: string
  name: string
  steps: TemplateSteps
  /** Resonant over batter head, cents, −1200 to 1200. */
  resonantCents: number
  /**
   * Where the kick may lie below the lowest tom, whole semitones, 0 to 36; whichever costs least is taken. With none, or
   * without toms, the kick is only kept to the middle of its range.
   */
  kickBelowLowestTom: readonly number[]
}

/** A fourth, a fifth or an octave under the lowest tom: common practice for the kick. */
const KICK_INTERVALS = [5, 7, 12] as const

const STARTING: readonly Pick<NoteTemplate, 'id' | 'name' | 'steps'>[] = [
  { id: 'fourths', name: 'Fourths', steps: { kind: 'per-inch', semitonesPerInch: 2.5 } },
  { id: 'thirds', name: 'Major thirds', steps: { kind: 'per-inch', semitonesPerInch: 2 } },
  { id: 'fourths-then-third', name: 'Two fourths, then thirds', steps: { kind: 'per-pair', semitones: [5, 5, 4] } },
  { id: 'equal-feel', name: 'Equal feel', steps: { kind: 'equal-feel' } },
  { id: 'free', name: 'Free', steps: { kind: 'free' } },
]

/** The templates a party starts with (common practice; a fourth for 2 in is 5 semitones for 2 in). */
export const NOTE_TEMPLATES: readonly NoteTemplate[] = STARTING.map((template) => ({
  ...template,
  resonantCents: 0,
  kickBelowLowestTom: KICK_INTERVALS,
}))

/** @throws AcousticsError naming the part of the template that is not what it says it must be */
export function requireTemplate({ steps, resonantCents, kickBelowLowestTom }: NoteTemplate): void {
  requireQuantity('resonantCents', resonantCents, { min: -1200, max: 1200, unit: 'cents' })
  for (const semitones of kickBelowLowestTom) {
    requireWhole('kickBelowLowestTom', semitones, { min: 0, max: 36, unit: 'semitones' })
  }
  if (steps.kind === 'per-inch') {
    requireQuantity('semitonesPerInch', steps.semitonesPerInch, { min: 0, max: 12, unit: 'semitones' })
  }
  if (steps.kind === 'per-pair') {
    if (steps.semitones.length === 0) {
      throw new AcousticsError('semitones', 'A template by pairs needs the interval of at least one pair.')
    }
    for (const each of steps.semitones) requireQuantity('semitones', each, { min: 0, max: 24, unit: 'semitones' })
  }
}
