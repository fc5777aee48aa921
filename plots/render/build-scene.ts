import { boundsUnion, type Bounds } from '../geometry/bounds'
import { footprintBounds } from '../geometry/footprint'
import { piecesInOrder, type Piece, type PlotDocument, type StageSize } from '../model/document'
import type { KitById } from '../model/kit-piece'
import { drawPiece, isGhost } from '../symbols/draw-piece'
import { areaWords, lengthWords, type LengthUnits } from '../symbols/length-words'
import { pieceFootprint } from '../symbols/piece-footprint'
import { outputsOf, pieceKindOf, pieceLevel, pieceName } from '../symbols/piece-kinds'
import type { DrawnShape } from '../symbols/shape'
import { placeLabels, type LabelRequest, type Obstacle } from './place-labels'
import { stageFrame, stageWords, type StageWords } from './stage-frame'
import type { TextSizes } from './text-size'

/** Channel numbers by piece and output; see `channelKey`. */
export type ChannelNumbers = ReadonlyMap<string, number>

/** The key of a piece's output in `ChannelNumbers`. */
export function channelKey(pieceId: string, output: string): string {
  return `${pieceId} ${output}`
}

/** One drawn thing: the stage's own (`pieceId` null) or a piece's. Later items lie over earlier ones. */
export type SceneItem = DrawnShape & { readonly pieceId: string | null }

export interface Scene {
  readonly items: readonly SceneItem[]
  /** Everything drawn, in metres. */
  readonly bounds: Bounds
  /** Pieces whose words found no place. */
  readonly unplaced: readonly string[]
}

export interface SceneInput {
  readonly document: PlotDocument
  readonly kit: KitById
  readonly channels: ChannelNumbers
  readonly sizes: TextSizes
  readonly units: LengthUnits
  /** The stage to draw on, or null for pieces alone (the kit inset). */
  readonly stage: StageSize | null
  readonly words?: StageWords
  /** Draw only these pieces; all when left out. */
  readonly only?: (piece: Piece) => boolean
  /** Leave out words of these pieces, where another drawing carries them. */
  readonly unlabelled?: (piece: Piece) => boolean
}

/** How bad it is to write over a piece: a cymbal is a thin line, a drum carries words of its own. */
const OBSTACLE_WEIGHTS: Readonly<Record<string, number>> = { drum: 3, microphone: 1.5, cymbal: 0.4 }
/** A kit piece drawn smaller than this many name heights is a mark among many, not a thing to read. */
const SMALL_EM = 3.3

/** The one drawing of a plot, from which the screen, the SVG and the PDF are all painted. Pure. */
export function buildScene(input: SceneInput): Scene {
  const { document, kit, stage, sizes } = input
  const frame = stage ? stageFrame(stage, sizes, input.units, input.words ?? stageWords) : null
  const pieces = piecesInOrder(document)
    .filter((piece) => input.only?.(piece) ?? true)
    .sort((a, b) => pieceLevel(a, kit) - pieceLevel(b, kit))
  const items: SceneItem[] = (frame?.shapes ?? []).map((shape) => ({ ...shape, pieceId: null }))
  const requests: LabelRequest[] = []
  const obstacles: Obstacle[] = []
  for (const piece of pieces) {
    for (const shape of drawPiece(document, piece, kit)) items.push({ ...shape, pieceId: piece.id })
    const footprint = pieceFootprint(document, piece, kit)
    const level = pieceLevel(piece, kit)
    if (level >= 2) obstacles.push({ pieceId: piece.id, footprint, weight: OBSTACLE_WEIGHTS[piece.kind] ?? 1 })
    if (!input.unlabelled?.(piece)) {
      const acrossM = footprint.shape === 'circle' ? footprint.radiusM * 2 : footprint.depthM
      const isSmall = acrossM < SMALL_EM * sizes.name
      const request = labelOf(piece, input, isSmall)
      if (request) requests.push({ ...request, pieceId: piece.id, footprint })
    }
  }
  const labels = placeLabels(requests, obstacles, sizes, frame?.boxes)
  items.push(...labels.leaders, ...labels.texts)
  const boxes = [
    ...(frame ? [frame.bounds] : []),
    ...pieces.map((piece) => footprintBounds(pieceFootprint(document, piece, kit))),
    ...labels.boxes,
  ]
  const bounds = boundsUnion(boxes) ?? { minXM: -0.5, minYM: -0.5, maxXM: 0.5, maxYM: 0.5 }
  return { items, bounds, unplaced: labels.unplaced }
}

function labelOf(
  piece: Piece,
  input: SceneInput,
  isSmall: boolean,
): Omit<LabelRequest, 'pieceId' | 'footprint'> | null {
  const { kit, channels, units } = input
  const name = pieceName(piece, kit)
  const numbers = outputsOf(piece)
    .map((output) => channels.get(channelKey(piece.id, output)))
    .filter((number) => number !== undefined)
  const entry = piece.kitEntryId === null ? undefined : kit.get(piece.kitEntryId)
  const small = (text: string) => ({ text, role: 'small', ink: 'soft' }) as const
  if (isGhost(piece, kit))
    return {
      prefer: 'inside',
      priority: 1,
      lines: [{ text: name, role: 'name', ink: 'soft' }, small('gone from the kit')],
    }
  if (piece.kind === 'microphone') {
    if (numbers.length === 0) return null
    return { prefer: 'beside', priority: 2, lines: [{ text: numbers.join(', '), role: 'channel', ink: 'spike' }] }
  }
  if (entry?.kind === 'drum')
    return {
      prefer: 'inside',
      priority: 0,
      lines: isSmall
        ? [{ text: name, role: 'small', ink: 'ink' }]
        : [
            { text: name, role: 'name', ink: 'ink' },
            ...(entry.noteLabel === null ? [] : [{ text: entry.noteLabel, role: 'note', ink: 'soft' } as const]),
          ],
    }
  if (entry?.kind === 'cymbal')
    // Clear of the bell.
    return {
      prefer: isSmall ? 'only inside' : 'inside',
      shifts: [0.58, -0.58],
      priority: 3,
      lines: [{ text: name, role: 'small', ink: 'brass' }],
    }
  if (entry?.kind === 'hardware' && entry.type !== 'throne' && entry.type !== 'rug') return null
  if (piece.kind === 'riser') {
    const high = lengthWords(piece.heightM ?? pieceKindOf(piece)?.heightM ?? 0, units)
    const area = areaWords(piece.widthM ?? 2.4, piece.depthM ?? 2.4, units)
    return { prefer: 'corner', priority: 5, lines: [small(`${name.toLowerCase()} ${area}, ${high} high`)] }
  }
  return {
    prefer: isSmall && entry?.kind === 'hardware' ? 'only inside' : 'inside',
    priority: 4,
    lines: [
      { text: name, role: 'small', ink: 'ink' },
      ...(numbers.length > 0 ? [{ text: `ch ${numbers.join(', ')}`, role: 'channel', ink: 'spike' } as const] : []),
    ],
  }
}
