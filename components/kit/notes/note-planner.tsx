'use client'

import type { Route } from 'next'
import { memo, useState } from 'react'
import { Button } from '@/components/ui/button'
import { ButtonLink } from '@/components/ui/button-link'
import { EmptyState } from '@/components/ui/empty-state'
import { LiveRegion } from '@/components/ui/live-region'
import { Notice } from '@/components/ui/notice'
import { showToast } from '@/components/ui/toast'
import { useKit, useSetNotes } from '@/lib/client/kit'
import { useNoteTemplates } from '@/lib/client/note-templates'
import type { DrumEntry, Entry } from '@/lib/contracts/kit'
import { noteText } from '@/lib/contracts/kit-form'
import type { PartyNoteTemplate } from '@/lib/contracts/note-template'
import { headRelationWords } from '@/lib/tuning/interval-name'
import { NOTE_TEMPLATES } from '@/lib/tuning/note-template'
import type { KitReader } from '../kit-reader'
import { PlannedDrum } from '../planned-drum'
import type { PlannedDrumProps } from '../planned-drum'
import { ChosenNote } from './chosen-note'
import { drumsWord } from './drums-word'
import { NoteChart } from './note-chart'
import { draftNoteOf, inNoteOrder, isTom } from './note-draft'
import { PlanBar } from './plan-bar'
import { PlanChoices } from './plan-choices'
import { PlanFoot } from './plan-foot'
import { planNow } from './plan-why'
import { standingsOf } from './standing'
import { useNoteHands } from './use-note-hands'
import { useNoteSession } from './use-note-session'
import { usePlanView } from './use-plan-view'
import { useUndoKeys } from './use-undo-keys'

export interface NotePlannerProps {
  partyId: string
  rigId: string
  initial: readonly Entry[]
  templates: readonly PartyNoteTemplate[]
  reader: KitReader
  mayEdit: boolean
  kitHref: Route
}

const isDrum = (entry: Entry): entry is DrumEntry & Entry => entry.kind === 'drum' && !entry.removed

/** Notes for every drum of a kit: planned by a template, moved by hand, set in one step. */
export function NotePlanner(props: NotePlannerProps) {
  const inKit = inNoteOrder(useKit(props.rigId, props.initial).data.filter(isDrum))
  if (inKit.length === 0) {
    return (
      <div className="mt-6">
        <EmptyState
          title="No drums to plan notes for"
          action={<ButtonLink href={props.kitHref}>To the kit</ButtonLink>}
        >
          Add the drums to the kit first. Their sizes and heads give the range in which each can sound.
        </EmptyState>
      </div>
    )
  }
  return <PlannerOf {...props} inKit={inKit} />
}

