'use client'

import { useState } from 'react'
import type { Note } from '@/lib/acoustics/note'
import { noteText } from '@/lib/contracts/kit-form'
import type { DrumEntry } from '@/lib/contracts/kit'
import type { KitReader } from '../kit-reader'
import type { NoteMove } from './note-bead'
import { bentBy, drafted, movedBy, pitchOf, withChange } from './note-draft'
import type { NoteDraft } from './note-draft'
import type { NoteSession } from './note-session'
import type { PlanChoice } from './plan-choices'
import { followed } from './plan-of'
import type { PlanView } from './use-plan-view'

/** Everything that a hand does to the plan: each a step with words, that can be undone by them. */
export function useNoteHands(input: {
  session: NoteSession
  view: PlanView
  inKit: readonly DrumEntry[]
  reader: KitReader
  choose: (drumId: string) => void
}) {
  const { session, view, inKit, reader, choose } = input
  const [said, setSaid] = useState('')

  const noted = (draft: NoteDraft, drum: DrumEntry, note: Note | null): NoteDraft => {
    const moved = withChange(draft, drum, { note })
    if (!note || !session.state().choices.othersFollow) return moved
    const drums = inKit.map((each) => drafted(each, moved))
    const after = drums.find(({ id }) => id === drum.id)
    if (!after) return moved
    return [...followed(drums, view.rules, after)].reduce<NoteDraft>((so, [id, to]) => {
      const other = inKit.find((each) => each.id === id)
      return other && id !== drum.id
        ? withChange(so, other, { note: { semitone: to.semitone, cents: to.cents || 0 } })
        : so
    }, moved)
  }
  const noteIn = (draft: NoteDraft, drum: DrumEntry) => {
    const base = inKit.find(({ id }) => id === drum.id)
    return base ? drafted(base, draft).spec.note : null
  }
  const atMove = (draft: NoteDraft, drum: DrumEntry, move: NoteMove): NoteDraft => {
    const note = noteIn(draft, drum)
    const base = inKit.find(({ id }) => id === drum.id)
    return note && base ? noted(draft, base, movedNote(note, move)) : draft
  }
  const toWords = (drum: DrumEntry, note: Note | null) =>
    `${drum.name} to ${note ? noteText(note, reader.locale) : 'no note'}`
  const step = (says: string, make: (draft: NoteDraft) => NoteDraft) => {
    session.change(says, make)
    setSaid(says)
  }
  const baseOf = (drum: DrumEntry) => inKit.find(({ id }) => id === drum.id) ?? drum
  const setNote = (drum: DrumEntry, note: Note | null) =>
    step(toWords(drum, note), (draft) => noted(draft, baseOf(drum), note))
  const planSays = (name: string) => `${name === view.best?.name ? 'plan' : name} by ${view.title}`
  const keep = (choice: PlanChoice) =>
    step(planSays(choice.name), (draft) => ({ ...draft, ...view.draftOf(choice.plan) }))

  return {
    /** The last step in words, for screen readers. */
    said,
    onChart: {
      choose: (drum: DrumEntry) => choose(drum.id),
      move: (drum: DrumEntry, move: NoteMove) => {
        const draft = session.state().trying?.draft ?? session.state().draft
        const note = noteIn(draft, drum)
        if (note) step(toWords(drum, movedNote(note, move)), (so) => atMove(so, drum, move))
      },
      slide: (drum: DrumEntry, move: NoteMove) => session.slide((draft) => atMove(draft, drum, move)),
      putDown: (drum: DrumEntry) => {
        const says = toWords(drum, noteIn(session.state().draft, drum))
        session.putDown(says)
        setSaid(says)
      },
      letGo: () => session.letGo(),
      give: (drum: DrumEntry, note: Note) => {
        choose(drum.id)
        setNote(drum, note)
      },
    },
    set: setNote,
    lock: (drum: DrumEntry, noteLocked: boolean) =>
      step(`${noteLocked ? 'lock' : 'unlock'} ${drum.name}`, (draft) =>
        withChange(draft, baseOf(drum), { noteLocked }),
      ),
    planBest: () => {
      if (view.best) keep(view.best)
    },
    keep,
    look: (choice: PlanChoice | null) => {
      session.look(
        choice && {
          id: choice.id,
          name: choice.name,
          draft: { ...session.state().draft, ...view.draftOf(choice.plan) },
        },
      )
      setSaid(choice ? `Looking at ${choice.name}` : 'Back to your plan')
    },
    keepTried: () => {
      const { trying } = session.state()
      if (trying) step(planSays(trying.name), (draft) => draft)
    },
    undo: () => {
      const last = session.state().history.undo.at(-1)
      session.undo()
      if (last) setSaid(`Undone: ${last.says}`)
    },
    redo: () => {
      const next = session.state().history.redo.at(-1)
      session.redo()
      if (next) setSaid(`Done again: ${next.says}`)
    },
    drop: () => step('back to the notes in the kit', () => ({})),
  }
}

function movedNote(note: Note, move: NoteMove): Note {
  if ('by' in move) return movedBy(note, move.by)
  return bentBy(note, 'byCents' in move ? move.byCents : (move.to - pitchOf(note)) * 100)
}
