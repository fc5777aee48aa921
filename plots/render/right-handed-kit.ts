import { emptyDocument, newPiece, type Piece, type PlotDocument } from '../model/document'
import type { KitById, KitPiece } from '../model/kit-piece'
import type { ChannelNumbers } from './build-scene'
import { channelKey } from './build-scene'

/** A right-hander's five-piece kit on a riser, for the drawing's tests and benchmarks. */

const entries: readonly KitPiece[] = [
  {
    kind: 'drum',
    id: 'k-kick',
    name: 'Kick 22',
    role: 'kick',
    diameterIn: 22,
    depthIn: 16,
    lugs: 8,
    noteLabel: 'A1',
    noteHz: 55,
  },
  {
    kind: 'drum',
    id: 'k-snare',
    name: 'Snare 14',
    role: 'snare',
    diameterIn: 14,
    depthIn: 5.5,
    lugs: 10,
    noteLabel: 'G♯3',
    noteHz: 207.7,
  },
  {
    kind: 'drum',
    id: 'k-tom',
    name: 'Tom 12',
    role: 'tom',
    diameterIn: 12,
    depthIn: 8,
    lugs: 6,
    noteLabel: 'D3',
    noteHz: 146.8,
  },
  {
    kind: 'drum',
    id: 'k-low',
    name: 'Tom 14',
    role: 'tom',
    diameterIn: 14,
    depthIn: 10,
    lugs: 8,
    noteLabel: 'A2',
    noteHz: 110,
  },
  {
    kind: 'drum',
    id: 'k-floor',
    name: 'Floor 16',
    role: 'floor-tom',
    diameterIn: 16,
    depthIn: 14,
    lugs: 8,
    noteLabel: 'E2',
    noteHz: 82.4,
  },
  { kind: 'cymbal', id: 'k-hats', name: 'Hats 14', type: 'hats', diameterIn: 14, count: 1 },
  { kind: 'cymbal', id: 'k-crash', name: 'Crash 17', type: 'crash', diameterIn: 17, count: 1 },
  { kind: 'cymbal', id: 'k-ride', name: 'Ride 21', type: 'ride', diameterIn: 21, count: 1 },
  { kind: 'hardware', id: 'k-throne', name: 'Throne', type: 'throne', count: 1 },
  { kind: 'microphone', id: 'k-mic', name: 'Dynamic', type: 'dynamic', phantom: false, stand: 'short', count: 8 },
]

export const rightHandedKit: KitById = new Map(entries.map((entry) => [entry.id, entry]))

const microphone = (id: string, at: string, xM: number, yM: number): Piece =>
  newPiece({ id, kind: 'microphone', kitEntryId: 'k-mic', xM, yM, aim: { pieceId: at } })

const pieces: readonly Piece[] = [
  newPiece({ id: 'riser', kind: 'riser', yM: 3.3, widthM: 2.4, depthM: 2.4 }),
  newPiece({ id: 'throne', kind: 'hardware', kitEntryId: 'k-throne', xM: 0, yM: 4.05 }),
  newPiece({ id: 'kick', kind: 'drum', kitEntryId: 'k-kick', xM: -0.08, yM: 2.75 }),
  newPiece({ id: 'snare', kind: 'drum', kitEntryId: 'k-snare', xM: 0.19, yM: 3.58 }),
  newPiece({ id: 'tom', kind: 'drum', kitEntryId: 'k-tom', xM: 0.14, yM: 3.15 }),
  newPiece({ id: 'low', kind: 'drum', kitEntryId: 'k-low', xM: -0.25, yM: 3.17 }),
  newPiece({ id: 'floor', kind: 'drum', kitEntryId: 'k-floor', xM: -0.52, yM: 3.6 }),
  newPiece({ id: 'hats', kind: 'cymbal', kitEntryId: 'k-hats', xM: 0.62, yM: 3.6 }),
  newPiece({ id: 'crash', kind: 'cymbal', kitEntryId: 'k-crash', xM: 0.6, yM: 3.05 }),
  newPiece({ id: 'ride', kind: 'cymbal', kitEntryId: 'k-ride', xM: -0.78, yM: 3.12 }),
  microphone('mic-kick', 'kick', -0.1, 2.42),
  microphone('mic-snare', 'snare', 0.42, 3.44),
  microphone('mic-tom', 'tom', 0.3, 2.98),
  microphone('mic-low', 'low', -0.4, 2.97),
  microphone('mic-floor', 'floor', -0.72, 3.75),
]

export const rightHandedPlot: PlotDocument = {
  ...emptyDocument,
  pieces: Object.fromEntries(pieces.map((piece) => [piece.id, piece])),
}

export const rightHandedChannels: ChannelNumbers = new Map(
  ['mic-kick', 'mic-snare', 'mic-tom', 'mic-low', 'mic-floor'].map((id, index) => [channelKey(id, 'mic'), index + 1]),
)
