import { apply } from './apply'
import type { PlotAction, PlotCommand } from './command'
import type { PlotDocument } from './document'
import { PlotCommandError, type PlotCommandErrorCode } from './plot-command-error'

/**
 * What became of one of our unsent commands when others' commands came first:
 * - `kept`: it stands as it was made
 * - `kept over`: it stands, and sets something that the others had set too; ours is later, so ours shows
 * - `trimmed`: it stands for the pieces that are still there
 * - `dropped`: it cannot stand any more; `reason` says why
 * - `arrived`: it is among the others' commands, so an earlier sending had reached the server after all
 */
export type RebaseOutcome =
  | { readonly command: PlotCommand; readonly became: 'kept' | 'kept over' | 'trimmed' | 'arrived' }
  | { readonly command: PlotCommand; readonly became: 'dropped'; readonly reason: PlotCommandErrorCode }

export interface Rebased {
  /** The document after the others' commands and then ours. */
  readonly document: PlotDocument
  /** Our commands as they are to be sent now, under the same ids. */
  readonly commands: readonly PlotCommand[]
  readonly outcomes: readonly RebaseOutcome[]
}

/**
 * Puts our unsent commands after commands of others that the server took first. Every writer who rebases on the
 * server's order ends with the server's document, and every command of ours has an outcome that can be shown.
 * @param base the document that `remote` follows on
 */
export function rebase(base: PlotDocument, remote: readonly PlotCommand[], local: readonly PlotCommand[]): Rebased {
  const arrived = new Set(remote.map((command) => command.clientId))
  const touched = new Set(remote.flatMap(touches))
  let document = remote.reduce<PlotDocument>((at, command) => apply(at, command), base)
  const commands: PlotCommand[] = []
  const outcomes: RebaseOutcome[] = []
  for (const command of local) {
    if (arrived.has(command.clientId)) {
      outcomes.push({ command, became: 'arrived' })
      continue
    }
    const fitted = fit(document, command)
    if (fitted.action === null) {
      outcomes.push({ command, became: 'dropped', reason: fitted.reason })
      continue
    }
    const sent: PlotCommand = { ...fitted.action, clientId: command.clientId }
    document = fitted.document
    commands.push(sent)
    const over = touches(sent).some((touch) => touched.has(touch))
    outcomes.push({ command, became: fitted.trimmed ? 'trimmed' : over ? 'kept over' : 'kept' })
  }
  return { document, commands, outcomes }
}

export type Fitted =
  | { readonly action: PlotAction; readonly document: PlotDocument; readonly trimmed: boolean }
  | { readonly action: null; readonly reason: PlotCommandErrorCode }

/** An action cut down to what still applies to a document, with the document after it; or why none of it does. */
export function fit(document: PlotDocument, action: PlotAction): Fitted {
  const kept = keepWhatFits(document, action)
  if (kept === null) return { action: null, reason: missingReason(action) }
  try {
    return { action: kept, document: apply(document, kept), trimmed: sizeOf(kept) < sizeOf(action) }
  } catch (error) {
    if (error instanceof PlotCommandError) return { action: null, reason: error.code }
    throw error
  }
}

function keepWhatFits(document: PlotDocument, action: PlotAction): PlotAction | null {
  const there = (pieceId: string) => Object.hasOwn(document.pieces, pieceId)
  switch (action.type) {
    case 'place': {
      const drums = new Set(Object.values(document.pieces).map((piece) => drumOf(piece)))
      const pieces = action.pieces.filter((piece) => {
        const drum = drumOf(piece)
        return !there(piece.id) && (drum === null || !drums.has(drum))
      })
      return pieces.length > 0 ? { ...action, pieces } : null
    }
    case 'remove': {
      const pieceIds = action.pieceIds.filter(there)
      return pieceIds.length > 0 ? { ...action, pieceIds } : null
    }
    case 'move': {
      const moves = action.moves.filter((move) => there(move.pieceId))
      return moves.length > 0 ? { ...action, moves } : null
    }
    case 'rotate': {
      const turns = action.turns.filter((turn) => there(turn.pieceId))
      return turns.length > 0 ? { ...action, turns } : null
    }
    case 'edit':
    case 'aim':
      return there(action.pieceId) ? action : null
    case 'setStage':
      return action
  }
}

function drumOf(piece: { readonly kind: string; readonly kitEntryId: string | null }): string | null {
  return piece.kind === 'drum' ? piece.kitEntryId : null
}

function missingReason(action: PlotAction): PlotCommandErrorCode {
  if (action.type !== 'place') return 'piece-not-there'
  return action.pieces.some((piece) => piece.kind === 'drum') ? 'drum-already-placed' : 'piece-already-there'
}

function sizeOf(action: PlotAction): number {
  switch (action.type) {
    case 'place':
      return action.pieces.length
    case 'remove':
      return action.pieceIds.length
    case 'move':
      return action.moves.length
    case 'rotate':
      return action.turns.length
    default:
      return 1
  }
}

/** What a command sets, as `piece field` keys, to see whether two people set the same thing. */
function touches(command: PlotCommand): string[] {
  switch (command.type) {
    case 'place':
    case 'remove':
      return []
    case 'move':
      return command.moves.map((move) => `${move.pieceId} place`)
    case 'rotate':
      return command.turns.map((turn) => `${turn.pieceId} rotation`)
    case 'edit':
      return Object.keys(command.changes).map((field) => `${command.pieceId} ${field}`)
    case 'aim':
      return [`${command.pieceId} aim`]
    case 'setStage':
      return ['stage']
  }
}
