import { requireWhole } from '@/lib/acoustics/require-quantity'
import { costOf } from './note-cost'
import { judgeKit } from './note-judge'
import { thousandthsOf } from './note-plan-key'
import { planKitOf } from './note-plan-kit'
import type { PlanKit } from './note-plan-kit'
import type { NotePlanInput, NotePlans, PlanChange } from './note-plan-model'
import { plansInOrder } from './note-plans-in-order'
import type { FoundPlan } from './note-plans-in-order'

/** As many as a person reads. */
export const DEFAULT_ALTERNATIVES = 8

/**
 * The best note for every drum of a kit, and what else could be done. Of all plans in whole semitones (on the anchor's cents,
 * each drum at most an octave outside its range) the one of the least cost by `NOTE_COSTS`: each drum near the middle of its range, the
 * toms' intervals as the template asks, each kick an asked interval under the lowest tom, snares off the toms' note names, no two
 * drums nearer than the set distance, no larger tom above a smaller. Locks and the anchor are kept exactly. Of equal cost
 * the plan whose drums together lie nearest the middles of their ranges, then the one that is lower at the first difference.
 *
 * Alternatives, cheapest first: the best plan's own intervals at every other height, and the best plan of every other set of intervals;
 * kicks and snares follow each. None when no tom can move.
 * @throws AcousticsError see `planKitOf`, or `alternatives` not a whole number 0 to 40
 */
export function planNotes(input: NotePlanInput): NotePlans {
  const kit = planKitOf(input)
  const wanted = input.alternatives ?? DEFAULT_ALTERNATIVES
  requireWhole('alternatives', wanted, { min: 0, max: 40, unit: '' })
  const [found, ...others] = differentPlans(plansInOrder(kit), wanted + 1)
  if (!found) throw new Error('every kit has a plan')
  const best = judgeKit(kit, found.notes, 'planned')
  return {
    best,
    alternatives: others.map((other) => {
      const plan = judgeKit(kit, other.notes, 'planned')
      return {
        plan,
        change: changeFrom(found, other, kit),
        extraCost: costOf(thousandthsOf(other.key) - thousandthsOf(found.key)),
      }
    }),
  }
}

/** The first plan, then its own intervals at other heights and the first plan of each other set of intervals. */
function differentPlans(inOrder: Iterable<FoundPlan>, most: number): FoundPlan[] {
  const kept: FoundPlan[] = []
  const patterns = new Set<string>()
  for (const plan of inOrder) {
    const [first] = kept
    const pattern = intervalsOf(plan).join(' ')
    if (!first || !patterns.has(pattern) || intervalsOf(first).join(' ') === pattern) kept.push(plan)
    patterns.add(pattern)
    if (kept.length === most) break
  }
  return kept
}

/** Whole cents: equal intervals must be equal however their fractions were come by. */
function intervalsOf({ tomPitches }: FoundPlan): number[] {
  return tomPitches.slice(1).map((pitch, i) => Math.round(((tomPitches[i] ?? 0) - pitch) * 100))
}

function changeFrom(best: FoundPlan, here: FoundPlan, { toms }: PlanKit): PlanChange {
  const [from, to] = [intervalsOf(best), intervalsOf(here)]
  const intervals = toms.slice(1).flatMap((lower, i) => {
    const [was = 0, is = 0] = [from[i], to[i]]
    return was === is ? [] : [{ upperId: toms[i]?.id ?? '', lowerId: lower.id, best: was / 100, here: is / 100 }]
  })
  if (intervals.length > 0) return { kind: 'intervals', intervals }
  return { kind: 'shifted', semitones: Math.round(((here.tomPitches[0] ?? 0) - (best.tomPitches[0] ?? 0)) * 100) / 100 }
}
