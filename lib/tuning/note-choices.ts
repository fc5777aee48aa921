import type { Note } from '@/lib/acoustics/note'
import { offMiddleCost, outOfRangeCost } from './note-cost'
import { centreOf, notesWithinReach, pitchOf } from './note-plan-kit'
import type { PlanKit } from './note-plan-kit'
import type { PlanDrum } from './note-plan-model'

/** A note a drum may be given and what it costs by itself. */
export type NoteChoice = {
  note: Note
  pitch: number
  /** Thousandths. */
  cost: number
  /** Whole cents from the middle of the drum's range: of equal costs the nearest is taken. */
  fromCentre: number
}

/** Every note a plan may give a drum, lowest first. */
export function noteChoices(kit: PlanKit, drum: PlanDrum): NoteChoice[] {
  return notesWithinReach(kit, drum).map((note) => {
    const pitch = pitchOf(note)
    const cost = offMiddleCost(pitch, drum.range) + outOfRangeCost(pitch, drum.range)
    return { note, pitch, cost, fromCentre: Math.round(Math.abs(pitch - centreOf(drum)) * 100) }
  })
}

/** The choice of the least cost, `more` added to each; of equal ones the nearest to the middle, then the lowest. */
export function cheapestChoice(
  choices: readonly NoteChoice[],
  more: (choice: NoteChoice) => number,
): { choice: NoteChoice; cost: number } {
  let best: { choice: NoteChoice; cost: number } | null = null
  for (const choice of choices) {
    if (best && choice.cost > best.cost) continue
    const cost = choice.cost + more(choice)
    if (!best || cost < best.cost || (cost === best.cost && choice.fromCentre < best.choice.fromCentre)) {
      best = { choice, cost }
    }
  }
  if (!best) throw new Error('a drum has no note within its reach')
  return best
}
