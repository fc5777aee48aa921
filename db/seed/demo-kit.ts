import { fivePieceKit, newDrum, newPiece } from '@/lib/contracts/kit-defaults'
import type { DrumSpec, EntryInput } from '@/lib/contracts/kit'
import { demoId } from './demo-id'

/** The two kits of the demo: what stands in them, where it stands on the plot and which channel hears it. */

type Drum = Extract<EntryInput, { kind: 'drum' }>
type Placed = { xM: number; yM: number; rotationDeg?: number; zM?: number }
type KitThing = { key: string; entry: EntryInput; at?: Placed; aimsAt?: string; channel?: number }

/** Noted on the party's own gauge, relative to it; notes on the A4 = 69 count. */
function drum(
  base: Drum,
  say: {
    name?: string
    semitone: number
    gauge: number
    /** As the batter's unless said. */
    resonantGauge?: number
    muffling?: string
    supply?: Drum['supply']
    spec?: Partial<DrumSpec>
  },
): Drum {
  const { diameterIn, depthIn } = { ...base.spec, ...say.spec }
  const resonant = say.spec?.resonant === undefined ? base.spec.resonant : say.spec.resonant
  return {
    ...base,
    name: say.name ?? base.name,
    supply: say.supply ?? base.supply,
    spec: {
      ...base.spec,
      ...say.spec,
      batter: { ...base.spec.batter, gauge: say.gauge },
      resonant: resonant ? { ...resonant, gauge: say.resonantGauge ?? say.gauge } : null,
      note: { semitone: say.semitone, cents: 0 },
      muffling: say.muffling ?? '',
      insteadOf: {
        diameterMinIn: diameterIn,
        diameterMaxIn: base.spec.role === 'kick' ? diameterIn : diameterIn + 1,
        depthMinIn: Math.max(3, depthIn - 2),
        depthMaxIn: depthIn + 2,
      },
    },
  }
}

const [kick, snare] = fivePieceKit() as [Drum, Drum]

function cymbal(name: string, type: 'hats' | 'crash' | 'ride', diameterIn: number): EntryInput {
  return { kind: 'cymbal', name, supply: 'carried', count: 1, remark: '', spec: { type, diameterIn } }
}

function hardware(
  name: string,
  type: Extract<EntryInput, { kind: 'hardware' }>['spec']['type'],
  count: number,
  supply: EntryInput['supply'] = 'rented',
): EntryInput {
  return { kind: 'hardware', name, supply, count, remark: '', spec: { type } }
}

function microphone(name: string, spec: Extract<EntryInput, { kind: 'microphone' }>['spec']): EntryInput {
  return { ...newPiece('microphone'), kind: 'microphone', name, supply: 'venue', spec }
}

const clipOn = { type: 'clip-on', phantom: true, stand: 'clip' } as const
const overhead = { type: 'small-condenser', phantom: true, stand: 'tall' } as const

