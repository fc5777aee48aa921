import { headingDeg } from '../geometry/angle'
import { pieceCentre, type Piece, type PlotDocument } from './document'

/**
 * The way a piece faces, degrees clockwise from the audience. A piece with an aim faces what it aims at wherever that
 * stands; when its aim is gone, or there is none, it keeps its own rotation.
 */
export function pieceHeadingDeg(document: PlotDocument, piece: Piece): number {
  const target = piece.aim ? document.pieces[piece.aim.pieceId] : undefined
  if (!target || target.id === piece.id) return piece.rotationDeg
  return headingDeg(pieceCentre(piece), pieceCentre(target))
}
