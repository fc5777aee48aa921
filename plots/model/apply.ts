import { normaliseDeg } from '../geometry/angle'
import { checkAngle, checkCoordinate, checkPiece, checkStage } from './check'
import { editableFields, piecesOf, type PlotAction } from './command'
import { PLOT_LIMITS, type Piece, type PlotDocument } from './document'
import { PlotCommandError } from './plot-command-error'

/**
 * The document after an action. Pure: the given document is never changed, untouched pieces are shared, and unknown
 * properties stay. Throws PlotCommandError when the action does not fit; then nothing of it is applied.
 */
export function apply(document: PlotDocument, action: PlotAction): PlotDocument {
  refuseTwice(action)
  switch (action.type) {
    case 'place':
      return place(document, action.pieces)
    case 'remove': {
      const pieces = { ...document.pieces }
      for (const pieceId of action.pieceIds) {
        pieceOf(document, pieceId)
        delete pieces[pieceId]
      }
      return { ...document, pieces }
    }
    case 'move':
      return change(
        document,
        action.moves.map(({ pieceId, xM, yM }) => {
          checkCoordinate(xM, pieceId)
          checkCoordinate(yM, pieceId)
          return [pieceId, { xM, yM }]
        }),
      )
    case 'rotate':
      return change(
        document,
        action.turns.map(({ pieceId, rotationDeg }) => {
          checkAngle(rotationDeg, pieceId)
          return [pieceId, { rotationDeg: normaliseDeg(rotationDeg) }]
        }),
      )
    case 'edit': {
      for (const field of Object.keys(action.changes))
        if (!editableFields.some((known) => known === field))
          throw new PlotCommandError('bad-value', `“${field}” cannot be edited`, action.pieceId)
      return change(document, [[action.pieceId, action.changes]])
    }
    case 'aim':
      // The piece aimed at may be gone by now (its microphone then keeps its heading), so it is not looked up.
      return change(document, [[action.pieceId, { aim: action.at === null ? null : { pieceId: action.at } }]])
    case 'setStage':
      checkStage(action.stage)
      return { ...document, stage: { ...document.stage, ...action.stage } }
    default:
      throw new PlotCommandError('unknown-command', 'This command comes from a newer release')
  }
}

function refuseTwice(action: PlotAction): void {
  const ids = piecesOf(action)
  if (new Set(ids).size !== ids.length)
    throw new PlotCommandError('piece-named-twice', 'A command names each piece once')
}

function pieceOf(document: PlotDocument, pieceId: string): Piece {
  const piece = Object.hasOwn(document.pieces, pieceId) ? document.pieces[pieceId] : undefined
  if (!piece) throw new PlotCommandError('piece-not-there', 'The piece is not on the plot', pieceId)
  return piece
}

function place(document: PlotDocument, placed: readonly Piece[]): PlotDocument {
  const pieces = { ...document.pieces }
  const drums = new Set(
    Object.values(document.pieces).flatMap((piece) => (piece.kind === 'drum' ? [piece.kitEntryId] : [])),
  )
  for (const piece of placed) {
    if (Object.hasOwn(pieces, piece.id))
      throw new PlotCommandError('piece-already-there', 'The piece is already on the plot', piece.id)
    // Each drum is one entry of the kit, so it stands once; cymbals, stands and microphones may come in numbers.
    if (piece.kind === 'drum' && piece.kitEntryId !== null) {
      if (drums.has(piece.kitEntryId))
        throw new PlotCommandError('drum-already-placed', 'The drum is already on the plot', piece.id)
      drums.add(piece.kitEntryId)
    }
    checkPiece(piece)
    pieces[piece.id] = { ...piece, rotationDeg: normaliseDeg(piece.rotationDeg) }
  }
  if (Object.keys(pieces).length > PLOT_LIMITS.pieces)
    throw new PlotCommandError('too-many-pieces', `A plot holds at most ${PLOT_LIMITS.pieces} pieces`)
  return { ...document, pieces }
}

function change(document: PlotDocument, changes: readonly (readonly [string, Partial<Piece>])[]): PlotDocument {
  const pieces = { ...document.pieces }
  for (const [pieceId, fields] of changes) {
    const changed = { ...pieceOf(document, pieceId), ...fields }
    checkPiece(changed)
    pieces[pieceId] = changed
  }
  return { ...document, pieces }
}
