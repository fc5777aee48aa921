import { rightHandedPlot } from '@/plots/render/right-handed-kit'
import type { PackContactInput, PackHireInput, PackShowInput } from './pack-input'
import type { FrozenDrum, FrozenDrumSpec, FrozenEntry } from './frozen-kit'
import { linesOfKit } from './line-content'
import type { RevisionDocument, RigSpec } from './revision-document'
import { REVISION_SCHEMA_VERSION } from './revision-document'

/** A right-hander's rig of an invented party, its show and its hire: for the tests of revisions, packs and PDFs. */

const uuid = (tail: string) => `00000000-0000-4000-8000-${tail.padStart(12, '0')}`

const head = (mils: number[], film: 'clear' | 'coated', gauge: number | null) =>
  ({ plyMils: mils, film, coatingGPerM2: film === 'coated' ? 45 : 0, damping: 'none', gauge }) as const

export function sampleDrum(
  entry: { id: string; name: string; position: number; supply?: FrozenEntry['supply'] },
  spec: Pick<FrozenDrumSpec, 'role' | 'diameterIn' | 'depthIn' | 'lugs'> & Partial<FrozenDrumSpec>,
): FrozenDrum {
  return {
    ...{ kind: 'drum', count: 1, remark: '', supply: 'rented', ...entry },
    spec: {
      ...{ shell: 'maple', ported: false, noteLocked: false, headRelationCents: 0, toleranceCents: 10, muffling: '' },
      batter: head([10], 'coated', 75),
      resonant: head([10], 'clear', 74),
      note: null,
      insteadOf: null,
      ...spec,
    },
  }
}

export const sampleKit: readonly FrozenEntry[] = [
  sampleDrum(
    { id: 'k-kick', name: 'Kick 22', position: 0 },
    {
      ...{
        role: 'kick',
        diameterIn: 22,
        depthIn: 16,
        lugs: 8,
        ported: true,
        muffling: 'one pillow, touching both heads',
      },
      note: { semitone: 33, cents: 0 },
      batter: { ...head([10, 7], 'clear', 32), damping: 'felt' },
    },
  ),
  sampleDrum(
    { id: 'k-snare', name: 'Snare 14', position: 1, supply: 'carried' },
    {
      ...{ role: 'snare', diameterIn: 14, depthIn: 5.5, lugs: 10, headRelationCents: 500, toleranceCents: 15 },
      note: { semitone: 55, cents: 0 },
      resonant: head([3], 'clear', null),
    },
  ),
  sampleDrum(
    { id: 'k-tom', name: 'Tom 12', position: 2 },
    {
      ...{ role: 'tom', diameterIn: 12, depthIn: 8, lugs: 6, headRelationCents: 300 },
      note: { semitone: 49, cents: 0 },
      insteadOf: { diameterMinIn: 12, diameterMaxIn: 13, depthMinIn: 7, depthMaxIn: 10 },
    },
  ),
  sampleDrum(
    { id: 'k-low', name: 'Tom 14', position: 3 },
    { role: 'tom', diameterIn: 14, depthIn: 10, lugs: 8, note: { semitone: 45, cents: 0 } },
  ),
  sampleDrum(
    { id: 'k-floor', name: 'Floor tom 16', position: 4 },
    { role: 'floor-tom', diameterIn: 16, depthIn: 14, lugs: 8, note: { semitone: 40, cents: -12 } },
  ),
  {
    id: 'k-hats',
    position: 5,
    kind: 'cymbal',
    name: 'Hats 14',
    supply: 'carried',
    count: 1,
    remark: '',
    spec: { type: 'hats', diameterIn: 14 },
  },
  {
    id: 'k-crash',
    position: 6,
    kind: 'cymbal',
    name: 'Crash 17',
    supply: 'carried',
    count: 1,
    remark: '',
    spec: { type: 'crash', diameterIn: 17 },
  },
  {
    id: 'k-ride',
    position: 7,
    kind: 'cymbal',
    name: 'Ride 21',
    supply: 'venue',
    count: 1,
    remark: 'no rivets',
    spec: { type: 'ride', diameterIn: 21 },
  },
  {
    id: 'k-throne',
    position: 8,
    kind: 'hardware',
    name: 'Throne',
    supply: 'venue',
    count: 1,
    remark: 'round seat',
    spec: { type: 'throne' },
  },
  {
    id: 'k-boom',
    position: 9,
    kind: 'hardware',
    name: 'Boom stands',
    supply: 'venue',
    count: 4,
    remark: '',
    spec: { type: 'boom-stand' },
  },
  {
    id: 'k-mic',
    position: 10,
    kind: 'microphone',
    name: 'Drum microphones',
    supply: 'venue',
    count: 8,
    remark: '',
    spec: { type: 'dynamic', phantom: false, stand: 'short' },
  },
]

