import { z } from 'zod'
import { emptyHistory, grounded, recorded, redone, undone } from './draft-history'
import type { DraftHistory } from './draft-history'
import { draftNoteSchema } from './note-draft'
import type { NoteDraft } from './note-draft'

const choicesSchema = z.object({
  /** A template of everybody's or of the party's own. */
  templateId: z.string(),
  /** The drum that the others are stepped from; null: none, every note free. */
  anchorId: z.string().nullable(),
  /** No two drums nearer than this, semitones. */
  apartSemitones: z.number().int().min(0).max(12),
  /** Whether a plan sets the heads' relation as its template has it. */
  headsToo: z.boolean(),
  /** Whether the other drums are planned anew round a note that is moved. */
  othersFollow: z.boolean(),
})
/** How to plan. Kept with the draft, which is judged by it. */
export type PlanChoices = z.infer<typeof choicesSchema>

const keptSchema = z.object({
  keptAt: z.iso.datetime(),
  draft: z.record(z.string(), draftNoteSchema),
  choices: choicesSchema,
})

export interface NotePlanState {
  /** The plan so far, a note that is being dragged included. */
  readonly draft: NoteDraft
  readonly history: DraftHistory
  /** The draft before the note in hand was taken up; null: none is. */
  readonly inHand: NoteDraft | null
  /** Another plan, looked at and not taken yet. */
  readonly trying: { readonly id: string; readonly name: string; readonly draft: NoteDraft } | null
  readonly choices: PlanChoices
  /** When the draft was kept that this page began with; null: it began with the kit's notes. */
  readonly keptAt: string | null
}

export type Shelf = Pick<Storage, 'getItem' | 'setItem' | 'removeItem'>

/**
 * The plan of one kit's notes while it is made: the draft, its history, what is being tried. The draft is kept on the device after
 * every step, so that it outlives the page until it is set or dropped.
 */
export function createNoteSession(input: {
  rigId: string
  shelf: Shelf | null
  choices: PlanChoices
  now: () => Date
}) {
  const key = `hoopwright notes ${input.rigId}`
  const listeners = new Set<() => void>()
  const kept = readKept(input.shelf, key)
  const fresh: NotePlanState = {
    ...{ draft: {}, history: emptyHistory, inHand: null, trying: null, choices: input.choices, keptAt: null },
  }
  let state: NotePlanState = kept ? { ...fresh, draft: kept.draft, choices: kept.choices, keptAt: kept.keptAt } : fresh

  const become = (change: Partial<NotePlanState>) => {
    state = { ...state, ...change }
    if (state.inHand === null) keep()
    listeners.forEach((listener) => listener())
  }
  const keep = () => {
    try {
      if (Object.keys(state.draft).length === 0) return input.shelf?.removeItem(key)
      const { draft, choices } = state
      input.shelf?.setItem(key, JSON.stringify({ keptAt: input.now().toISOString(), draft, choices }))
    } catch {
      // A device that keeps nothing: the draft lasts as long as this page.
    }
  }
  const stepTo = (says: string, before: NoteDraft, after: NoteDraft) =>
    become({ draft: after, history: recorded(state.history, { says, before, after }), inHand: null, trying: null })

  return {
    subscribe: (listener: () => void) => {
      listeners.add(listener)
      return () => {
        listeners.delete(listener)
      }
    },
    state: () => state,
    /** What the page shows before it has read the device. */
    fresh: () => fresh,
    /** A step on what is shown: what is being tried is taken with it. */
    change: (says: string, make: (draft: NoteDraft) => NoteDraft) =>
      stepTo(says, state.draft, make(state.trying?.draft ?? state.draft)),
    /** Moves the note in hand; the whole way from taking it up to putting it down is one step. */
    slide: (make: (draft: NoteDraft) => NoteDraft) =>
      become({
        inHand: state.inHand ?? state.draft,
        draft: make(state.trying?.draft ?? state.draft),
        trying: null,
      }),
    putDown: (says: string) => {
      if (state.inHand) stepTo(says, state.inHand, state.draft)
    },
    letGo: () => {
      if (state.inHand) become({ draft: state.inHand, inHand: null })
    },
    undo: () => become({ ...undone(state.history), trying: null }),
    redo: () => become({ ...redone(state.history), trying: null }),
    look: (trying: NotePlanState['trying']) => become({ trying }),
    choose: (choices: Partial<PlanChoices>) => become({ choices: { ...state.choices, ...choices } }),
    /** The kit now has the draft's notes; `inKitBefore` is what it had. */
    wasSet: (inKitBefore: NoteDraft) =>
      become({ draft: {}, history: grounded(state.history, inKitBefore), trying: null, keptAt: null }),
  }
}
export type NoteSession = ReturnType<typeof createNoteSession>

function readKept(shelf: Shelf | null, key: string) {
  try {
    const kept = keptSchema.safeParse(JSON.parse(shelf?.getItem(key) ?? 'null'))
    return kept.success ? kept.data : null
  } catch {
    return null
  }
}
