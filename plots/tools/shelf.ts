import { footprintsOverlap } from '../geometry/footprint'
import { distanceM, plotPoint, type PlotPoint } from '../geometry/point'
import { newPiece, pieceCentre, piecesInOrder, type Piece, type PlotDocument } from '../model/document'
import type { KitById, KitPiece } from '../model/kit-piece'
import { areaWords, type LengthUnits } from '../symbols/length-words'
import { pieceFootprint } from '../symbols/piece-footprint'
import { pieceKindOf, pieceKinds, pieceLevel, type PieceKind } from '../symbols/piece-kinds'
import { tidy } from './move-pieces'

/** Something that can be put on the plot. */
export type ShelfItem =
  | {
      readonly from: 'kit'
      readonly key: string
      readonly entry: KitPiece
      readonly name: string
      readonly hint: string
      readonly left: number
    }
  | {
      readonly from: 'kind'
      readonly key: string
      readonly kind: PieceKind
      readonly name: string
      readonly hint: string
    }

/** How far a microphone dropped near a drum looks for one to aim at, metres from its middle. */
const AIM_REACH_M = 0.7

/** What the kit holds and the plot does not yet, in the kit's order, with how many of each are left. */
export function shelfFromKit(document: PlotDocument, kit: KitById): ShelfItem[] {
  const placed = new Map<string, number>()
  for (const piece of Object.values(document.pieces))
    if (piece.kitEntryId !== null) placed.set(piece.kitEntryId, (placed.get(piece.kitEntryId) ?? 0) + 1)
  return [...kit.values()].flatMap((entry): ShelfItem[] => {
    const left = (entry.kind === 'drum' ? 1 : entry.count) - (placed.get(entry.id) ?? 0)
    if (left <= 0) return []
    return [{ from: 'kit', key: `kit-${entry.id}`, entry, name: entry.name, hint: hintOf(entry, left), left }]
  })
}

/** Other pieces whose word, other names or size hold what was typed; all of them for nothing typed. */
export function shelfOfKinds(query: string, units: LengthUnits): ShelfItem[] {
  const wanted = query.trim().toLowerCase()
  return pieceKinds
    .filter((kind) => kind.onShelf)
    .map((kind) => ({ kind, hint: areaWords(kind.widthM, kind.depthM, units) }))
    .filter(({ kind, hint }) =>
      [kind.word, ...kind.alsoFoundBy, hint].some((text) => text.toLowerCase().includes(wanted)),
    )
    .map(({ kind, hint }): ShelfItem => ({ from: 'kind', key: `kind-${kind.kind}`, kind, name: kind.word, hint }))
}

/** A new piece of a shelf item at a place. A microphone aims at the drum it is put down by. */
export function pieceOf(item: ShelfItem, id: string, at: PlotPoint, document: PlotDocument): Piece {
  const where = { xM: tidy(at.xM), yM: tidy(at.yM) }
  const kind = item.from === 'kit' ? item.entry.kind : item.kind.kind
  const piece = newPiece({
    id,
    kind,
    kitEntryId: item.from === 'kit' ? item.entry.id : null,
    ...where,
    ...(kind === 'text' ? { label: 'Text' } : {}),
  })
  if (!pieceKindOf(piece)?.aims) return piece
  const drum = piecesInOrder(document)
    .filter((other) => other.kind === 'drum' && distanceM(pieceCentre(other), at) <= AIM_REACH_M)
    .sort((a, b) => distanceM(pieceCentre(a), at) - distanceM(pieceCentre(b), at))[0]
  return drum ? { ...piece, aim: { pieceId: drum.id } } : piece
}

/**
 * A new piece of an item when nobody pointed at a place: a microphone of the kit before the first drum that has none,
 * anything else on the nearest free spot to `near`.
 */
export function pieceByItself(
  item: ShelfItem,
  id: string,
  document: PlotDocument,
  kit: KitById,
  near: PlotPoint,
): Piece {
  if (item.from === 'kit' && item.entry.kind === 'microphone') {
    const aimedAt = new Set(piecesInOrder(document).flatMap((piece) => piece.aim?.pieceId ?? []))
    const drum = piecesInOrder(document).find((piece) => piece.kind === 'drum' && !aimedAt.has(piece.id))
    if (drum) {
      const footprint = pieceFootprint(document, drum, kit)
      const reachM = footprint.shape === 'circle' ? footprint.radiusM : footprint.depthM / 2
      const before = plotPoint(drum.xM, drum.yM - reachM - 0.12)
      return { ...pieceOf(item, id, before, document), aim: { pieceId: drum.id } }
    }
  }
  return pieceOf(item, id, freeSpot(item, document, kit, near), document)
}

function freeSpot(item: ShelfItem, document: PlotDocument, kit: KitById, near: PlotPoint): PlotPoint {
  const solids = piecesInOrder(document).filter((piece) => pieceLevel(piece, kit) >= 2 && piece.kind !== 'text')
  const isFree = (at: PlotPoint) => {
    const footprint = pieceFootprint(document, pieceOf(item, 'new', at, document), kit)
    return !solids.some((piece) => footprintsOverlap(footprint, pieceFootprint(document, piece, kit)))
  }
  // Rings of growing size round the wished spot, sixteen places on each.
  for (let ring = 0; ring < 40; ring += 1)
    for (let place = 0; place < (ring === 0 ? 1 : 16); place += 1) {
      const angle = (place / 16) * 2 * Math.PI
      const at = plotPoint(near.xM + Math.cos(angle) * ring * 0.2, near.yM + Math.sin(angle) * ring * 0.2)
      if (isFree(at)) return at
    }
  return near
}

function hintOf(entry: KitPiece, left: number): string {
  const many = left > 1 ? `${left} left` : ''
  switch (entry.kind) {
    case 'drum':
      return `${entry.diameterIn} × ${entry.depthIn} in`
    case 'cymbal':
      return [`${entry.diameterIn} in`, many].filter(Boolean).join(', ')
    default:
      return many || entry.kind
  }
}
