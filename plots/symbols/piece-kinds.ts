import type { KitById } from '../model/kit-piece'
import type { Piece } from '../model/document'

/** What a kind of piece is, where nothing else is said of it. Sizes in metres, common practice. */
export interface PieceKind {
  readonly kind: string
  /** The trade's word for it, as shown on the shelf. */
  readonly word: string
  /** More words a person might look for it by. */
  readonly alsoFoundBy: readonly string[]
  readonly shape: 'circle' | 'rect'
  readonly widthM: number
  readonly depthM: number
  readonly heightM: number
  readonly outputs: readonly string[]
  /** Whether it points at another piece. */
  readonly aims: boolean
  /** `kit`: drawn from a kit entry; `own`: carries its own size. */
  readonly from: 'kit' | 'own'
  /** Whether it can be put on the plot without a kit entry. */
  readonly onShelf: boolean
  /** Drawing order: low lies under high. */
  readonly level: number
}

const kinds: readonly PieceKind[] = [
  own('riser', 'Riser', 2.4, 2.4, 0.4, [], { level: 0, alsoFoundBy: ['platform', 'drum riser', '2.4'] }),
  own('rug', 'Rug', 2, 1.6, 0.01, [], { level: 1, alsoFoundBy: ['carpet', 'mat'] }),
  own('wedge', 'Wedge', 0.6, 0.45, 0.35, [], { alsoFoundBy: ['monitor', 'mix'] }),
  own('amp', 'Amp', 0.65, 0.35, 0.6, ['mic'], { alsoFoundBy: ['guitar', 'cabinet', 'combo'] }),
  own('bass-rig', 'Bass rig', 0.65, 0.45, 1.1, ['di', 'mic'], { alsoFoundBy: ['bass amp', 'cabinet'] }),
  own('keys', 'Keys', 1.35, 0.4, 1, ['L', 'R'], { alsoFoundBy: ['keyboard', 'piano', 'synth'] }),
  own('pad', 'Pad', 0.35, 0.33, 0.9, ['trigger'], { alsoFoundBy: ['trigger', 'electronic drum', 'sampler'] }),
  own('playback', 'Playback rack', 0.55, 0.6, 0.8, ['L', 'R', 'click'], {
    alsoFoundBy: ['tracks', 'click', 'computer'],
  }),
  own('di', 'DI', 0.12, 0.16, 0.08, ['di'], { level: 3, alsoFoundBy: ['direct box'] }),
  own('stage-box', 'Stage box', 0.48, 0.3, 0.2, [], { alsoFoundBy: ['box', 'multicore', 'sub-snake'] }),
  own('power-drop', 'Power drop', 0.3, 0.2, 0.15, [], { alsoFoundBy: ['mains', 'distro', 'outlet'] }),
  own('throne', 'Throne', 0.34, 0.34, 0.5, [], { shape: 'circle', level: 3, alsoFoundBy: ['stool', 'seat'] }),
  own('person', 'Person', 0.5, 0.5, 1.75, ['talkback'], {
    shape: 'circle',
    level: 3,
    alsoFoundBy: ['player', 'singer', 'musician'],
  }),
  own('microphone', 'Microphone', 0.06, 0.18, 1.5, ['mic'], {
    level: 6,
    aims: true,
    alsoFoundBy: ['mic', 'vocal', 'talkback'],
  }),
  own('text', 'Text', 0.6, 0.2, 0, [], { level: 7, alsoFoundBy: ['note', 'words'] }),
  kit('drum', 'Drum', [], 4),
  kit('cymbal', 'Cymbal', [], 5),
  kit('hardware', 'Hardware', [], 2),
]

function own(
  kind: string,
  word: string,
  widthM: number,
  depthM: number,
  heightM: number,
  outputs: readonly string[],
  rest: Partial<PieceKind>,
): PieceKind {
  return {
    kind,
    word,
    widthM,
    depthM,
    heightM,
    outputs,
    alsoFoundBy: [],
    shape: 'rect',
    aims: false,
    from: 'own',
    onShelf: true,
    level: 2,
    ...rest,
  }
}

function kit(kind: string, word: string, outputs: readonly string[], level: number): PieceKind {
  return { ...own(kind, word, 0.35, 0.35, 0.8, outputs, { shape: 'circle', level }), from: 'kit', onShelf: false }
}

const byKind = new Map(kinds.map((entry) => [entry.kind, entry]))

/** Every kind of this release, in shelf order. */
export const pieceKinds: readonly PieceKind[] = kinds

/** The kind of a piece, or null for a kind of a newer release. */
export function pieceKindOf(piece: Pick<Piece, 'kind'>): PieceKind | null {
  return byKind.get(piece.kind) ?? null
}

/** The outputs a channel can take from a piece: its own list, else the kind's usual one. */
export function outputsOf(piece: Pick<Piece, 'kind' | 'outputs'>): readonly string[] {
  return piece.outputs ?? pieceKindOf(piece)?.outputs ?? []
}

/** What a piece is called: its label, else the kit entry's name, else the kind's word (or the unknown kind itself). */
export function pieceName(piece: Piece, kit: KitById): string {
  if (piece.label.trim() !== '') return piece.label
  const entry = piece.kitEntryId === null ? undefined : kit.get(piece.kitEntryId)
  return entry?.name ?? pieceKindOf(piece)?.word ?? piece.kind
}

/** Drawing order of a piece: low lies under high. Risers and rugs (0 and 1) are ground that others stand on. */
export function pieceLevel(piece: Piece, kit: KitById): number {
  const entry = piece.kitEntryId === null ? undefined : kit.get(piece.kitEntryId)
  if (entry?.kind === 'hardware' && entry.type === 'rug') return 1
  return pieceKindOf(piece)?.level ?? 2
}
