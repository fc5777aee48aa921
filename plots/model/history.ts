import { apply } from './apply'
import type { PlotAction } from './command'
import type { PlotDocument } from './document'
import { invert } from './invert'
import { fit } from './rebase'

/**
 * Undo and redo of one person's own steps, without limit. A step is what one gesture did, kept as the actions that take
 * it back; others' steps are never taken back by it.
 */
export interface PlotHistory {
  readonly undo: readonly (readonly PlotAction[])[]
  readonly redo: readonly (readonly PlotAction[])[]
}

export const emptyHistory: PlotHistory = { undo: [], redo: [] }

/** What a step back or forward does: the actions to apply and send, and the history after it. */
export interface HistoryStep {
  readonly actions: readonly PlotAction[]
  readonly history: PlotHistory
}

/** Remembers a step made on `before`. A new step ends what could be redone. */
export function record(history: PlotHistory, before: PlotDocument, actions: readonly PlotAction[]): PlotHistory {
  return { undo: [...history.undo, inverses(before, actions)], redo: [] }
}

/**
 * The newest own step taken back on the document as it now is. Parts that others have made impossible (a piece they
 * removed) are left out; steps of which nothing is left are passed over. Null when there is nothing to take back.
 */
export function undo(history: PlotHistory, document: PlotDocument): HistoryStep | null {
  for (let left = history.undo.length; left > 0; left -= 1) {
    const taken = fitAll(document, history.undo[left - 1] ?? [])
    if (taken.length > 0)
      return {
        actions: taken,
        history: { undo: history.undo.slice(0, left - 1), redo: [...history.redo, inverses(document, taken)] },
      }
  }
  return null
}

/** The step last taken back, done again; the mirror of `undo`. */
export function redo(history: PlotHistory, document: PlotDocument): HistoryStep | null {
  for (let left = history.redo.length; left > 0; left -= 1) {
    const taken = fitAll(document, history.redo[left - 1] ?? [])
    if (taken.length > 0)
      return {
        actions: taken,
        history: { undo: [...history.undo, inverses(document, taken)], redo: history.redo.slice(0, left - 1) },
      }
  }
  return null
}

function inverses(before: PlotDocument, actions: readonly PlotAction[]): PlotAction[] {
  const back: PlotAction[] = []
  let document = before
  for (const action of actions) {
    back.unshift(invert(document, action))
    document = apply(document, action)
  }
  return back
}

function fitAll(document: PlotDocument, actions: readonly PlotAction[]): PlotAction[] {
  const fitted: PlotAction[] = []
  let at = document
  for (const action of actions) {
    const next = fit(at, action)
    if (next.action === null) continue
    fitted.push(next.action)
    at = next.document
  }
  return fitted
}
