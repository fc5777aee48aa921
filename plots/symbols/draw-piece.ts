import type { Footprint } from '../geometry/footprint'
import { pieceCentre, type Piece, type PlotDocument } from '../model/document'
import type { KitById } from '../model/kit-piece'
import { cymbal } from './cymbal'
import { hoop, kick } from './hoop'
import { microphone } from './microphone'
import { pieceFootprint } from './piece-footprint'
import { standAt, type Shape } from './shape'
import { frontedBox, ghostCircle, keys, person, riser, rug, seat, stand, unknownBox, wedge } from './stage-pieces'

/** Whether a piece draws from a kit entry that the kit no longer holds. */
export function isGhost(piece: Piece, kit: KitById): boolean {
  return piece.kitEntryId !== null && !kit.has(piece.kitEntryId)
}

/** The shapes of one piece where it stands on the plot, lowest first. Words are added by the scene. */
export function drawPiece(document: PlotDocument, piece: Piece, kit: KitById): Shape[] {
  const footprint = pieceFootprint(document, piece, kit)
  const rotationDeg = footprint.shape === 'rect' ? footprint.rotationDeg : piece.rotationDeg
  return shapesOf(piece, footprint, kit).map((shape) => standAt(shape, pieceCentre(piece), rotationDeg))
}

function shapesOf(piece: Piece, footprint: Footprint, kit: KitById): Shape[] {
  const widthM = footprint.shape === 'circle' ? footprint.radiusM * 2 : footprint.widthM
  const depthM = footprint.shape === 'circle' ? footprint.radiusM * 2 : footprint.depthM
  if (isGhost(piece, kit))
    return footprint.shape === 'circle' ? ghostCircle(widthM) : unknownBox(widthM, depthM, 'ghost')
  const entry = piece.kitEntryId === null ? undefined : kit.get(piece.kitEntryId)
  switch (entry?.kind) {
    case 'drum':
      return entry.role === 'kick' ? kick(widthM, depthM, entry.lugs) : hoop(widthM, entry.lugs)
    case 'cymbal':
      return cymbal(widthM, entry.type === 'hats')
    case 'hardware':
      if (entry.type === 'throne') return seat(widthM)
      if (entry.type === 'rug') return rug(widthM, depthM)
      return footprint.shape === 'circle' ? stand(widthM) : frontedBox(widthM, depthM, entry.type)
    case 'microphone':
    case undefined:
      return ownShapes(piece.kind, widthM, depthM)
  }
}

function ownShapes(kind: string, widthM: number, depthM: number): Shape[] {
  switch (kind) {
    case 'riser':
      return riser(widthM, depthM)
    case 'rug':
      return rug(widthM, depthM)
    case 'wedge':
      return wedge(widthM, depthM)
    case 'keys':
      return keys(widthM, depthM)
    case 'throne':
      return seat(widthM)
    case 'person':
      return person(widthM)
    case 'microphone':
      return microphone(widthM, depthM)
    case 'text':
      return []
    case 'amp':
    case 'bass-rig':
    case 'pad':
    case 'playback':
    case 'di':
    case 'stage-box':
    case 'power-drop':
      return frontedBox(widthM, depthM, kind)
    default:
      return unknownBox(widthM, depthM, 'unknown')
  }
}
