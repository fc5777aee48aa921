import { z } from 'zod'
import { TAP_RATIO_LIMITS } from '@/lib/acoustics/tap-ratio-limits'
import { WARBLE_LIMIT_HZ, warbleLimits } from '@/lib/tuning/warble-limit'
import { idSchema, nameSchema, remarkSchema, versionSchema } from './common'

/**
 * The kit of a rig: drums, cymbals, hardware and microphones. A kit entry is the one place where a thing is described;
 * the plot, the lines, the sheets and the readings all refer to it by id.
 * Drum and cymbal sizes stay nominal inches, as the trade writes them.
 */

export const entryKinds = ['drum', 'cymbal', 'hardware', 'microphone'] as const
export type EntryKind = (typeof entryKinds)[number]

export const drumRoles = ['kick', 'snare', 'tom', 'floor-tom'] as const
export type DrumRole = (typeof drumRoles)[number]
export const drumRoleWords: Record<DrumRole, string> = {
  kick: 'kick',
  snare: 'snare',
  tom: 'tom',
  'floor-tom': 'floor tom',
}

export const supplies = ['carried', 'rented', 'venue'] as const
export type Supply = (typeof supplies)[number]
export const supplyWords: Record<Supply, string> = { carried: 'carried', rented: 'rented', venue: "the venue's" }

export const lugCounts = [4, 5, 6, 8, 10, 12] as const

export const headSides = ['batter', 'resonant'] as const
export type HeadSide = (typeof headSides)[number]

const inches = (low: number, high: number) =>
  z
    .number('write a size in inches')
    .min(low, `at least ${low} in`)
    .max(high, `at most ${high} in`)
    .refine((value) => Number.isInteger(value * 4), 'whole or quarter inches')

/** Film tensions between which a head is playable, N/m; kept per head once the party has learnt them. */
const headRangeSchema = z
  .object({
    slackNPerM: z.number('write a tension in N/m').min(50, 'at least 50 N/m').max(20_000, 'at most 20 000 N/m'),
    chokedNPerM: z.number('write a tension in N/m').min(50, 'at least 50 N/m').max(20_000, 'at most 20 000 N/m'),
  })
  .refine((range) => range.slackNPerM < range.chokedNPerM, {
    path: ['chokedNPerM'],
    message: 'the choked edge lies over the slack edge',
  })

export const headSchema = z.object({
  /** One film thickness per ply, in mil (1 mil = 25.4 µm). */
  plyMils: z
    .array(z.number().min(2, 'at least 2 mil').max(20, 'at most 20 mil'))
    .min(1, 'at least one ply')
    .max(3, 'at most three plies'),
  film: z.enum(['clear', 'coated', 'other'], 'choose a film'),
  /** Mass the coating adds, g/m². */
  coatingGPerM2: z.number('write a mass in g/m²').min(0, 'at least 0 g/m²').max(300, 'at most 300 g/m²'),
  damping: z.enum(['none', 'ring', 'dot', 'gel', 'felt'], 'choose a damping'),
  /** The drum tech's own noted gauge reading, relative to that gauge. */
  gauge: z.number().min(0, 'at least 0').max(120, 'at most 120').nullable(),
  /** The head's own playable range; null: the default of its role. Heads written before there was one have none. */
  range: headRangeSchema.nullable().default(null),
})
export type Head = z.infer<typeof headSchema>

/** C0 to C7: wider than any drum, narrow enough to catch a slip. */
const drumNoteSchema = z.object({
  semitone: z.number().int('a whole semitone').min(12, 'at least C0, 16.4 Hz').max(96, 'at most C7, 2093 Hz'),
  cents: z.number().min(-50, 'at least -50 cents').max(50, 'at most 50 cents'),
})

const headRelationSchema = z.number().min(-1200, 'at least -1200 cents').max(1200, 'at most 1200 cents')

export const drumSpecSchema = z.object({
  role: z.enum(drumRoles, 'choose what the drum is'),
  diameterIn: inches(6, 28),
  depthIn: inches(3, 24),
  lugs: z.union(
    lugCounts.map((count) => z.literal(count)),
    'choose 4, 5, 6, 8, 10 or 12 lugs a head',
  ),
  shell: z.string().trim().max(80, 'at most 80 characters'),
  ported: z.boolean(),
  batter: headSchema,
  resonant: headSchema.nullable(),
  /** Target note: semitone on the A4 = 69 count, with cents beside it. Null until a note is set. */
  note: drumNoteSchema.nullable(),
  /** A locked note is left alone when a template plans the others. */
  noteLocked: z.boolean(),
  /** How far the resonant head's tap stands above the batter's, each with the other head damped, cents. */
  headRelationCents: headRelationSchema,
  /** The batter's tap over the drum's note, measured on this drum; null: the model's. Replaces it where it is there. */
  measuredTapRatio: z
    .number()
    .min(TAP_RATIO_LIMITS.min, `at least ${TAP_RATIO_LIMITS.min}`)
    .max(TAP_RATIO_LIMITS.max, `at most ${TAP_RATIO_LIMITS.max}`)
    .nullable()
    .default(null),
  /** How far a lug may stand from the target and still be even, cents. */
  toleranceCents: z.number().min(1, 'at least 1 cent').max(100, 'at most 100 cents'),
  /** Warble that is let pass, beats a second. */
  warbleLimitHz: z
    .number('write beats a second')
    .min(warbleLimits.min, `at least ${warbleLimits.min} a second`)
    .max(warbleLimits.max, `at most ${warbleLimits.max} a second`)
    .default(WARBLE_LIMIT_HZ),
  muffling: z.string().trim().max(200, 'at most 200 characters'),
  /** What may come instead without asking again. */
  insteadOf: z
    .object({
      diameterMinIn: inches(6, 28),
      diameterMaxIn: inches(6, 28),
      depthMinIn: inches(3, 24),
      depthMaxIn: inches(3, 24),
    })
    .refine((range) => range.diameterMinIn <= range.diameterMaxIn, {
      path: ['diameterMaxIn'],
      message: 'the widest is at least the narrowest',
    })
    .refine((range) => range.depthMinIn <= range.depthMaxIn, {
      path: ['depthMaxIn'],
      message: 'the deepest is at least the shallowest',
    })
    .nullable(),
})
export type DrumSpec = z.infer<typeof drumSpecSchema>

