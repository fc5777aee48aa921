import { z } from 'zod'
import { idSchema } from './common'

/** Freezing a rig: a note is wanted, because it is what its readers see first. */
export const issueRevisionSchema = z.object({
  id: idSchema.optional(),
  note: z.string().trim().min(1, 'say what this revision is for, or what changed').max(2000, 'at most 2000 characters'),
})
export type IssueRevision = z.infer<typeof issueRevisionSchema>

export const revisionSummarySchema = z.object({
  id: idSchema,
  rigId: idSchema,
  rigName: z.string(),
  tourId: idSchema,
  number: z.number().int(),
  note: z.string(),
  issuedAt: z.iso.datetime(),
  issuedBy: z.object({ id: idSchema, name: z.string() }),
  /** How many lines it asks. */
  lines: z.number().int(),
})
export type RevisionSummary = z.infer<typeof revisionSummarySchema>
export const revisionListSchema = z.object({ revisions: z.array(revisionSummarySchema) })

const changedSchema = z.object({ entryId: idSchema, name: z.string(), differences: z.array(z.string()).readonly() })
const wordsSchema = z.object({ entryId: idSchema, words: z.string() })
export const specChangesSchema = z.object({
  added: z.array(wordsSchema).readonly(),
  dropped: z.array(wordsSchema).readonly(),
  changed: z.array(changedSchema).readonly(),
  tuning: z.array(changedSchema).readonly(),
  gauge: z.array(z.string()).readonly(),
  plot: z.array(z.string()).readonly(),
  channels: z.array(z.string()).readonly(),
})

export const revisionDetailSchema = revisionSummarySchema.extend({
  documentHash: z.string(),
  asked: z.array(
    z.object({
      lineId: idSchema,
      hash: z.string(),
      position: z.number().int(),
      words: z.string(),
      details: z.array(z.string()),
      insteadOf: z.string().nullable(),
      supply: z.enum(['rented', 'venue']),
    }),
  ),
  /** Names of what is carried and so not asked for. */
  carried: z.array(z.string()),
  pieces: z.number().int(),
  channels: z.number().int(),
  previousNumber: z.number().int().nullable(),
  changes: specChangesSchema.nullable(),
})
export type RevisionDetail = z.infer<typeof revisionDetailSchema>

/** What the next revision of a rig would be. */
export type RevisionPreview = {
  rigId: string
  rigName: string
  shows: number
  number: number
  state: 'ready' | 'same' | 'empty'
  lines: number
  changes: z.infer<typeof specChangesSchema> | null
}