function PlannerOf(props: NotePlannerProps & { inKit: readonly DrumEntry[] }) {
  const { partyId, rigId, reader, mayEdit, inKit } = props
  const own = useNoteTemplates(partyId, props.templates).data
  const { session, state } = useNoteSession({ rigId, choices: firstChoices(inKit), keeps: mayEdit })
  const [chosenId, setChosenId] = useState<string | null>(null)
  const [typedC, setTypedC] = useState('')
  const set = useSetNotes(rigId)
  const temperature = readTemperature(typedC)
  const view = usePlanView({ inKit, own, state, reader, chosenId, temperatureC: temperature.value })
  const hands = useNoteHands({ session, view, inKit, reader, choose: setChosenId })
  useUndoKeys(hands.undo, hands.redo, mayEdit && !set.isPending)
  const { drums, judged, template, stage, toSet, trying } = view
  const nameOf = (id: string) => inKit.find((drum) => drum.id === id)?.name ?? 'another drum'
  const editing = mayEdit && !set.isPending
  const chosen = drums.find(({ id }) => id === chosenId)

  return (
    <>
      <p className="mt-1 text-sm text-soft">
        Each bar is what a drum can sound, slack at its left end and choked at its right, the middle third shaded; the
        bead is its note. A4 = <span className="figures">{reader.referenceHz}</span> Hz.
      </p>
      {mayEdit && (
        <div className="mt-3 border-y border-line py-3">
          <PlanBar
            {...{ partyId, own, template, choices: state.choices, everybodys: view.everybodys }}
            toms={drums.filter(isTom)}
            onChoose={session.choose}
            temperature={{ text: typedC, problem: temperature.problem, onType: setTypedC }}
            headsOf={view.otherHeads.map(nameOf)}
            onPlan={view.best ? hands.planBest : null}
          />
        </div>
      )}
      {mayEdit && state.keptAt && toSet.length > 0 && (
        <Notice kind="wait" word="Not set" className="mt-4">
          The plan of {keptWords(state.keptAt)} was kept on this device.
        </Notice>
      )}
      <div className="mt-4 grid gap-x-10 gap-y-6 lg:grid-cols-[minmax(0,1fr)_21rem]">
        {/* In sight while the plans beside it are gone through. */}
        <div className="min-w-0 lg:sticky lg:top-4 lg:self-start">
          <NoteChart
            {...{ drums, judged, reader, chosenId }}
            ranged={view.ranged}
            scale={view.scale}
            compare={view.compare}
            anchorId={view.rules.anchorId}
            costs={view.costSteps}
            hands={editing ? hands.onChart : null}
          />
          {judged && !chosen && (
            <p className="mt-2 border-t border-line pt-2 text-sm">{planNow(judged, nameOf).join(' ')}</p>
          )}
          {mayEdit && (
            <p className="flex min-h-control flex-wrap items-center gap-x-1 text-sm">
              {toSet.length === 0 ? (
                <span className="text-soft">The kit has these notes.</span>
              ) : (
                <>
                  <span className="text-plum">
                    {drumsWord(toSet.length)} not as in the kit, whose notes are the rings.
                  </span>
                  <Button kind="quiet" disabled={set.isPending} onClick={hands.drop} className="max-sm:-ml-4">
                    Back to the notes in the kit
                  </Button>
                </>
              )}
            </p>
          )}
        </div>
        {mayEdit && (
          <div className="flex min-w-0 flex-col gap-4">
            {chosen ? (
              <ChosenNote
                drum={chosen}
                standings={standingsOf(judged, chosen.id, nameOf)}
                reasons={view.reasonsOf(chosen.id)}
                planCost={view.costWords}
                best={view.betterNote}
                reader={reader}
                onSet={(note) => hands.set(chosen, note)}
                onLock={(locked) => hands.lock(chosen, locked)}
              />
            ) : (
              <p className="text-sm text-soft">
                Drag a bead, or move it by the arrow keys: Shift for an octave, Alt for a cent, Home and End for the
                edges of the range. The steps over its bar show what each note would cost the plan.
              </p>
            )}
            {view.refusal ? (
              <Notice kind="error" word="No plan">
                {view.refusal}
              </Notice>
            ) : (
              <PlanChoices
                {...{ drums: inKit, reader, choices: view.choices, title: view.title }}
                lookedAt={trying?.id ?? null}
                hands={editing ? { look: hands.look, keep: hands.keep } : null}
              />
            )}
          </div>
        )}
      </div>
      <h2 className="mt-8 border-b-2 border-ink pb-2 text-2xl">What each head needs</h2>
      <ul>
        {view.unhurried.drums.map((drum) => (
          <SamePlannedDrum
            key={drum.id}
            {...{ drum, reader, stage }}
            was={toSet.some(({ entryId }) => entryId === drum.id) ? wasWords(drum, inKit, reader) : null}
            standings={standingsOf(view.unhurried.judged, drum.id, nameOf)}
          />
        ))}
      </ul>
      <LiveRegion>{hands.said && `${hands.said}. The plan costs ${view.costWords}.`}</LiveRegion>
      {mayEdit && (
        <PlanFoot
          {...{ toSet: toSet.length, history: state.history, trying: trying?.name ?? null }}
          setting={{ busy: set.isPending, tries: set.failureCount, error: set.error }}
          onSet={() =>
            set.mutate(toSet, {
              onSuccess: () => {
                const before = inKit.filter(({ id }) => toSet.some(({ entryId }) => entryId === id))
                session.wasSet(Object.fromEntries(before.map((drum) => [drum.id, draftNoteOf(drum)])))
                showToast(`Notes set for ${drumsWord(toSet.length)}.`)
              },
            })
          }
          onUndo={hands.undo}
          onRedo={hands.redo}
          onKeepTried={hands.keepTried}
          onLeaveTried={() => hands.look(null)}
        />
      )}
    </>
  )
}

/** A drum's figures take their time: they are worked out again only for a drum that changed. */
const SamePlannedDrum = memo(PlannedDrum, (before: PlannedDrumProps, after: PlannedDrumProps) => {
  const words = ({ standings }: PlannedDrumProps) => standings.map((standing) => standing.words).join()
  return (
    before.drum === after.drum &&
    before.stage === after.stage &&
    before.was === after.was &&
    words(before) === words(after)
  )
})

/** Fourths from a locked tom, else the middle one, where it has a note. */
function firstChoices(inKit: readonly DrumEntry[]) {
  const toms = inKit.filter((drum) => isTom(drum) && drum.spec.note)
  const anchor = toms.find(({ spec }) => spec.noteLocked) ?? toms[Math.floor((toms.length - 1) / 2)]
  return {
    templateId: NOTE_TEMPLATES[0]?.id ?? '',
    anchorId: anchor?.id ?? null,
    apartSemitones: 2,
    headsToo: true,
    othersFollow: false,
  }
}

/** What the kit has for a drum that the plan would change. */
function wasWords(drum: DrumEntry, inKit: readonly DrumEntry[], reader: KitReader): string {
  const kept = inKit.find(({ id }) => id === drum.id)?.spec
  if (!kept) return ''
  const note = kept.note ? noteText(kept.note, reader.locale) : 'no note'
  return kept.headRelationCents === drum.spec.headRelationCents
    ? note
    : `${note}, ${headRelationWords(kept.headRelationCents)}`
}

function keptWords(keptAt: string): string {
  return new Date(keptAt).toLocaleString('en-GB', {
    ...{ weekday: 'short', day: 'numeric', month: 'short', hour: '2-digit', minute: '2-digit' },
  })
}

function readTemperature(text: string): { value: number | null; problem: string | null } {
  if (text.trim() === '') return { value: null, problem: null }
  const value = Number(text.trim().replace(',', '.').replace('−', '-'))
  return value >= -40 && value <= 60 ? { value, problem: null } : { value: null, problem: 'from −40 to 60 °C' }
}
