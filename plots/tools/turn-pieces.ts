import { headingDeg, normaliseDeg } from '../geometry/angle'
import type { PlotPoint } from '../geometry/point'
import type { PlotAction } from '../model/command'
import { pieceCentre, type Piece, type PlotDocument } from '../model/document'

/** How far the [ and ] keys turn, degrees; with Alt 1. */
export const TURN_DEG = 15

/** Turns each chosen piece about its own middle, clockwise when positive. Locked pieces stay; null when none turns. */
export function turnBy(
  document: PlotDocument,
  pieceIds: readonly string[],
  byDeg: number,
): Extract<PlotAction, { type: 'rotate' }> | null {
  const turns = pieceIds.flatMap((pieceId) => {
    const piece = document.pieces[pieceId]
    return piece && !piece.locked ? [{ pieceId, rotationDeg: normaliseDeg(piece.rotationDeg + byDeg) }] : []
  })
  return turns.length > 0 ? { type: 'rotate', turns } : null
}

/** Turns a piece so that its front faces the pointer, to whole steps of 15° unless `isFree`. */
export function turnTowards(
  piece: Piece,
  pointer: PlotPoint,
  isFree: boolean,
): Extract<PlotAction, { type: 'rotate' }> {
  const heading = headingDeg(pieceCentre(piece), pointer)
  const rotationDeg = normaliseDeg(isFree ? Math.round(heading) : Math.round(heading / TURN_DEG) * TURN_DEG)
  return { type: 'rotate', turns: [{ pieceId: piece.id, rotationDeg }] }
}
