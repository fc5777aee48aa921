import { useMemo } from 'react'
import { boundsUnion, growBounds, type Bounds } from '../geometry/bounds'
import { footprintBounds } from '../geometry/footprint'
import { piecesInOrder, type Piece, type PlotDocument } from '../model/document'
import type { KitById } from '../model/kit-piece'
import { buildScene, type ChannelNumbers, type Scene } from '../render/build-scene'
import { screenTextSizes } from '../render/text-size'
import type { LengthUnits } from '../symbols/length-words'
import { pieceFootprint } from '../symbols/piece-footprint'

/** The scene as the screen shows it: its words keep their size at every zoom. */
export function useScene(
  document: PlotDocument,
  kit: KitById,
  channels: ChannelNumbers,
  units: LengthUnits,
  pxPerM: number,
): Scene {
  return useMemo(
    () => buildScene({ document, kit, channels, units, sizes: screenTextSizes(pxPerM), stage: document.stage }),
    [document, kit, channels, units, pxPerM],
  )
}

/** The whole stage with the words round it. */
export function stageBounds({ stage }: PlotDocument): Bounds {
  const half = stage.widthM / 2
  return growBounds({ minXM: -half, minYM: 0, maxXM: half, maxYM: stage.depthM }, stage.widthM * 0.04)
}

/** Everything placed, with some room; the stage while nothing is. */
export function piecesBounds(document: PlotDocument, kit: KitById): Bounds {
  return boundsOf(document, kit, () => true) ?? stageBounds(document)
}

/** The kit close by, with some room; everything while no kit piece is placed. */
export function kitBounds(document: PlotDocument, kit: KitById): Bounds {
  return boundsOf(document, kit, (piece) => piece.kitEntryId !== null) ?? piecesBounds(document, kit)
}

function boundsOf(document: PlotDocument, kit: KitById, wanted: (piece: Piece) => boolean): Bounds | null {
  const boxes = piecesInOrder(document)
    .filter(wanted)
    .map((piece) => footprintBounds(pieceFootprint(document, piece, kit)))
  const union = boundsUnion(boxes)
  return union && growBounds(union, 0.3)
}
