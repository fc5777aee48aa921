import { z } from 'zod'
import { minorDigits, parseMoney, typedMoney } from '@/lib/staging/money'
import { currencySchema, dateSchema, idSchema, versionSchema, wallTimeSchema, zoneSchema } from './common'
import { wallSchema } from './tour'

export const rateBases = ['day', 'show', 'week'] as const
export type RateBasis = (typeof rateBases)[number]

const short = z.string().trim().max(200, 'at most 200 characters')

const fields = z.object({
  supplierId: z.uuid('choose a supplier from the directory'),
  name: z.string().trim().max(120, 'at most 120 characters'),
  showIds: z
    .array(idSchema)
    .min(1, 'choose at least one show')
    .max(100, 'at most 100 shows')
    .refine((ids) => new Set(ids).size === ids.length, 'each show once'),
  /** The zone that the windows are told in; null takes the supplier's. */
  zone: zoneSchema.nullable(),
  deliveryDate: dateSchema.nullable(),
  deliveryFrom: wallTimeSchema.nullable(),
  deliveryUntil: wallTimeSchema.nullable(),
  collectionDate: dateSchema.nullable(),
  collectionFrom: wallTimeSchema.nullable(),
  collectionUntil: wallTimeSchema.nullable(),
  receiver: short,
  conditionOnReturn: short,
  poNumber: z.string().trim().max(60, 'at most 60 characters'),
  rateBasis: z.enum(rateBases, 'choose day, show or week'),
  currency: currencySchema.nullable(),
  /** The amount as typed ("1 250,50"); empty while it is not known. Stored in minor units of the currency. */
  transport: z.string().trim().max(24, 'at most 24 characters'),
  taxPercent: z
    .number('write a percentage such as 25')
    .min(0, 'from 0 %')
    .max(100, 'up to 100 %')
    .refine((percent) => Math.abs(percent * 100 - Math.round(percent * 100)) < 1e-6, 'at most two decimals')
    .nullable(),
  validUntil: dateSchema.nullable(),
  answersDue: wallSchema.nullable(),
  confirmed: z.boolean(),
})

export const hireInputSchema = fields.superRefine((hire, context) => {
  const say = (path: keyof typeof hire, message: string) => context.addIssue({ code: 'custom', path: [path], message })
  const windows = [
    ['deliveryFrom', 'deliveryUntil', 'deliveryDate'],
    ['collectionFrom', 'collectionUntil', 'collectionDate'],
  ] as const
  for (const [from, until, date] of windows) {
    if ((hire[from] || hire[until]) && !hire[date]) say(date, 'choose the day of this window')
    if (hire[from] && hire[until] && hire[until] <= hire[from]) say(until, `after ${hire[from]}`)
  }
  if (hire.deliveryDate && hire.collectionDate && hire.collectionDate < hire.deliveryDate) {
    say('collectionDate', 'on or after the delivery')
  }
  if (hire.transport === '') return
  if (!hire.currency) return say('currency', 'choose the currency of the transport')
  // A currency that is none is told by its own field.
  if (!currencySchema.safeParse(hire.currency).success) return
  if (parseMoney(hire.transport, hire.currency) === null) {
    const digits = minorDigits(hire.currency)
    say(
      'transport',
      digits === 0
        ? 'write an amount such as 1250'
        : `write an amount such as ${typedMoney(1250 * 10 ** digits, hire.currency)}`,
    )
  }
})
export type HireInput = z.infer<typeof hireInputSchema>
export const createHireSchema = z.object({ id: idSchema.optional(), hire: hireInputSchema })
export const updateHireSchema = z.object({ version: versionSchema, hire: hireInputSchema })

export const hireSchema = z.object({
  id: idSchema,
  tourId: idSchema,
  supplierId: idSchema,
  supplierName: z.string(),
  name: z.string(),
  showIds: z.array(idSchema),
  zone: z.string().nullable(),
  deliveryDate: z.string().nullable(),
  deliveryFrom: z.string().nullable(),
  deliveryUntil: z.string().nullable(),
  collectionDate: z.string().nullable(),
  collectionFrom: z.string().nullable(),
  collectionUntil: z.string().nullable(),
  receiver: z.string(),
  conditionOnReturn: z.string(),
  poNumber: z.string(),
  rateBasis: z.enum(rateBases),
  currency: z.string().nullable(),
  transportMinor: z.number().int().nullable(),
  taxBasisPoints: z.number().int().nullable(),
  validUntil: z.string().nullable(),
  answersDueAt: z.string().nullable(),
  answersDue: z.object({ date: z.string(), time: z.string() }).nullable(),
  confirmedAt: z.string().nullable(),
  version: versionSchema,
})
export type Hire = z.infer<typeof hireSchema>

/** A hire as a form holds it and a route takes it. */
export function hireInputOf(hire: Hire): HireInput {
  const { id: _id, tourId: _tour, supplierName: _name, version: _version, answersDueAt: _at, ...rest } = hire
  const { transportMinor, taxBasisPoints, confirmedAt, ...same } = rest
  return {
    ...same,
    transport: transportMinor === null || !hire.currency ? '' : typedMoney(transportMinor, hire.currency),
    taxPercent: taxBasisPoints === null ? null : taxBasisPoints / 100,
    confirmed: confirmedAt !== null,
  }
}
