import type { EditableField, PieceChanges, PlotAction } from './command'
import type { Piece, PlotDocument } from './document'
import { PlotCommandError } from './plot-command-error'

/**
 * The action that takes back `action`, read from the document as it was before it. For every action that applies,
 * apply(apply(document, action), invert(document, action)) equals the document.
 */
export function invert(document: PlotDocument, action: PlotAction): PlotAction {
  const before = (pieceId: string): Piece => {
    const piece = document.pieces[pieceId]
    if (!piece) throw new PlotCommandError('piece-not-there', 'The piece is not on the plot', pieceId)
    return piece
  }
  switch (action.type) {
    case 'place':
      return { type: 'remove', pieceIds: action.pieces.map((piece) => piece.id) }
    case 'remove':
      return { type: 'place', pieces: action.pieceIds.map(before) }
    case 'move':
      return {
        type: 'move',
        moves: action.moves.map(({ pieceId }) => {
          const { xM, yM } = before(pieceId)
          return { pieceId, xM, yM }
        }),
      }
    case 'rotate':
      return {
        type: 'rotate',
        turns: action.turns.map(({ pieceId }) => ({ pieceId, rotationDeg: before(pieceId).rotationDeg })),
      }
    case 'edit': {
      const piece = before(action.pieceId)
      const fields = Object.keys(action.changes) as EditableField[]
      const changes: PieceChanges = Object.fromEntries(fields.map((field) => [field, piece[field]]))
      return { type: 'edit', pieceId: action.pieceId, changes }
    }
    case 'aim':
      return { type: 'aim', pieceId: action.pieceId, at: before(action.pieceId).aim?.pieceId ?? null }
    case 'setStage':
      return { type: 'setStage', stage: { widthM: document.stage.widthM, depthM: document.stage.depthM } }
  }
}
