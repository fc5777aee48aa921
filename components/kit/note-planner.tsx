'use client'

import type { Route } from 'next'
import { useState } from 'react'
import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { Button } from '@/components/ui/button'
import { ButtonLink } from '@/components/ui/button-link'
import { EmptyState } from '@/components/ui/empty-state'
import { Field } from '@/components/ui/field'
import { Notice } from '@/components/ui/notice'
import { NumberInput } from '@/components/ui/number-input'
import { showToast } from '@/components/ui/toast'
import { useKit, useSetNotes } from '@/lib/client/kit'
import type { DrumEntry, Entry } from '@/lib/contracts/kit'
import { noteText } from '@/lib/contracts/kit-form'
import type { KitReader } from './kit-reader'
import { NoteChart } from './note-chart'
import { drafted, inNoteOrder, judged, movedBy, notesToSet, planned } from './note-draft'
import type { DraftNote, NoteDraft } from './note-draft'
import { PlanBar } from './plan-bar'
import { PlannedDrum } from './planned-drum'
import { WaitingForConnection } from './waiting-for-connection'

export interface NotePlannerProps {
  rigId: string
  initial: readonly Entry[]
  reader: KitReader
  mayEdit: boolean
  kitHref: Route
}

const isDrum = (entry: Entry): entry is DrumEntry & Entry => entry.kind === 'drum' && !entry.removed

/** Notes for every drum of a kit: planned by a template, moved by hand, set in one step. */
export function NotePlanner({ rigId, initial, reader, mayEdit, kitHref }: NotePlannerProps) {
  const inKit = inNoteOrder(useKit(rigId, initial).data.filter(isDrum))
  const [draft, setDraft] = useState<NoteDraft>({})
  const [typedC, setTypedC] = useState('')
  const set = useSetNotes(rigId)
  const temperature = readTemperature(typedC)
  const stage = {
    referenceHz: reader.referenceHz,
    ...(temperature.value === null ? {} : { temperatureC: temperature.value }),
  }

  if (inKit.length === 0) {
    return (
      <div className="mt-6">
        <EmptyState title="No drums to plan notes for" action={<ButtonLink href={kitHref}>To the kit</ButtonLink>}>
          Add the drums to the kit first. Their sizes and heads give the range in which each can sound.
        </EmptyState>
      </div>
    )
  }
  const drums = inKit.map((drum) => drafted(drum, draft))
  const judgements = judged(drums, stage)
  const toSet = notesToSet(inKit, draft)
  const change = (drum: DrumEntry, to: Partial<DraftNote>) =>
    setDraft((now) => {
      const { note, noteLocked } = drafted(drum, now).spec
      return { ...now, [drum.id]: { note, noteLocked, ...to } }
    })
  const move = (drum: DrumEntry, semitones: number) =>
    setDraft((now) => {
      const { note, noteLocked } = drafted(drum, now).spec
      return note ? { ...now, [drum.id]: { note: movedBy(note, semitones), noteLocked } } : now
    })
  const editing = mayEdit && !set.isPending

  return (
    <>
      <p className="mt-2 max-w-prose text-soft">
        Each bar is what the drum’s batter head can sound, the middle shaded; the bead is its note. Frequencies by A4 ={' '}
        <span className="figures">{reader.referenceHz}</span> Hz.
      </p>
      {mayEdit && (
        <div className="mt-4 border-y border-line py-4">
          <PlanBar
            toms={drums.filter(({ spec }) => spec.role === 'tom' || spec.role === 'floor-tom')}
            reader={reader}
            onPlan={(template, anchor) => {
              try {
                setDraft(planned(drums, template, anchor, stage))
                return null
              } catch (error) {
                if (error instanceof AcousticsError) return error.message
                throw error
              }
            }}
          />
        </div>
      )}
      <div className="mt-6">
        <NoteChart drums={drums} reader={reader} stage={stage} onMove={editing ? move : null} />
      </div>
      <h2 className="mt-8 border-b-2 border-ink pb-2 text-2xl">What each head needs</h2>
      <ul>
        {drums.map((drum) => {
          const kept = inKit.find(({ id }) => id === drum.id)?.spec.note
          const differs = toSet.some(({ entryId }) => entryId === drum.id)
          return (
            <PlannedDrum
              key={drum.id}
              {...{ drum, reader, stage }}
              was={differs ? (kept ? noteText(kept, reader.locale) : 'no note') : null}
              judgement={judgements.get(drum.id)}
              nameOf={(id) => drums.find((other) => other.id === id)?.name ?? 'another drum'}
              edit={
                editing ? { move: (by) => move(drum, by), lock: (noteLocked) => change(drum, { noteLocked }) } : null
              }
            />
          )
        })}
      </ul>
      <div className="mt-4 max-w-56">
        <Field
          label="Stage temperature"
          optional
          error={temperature.problem ?? undefined}
          hint="20 °C unless typed; only the figures follow it"
        >
          {(control) => (
            <NumberInput {...control} unit="°C" value={typedC} onChange={(event) => setTypedC(event.target.value)} />
          )}
        </Field>
      </div>
      {mayEdit && (
        <div className="sticky bottom-0 z-20 mt-6 flex flex-col gap-2 border-t-2 border-ink bg-paper py-3">
          <WaitingForConnection busy={set.isPending} tries={set.failureCount} what="The plan" />
          {set.isError && !set.isPending && toSet.length > 0 && (
            <Notice kind="error">
              {set.error.message} Your plan is kept here; the notes in the kit now stand beside it.
            </Notice>
          )}
          <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
            <Button
              kind="primary"
              disabled={toSet.length === 0}
              busy={set.isPending && 'Setting the notes'}
              onClick={() =>
                set.mutate(toSet, {
                  onSuccess: () => {
                    setDraft({})
                    showToast(`Notes set for ${drumsWord(toSet.length)}.`)
                  },
                })
              }
            >
              {toSet.length === 0 ? 'Set notes' : `Set notes for ${drumsWord(toSet.length)}`}
            </Button>
            {toSet.length === 0 ? (
              <span className="text-soft">The kit has these notes.</span>
            ) : (
              <Button kind="quiet" disabled={set.isPending} onClick={() => setDraft({})}>
                Back to the notes in the kit
              </Button>
            )}
          </div>
        </div>
      )}
    </>
  )
}

function drumsWord(count: number): string {
  return count === 1 ? '1 drum' : `${count} drums`
}

function readTemperature(text: string): { value: number | null; problem: string | null } {
  if (text.trim() === '') return { value: null, problem: null }
  const value = Number(text.trim().replace(',', '.').replace('−', '-'))
  return value >= -40 && value <= 60 ? { value, problem: null } : { value: null, problem: 'from −40 to 60 °C' }
}
