import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import type { Note } from '@/lib/acoustics/note'
import type { DrumEntry } from '@/lib/contracts/kit'
import type { TuningStage } from '@/lib/tuning/drum-estimate'
import { judgePlan } from '@/lib/tuning/note-judge'
import { costOfMoving } from '@/lib/tuning/note-moves'
import { planNotes } from '@/lib/tuning/note-plan'
import type { JudgedPlan, MoveCost, NotePlanInput, NotePlans, PlanDrum } from '@/lib/tuning/note-plan-model'
import type { NoteTemplate } from '@/lib/tuning/note-template'
import { planDrumOf } from '@/lib/tuning/plan-drum'
import { isTom } from './note-draft'

/** What a kit's notes are planned and judged by. */
export interface PlanRules {
  readonly template: NoteTemplate
  readonly apartSemitones: number
  /** The tom that the others are stepped from, at the note that it has; null: none. */
  readonly anchorId: string | null
  readonly stage: TuningStage
}

const known = new Map<string, PlanDrum>()
const knownAtMost = 500

/** The drum's range, worked out once for each size, head, relation and stage. */
function rangedDrum({ id, name, spec }: DrumEntry, stage: TuningStage): PlanDrum {
  const { note: _note, noteLocked: _locked, ...rest } = spec
  const key = JSON.stringify([id, name, rest, stage])
  const found = known.get(key)
  if (found) return found
  const made = planDrumOf(id, name, { ...spec, note: null, noteLocked: false }, stage)
  if (known.size >= knownAtMost) known.clear()
  known.set(key, made)
  return made
}

/** The drum as the plan takes it. @throws AcousticsError whatever its heads refuse */
export function plannedDrumOf(drum: DrumEntry, stage: TuningStage): PlanDrum {
  const ranged = rangedDrum(drum, stage)
  const { note, noteLocked } = drum.spec
  return noteLocked && note ? { ...ranged, lockedNote: note } : ranged
}

function inputOf(drums: readonly DrumEntry[], rules: PlanRules): NotePlanInput {
  const { template, apartSemitones, anchorId, stage } = rules
  const anchor = drums.find((drum) => drum.id === anchorId && isTom(drum))
  return {
    ...{ template, apartSemitones, drums: drums.map((drum) => plannedDrumOf(drum, stage)) },
    ...(anchor?.spec.note ? { anchor: { drumId: anchor.id, note: anchor.spec.note } } : {}),
  }
}

function notesOf(drums: readonly DrumEntry[]): Map<string, Note> {
  return new Map(drums.flatMap(({ id, spec }) => (spec.note ? [[id, spec.note] as const] : [])))
}

const noted = (drums: readonly DrumEntry[]) => drums.filter(({ spec }) => spec.note !== null)

/** What the core refuses is said; anything else is a fault of ours. */
function orRefusal<Answer>(work: () => Answer): Answer | { refusal: string } {
  try {
    return work()
  } catch (error) {
    if (error instanceof AcousticsError) return { refusal: error.message }
    throw error
  }
}

/** The notes as they stand and what they cost; null while no drum has one, or when the core refuses one of them. */
export function judgedAsIs(drums: readonly DrumEntry[], rules: PlanRules): JudgedPlan | null {
  const judged = noted(drums)
  if (judged.length === 0) return null
  const answer = orRefusal(() => judgePlan(inputOf(judged, rules), notesOf(judged)))
  return 'refusal' in answer ? null : answer
}

const planned = new Map<string, NotePlans | { refusal: string }>()
const plannedAtMost = 40

/** The best plan and the next best, round the anchor and the locks, or why there is none. Worked out once as long as these stay. */
export function rankedPlans(drums: readonly DrumEntry[], rules: PlanRules): NotePlans | { refusal: string } {
  return orRefusal(() => {
    const input = inputOf(drums, rules)
    const key = JSON.stringify(input)
    const found = planned.get(key) ?? orRefusal(() => planNotes(input))
    if (planned.size >= plannedAtMost) planned.clear()
    planned.set(key, found)
    return found
  })
}

/** What each other note of one drum would cost the plan; with `replan` after the others have gone along. */
export function costsOfMoving(
  drums: readonly DrumEntry[],
  rules: PlanRules,
  drumId: string,
  options: { replan: boolean },
): MoveCost[] {
  const among = drums.filter(({ id, spec }) => id === drumId || spec.note !== null)
  const answer = orRefusal(() => costOfMoving(inputOf(among, rules), notesOf(among), drumId, options))
  return 'refusal' in answer ? [] : answer
}

/** The notes of all drums when one has been moved and the others go along as they fit best; its own alone when nothing fits. */
export function followed(drums: readonly DrumEntry[], rules: PlanRules, moved: DrumEntry): Map<string, Note> {
  const others = drums.map((drum) =>
    drum.id === moved.id ? { ...moved, spec: { ...moved.spec, noteLocked: true } } : drum,
  )
  const plans = rankedPlans(others, { ...rules, anchorId: isTom(moved) ? moved.id : rules.anchorId })
  return 'refusal' in plans ? notesOf([moved]) : new Map(plans.best.drums.map(({ drumId, note }) => [drumId, note]))
}
