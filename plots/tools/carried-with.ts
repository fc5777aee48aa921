import { piecesInOrder, type PlotDocument } from '../model/document'

/**
 * The pieces that move when these do: themselves, and microphones that aim at one of them, so that a moved drum keeps
 * its microphone where it was set. Locked pieces stay.
 */
export function carriedWith(document: PlotDocument, pieceIds: readonly string[]): string[] {
  const moving = new Set(pieceIds)
  return piecesInOrder(document)
    .filter((piece) => !piece.locked)
    .filter((piece) => moving.has(piece.id) || (piece.aim !== null && moving.has(piece.aim.pieceId)))
    .map((piece) => piece.id)
}
