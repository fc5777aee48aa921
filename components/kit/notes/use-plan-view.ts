'use client'

import { useDeferredValue, useMemo } from 'react'
import type { CostStep } from '@/components/signature/cost-steps'
import type { RangeScale } from '@/components/signature/range-bar'
import type { DrumEntry } from '@/lib/contracts/kit'
import { noteText } from '@/lib/contracts/kit-form'
import type { PartyNoteTemplate } from '@/lib/contracts/note-template'
import type { TuningStage } from '@/lib/tuning/drum-estimate'
import type { JudgedPlan, MoveCost, PlanDrum } from '@/lib/tuning/note-plan-model'
import { intervalReason } from '@/lib/tuning/note-plan-words'
import { NOTE_TEMPLATES } from '@/lib/tuning/note-template'
import type { NoteTemplate } from '@/lib/tuning/note-template'
import type { KitReader } from '../kit-reader'
import { splitWords } from './cost-words'
import { drafted, notesToSet, pitchOf, sameNote } from './note-draft'
import type { NoteDraft } from './note-draft'
import type { NotePlanState } from './note-session'
import type { PlanChoice } from './plan-choices'
import { costsOfMoving, judgedAsIs, plannedDrumOf, rankedPlans } from './plan-of'
import type { PlanRules } from './plan-of'
import { headsFollow, planDraft } from './plan-draft'
import { planWhy } from './plan-why'

export interface PlanViewInput {
  inKit: readonly DrumEntry[]
  own: readonly PartyNoteTemplate[]
  state: NotePlanState
  reader: KitReader
  chosenId: string | null
  temperatureC: number | null
}

const [firstTemplate] = NOTE_TEMPLATES
if (!firstTemplate) throw new Error('there is no template to plan by')
const usualTemplate: NoteTemplate = firstTemplate

/** Dearer than this over the best, choices look alike: a drum two semitones out of its range. */
const dearestShown = 20

/** Everything that the planner shows, worked out from the kit, the draft and the choices. */
export function usePlanView({ inKit, own, state, reader, chosenId, temperatureC }: PlanViewInput) {
  const { choices, trying, inHand } = state
  const draft = trying?.draft ?? state.draft
  const template = [...NOTE_TEMPLATES, ...own].find(({ id }) => id === choices.templateId) ?? usualTemplate
  const { referenceHz } = reader
  const stage = useMemo<TuningStage>(
    () => ({ referenceHz, ...(temperatureC === null ? {} : { temperatureC }) }),
    [referenceHz, temperatureC],
  )
  const anchorId = choices.anchorId
  const { apartSemitones } = choices
  const rules = useMemo<PlanRules>(
    () => ({ template, apartSemitones, anchorId, stage }),
    [template, apartSemitones, anchorId, stage],
  )
  const drums = useMemo(() => inKit.map((drum) => drafted(drum, draft)), [inKit, draft])
  // Plans start from the person's own draft, also while one of them is looked at.
  const mine = useMemo(() => inKit.map((drum) => drafted(drum, state.draft)), [inKit, state.draft])
  const ranged = useMemo(() => drums.map((drum) => plannedDrumOf(drum, stage)), [drums, stage])
  const judged = useMemo(() => judgedAsIs(drums, rules), [drums, rules])
  // What takes longer than a frame comes after the bead, so that it never lags behind the hand.
  const laterMine = useDeferredValue(mine)
  const laterDrums = useDeferredValue(drums)
  const laterJudged = useDeferredValue(judged)
  const plans = useMemo(() => rankedPlans(laterMine, rules), [laterMine, rules])
  const costs = useMemo(
    () => (chosenId === null ? [] : costsOfMoving(laterDrums, rules, chosenId, { replan: choices.othersFollow })),
    [laterDrums, rules, chosenId, choices.othersFollow],
  )
  const settled = useMemo(
    () => (inHand === null ? drums : inKit.map((drum) => drafted(drum, inHand))),
    [inHand, drums, inKit],
  )

  const nameOf = (id: string) => inKit.find((drum) => drum.id === id)?.name ?? 'another drum'
  const draftOf = (plan: JudgedPlan): NoteDraft => planDraft(plan, mine, template, choices.headsToo)
  const anchor = mine.find(({ id, spec }) => id === anchorId && spec.note)
  const from = anchor?.spec.note ? ` from ${noteText(anchor.spec.note, reader.locale)} on ${anchor.name}` : ''
  const listed: PlanChoice[] =
    'refusal' in plans
      ? []
      : [{ plan: plans.best, change: null }, ...plans.alternatives].map(({ plan, change }, index) => ({
          id: plan.drums.map(({ drumId, note }) => `${drumId} ${pitchOf(note)}`).join(' '),
          name: index === 0 ? 'the best' : `plan ${index + 1}`,
          plan,
          why: planWhy(plan, change, nameOf),
          current: notesToSet(mine, draftOf(plan)).length === 0,
        }))
  const chosen = drums.find(({ id }) => id === chosenId)

  return {
    ...{ drums, mine, ranged, judged, template, rules, stage, trying, draftOf },
    unhurried: { drums: laterDrums, judged: laterJudged },
    everybodys: NOTE_TEMPLATES,
    reasonsOf: (drumId: string) =>
      (judged?.intervals ?? [])
        .filter(({ upperId, lowerId }) => upperId === drumId || lowerId === drumId)
        .flatMap((interval) => intervalReason(interval, nameOf) ?? []),
    best: listed[0] ?? null,
    choices: listed,
    refusal: 'refusal' in plans ? plans.refusal : null,
    title: `${template.name}${from}`,
    toSet: notesToSet(inKit, state.draft),
    otherHeads: mine
      .filter((drum) => headsFollow(drum) && drum.spec.headRelationCents !== template.resonantCents)
      .map(({ id }) => id),
    scale: scaleOf(ranged, settled),
    compare: comparison(trying ? mine : inKit, drums),
    costWords: judged ? splitWords(judged.cost, judged.split) : 'nothing',
    costSteps: costs.length === 0 ? null : stepsOf(costs),
    betterNote: chosen ? betterOf(costs, chosen) : null,
  }
}
export type PlanView = ReturnType<typeof usePlanView>

