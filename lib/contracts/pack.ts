import { z } from 'zod'
import { idSchema } from './common'

/** A preview of what one recipient would get: a venue's for one show, or a supplier's for one hire. */
export const makePackSchema = z
  .object({
    id: idSchema.optional(),
    showId: idSchema.optional(),
    hireId: idSchema.optional(),
    /** The rig's newest revision unless given. */
    revisionId: idSchema.optional(),
    /** Of a hire over shows of several rigs: which one. */
    rigId: idSchema.optional(),
  })
  .refine((input) => (input.showId === undefined) !== (input.hireId === undefined), {
    path: ['showId'],
    message: 'name one show or one hire',
  })
export type MakePack = z.infer<typeof makePackSchema>

export const packStateSchema = z.object({
  id: idSchema,
  revisionId: idSchema,
  revisionNumber: z.number().int(),
  showId: idSchema.nullable(),
  hireId: idSchema.nullable(),
  createdAt: z.iso.datetime(),
  /** `late`: the PDF should long have been there, and another preview is the way to get one. */
  pdf: z.enum(['making', 'ready', 'late']),
  pages: z.number().int().nullable(),
  /** A PDF that was sent holds the link that answers in its reader's name: only whoever may send opens it. */
  mayOpen: z.boolean(),
})
export type PackState = z.infer<typeof packStateSchema>
