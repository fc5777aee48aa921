import { z } from 'zod'
import { idSchema } from './common'

/** How long a sending can be held back, in seconds, so that it can be stopped. */
export const holdBackSeconds = 20

/** Sends one revision to several recipients; each is one sending of its own with an id made by the client. */
export const sendSchema = z.object({
  revisionId: idSchema,
  holdBack: z.boolean(),
  recipients: z
    .array(
      z
        .object({
          dispatchId: idSchema,
          contactId: idSchema,
          showId: idSchema.nullable(),
          hireId: idSchema.nullable(),
        })
        .refine((recipient) => (recipient.showId === null) !== (recipient.hireId === null), 'either a show or a hire'),
    )
    .min(1, 'choose at least one recipient')
    .max(60, 'at most 60 recipients at once')
    .refine((list) => new Set(list.map((entry) => entry.dispatchId)).size === list.length, 'each sending once'),
})
export type Send = z.infer<typeof sendSchema>
export type SendRecipient = Send['recipients'][number]

/** What became of each recipient: one refusal does not hold up the others. */
export const sendOutcomesSchema = z.object({
  outcomes: z.array(
    z.object({
      dispatchId: idSchema,
      contactId: idSchema,
      outcome: z.enum(['queued', 'refused']),
      /** Why it was refused, empty otherwise. */
      message: z.string(),
    }),
  ),
})
export type SendOutcomes = z.infer<typeof sendOutcomesSchema>

export const stoppedSchema = z.object({ stopped: z.literal(true) })
