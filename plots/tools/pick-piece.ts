import { footprintBounds, footprintContains, type Footprint } from '../geometry/footprint'
import type { PlotPoint } from '../geometry/point'
import { piecesInOrder, type Piece, type PlotDocument } from '../model/document'
import type { KitById } from '../model/kit-piece'
import { pieceFootprint } from '../symbols/piece-footprint'
import { pieceLevel } from '../symbols/piece-kinds'

/**
 * The piece under the pointer: the one on top, the smaller of two at one level. A riser or a rug answers at its edge
 * only, until it is chosen, so that the ground under a kit can be dragged to look around. `slackM` is a finger's width.
 */
export function pickPiece(
  document: PlotDocument,
  kit: KitById,
  point: PlotPoint,
  slackM: number,
  chosen: ReadonlySet<string>,
): Piece | null {
  const found = piecesInOrder(document)
    .map((piece) => ({ piece, footprint: pieceFootprint(document, piece, kit), level: pieceLevel(piece, kit) }))
    .filter(({ piece, footprint, level }) =>
      level <= 1 && !chosen.has(piece.id)
        ? isOnEdge(footprint, point, slackM)
        : footprintContains(footprint, point, slackM),
    )
    .sort((a, b) => {
      const exactA = footprintContains(a.footprint, point) ? 0 : 1
      const exactB = footprintContains(b.footprint, point) ? 0 : 1
      return exactA - exactB || b.level - a.level || areaOf(a.footprint) - areaOf(b.footprint)
    })[0]
  return found?.piece ?? null
}

function isOnEdge(footprint: Footprint, point: PlotPoint, slackM: number): boolean {
  return footprintContains(footprint, point, slackM) && !footprintContains(footprint, point, -slackM)
}

function areaOf(footprint: Footprint): number {
  const { minXM, maxXM, minYM, maxYM } = footprintBounds(footprint)
  return (maxXM - minXM) * (maxYM - minYM)
}
