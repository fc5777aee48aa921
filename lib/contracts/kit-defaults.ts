import { inchFractions } from '@/lib/staging/size'
import { WARBLE_LIMIT_HZ } from '@/lib/tuning/warble-limit'
import type { DrumRole, DrumSpec, EntryInput, EntryKind, Head } from './kit'

/** What a new entry starts from, so that adding one takes seconds: common sizes of each role (common practice). */

const onePly = (film: Head['film'], plyMil = 10): Head => ({
  ...{ plyMils: [plyMil], film, coatingGPerM2: 0, damping: 'none', gauge: null, range: null },
})

const roleDefaults: Record<
  DrumRole,
  Pick<DrumSpec, 'diameterIn' | 'depthIn' | 'lugs' | 'batter' | 'resonant' | 'ported'>
> = {
  kick: {
    ...{ diameterIn: 22, depthIn: 16, lugs: 8, ported: true },
    batter: { ...onePly('clear'), damping: 'ring' },
    resonant: { ...onePly('other'), damping: 'ring' },
  },
  snare: {
    ...{ diameterIn: 14, depthIn: 6.5, lugs: 10, ported: false },
    batter: onePly('coated'),
    resonant: onePly('clear', 3),
  },
  tom: {
    ...{ diameterIn: 12, depthIn: 8, lugs: 6, ported: false },
    batter: onePly('coated'),
    resonant: onePly('clear'),
  },
  'floor-tom': {
    ...{ diameterIn: 16, depthIn: 14, lugs: 8, ported: false },
    ...{ batter: onePly('coated'), resonant: onePly('clear') },
  },
}

const roleNames: Record<DrumRole, string> = { kick: 'Kick', snare: 'Snare', tom: 'Tom', 'floor-tom': 'Floor' }

/** The name that a drum goes by until it is given another: "Tom 12". */
export function usualDrumName(role: DrumRole, diameterIn: number): string {
  return `${roleNames[role]} ${inchFractions(diameterIn)}`
}

const common = { supply: 'rented' as const, count: 1, remark: '' }

export function newDrum(role: DrumRole, size: Partial<Pick<DrumSpec, 'diameterIn' | 'depthIn' | 'lugs'>> = {}) {
  // A copy: two drums must not share one head.
  const usual = { ...structuredClone(roleDefaults[role]), ...size }
  return {
    ...{ kind: 'drum' as const, name: usualDrumName(role, usual.diameterIn), ...common, count: 1 as const },
    spec: {
      ...{ role, ...usual, shell: '', note: null, noteLocked: false, headRelationCents: 0, toleranceCents: 10 },
      ...{ measuredTapRatio: null, warbleLimitHz: WARBLE_LIMIT_HZ, muffling: '', insteadOf: null },
    },
  } satisfies EntryInput
}

/** A kick, a snare, two toms and a floor tom. */
export function fivePieceKit(): EntryInput[] {
  return [
    newDrum('kick'),
    newDrum('snare'),
    newDrum('tom', { diameterIn: 10, depthIn: 7 }),
    newDrum('tom'),
    newDrum('floor-tom'),
  ]
}

export function newPiece(kind: Exclude<EntryKind, 'drum'>): EntryInput {
  switch (kind) {
    case 'cymbal':
      return { kind, name: 'Crash 18', ...common, spec: { type: 'crash', diameterIn: 18 } }
    case 'hardware':
      return { kind, name: 'Boom stand', ...common, spec: { type: 'boom-stand' } }
    case 'microphone':
      return { kind, name: 'Clip-on', ...common, spec: { type: 'clip-on', phantom: true, stand: 'clip' } }
  }
}
