import type { Piece, PlotDocument } from '../model/document'
import type { KitById } from '../model/kit-piece'
import { pieceName } from './piece-kinds'

/** What a new channel of an output starts with: named for what is heard, with the microphone's stand and phantom. */
export function channelDefaults(
  document: PlotDocument,
  kit: KitById,
  piece: Piece,
  output: string,
): { readonly name: string; readonly stand: string; readonly phantom: boolean } {
  const entry = piece.kitEntryId === null ? undefined : kit.get(piece.kitEntryId)
  const aimed = piece.aim ? document.pieces[piece.aim.pieceId] : undefined
  const own = output === 'mic' ? pieceName(piece, kit) : `${pieceName(piece, kit)} ${output}`
  return {
    name: (aimed ? pieceName(aimed, kit) : own).slice(0, 60),
    stand: entry?.kind === 'microphone' && entry.stand !== 'none' ? entry.stand : '',
    phantom: entry?.kind === 'microphone' && entry.phantom,
  }
}

/** The usual order of a channel list: kick, snare, hats, toms, floor toms, other cymbals, then the rest. */
export function channelRank(document: PlotDocument, kit: KitById, piece: Piece): number {
  const heard = (piece.aim ? document.pieces[piece.aim.pieceId] : undefined) ?? piece
  const entry = heard.kitEntryId === null ? undefined : kit.get(heard.kitEntryId)
  if (entry?.kind === 'drum') return { kick: 0, snare: 1, tom: 3, 'floor-tom': 4 }[entry.role]
  if (entry?.kind === 'cymbal') return entry.type === 'hats' ? 2 : 5
  return entry ? 6 : 7
}
