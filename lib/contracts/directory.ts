import { z } from 'zod'
import { lengthBound } from '@/lib/staging/length'
import { currencySchema, emailSchema, idSchema, nameSchema, remarkSchema, versionSchema, zoneSchema } from './common'
import { listQuerySchema } from './list'

export const stageAccesses = ['dock', 'stairs', 'lift', 'door', 'push'] as const
export type StageAccess = (typeof stageAccesses)[number]
export const stageAccessWords: Record<StageAccess, string> = {
  dock: 'loading dock',
  stairs: 'stairs',
  lift: 'lift',
  door: 'narrow door',
  push: 'long push',
}

export const contactDuties = ['backline', 'production', 'sound', 'delivery', 'accounts'] as const
export type ContactDuty = (typeof contactDuties)[number]

const placeName = z.string().trim().max(80, 'at most 80 characters')

export const venueInputSchema = z.object({
  name: nameSchema,
  town: placeName,
  country: placeName,
  /** Null while it is not known yet. */
  zone: zoneSchema.nullable(),
  remark: remarkSchema,
})
export type VenueInput = z.infer<typeof venueInputSchema>
export const createVenueSchema = z.object({ id: idSchema.optional(), venue: venueInputSchema })
export const updateVenueSchema = z.object({ version: versionSchema, venue: venueInputSchema })
export const venueSchema = venueInputSchema.extend({ id: idSchema, version: versionSchema })
export type Venue = z.infer<typeof venueSchema>

const metres = (low: number, high: number) =>
  z
    .number('write a length such as 8 m, 26 ft or 7\'10"')
    .min(low, `at least ${lengthBound(low)}`)
    .max(high, `at most ${lengthBound(high)}`)

export const stageInputSchema = z.object({
  name: nameSchema,
  widthM: metres(1, 100),
  depthM: metres(1, 100),
  /** Of the deck over the floor. */
  heightM: metres(0, 10),
  access: z
    .array(z.enum(stageAccesses, 'choose from dock, stairs, lift, door, push'))
    .refine((set) => new Set(set).size === set.length, 'each way once'),
  volts: z.number('write volts, such as 230').min(90, 'at least 90 V').max(500, 'at most 500 V').nullable(),
  mainsHz: z.union([z.literal(50), z.literal(60)], 'choose 50 or 60 Hz').nullable(),
  inlets: z.string().trim().max(200, 'at most 200 characters'),
})
export type StageInput = z.infer<typeof stageInputSchema>
export const createStageSchema = z.object({ id: idSchema.optional(), stage: stageInputSchema })
export const updateStageSchema = z.object({ version: versionSchema, stage: stageInputSchema })
export const stageSchema = stageInputSchema.extend({
  id: idSchema,
  venueId: idSchema,
  // Kept as a plain number: what was stored must always be shown.
  mainsHz: z.number().nullable(),
  version: versionSchema,
})
export type Stage = z.infer<typeof stageSchema>

export const supplierInputSchema = z.object({
  name: nameSchema,
  town: placeName,
  country: placeName,
  zone: zoneSchema.nullable(),
  currency: currencySchema.nullable(),
  remark: remarkSchema,
})
export type SupplierInput = z.infer<typeof supplierInputSchema>
export const createSupplierSchema = z.object({ id: idSchema.optional(), supplier: supplierInputSchema })
export const updateSupplierSchema = z.object({ version: versionSchema, supplier: supplierInputSchema })
export const supplierSchema = supplierInputSchema.extend({ id: idSchema, version: versionSchema })
export type Supplier = z.infer<typeof supplierSchema>

export const contactInputSchema = z.object({
  name: nameSchema,
  email: emailSchema,
  phone: z
    .string()
    .trim()
    .max(40, 'at most 40 characters')
    .regex(/^[+\d\s().-]*$/, 'digits, spaces and + ( ) . - only'),
  duties: z
    .array(z.enum(contactDuties, 'choose from backline, production, sound, delivery, accounts'))
    .min(1, 'choose at least one duty: mails go out by it')
    .refine((set) => new Set(set).size === set.length, 'each duty once'),
})
export type ContactInput = z.infer<typeof contactInputSchema>
export const createContactSchema = z.object({ id: idSchema.optional(), contact: contactInputSchema })
export const updateContactSchema = z.object({ version: versionSchema, contact: contactInputSchema })
export const contactSchema = contactInputSchema.extend({
  id: idSchema,
  venueId: idSchema.nullable(),
  supplierId: idSchema.nullable(),
  version: versionSchema,
})
export type Contact = z.infer<typeof contactSchema>

export const venueFilters = ['all', 'no-zone', 'no-stage', 'no-contact'] as const
export const venueListQuery = listQuerySchema(['name', 'town', 'country'], venueFilters)
export type VenueListQuery = z.infer<typeof venueListQuery>
export const supplierFilters = ['all', 'no-currency', 'no-contact'] as const
export const supplierListQuery = listQuerySchema(['name', 'town', 'country'], supplierFilters)
export type SupplierListQuery = z.infer<typeof supplierListQuery>
