import type { Piece, StageSize } from './document'

/** Version of the commands' shape, stored beside every command. */
export const PLOT_COMMAND_VERSION = 1

/** Fields of a piece that an `edit` may set; every other field has a command of its own. */
export const editableFields = ['label', 'zM', 'widthM', 'depthM', 'heightM', 'set', 'locked', 'outputs'] as const
export type EditableField = (typeof editableFields)[number]
export type PieceChanges = Partial<Pick<Piece, EditableField>>

/** One thing done to a plot, with absolute values, so that the same command twice is the same command once. */
export type PlotAction =
  | { readonly type: 'place'; readonly pieces: readonly Piece[] }
  | { readonly type: 'remove'; readonly pieceIds: readonly string[] }
  | {
      readonly type: 'move'
      readonly moves: readonly { readonly pieceId: string; readonly xM: number; readonly yM: number }[]
    }
  | { readonly type: 'rotate'; readonly turns: readonly { readonly pieceId: string; readonly rotationDeg: number }[] }
  | { readonly type: 'edit'; readonly pieceId: string; readonly changes: PieceChanges }
  | { readonly type: 'aim'; readonly pieceId: string; readonly at: string | null }
  | { readonly type: 'setStage'; readonly stage: StageSize }

/** An action under the id its maker gave it; the id makes a repeated sending the same sending. */
export type PlotCommand = PlotAction & { readonly clientId: string }

/** The pieces a command speaks of; none for a command of a newer release. */
export function piecesOf(action: PlotAction): string[] {
  switch (action.type) {
    case 'place':
      return action.pieces.map((piece) => piece.id)
    case 'remove':
      return [...action.pieceIds]
    case 'move':
      return action.moves.map((move) => move.pieceId)
    case 'rotate':
      return action.turns.map((turn) => turn.pieceId)
    case 'edit':
    case 'aim':
      return [action.pieceId]
    default:
      return []
  }
}
