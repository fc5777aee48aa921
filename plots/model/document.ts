import { plotPoint, type PlotPoint } from '../geometry/point'

/** Version of the document's shape. Older documents are upgraded in memory by `readDocument`, never on disk. */
export const PLOT_SCHEMA_VERSION = 1

/** Whose a piece is at a shared stage: what stays, what strikes, what the changeover moves. */
export const pieceSets = ['ours', 'support', 'changeover'] as const
export type PieceSet = (typeof pieceSets)[number]

/**
 * One thing on the plot. Kit pieces (`kitEntryId` set) carry no copy of the entry's data; other pieces carry their own
 * size. Lengths in metres, `rotationDeg` clockwise from facing the audience, [0, 360). A property that this release
 * does not know stays on the object through every change.
 */
export interface Piece {
  readonly id: string
  /** A kind of this release (`plots/symbols/piece-kinds`) or of a newer one; unknown kinds draw as labelled boxes. */
  readonly kind: string
  readonly kitEntryId: string | null
  readonly xM: number
  readonly yM: number
  readonly rotationDeg: number
  /** Height above what it stands on; null when nobody has said. */
  readonly zM: number | null
  /** Own size of a piece that is not in the kit; null takes the kind's usual size. */
  readonly widthM: number | null
  readonly depthM: number | null
  readonly heightM: number | null
  readonly label: string
  /** What a microphone points at. It may name a piece that is gone; then the microphone keeps its own heading. */
  readonly aim: { readonly pieceId: string } | null
  readonly set: PieceSet
  readonly locked: boolean
  /** Named outputs, or null for the kind's usual ones. */
  readonly outputs: readonly string[] | null
}

/** The drawing: a nominal stage, and the pieces by id. */
export interface PlotDocument {
  readonly schemaVersion: number
  readonly stage: StageSize
  readonly pieces: Readonly<Record<string, Piece>>
}

/** A stage's clear floor in metres: width across, depth upstage from the downstage edge. */
export interface StageSize {
  readonly widthM: number
  readonly depthM: number
}

/** Limits every command is held to. A piece further off than this is a slip of the keyboard, not a plot. */
export const PLOT_LIMITS = {
  coordinateM: 200,
  sizeMinM: 0.01,
  sizeMaxM: 60,
  heightMaxM: 30,
  stageMinM: 1,
  stageMaxM: 100,
  labelLength: 80,
  outputs: 32,
  outputLength: 24,
  pieces: 1000,
  piecesPerCommand: 500,
} as const

/** An empty plot on a stage of a middling hall. */
export const emptyDocument: PlotDocument = {
  schemaVersion: PLOT_SCHEMA_VERSION,
  stage: { widthM: 10, depthM: 8 },
  pieces: {},
}

/** A piece with every field at rest, to be filled by the caller. */
export function newPiece(piece: Pick<Piece, 'id' | 'kind'> & Partial<Piece>): Piece {
  return {
    kitEntryId: null,
    xM: 0,
    yM: 0,
    rotationDeg: 0,
    zM: null,
    widthM: null,
    depthM: null,
    heightM: null,
    label: '',
    aim: null,
    set: 'ours',
    locked: false,
    outputs: null,
    ...piece,
  }
}

/** Where a piece's middle stands. */
export function pieceCentre(piece: Piece): PlotPoint {
  return plotPoint(piece.xM, piece.yM)
}

/** All pieces in one fixed order, by id, so that the same document always draws and prints the same. */
export function piecesInOrder(document: PlotDocument): Piece[] {
  return Object.values(document.pieces).sort((a, b) => (a.id < b.id ? -1 : a.id > b.id ? 1 : 0))
}