export const sampleSpec: RigSpec = {
  party: { id: uuid('1'), name: 'Saltmarsh Radio', locale: 'en', units: 'metric', referenceHz: 440, paper: 'A4' },
  tour: { id: uuid('2'), name: 'Autumn run' },
  rig: { id: uuid('3'), name: 'full rig' },
  kit: sampleKit,
  plot: { sequence: 15, document: rightHandedPlot },
  channels: (
    [
      ['mic-kick', 'Kick'],
      ['mic-snare', 'Snare'],
      ['mic-tom', 'Tom'],
      ['mic-low', 'Low tom'],
      ['mic-floor', 'Floor tom'],
    ] as const
  ).map(([pieceId, name], index) => ({
    ...{ id: `c-${index + 1}`, number: index + 1, name, pieceId, output: 'mic', stand: 'short', phantom: false },
  })),
  gauge: null,
}

/** A revision of a spec, its lines named after their entries: what the use case does with real ids and hashes. */
export function sampleRevision(spec: RigSpec = sampleSpec): RevisionDocument {
  return {
    schemaVersion: REVISION_SCHEMA_VERSION,
    ...spec,
    lines: linesOfKit(spec.kit).map((line) => ({
      ...line,
      lineId: `line of ${line.entryId}`,
      hash: `hash of ${line.entryId}`,
    })),
  }
}

export const sampleShow: PackShowInput = {
  id: uuid('4'),
  date: '2031-10-14',
  name: '',
  venue: { id: uuid('5'), name: 'Salle Nord', town: 'Arvic', country: 'France' },
  stage: {
    name: 'Main stage',
    widthM: 10,
    depthM: 8,
    heightM: 1.2,
    access: ['dock', 'lift'],
    volts: 230,
    mainsHz: 50,
    inlets: 'CEE 32 A',
  },
  zone: 'Europe/Paris',
  loadInTime: '14:00',
  showTime: '20:30',
  showDayOffset: 0,
  answersDueAt: '2031-10-02T16:00:00.000Z',
  slot: null,
  sharedKit: null,
  player: { name: 'Wren', hand: 'right', throneHeightM: 0.52, mixes: 'one in-ear mix, click in the left ear' },
  supplierNames: ['Fenland Backline'],
}

export const sampleHire: PackHireInput = {
  id: uuid('6'),
  supplier: { id: uuid('7'), name: 'Fenland Backline', town: 'Lisby', country: 'Denmark' },
  zone: 'Europe/Paris',
  deliveryDate: '2031-10-14',
  deliveryFrom: '10:00',
  deliveryUntil: '12:00',
  collectionDate: '2031-10-15',
  collectionFrom: null,
  collectionUntil: '01:00',
  receiver: 'the drum tech, at the dock',
  conditionOnReturn: 'heads stay on',
  poNumber: 'SR-1031',
  answersDueAt: '2031-10-02T16:00:00.000Z',
}

export const sampleContacts: readonly PackContactInput[] = [
  { of: { kind: 'party' }, name: 'Ida Marsh', duty: 'tour manager', email: 'ida@saltmarsh.example', phone: '' },
  { of: { kind: 'party' }, name: 'Jon Reed', duty: 'drum tech', email: 'jon@saltmarsh.example', phone: '' },
  {
    of: { kind: 'venue', id: uuid('5') },
    name: 'Élodie Žák',
    duty: 'backline',
    email: 'backline@sallenord.example',
    phone: '+33 0 00 00 00 00',
  },
  {
    of: { kind: 'supplier', id: uuid('7') },
    name: 'Hire desk',
    duty: 'delivery',
    email: 'desk@fenland.example',
    phone: '',
  },
]
