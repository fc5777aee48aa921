import type { PlotAction } from '../model/command'
import type { PlotDocument } from '../model/document'
import { carriedWith } from './carried-with'
import { tidy } from './move-pieces'

/** How far an arrow key moves, metres: 5 cm, with Shift 50 cm, with Alt 1 cm. */
export const NUDGE_M = { plain: 0.05, shift: 0.5, alt: 0.01 } as const

const directions: Readonly<Record<string, readonly [number, number]>> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, 1],
  ArrowDown: [0, -1],
}

/** What an arrow key does to the chosen pieces, as seen on the sheet; null for other keys or when nothing may move. */
export function nudge(
  document: PlotDocument,
  pieceIds: readonly string[],
  key: { readonly key: string; readonly shiftKey: boolean; readonly altKey: boolean },
): Extract<PlotAction, { type: 'move' }> | null {
  const direction = directions[key.key]
  if (!direction) return null
  const stepM = key.shiftKey ? NUDGE_M.shift : key.altKey ? NUDGE_M.alt : NUDGE_M.plain
  const moves = carriedWith(document, pieceIds).flatMap((pieceId) => {
    const piece = document.pieces[pieceId]
    return piece
      ? [{ pieceId, xM: tidy(piece.xM + direction[0] * stepM), yM: tidy(piece.yM + direction[1] * stepM) }]
      : []
  })
  return moves.length > 0 ? { type: 'move', moves } : null
}
