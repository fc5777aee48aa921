import { typeWords } from '@/lib/advance/kit-words'
import type { Piece } from '../model/document'
import type { KitById } from '../model/kit-piece'
import { lengthWords, type LengthUnits } from '../symbols/length-words'
import { isGhost } from '../symbols/draw-piece'
import { pieceKindOf, pieceName } from '../symbols/piece-kinds'

/** Where a piece stands, in words: "0.4 m stage left, 3 m upstage". */
export function placeWords(piece: Pick<Piece, 'xM' | 'yM'>, units: LengthUnits): string {
  const across =
    Math.abs(piece.xM) < 0.005
      ? 'on the centre line'
      : `${lengthWords(Math.abs(piece.xM), units)} stage ${piece.xM > 0 ? 'left' : 'right'}`
  const deep =
    piece.yM < 0
      ? `${lengthWords(-piece.yM, units)} downstage of the edge`
      : `${lengthWords(piece.yM, units)} upstage of the edge`
  return `${across}, ${deep}`
}

/** What a piece is, in a line: "12 in across, 8 deep, 6 lugs". */
export function kindWords(piece: Piece, kit: KitById, units: LengthUnits): string {
  if (isGhost(piece, kit)) return 'Gone from the kit: put it back there, or take it off the plot'
  const entry = piece.kitEntryId === null ? undefined : kit.get(piece.kitEntryId)
  switch (entry?.kind) {
    case 'drum':
      return `${entry.diameterIn} in across, ${entry.depthIn} deep, ${entry.lugs} lugs`
    case 'cymbal':
      return `${entry.type}, ${entry.diameterIn} in`
    case 'hardware':
      return typeWords(entry.type)
    case 'microphone':
      return `${typeWords(entry.type)}${entry.phantom ? ', phantom' : ''}`
    case undefined: {
      const kind = pieceKindOf(piece)
      if (!kind) return `${piece.kind}, from a newer release`
      const wide = lengthWords(piece.widthM ?? kind.widthM, units)
      const deep = lengthWords(piece.depthM ?? kind.depthM, units)
      return kind.shape === 'circle' ? `${kind.word}, ${wide} across` : `${kind.word}, ${wide} wide, ${deep} deep`
    }
  }
}

/** The piece for a screen reader: name, what it is, where it stands. */
export function spokenPiece(piece: Piece, kit: KitById, units: LengthUnits): string {
  const name = pieceName(piece, kit)
  return `${name}, ${kindWords(piece, kit, units)}, ${placeWords(piece, units)}${piece.locked ? ', locked' : ''}`
}
