import { cheapestChoice, noteChoices } from './note-choices'
import type { NoteChoice } from './note-choices'
import { intervalCost, orderCost, tooCloseCost } from './note-cost'
import type { PlanKit } from './note-plan-kit'

export type KickNotes = { choices: readonly NoteChoice[]; cost: number }

/** The cheapest note of each kick under a lowest tom (null without toms); ties nearest the middle, then lowest. Answers are kept. */
export type KickSearch = (lowestPitch: number | null) => KickNotes

/** The kicks of a kit without regard to snares: with the lowest tom's pitch known each kick stands alone. */
export function kicksAlone(kit: PlanKit): KickSearch {
  return kickSearch(kit, () => 0)
}

/** The kicks beside given snares, near which none may come. */
export function kicksBeside(kit: PlanKit, snarePitches: readonly number[], alone: KickSearch): KickSearch {
  const beside = ({ pitch }: NoteChoice) =>
    snarePitches.reduce((sum, snare) => sum + tooCloseCost(pitch - snare, kit.apartSemitones), 0)
  let search: KickSearch | null = null
  return (lowest) => {
    const found = alone(lowest)
    // Snares only ever add cost: what is best without them and not near one is best beside them.
    if (found.choices.every((choice) => beside(choice) === 0)) return found
    search ??= kickSearch(kit, beside)
    return search(lowest)
  }
}

function kickSearch(kit: PlanKit, more: (choice: NoteChoice) => number): KickSearch {
  const { kicks, kickBelow, apartSemitones } = kit
  const rows = kicks.map((kick) => noteChoices(kit, kick))
  const known = new Map<number | null, KickNotes>()
  return (lowest) => {
    const there = known.get(lowest)
    if (there) return there
    const found = rows.map((choices) =>
      cheapestChoice(choices, (choice) => {
        if (lowest === null) return more(choice)
        const got = lowest - choice.pitch
        return more(choice) + intervalCost(got, kickBelow) + orderCost(got) + tooCloseCost(got, apartSemitones)
      }),
    )
    const answer = { choices: found.map(({ choice }) => choice), cost: found.reduce((sum, { cost }) => sum + cost, 0) }
    known.set(lowest, answer)
    return answer
  }
}
