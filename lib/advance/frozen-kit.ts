/**
 * A kit entry as a revision keeps it: whole, with its id. The shapes are those of a live kit entry, stated here because the
 * rules of the advance must be able to read a revision that was frozen long ago. Sizes are nominal inches.
 */
export interface FrozenHead {
  /** One film thickness per ply, mil. */
  readonly plyMils: readonly number[]
  readonly film: 'clear' | 'coated' | 'other'
  readonly coatingGPerM2: number
  readonly damping: 'none' | 'ring' | 'dot' | 'gel' | 'felt'
  /** The drum tech's own noted reading, relative to that gauge. */
  readonly gauge: number | null
  /** The head's own playable range, N/m; absent or null: the default of its role. */
  readonly range?: { readonly slackNPerM: number; readonly chokedNPerM: number } | null
}

export interface SizeRange {
  readonly diameterMinIn: number
  readonly diameterMaxIn: number
  readonly depthMinIn: number
  readonly depthMaxIn: number
}

export interface FrozenDrumSpec {
  readonly role: 'kick' | 'snare' | 'tom' | 'floor-tom'
  readonly diameterIn: number
  readonly depthIn: number
  /** Lugs per head. */
  readonly lugs: number
  readonly shell: string
  readonly ported: boolean
  readonly batter: FrozenHead
  readonly resonant: FrozenHead | null
  readonly note: { readonly semitone: number; readonly cents: number } | null
  readonly noteLocked: boolean
  /** Tap of the resonant over that of the batter head, each with the other damped. */
  readonly headRelationCents: number
  /** Batter tap over the drum's note as measured on this drum; absent or null: the model's. */
  readonly measuredTapRatio?: number | null
  readonly toleranceCents: number
  /** Warble that is let pass, beats a second; absent: the usual limit. */
  readonly warbleLimitHz?: number
  readonly muffling: string
  readonly insteadOf: SizeRange | null
}

export interface FrozenCymbalSpec {
  readonly type: 'hats' | 'crash' | 'ride' | 'splash' | 'china' | 'other'
  readonly diameterIn: number
}

export interface FrozenHardwareSpec {
  readonly type: string
}

export interface FrozenMicrophoneSpec {
  readonly type: string
  readonly phantom: boolean
  readonly stand: string
}

export interface FrozenEntryCommon {
  readonly id: string
  readonly position: number
  readonly name: string
  readonly supply: 'carried' | 'rented' | 'venue'
  readonly count: number
  readonly remark: string
}

export type FrozenEntry = FrozenEntryCommon &
  (
    | { readonly kind: 'drum'; readonly spec: FrozenDrumSpec }
    | { readonly kind: 'cymbal'; readonly spec: FrozenCymbalSpec }
    | { readonly kind: 'hardware'; readonly spec: FrozenHardwareSpec }
    | { readonly kind: 'microphone'; readonly spec: FrozenMicrophoneSpec }
  )
export type FrozenDrum = Extract<FrozenEntry, { kind: 'drum' }>

/** Entries in the one order in which they are listed, numbered and printed. */
export function entriesInOrder<Entry extends Pick<FrozenEntryCommon, 'id' | 'position'>>(
  entries: readonly Entry[],
): Entry[] {
  return [...entries].sort((a, b) => a.position - b.position || (a.id < b.id ? -1 : a.id > b.id ? 1 : 0))
}
