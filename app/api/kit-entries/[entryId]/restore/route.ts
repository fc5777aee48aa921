import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { entrySchema, removeEntrySchema } from '@/lib/contracts/kit'
import { defineRoute } from '@/lib/server/http/define-route'
import { restoreEntry } from '@/lib/server/kit/change-entry'

export const POST = defineRoute({
  params: z.object({ entryId: idSchema }),
  body: removeEntrySchema,
  response: entrySchema,
  handler: ({ actor, params, body }) => restoreEntry(actor, { ...params, ...body }),
})
