import { z } from 'zod'
import { readingLimits } from '@/lib/tuning/reading-limits'
import { idSchema, nameSchema, remarkSchema } from './common'
import { headSides } from './kit'

export const readingMethods = ['gauge', 'tap-typed', 'tap-heard'] as const
export type ReadingMethod = (typeof readingMethods)[number]
export const readingUnits = ['gauge', 'Hz', 'cents'] as const
export type ReadingUnit = (typeof readingUnits)[number]

/** Readings that one request takes. */
export const READING_BATCH = 200

const byNameSchema = z.string().trim().max(120, 'at most 120 characters')

/** One reading as a phone sends it. `id`, `deviceId` and `deviceSequence` make a repeated request the same request. */
export const readingInputSchema = z
  .object({
    id: idSchema,
    entryId: z.uuid('choose a drum of this sheet'),
    side: z.enum(headSides, 'batter or resonant'),
    lug: z
      .number('write a lug number')
      .int('a whole lug number')
      .min(1, 'lugs count from 1')
      .max(12, 'at most 12 lugs'),
    deviceId: idSchema,
    deviceSequence: z.number().int('a whole number').min(1, 'at least 1').max(2_147_483_647, 'at most 2147483647'),
    /** The device's clock. */
    deviceAt: z.iso.datetime('write an instant such as 2031-10-14T17:05:00Z'),
    method: z.enum(['gauge', 'tap-typed'], 'gauge or tap-typed'),
    value: z.number('write a number'),
    unit: z.enum(readingUnits, 'Hz, cents or gauge'),
    /** The tap pitch that was aimed at, Hz: cents mean nothing without it. */
    targetHz: z.number().min(20, 'at least 20 Hz').max(2000, 'at most 2000 Hz').nullable(),
    otherHead: z.enum(['damped', 'open'], 'damped or open'),
    onStand: z.boolean('true or false'),
    gauge: z.string().trim().max(80, 'at most 80 characters'),
    temperatureC: z.number().min(-30, 'at least -30 °C').max(60, 'at most 60 °C').nullable(),
    pass: z.number().int('a whole number').min(1, 'passes count from 1').max(99, 'at most 99 passes'),
    /** The reading that this one corrects. */
    strikes: idSchema.nullable(),
    /** Who holds the phone, if they said so; a signed-in person's own name stands instead. */
    byName: byNameSchema,
  })
  .superRefine((reading, context) => {
    const fault = (path: string, message: string) => context.addIssue({ code: 'custom', path: [path], message })
    const { min, max, unit } = readingLimits[reading.unit]
    if (reading.value < min || reading.value > max) fault('value', `from ${min} to ${max} ${unit}`)
    if ((reading.method === 'gauge') !== (reading.unit === 'gauge')) {
      fault('unit', reading.method === 'gauge' ? 'a gauge reads in its own units' : 'a tap is in Hz or cents')
    }
    if (reading.unit === 'cents' && reading.targetHz === null)
      fault('targetHz', 'cents need the pitch they are counted from')
    if (reading.strikes === reading.id) fault('strikes', 'a reading cannot strike itself')
  })
export type ReadingInput = z.infer<typeof readingInputSchema>

export const addReadingsSchema = z.object({
  readings: z
    .array(readingInputSchema)
    .min(1, 'at least one reading')
    .max(READING_BATCH, `at most ${READING_BATCH} readings at once`)
    .superRefine((readings, context) => {
      const seen = { id: new Set<string>(), number: new Set<string>(), strikes: new Set<string>() }
      const once = (kind: keyof typeof seen, key: string | null, index: number, field: string) => {
        if (key === null) return
        if (seen[kind].has(key))
          context.addIssue({ code: 'custom', path: [index, field], message: 'stands twice in this request' })
        seen[kind].add(key)
      }
      readings.forEach((reading, index) => {
        once('id', reading.id, index, 'id')
        once('number', `${reading.deviceId} ${reading.deviceSequence}`, index, 'deviceSequence')
        once('strikes', reading.strikes, index, 'strikes')
      })
    }),
})

/** A drum handed over as tuned, or taken back. The same id again is the same sign-off. */
export const signOffSchema = z.object({
  id: idSchema,
  entryId: z.uuid('choose a drum of this sheet'),
  decision: z.enum(['signed', 'taken-back'], 'signed or taken-back'),
  byName: byNameSchema,
  remark: remarkSchema,
})
export type SignOffInput = z.infer<typeof signOffSchema>

