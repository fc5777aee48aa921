import { noteFrequencyHz } from '@/lib/acoustics/note'
import { noteName } from '@/lib/acoustics/note-name'
import type { DrumRole } from '@/lib/acoustics/tension-range'
import { planNotes } from '@/lib/tuning/note-plan'
import { NOTE_TEMPLATES } from '@/lib/tuning/note-template'
import { planDrumOf } from '@/lib/tuning/plan-drum'
import { buildScene, channelKey, emptyDocument, newPiece, screenTextSizes } from '@/plots/index'
import type { KitPiece, Piece, Scene } from '@/plots/index'

interface ExampleDrum {
  id: string
  name: string
  role: DrumRole
  diameterIn: number
  depthIn: number
  lugs: number
}

const batter = { plyMils: [10], coatingGPerM2: 50 }
const resonant = { plyMils: [7.5], coatingGPerM2: 0 }
const snareSide = { plyMils: [3], coatingGPerM2: 0 }

const drums: readonly ExampleDrum[] = [
  { id: 'snare', name: 'Snare', role: 'snare', diameterIn: 14, depthIn: 6.5, lugs: 10 },
  { id: 'tom-12', name: 'Tom 12', role: 'tom', diameterIn: 12, depthIn: 8, lugs: 6 },
  { id: 'tom-14', name: 'Tom 14', role: 'floor-tom', diameterIn: 14, depthIn: 14, lugs: 8 },
  { id: 'floor-16', name: 'Floor 16', role: 'floor-tom', diameterIn: 16, depthIn: 16, lugs: 8 },
  { id: 'kick', name: 'Kick 22', role: 'kick', diameterIn: 22, depthIn: 16, lugs: 8 },
]

const cymbals = [
  { id: 'hats', name: 'Hats 14', type: 'hats', diameterIn: 14 },
  { id: 'crash', name: 'Crash 17', type: 'crash', diameterIn: 17 },
  { id: 'ride', name: 'Ride 21', type: 'ride', diameterIn: 21 },
] as const

/** Metres, x to stage left and y upstage, about the middle of the kit. */
const places: Record<string, [number, number]> = {
  throne: [0, 0.88],
  'floor-16': [-0.6, 0.52],
  snare: [0.13, 0.46],
  hats: [0.6, 0.5],
  'tom-14': [-0.28, 0.1],
  'tom-12': [0.17, 0.06],
  ride: [-0.86, 0.06],
  crash: [0.62, -0.06],
  kick: [-0.06, -0.38],
}

const microphones: readonly { id: string; aim: string; at: [number, number]; channel: number }[] = [
  { id: 'mic-kick', aim: 'kick', at: [-0.06, -0.72], channel: 1 },
  { id: 'mic-snare', aim: 'snare', at: [0.31, 0.33], channel: 2 },
  { id: 'mic-hats', aim: 'hats', at: [0.78, 0.68], channel: 4 },
  { id: 'mic-12', aim: 'tom-12', at: [0.26, -0.1], channel: 5 },
  { id: 'mic-14', aim: 'tom-14', at: [-0.38, -0.07], channel: 6 },
  { id: 'mic-16', aim: 'floor-16', at: [-0.73, 0.7], channel: 7 },
]

const fourths = NOTE_TEMPLATES.find((template) => template.id === 'fourths') ?? NOTE_TEMPLATES[0]!

const withRanges = drums.map((drum) => ({
  drum,
  planDrum: planDrumOf(drum.id, drum.name, {
    ...{ ...drum, batter, resonant: drum.role === 'snare' ? snareSide : resonant, ported: false },
    ...{ headRelationCents: 0, note: null, noteLocked: false },
  }),
}))

/** Fourths down from D3 on the 12 in tom, planned by the same rules as everybody's kit. */
const plan = planNotes({
  template: fourths,
  drums: withRanges.map(({ planDrum }) => planDrum),
  anchor: { drumId: 'tom-12', note: { semitone: 50, cents: 0 } },
  alternatives: 0,
}).best

function plannedNote(drumId: string) {
  const planned = plan.drums.find((drum) => drum.drumId === drumId)
  if (!planned) return null
  const { note } = planned
  return { name: noteName(note.semitone), semitone: note.semitone, hz: noteFrequencyHz(note) }
}

/** The example kit's drums with their planned notes, and where each is slack, in its middle third, and choked, as pitches. */
export const exampleDrums = withRanges.map(({ drum, planDrum }) => ({
  ...drum,
  note: plannedNote(drum.id),
  range: planDrum.range,
}))

function piece(id: string, kind: string, rest: Partial<Piece>): Piece {
  const [xM = 0, yM = 0] = places[id] ?? []
  return newPiece({ id, kind, xM, yM, ...rest })
}

/** The example kit from above as the plot draws it, with words that read at `pxPerM` pixels a metre. */
export function exampleScene(pxPerM: number): Scene {
  const kit: KitPiece[] = [
    ...exampleDrums.map(({ note, range: _range, ...drum }): KitPiece => ({
      ...drum,
      kind: 'drum',
      noteLabel: note?.name ?? null,
      noteHz: note?.hz ?? null,
    })),
    ...cymbals.map((cymbal): KitPiece => ({ ...cymbal, kind: 'cymbal', count: 1 })),
  ]
  const pieces = [
    piece('throne', 'throne', {}),
    ...kit.map((entry) => piece(entry.id, entry.kind, { kitEntryId: entry.id })),
    ...microphones.map(({ id, aim, at }) =>
      piece(id, 'microphone', {
        xM: at[0],
        yM: at[1],
        widthM: 0.045,
        depthM: 0.11,
        aim: { pieceId: aim },
        outputs: ['mic'],
      }),
    ),
  ]
  return buildScene({
    document: { ...emptyDocument, pieces: Object.fromEntries(pieces.map((one) => [one.id, one])) },
    kit: new Map(kit.map((entry) => [entry.id, entry])),
    channels: new Map(microphones.map(({ id, channel }) => [channelKey(id, 'mic'), channel])),
    sizes: screenTextSizes(pxPerM),
    units: 'metric',
    stage: null,
  })
}
