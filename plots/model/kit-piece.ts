/**
 * What the plot needs to know of a kit entry to draw it. The plot never stores any of this: a piece holds the entry's
 * id and the drawing asks the kit, so a changed drum changes on every plot. Sizes are nominal inches.
 */
export type KitPiece =
  | {
      readonly kind: 'drum'
      readonly id: string
      readonly name: string
      readonly role: 'kick' | 'snare' | 'tom' | 'floor-tom'
      readonly diameterIn: number
      readonly depthIn: number
      /** Lugs per head. */
      readonly lugs: number
      /** The target note as the reader names it ("D3"), or null before one is set. */
      readonly noteLabel: string | null
      readonly noteHz: number | null
    }
  | {
      readonly kind: 'cymbal'
      readonly id: string
      readonly name: string
      readonly type: 'hats' | 'crash' | 'ride' | 'splash' | 'china' | 'other'
      readonly diameterIn: number
      readonly count: number
    }
  | {
      readonly kind: 'hardware'
      readonly id: string
      readonly name: string
      readonly type: string
      readonly count: number
    }
  | {
      readonly kind: 'microphone'
      readonly id: string
      readonly name: string
      readonly type: string
      readonly phantom: boolean
      readonly stand: string
      readonly count: number
    }

/** The kit entries by id. An entry taken out of the kit is not in it; its pieces draw as ghosts. */
export type KitById = ReadonlyMap<string, KitPiece>