/** A reading as it is kept. */
export const benchReadingSchema = z.object({
  id: idSchema,
  entryId: idSchema,
  side: z.enum(headSides),
  lug: z.number().int(),
  method: z.enum(readingMethods),
  value: z.number(),
  unit: z.enum(readingUnits),
  targetHz: z.number().nullable(),
  otherHead: z.enum(['damped', 'open']),
  onStand: z.boolean(),
  gauge: z.string(),
  temperatureC: z.number().nullable(),
  pass: z.number().int(),
  strikes: idSchema.nullable(),
  deviceId: idSchema,
  deviceSequence: z.number().int(),
  deviceAt: z.string(),
  /** Arrival by the server's clock; null while it still waits on the phone. */
  serverAt: z.string().nullable(),
  byName: z.string(),
  /** Through the bench link, or signed in. */
  via: z.enum(['link', 'person']),
})
export type BenchReading = z.infer<typeof benchReadingSchema>

export const benchSignOffSchema = z.object({
  id: idSchema,
  entryId: idSchema,
  decision: z.enum(['signed', 'taken-back']),
  byName: z.string(),
  remark: z.string(),
  /** Null while it still waits on the phone. */
  at: z.string().nullable(),
})
export type BenchSignOff = z.infer<typeof benchSignOffSchema>

const figureSchema = z.object({ hz: z.number(), name: z.string() })
export const benchHeadSchema = z.object({
  side: z.enum(headSides),
  words: z.string(),
  note: figureSchema.extend({ cents: z.number() }).nullable(),
  /** The tap to aim at beside a lug, an estimate with its bounds. */
  tap: figureSchema.extend({ lowHz: z.number(), highHz: z.number() }).nullable(),
  rodPullN: z.number().nullable(),
  /** What a gauge should read to start from: foretold by the tour's calibrated one, or as noted, relative to that gauge. */
  gauge: z
    .discriminatedUnion('kind', [
      z.object({
        kind: z.literal('foretold'),
        gauge: z.string(),
        reading: z.string(),
        bounds: z.string().nullable(),
        outside: z.string().nullable(),
      }),
      z.object({ kind: z.literal('noted'), reading: z.string() }),
    ])
    .nullable(),
  cautions: z.array(z.enum(['slack', 'choked', 'film-stress'])),
  /** Why there is no figure. */
  without: z.string().nullable(),
})
export type BenchHead = z.infer<typeof benchHeadSchema>

export const benchDrumSchema = z.object({
  entryId: idSchema,
  name: z.string(),
  role: z.enum(['kick', 'snare', 'tom', 'floor-tom']),
  sizeWords: z.string(),
  lugCount: z.number().int(),
  /** Clockwise from the badge as seen facing the batter head, radians. */
  lugAnglesRad: z.array(z.number()),
  toleranceCents: z.number(),
  /** Warble that is let pass, beats a second. */
  warbleLimitHz: z.number(),
  muffling: z.string(),
  relationWords: z.string().nullable(),
  /** What was settled to come instead, and the size that had been asked. */
  instead: z.object({ words: z.string(), askedWords: z.string() }).nullable(),
  /** Settled not to come at all. */
  missing: z.boolean(),
  heads: z.array(benchHeadSchema),
})
export type BenchDrum = z.infer<typeof benchDrumSchema>

/** Everything on the bench of one show. */
export const benchSchema = z.object({
  show: z.object({
    id: idSchema,
    title: z.string(),
    town: z.string(),
    date: z.string(),
    zone: z.string().nullable(),
    /** Whose kit it is when it is shared and must stay as it is. */
    mustNotRetune: z.string().nullable(),
  }),
  party: z.string(),
  rig: z.string(),
  /** Which revision the sheet is of; null while none was issued. */
  sheet: z
    .object({
      number: z.number().int(),
      /** Sent to this show, or else the newest that was issued. */
      from: z.enum(['sent', 'issued']),
      newestNumber: z.number().int(),
    })
    .nullable(),
  drums: z.array(benchDrumSchema),
  readings: z.array(benchReadingSchema),
  signOffs: z.array(benchSignOffSchema),
})
export type Bench = z.infer<typeof benchSchema>

export const addedReadingsSchema = z.object({ readings: z.array(benchReadingSchema) })

/** A bench link as the list shows it: never its secret. */
export const benchLinkSchema = z.object({
  grantId: idSchema,
  name: nameSchema,
  prints: z.number().int(),
  uses: z.number().int(),
  madeAt: z.string(),
  lastUsedAt: z.string().nullable(),
  expiresAt: z.string(),
  state: z.enum(['works', 'expired', 'withdrawn']),
})
export type BenchLink = z.infer<typeof benchLinkSchema>
export const benchLinksSchema = z.object({ links: z.array(benchLinkSchema) })