const fullRig: KitThing[] = [
  {
    key: 'kick',
    entry: drum(kick, { semitone: 33, gauge: 72, muffling: 'one soft pad, touching the batter' }),
    at: { xM: -0.14, yM: 4.6 },
  },
  {
    key: 'snare',
    entry: drum(snare, { semitone: 52, gauge: 86, resonantGauge: 77, supply: 'carried' }),
    at: { xM: 0.14, yM: 5.46 },
  },
  { key: 'tom 12', entry: drum(newDrum('tom'), { semitone: 50, gauge: 76 }), at: { xM: 0.17, yM: 5.06 } },
  {
    key: 'tom 14',
    entry: drum(newDrum('tom', { diameterIn: 14, depthIn: 10, lugs: 8 }), { semitone: 45, gauge: 74 }),
    at: { xM: -0.25, yM: 5.1 },
  },
  { key: 'floor 16', entry: drum(newDrum('floor-tom'), { semitone: 40, gauge: 72 }), at: { xM: -0.6, yM: 5.5 } },
  {
    key: 'spare snare',
    entry: {
      ...drum(newDrum('snare', { depthIn: 5.5 }), {
        name: 'Spare snare 14',
        semitone: 53,
        gauge: 87,
        resonantGauge: 78,
      }),
      remark: 'stays in its case, side stage',
    },
  },
  { key: 'hats', entry: cymbal('Hats 14', 'hats', 14), at: { xM: 0.62, yM: 5.46 } },
  { key: 'crash 17', entry: cymbal('Crash 17', 'crash', 17), at: { xM: 0.64, yM: 4.94 } },
  { key: 'crash 18', entry: cymbal('Crash 18', 'crash', 18) },
  { key: 'ride', entry: cymbal('Ride 21', 'ride', 21), at: { xM: -0.82, yM: 5.02 } },
  { key: 'throne', entry: hardware('Throne', 'throne', 1, 'carried'), at: { xM: 0, yM: 5.88 } },
  { key: 'pedal', entry: hardware('Kick pedal', 'kick-pedal', 1, 'carried') },
  { key: 'booms', entry: hardware('Boom stands', 'boom-stand', 8) },
  { key: 'hat stand', entry: hardware('Hi-hat stand, two leg', 'hat-stand', 1) },
  { key: 'snare stands', entry: hardware('Snare stands', 'snare-stand', 2) },
  { key: 'rug', entry: hardware('Rug, 2 by 1.6 m', 'rug', 1, 'venue') },
  {
    key: 'kick in',
    entry: microphone('Kick in', { type: 'boundary', phantom: true, stand: 'none' }),
    at: { xM: -0.14, yM: 4.58 },
    aimsAt: 'kick',
    channel: 1,
  },
  {
    key: 'kick out',
    entry: microphone('Kick out', { type: 'large-dynamic', phantom: false, stand: 'short' }),
    at: { xM: -0.14, yM: 4.22, zM: 0.35 },
    aimsAt: 'kick',
    channel: 2,
  },
  {
    key: 'snare top',
    entry: microphone('Snare top', { type: 'dynamic', phantom: false, stand: 'short' }),
    at: { xM: 0.36, yM: 5.32, zM: 0.7 },
    aimsAt: 'snare',
    channel: 3,
  },
  {
    key: 'hat mic',
    entry: microphone('Hats', { type: 'small-condenser', phantom: true, stand: 'short' }),
    at: { xM: 0.86, yM: 5.6, zM: 1.1 },
    aimsAt: 'hats',
    channel: 4,
  },
  {
    key: 'tom 12 mic',
    entry: microphone('Clip-on, tom 12', clipOn),
    at: { xM: 0.26, yM: 4.88, zM: 0.85 },
    aimsAt: 'tom 12',
    channel: 5,
  },
  {
    key: 'tom 14 mic',
    entry: microphone('Clip-on, tom 14', clipOn),
    at: { xM: -0.36, yM: 4.88, zM: 0.85 },
    aimsAt: 'tom 14',
    channel: 6,
  },
  { key: 'floor mic', entry: microphone('Clip-on, floor 16', clipOn) },
  {
    key: 'overhead right',
    entry: microphone('Overhead, stage right', overhead),
    at: { xM: -0.95, yM: 5.5, zM: 1.9 },
    aimsAt: 'snare',
    channel: 8,
  },
  {
    key: 'overhead left',
    entry: microphone('Overhead, stage left', overhead),
    at: { xM: 1.0, yM: 5.2, zM: 1.9 },
    aimsAt: 'snare',
    channel: 9,
  },
]

const flyRig: KitThing[] = [
  {
    key: 'kick',
    entry: drum(newDrum('kick', { diameterIn: 20, depthIn: 14 }), { semitone: 36, gauge: 60, supply: 'venue' }),
    at: { xM: -0.12, yM: 4.62 },
  },
  { key: 'snare', entry: drum(snare, { semitone: 52, gauge: 88, supply: 'carried' }), at: { xM: 0.14, yM: 5.46 } },
  { key: 'tom 12', entry: drum(newDrum('tom'), { semitone: 50, gauge: 76 }), at: { xM: 0.1, yM: 5.04 } },
  {
    key: 'floor 14',
    entry: drum(newDrum('floor-tom', { diameterIn: 14, depthIn: 14, lugs: 8 }), { semitone: 45, gauge: 74 }),
    at: { xM: -0.55, yM: 5.48 },
  },
  { key: 'hats', entry: cymbal('Hats 14', 'hats', 14), at: { xM: 0.62, yM: 5.46 } },
  { key: 'ride', entry: cymbal('Ride 21', 'ride', 21), at: { xM: -0.6, yM: 4.98 } },
  { key: 'throne', entry: hardware('Throne', 'throne', 1, 'venue'), at: { xM: 0, yM: 5.88 } },
  { key: 'booms', entry: hardware('Boom stands', 'boom-stand', 4) },
  { key: 'hat stand', entry: hardware('Hi-hat stand, two leg', 'hat-stand', 1) },
  {
    key: 'kick out',
    entry: microphone('Kick out', { type: 'large-dynamic', phantom: false, stand: 'short' }),
    at: { xM: -0.12, yM: 4.26, zM: 0.35 },
    aimsAt: 'kick',
    channel: 1,
  },
  {
    key: 'overhead',
    entry: microphone('Overhead', overhead),
    at: { xM: 0, yM: 6.1, zM: 2 },
    aimsAt: 'snare',
    channel: 2,
  },
]

export const demoRigs = [
  { key: 'full rig', things: fullRig },
  { key: 'fly rig', things: flyRig },
] as const
export type DemoRig = (typeof demoRigs)[number]

export const demoRigId = (rig: string) => demoId('rig', rig)
export const demoEntryId = (rig: string, key: string) => demoId('entry', rig, key)
export const demoPieceId = (rig: string, key: string) => demoId('piece', rig, key)
