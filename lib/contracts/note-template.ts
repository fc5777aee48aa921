import { z } from 'zod'
import { idSchema, nameSchema, versionSchema } from './common'

/** A party's own note templates, kept beside the ones that everybody has: how its toms are stepped and its heads stand. */

/** More than any party plans by; beyond it something has gone wrong. */
export const noteTemplateLimit = 40

const semitones = (most: number) =>
  z.number('write a number of semitones').min(0, 'at least 0 semitones').max(most, `at most ${most} semitones`)

const stepsSchema = z.discriminatedUnion(
  'kind',
  [
    z.object({ kind: z.literal('per-inch'), semitonesPerInch: semitones(12) }),
    z.object({
      kind: z.literal('per-pair'),
      /** From the smallest tom down, one step a pair; the last goes on for further pairs. */
      semitones: z.array(semitones(24).int('whole semitones')).min(1, 'at least one step').max(11, 'at most 11 steps'),
    }),
    z.object({ kind: z.literal('equal-feel') }),
    z.object({ kind: z.literal('free') }),
  ],
  'choose how the toms are stepped',
)

export const noteTemplateInputSchema = z.object({
  name: nameSchema,
  steps: stepsSchema,
  /** Resonant over batter head, cents. */
  resonantCents: z.number('write a number of cents').min(-1200, 'at least −1200 cents').max(1200, 'at most 1200 cents'),
  /** Where the kick may lie below the lowest tom, semitones; none: in the middle of its own range. */
  kickBelowLowestTom: z.array(semitones(36).int('whole semitones')).max(6, 'at most six places'),
})
export type NoteTemplateInput = z.infer<typeof noteTemplateInputSchema>

export const createNoteTemplateSchema = z.object({ id: idSchema.optional(), template: noteTemplateInputSchema })
export const updateNoteTemplateSchema = z.object({ version: versionSchema, template: noteTemplateInputSchema })
export const partyNoteTemplateSchema = noteTemplateInputSchema.extend({ id: idSchema, version: versionSchema })
export type PartyNoteTemplate = z.infer<typeof partyNoteTemplateSchema>
export const noteTemplatesSchema = z.object({ templates: z.array(partyNoteTemplateSchema) })