/** Two semitones beyond everything drawn, so that a bead can be taken out of its range. It stays as it is while one is in hand. */
function scaleOf(ranged: readonly PlanDrum[], settled: readonly DrumEntry[]): RangeScale {
  const pitches = settled.flatMap(({ spec }) => (spec.note ? [pitchOf(spec.note)] : []))
  return {
    from: Math.floor(Math.min(...ranged.map(({ range }) => range.low), ...pitches)) - 2,
    to: Math.ceil(Math.max(...ranged.map(({ range }) => range.high), ...pitches)) + 2,
  }
}

/** Where other notes lie that the shown ones differ from. */
function comparison(others: readonly DrumEntry[], shown: readonly DrumEntry[]): Map<string, number> {
  return new Map(
    others.flatMap(({ id, spec }, index) =>
      spec.note && !sameNote(spec.note, shown[index]?.spec.note ?? null) ? [[id, pitchOf(spec.note)] as const] : [],
    ),
  )
}

const costNow = ({ cost, replannedCost }: MoveCost) => replannedCost ?? cost

function stepsOf(costs: readonly MoveCost[]): CostStep[] {
  const least = Math.min(...costs.map(costNow))
  return costs.map((move) => ({
    at: pitchOf(move.note),
    // By the root, so that small differences near the best are seen beside the dear edges.
    share: Math.sqrt(Math.min(1, (costNow(move) - least) / dearestShown)),
    best: costNow(move) === least,
  }))
}

/** The cheapest other note, when it is cheaper than the present one. */
function betterOf(costs: readonly MoveCost[], { spec }: DrumEntry): { note: MoveCost['note']; cost: number } | null {
  const best = [...costs].sort((a, b) => costNow(a) - costNow(b))[0]
  const now = costs.find(({ note }) => sameNote(note, spec.note))
  return best && (!now || costNow(best) < costNow(now)) && !sameNote(best.note, spec.note)
    ? { note: best.note, cost: costNow(best) }
    : null
}
