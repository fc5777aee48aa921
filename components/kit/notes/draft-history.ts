import type { NoteDraft } from './note-draft'

/** One step of the plan: what it did in words ("Tom 12 to E3"), and the draft on either side of it. */
export interface DraftStep {
  readonly says: string
  readonly before: NoteDraft
  readonly after: NoteDraft
}

/** Undo and redo without limit, the newest step last in each. */
export interface DraftHistory {
  readonly undo: readonly DraftStep[]
  readonly redo: readonly DraftStep[]
}

export const emptyHistory: DraftHistory = { undo: [], redo: [] }

/** Remembers a step; a new one ends what could be redone. */
export function recorded(history: DraftHistory, step: DraftStep): DraftHistory {
  return { undo: [...history.undo, step], redo: [] }
}

/** The newest step taken back, and the draft then; null when there is none. */
export function undone({ undo, redo }: DraftHistory): { draft: NoteDraft; history: DraftHistory } | null {
  const step = undo.at(-1)
  return step ? { draft: step.before, history: { undo: undo.slice(0, -1), redo: [...redo, step] } } : null
}

/** The step last taken back, done again; the mirror of `undone`. */
export function redone({ undo, redo }: DraftHistory): { draft: NoteDraft; history: DraftHistory } | null {
  const step = redo.at(-1)
  return step ? { draft: step.after, history: { undo: [...undo, step], redo: redo.slice(0, -1) } } : null
}

/**
 * The history after the plan was set. A draft leaves out what stands as in the kit; what that meant before is written into every
 * step, so that undo still leads back to the notes of then.
 */
export function grounded({ undo, redo }: DraftHistory, inKitBefore: NoteDraft): DraftHistory {
  const ground = ({ says, before, after }: DraftStep): DraftStep => ({
    ...{ says, before: { ...inKitBefore, ...before }, after: { ...inKitBefore, ...after } },
  })
  return { undo: undo.map(ground), redo: redo.map(ground) }
}
