import { plotPoint } from '../geometry/point'
import type { CircleFootprint, Footprint, RectFootprint } from '../geometry/footprint'
import { pieceCentre, type Piece, type PlotDocument } from '../model/document'
import { pieceHeadingDeg } from '../model/heading'
import type { KitById, KitPiece } from '../model/kit-piece'
import { pieceKindOf } from './piece-kinds'

/** Metres in a nominal inch; exact by definition. */
export const METRES_PER_INCH = 0.0254

/** Across the feet of a spread stand, or the seat of a throne, metres; common practice. */
const HARDWARE_ACROSS_M: Readonly<Record<string, number>> = {
  throne: 0.34,
  'boom-stand': 0.6,
  'straight-stand': 0.55,
  'hat-stand': 0.5,
  'snare-stand': 0.4,
  'tom-stand': 0.5,
}

/**
 * What a piece covers, seen from above. Drums and cymbals have the size of their kit entry: a kick is a rectangle,
 * diameter by depth, every other drum a circle. A piece whose entry is gone, and an unknown kind, take a usual size.
 */
export function pieceFootprint(document: PlotDocument, piece: Piece, kit: KitById): Footprint {
  const entry = piece.kitEntryId === null ? undefined : kit.get(piece.kitEntryId)
  const fromKit = entry ? kitFootprint(piece, entry) : null
  if (fromKit) return fromKit
  const kind = pieceKindOf(piece)
  const widthM = piece.widthM ?? kind?.widthM ?? 0.5
  const depthM = piece.depthM ?? kind?.depthM ?? 0.5
  if (kind?.shape === 'circle') return circle(piece, widthM)
  return rect(piece, widthM, depthM, pieceHeadingDeg(document, piece))
}

function kitFootprint(piece: Piece, entry: KitPiece): Footprint | null {
  switch (entry.kind) {
    case 'drum': {
      const diameterM = entry.diameterIn * METRES_PER_INCH
      return entry.role === 'kick'
        ? rect(piece, diameterM, entry.depthIn * METRES_PER_INCH, piece.rotationDeg)
        : circle(piece, diameterM)
    }
    case 'cymbal':
      return circle(piece, entry.diameterIn * METRES_PER_INCH)
    case 'hardware': {
      if (entry.type === 'rug') return rect(piece, piece.widthM ?? 2, piece.depthM ?? 1.6, piece.rotationDeg)
      if (entry.type === 'kick-pedal') return rect(piece, 0.2, 0.36, piece.rotationDeg)
      return circle(piece, HARDWARE_ACROSS_M[entry.type] ?? 0.4)
    }
    case 'microphone':
      return null
  }
}

function circle(piece: Piece, acrossM: number): CircleFootprint {
  return { shape: 'circle', centre: pieceCentre(piece), radiusM: acrossM / 2 }
}

function rect(piece: Piece, widthM: number, depthM: number, rotationDeg: number): RectFootprint {
  return { shape: 'rect', centre: plotPoint(piece.xM, piece.yM), widthM, depthM, rotationDeg }
}
