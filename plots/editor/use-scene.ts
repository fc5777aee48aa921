import { useMemo } from 'react'
import { boundsUnion, growBounds, type Bounds } from '../geometry/bounds'
import { footprintBounds } from '../geometry/footprint'
import { piecesInOrder, type PlotDocument } from '../model/document'
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
  const boxes = piecesInOrder(document).map((piece) => footprintBounds(pieceFootprint(document, piece, kit)))
  const union = boundsUnion(boxes)
  return union ? growBounds(union, 0.35) : stageBounds(document)
}
