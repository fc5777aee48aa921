import { boundsUnion, growBounds } from '../geometry/bounds'
import { footprintBounds } from '../geometry/footprint'
import { INSET_SCALES, largestScaleThatFits } from '../geometry/paper'
import { piecesInOrder, type Piece, type PlotDocument } from '../model/document'
import type { KitById } from '../model/kit-piece'
import type { LengthUnits } from '../symbols/length-words'
import { pieceFootprint } from '../symbols/piece-footprint'
import { buildScene, type ChannelNumbers, type Scene } from './build-scene'
import { paperTextSizes } from './text-size'

/** The drums, cymbals and microphones of the kit, and the seat behind them, drawn large enough to read. */
export interface KitInset {
  readonly scene: Scene
  /** Printed at 1:`scale`. */
  readonly scale: number
  /** Whether the drawing at that scale fits the box; when not, the kit is spread too wide to be inset. */
  readonly fits: boolean
}

/** Whether a piece belongs in the kit inset. Stands are left out: they are read off the stage drawing. */
export function isInset(piece: Piece, kit: KitById): boolean {
  const entry = piece.kitEntryId === null ? undefined : kit.get(piece.kitEntryId)
  if (entry?.kind === 'hardware') return entry.type === 'throne'
  return piece.kitEntryId !== null || piece.kind === 'throne'
}

/** The kit inset at the largest of 1:10 and 1:20 that fits the box, or null when no kit piece is on the plot. */
export function kitInset(input: {
  readonly document: PlotDocument
  readonly kit: KitById
  readonly channels: ChannelNumbers
  readonly units: LengthUnits
  readonly box: { readonly widthMm: number; readonly heightMm: number }
}): KitInset | null {
  const { document, kit, box } = input
  const pieces = piecesInOrder(document).filter((piece) => isInset(piece, kit))
  const kitBounds = boundsUnion(pieces.map((piece) => footprintBounds(pieceFootprint(document, piece, kit))))
  if (!kitBounds) return null
  const drawAt = (scale: number): Scene => {
    const scene = buildScene({
      ...input,
      sizes: paperTextSizes(scale),
      stage: null,
      only: (piece) => isInset(piece, kit),
    })
    return { ...scene, bounds: growBounds(boundsUnion([scene.bounds, kitBounds]) ?? kitBounds, 0.03) }
  }
  const spread = (scene: Scene) => ({
    widthM: scene.bounds.maxXM - scene.bounds.minXM,
    depthM: scene.bounds.maxYM - scene.bounds.minYM,
  })
  for (const scale of INSET_SCALES) {
    const scene = drawAt(scale)
    if (largestScaleThatFits(spread(scene), box, [scale]) !== null) return { scene, scale, fits: true }
  }
  const smallest = INSET_SCALES[INSET_SCALES.length - 1] ?? 20
  return { scene: drawAt(smallest), scale: smallest, fits: false }
}
