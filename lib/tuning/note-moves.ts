import { costOf } from './note-cost'
import { judgeKit } from './note-judge'
import type { DrumNotes } from './note-judge'
import { thousandthsOf } from './note-plan-key'
import { planKitOf } from './note-plan-kit'
import type { MoveCost, NotePlanInput, PlanDrum } from './note-plan-model'
import { plansInOrder } from './note-plans-in-order'
import { AcousticsError } from '@/lib/acoustics/acoustics-error'

/**
 * What a plan would cost with one drum at each semitone of its range (at its present cents, or the anchor's while it has no
 * note), lowest first: the choices along its bar. A lock or anchor of the moved drum is lifted for the question.
 * @param notes the other drums as they stand
 * @param options.replan also plan every other drum anew round each choice
 * @throws AcousticsError naming `drumId`, or see `planKitOf`
 */
export function costOfMoving(
  input: NotePlanInput,
  notes: DrumNotes,
  drumId: string,
  { replan = false }: { replan?: boolean } = {},
): MoveCost[] {
  const drum = input.drums.find(({ id }) => id === drumId)
  if (!drum) throw new AcousticsError('drumId', 'The drum to move is not of this kit.')
  const kit = planKitOf(input)
  const cents = notes.get(drumId)?.cents ?? kit.cents
  const from = Math.max(0, Math.ceil(drum.range.low - cents / 100))
  const to = Math.min(127, Math.floor(drum.range.high - cents / 100))
  return Array.from({ length: Math.max(0, to - from + 1) }, (_, i) => {
    const note = { semitone: from + i, cents }
    return {
      note,
      cost: judgeKit(kit, new Map([...notes, [drumId, note]]), 'set').cost,
      replannedCost: replan ? leastCost(heldAt(input, drum, note)) : null,
    }
  })
}

function heldAt(
  { anchor, ...input }: NotePlanInput,
  drum: PlanDrum,
  lockedNote: PlanDrum['lockedNote'],
): NotePlanInput {
  return {
    ...input,
    drums: input.drums.map((each) => (each.id === drum.id ? { ...each, ...(lockedNote ? { lockedNote } : {}) } : each)),
    ...(anchor && anchor.drumId !== drum.id ? { anchor } : {}),
  }
}

function leastCost(input: NotePlanInput): number {
  const { value } = plansInOrder(planKitOf(input)).next()
  return value ? costOf(thousandthsOf(value.key)) : 0
}
