import { outputWords } from '@/lib/advance/kit-words'
import type { Channel } from '@/lib/contracts/channel'
import { channelRank, outputsOf, piecesInOrder, pieceName } from '@/plots/index'
import type { KitById, Piece, PlotDocument } from '@/plots/index'

/** An output of a piece, as a choice: its value names both. */
export interface OutputChoice {
  readonly value: string
  readonly label: string
  readonly pieceId: string
  readonly output: string
  /** Where it comes in the usual order of a channel list. */
  readonly rank: number
}

export function choiceValue(pieceId: string, output: string): string {
  return `${pieceId} ${output}`
}

/** Every output of every piece on the plot, by name: "Dynamic on Tom 12", "Playback rack, click". */
export function outputChoices(document: PlotDocument, kit: KitById): OutputChoice[] {
  return piecesInOrder(document)
    .flatMap((piece) =>
      outputsOf(piece).map((output) => ({
        value: choiceValue(piece.id, output),
        label: sourceWords(document, kit, piece, output),
        pieceId: piece.id,
        output,
        rank: channelRank(document, kit, piece),
      })),
    )
    .sort((a, b) => a.label.localeCompare(b.label) || (a.value < b.value ? -1 : 1))
}

/** What a channel takes, in words; a piece that has left the plot is said to be gone. */
export function takenWords(document: PlotDocument, kit: KitById, channel: Channel): string {
  if (channel.pieceId === null) return 'nothing yet'
  const piece = document.pieces[channel.pieceId]
  return piece ? sourceWords(document, kit, piece, channel.output) : 'a piece that is gone from the plot'
}

function sourceWords(document: PlotDocument, kit: KitById, piece: Piece, output: string): string {
  const name = pieceName(piece, kit)
  const aimed = piece.aim ? document.pieces[piece.aim.pieceId] : undefined
  if (aimed) return `${name} on ${pieceName(aimed, kit)}`
  return output === 'mic' ? name : `${name}, ${outputWords(output)}`
}
