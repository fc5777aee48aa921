import { z } from 'zod'
import { idSchema, nameSchema, roleSchema, versionSchema } from './common'

export const unitSystems = ['metric', 'imperial'] as const
export const paperSizes = ['A4', 'Letter'] as const
/** Languages in which the notes can be named. */
export const locales = ['en', 'de', 'fr'] as const

export const unitWords: Record<(typeof unitSystems)[number], string> = {
  metric: 'metres and millimetres',
  imperial: 'feet and inches',
}
export const localeWords: Record<(typeof locales)[number], string> = {
  en: 'English (B, B♭, F♯)',
  de: 'German (H, B, Fis)',
  fr: 'French (si, si♭, fa♯)',
}

export const createPartySchema = z.object({ id: idSchema.optional(), name: nameSchema })

export const partySettingsSchema = z.object({
  name: nameSchema,
  units: z.enum(unitSystems, 'choose metric or imperial'),
  /** Frequency of A4, Hz. */
  referenceHz: z
    .number('write a frequency in Hz, such as 440')
    .min(415, 'at least 415 Hz')
    .max(466, 'at most 466 Hz')
    .refine((hz) => Number.isInteger(hz * 10), 'at most one decimal'),
  paper: z.enum(paperSizes, 'choose A4 or Letter'),
  locale: z.enum(locales, 'choose how notes are named'),
})
export type PartySettings = z.infer<typeof partySettingsSchema>

export const updatePartySchema = partySettingsSchema.extend({ version: versionSchema })
export type UpdateParty = z.infer<typeof updatePartySchema>

export const partySchema = partySettingsSchema.extend({ id: idSchema, version: versionSchema })
export type Party = z.infer<typeof partySchema>

/** A party a person may switch to. */
export const ownPartySchema = z.object({ id: idSchema, name: z.string(), roles: z.array(roleSchema) })
export type OwnParty = z.infer<typeof ownPartySchema>