export const cymbalSpecSchema = z.object({
  type: z.enum(['hats', 'crash', 'ride', 'splash', 'china', 'other'], 'choose a cymbal'),
  diameterIn: inches(6, 26),
})
export type CymbalSpec = z.infer<typeof cymbalSpecSchema>

export const hardwareSpecSchema = z.object({
  type: z.enum(
    ['throne', 'boom-stand', 'straight-stand', 'hat-stand', 'snare-stand', 'tom-stand', 'kick-pedal', 'rug', 'other'],
    'choose a kind of hardware',
  ),
})
export type HardwareSpec = z.infer<typeof hardwareSpecSchema>

export const microphoneSpecSchema = z.object({
  /** The kind only, never a maker's name. */
  type: z.enum(
    ['large-dynamic', 'dynamic', 'clip-on', 'small-condenser', 'large-condenser', 'boundary', 'other'],
    'choose a kind of microphone',
  ),
  phantom: z.boolean(),
  stand: z.enum(['none', 'clip', 'short', 'tall', 'straight'], 'choose a stand'),
})
export type MicrophoneSpec = z.infer<typeof microphoneSpecSchema>

const common = {
  name: nameSchema,
  supply: z.enum(supplies, 'choose who brings it'),
  count: z.number().int('whole pieces').min(1, 'at least 1').max(99, 'at most 99'),
  remark: remarkSchema,
}

/** What a form holds and a route takes for one kit entry. */
export const entryInputSchema = z.discriminatedUnion('kind', [
  z.object({
    ...common,
    kind: z.literal('drum'),
    count: z.literal(1, 'each drum is its own entry'),
    spec: drumSpecSchema,
  }),
  z.object({ ...common, kind: z.literal('cymbal'), spec: cymbalSpecSchema }),
  z.object({ ...common, kind: z.literal('hardware'), spec: hardwareSpecSchema }),
  z.object({ ...common, kind: z.literal('microphone'), spec: microphoneSpecSchema }),
])
export type EntryInput = z.infer<typeof entryInputSchema>

export const createEntrySchema = z.object({ id: idSchema.optional(), entry: entryInputSchema })
export const updateEntrySchema = z.object({ version: versionSchema, entry: entryInputSchema })
/** Taking an entry out of the kit, and putting it back. */
export const removeEntrySchema = z.object({ version: versionSchema })

/** What a kit holds at most: beyond it something has gone wrong. */
export const kitLimit = 200

/** Several new entries in one step, all or none. */
export const addEntriesSchema = z.object({
  entries: z
    .array(z.object({ id: idSchema, entry: entryInputSchema }))
    .min(1, 'at least one entry')
    .max(60, 'at most 60 entries at once')
    .refine((entries) => new Set(entries.map(({ id }) => id)).size === entries.length, 'each id once'),
})

/** Every entry of the kit, each once, in the order wanted. */
export const orderEntriesSchema = z.object({
  entryIds: z
    .array(idSchema)
    .min(1, 'at least one entry')
    .max(kitLimit, `at most ${kitLimit} entries`)
    .refine((ids) => new Set(ids).size === ids.length, 'each entry once'),
})

/** Copies another rig's kit into this one. The same copyId again is the same request. */
export const copyKitSchema = z.object({ copyId: idSchema, fromRigId: z.uuid('choose a rig to copy from') })

export const kitQuerySchema = z.object({
  /** `true` reads entries that were taken out, too. */
  removed: z.enum(['true', 'false'], 'true or false').default('false'),
})

const row = { id: idSchema, rigId: idSchema, position: z.number().int(), version: versionSchema, removed: z.boolean() }
/** A kit entry as the routes answer it. */
export const entrySchema = z.intersection(z.object(row), entryInputSchema)
export type Entry = z.infer<typeof entrySchema>
export type DrumEntry = Extract<Entry, { kind: 'drum' }>

export const kitSchema = z.object({ rigId: idSchema, entries: z.array(entrySchema) })
export type Kit = z.infer<typeof kitSchema>

/** Sets many notes in one step, each against the version that was seen. */
export const setNotesSchema = z.object({
  notes: z
    .array(
      z.object({
        entryId: idSchema,
        version: versionSchema,
        note: drumNoteSchema.nullable(),
        noteLocked: z.boolean(),
        /** Left as it is unless given. */
        headRelationCents: headRelationSchema.optional(),
      }),
    )
    .min(1, 'at least one note')
    .max(60, 'at most 60 notes at once')
    .refine((notes) => new Set(notes.map(({ entryId }) => entryId)).size === notes.length, 'each drum once'),
})
export type SetNotes = z.infer<typeof setNotesSchema>
