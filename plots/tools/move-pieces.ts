import type { Footprint } from '../geometry/footprint'
import { footprintBounds } from '../geometry/footprint'
import { plotPoint } from '../geometry/point'
import { snapMove, type SnapGuide } from '../geometry/snap'
import type { PlotAction } from '../model/command'
import { PLOT_LIMITS, piecesInOrder, type Piece, type PlotDocument } from '../model/document'
import type { KitById } from '../model/kit-piece'
import { pieceFootprint } from '../symbols/piece-footprint'
import { carriedWith } from './carried-with'

export interface MoveResult {
  /** The move as a command's action, or null when nothing may move. */
  readonly action: Extract<PlotAction, { type: 'move' }> | null
  readonly guides: readonly SnapGuide[]
}

/**
 * The move gesture, computed from the document as it was when the drag began: how far the pointer has come, and what
 * the piece in hand snaps to. Microphones aimed at a moved drum come with it.
 */
export function movePieces(input: {
  readonly document: PlotDocument
  readonly kit: KitById
  readonly pieceIds: readonly string[]
  /** The piece under the pointer; it is the one that snaps. */
  readonly leadId: string
  readonly byXM: number
  readonly byYM: number
  /** Null moves freely. */
  readonly snap: { readonly reachM: number; readonly gridM: number | null } | null
}): MoveResult {
  const { document, kit, leadId, snap } = input
  const ids = carriedWith(document, input.pieceIds)
  const lead = document.pieces[leadId]
  if (!lead || ids.length === 0) return { action: null, guides: [] }
  let { byXM, byYM } = input
  let guides: readonly SnapGuide[] = []
  // A microphone stands where the ear wants it: nothing to line it up with.
  if (snap && lead.kind !== 'microphone' && lead.kind !== 'text') {
    const snapped = snapMove({
      ...snap,
      moving: shifted(pieceFootprint(document, lead, kit), byXM, byYM),
      others: snapTargets(document, kit, lead, new Set(ids)),
    })
    byXM = snapped.point.xM - lead.xM
    byYM = snapped.point.yM - lead.yM
    guides = snapped.guides
  }
  const moves = ids.map((pieceId) => {
    const piece = document.pieces[pieceId] ?? lead
    return { pieceId, xM: tidy(piece.xM + byXM), yM: tidy(piece.yM + byYM) }
  })
  return { action: { type: 'move', moves }, guides }
}

/** What a piece can snap to: drums touch drums; everything lines up with drums, risers and other solid pieces. */
export function snapTargets(
  document: PlotDocument,
  kit: KitById,
  lead: Piece,
  moving: ReadonlySet<string>,
): Footprint[] {
  return piecesInOrder(document)
    .filter((piece) => !moving.has(piece.id) && piece.kind !== 'microphone' && piece.kind !== 'text')
    .map((piece) => {
      const footprint = pieceFootprint(document, piece, kit)
      const mayTouch = lead.kind === 'drum' && piece.kind === 'drum'
      return mayTouch || footprint.shape === 'rect' ? footprint : boxRound(footprint)
    })
}

/** A place on the stage to a tenth of a millimetre, held inside the plot's limits. */
export function tidy(valueM: number): number {
  const held = Math.min(PLOT_LIMITS.coordinateM, Math.max(-PLOT_LIMITS.coordinateM, valueM))
  return Math.round(held * 1e4) / 1e4 || 0
}

function shifted(footprint: Footprint, byXM: number, byYM: number): Footprint {
  const { xM, yM } = footprint.centre
  return { ...footprint, centre: plotPoint(xM + byXM, yM + byYM) }
}

function boxRound(footprint: Footprint): Footprint {
  const bounds = footprintBounds(footprint)
  return {
    shape: 'rect',
    centre: footprint.centre,
    widthM: bounds.maxXM - bounds.minXM,
    depthM: bounds.maxYM - bounds.minYM,
    rotationDeg: 0,
  }
}
