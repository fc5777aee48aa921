import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { entrySchema, createEntrySchema } from '@/lib/contracts/kit'
import { defineRoute } from '@/lib/server/http/define-route'
import { createEntry } from '@/lib/server/kit/add-entries'

export const POST = defineRoute({
  params: z.object({ rigId: idSchema }),
  body: createEntrySchema,
  response: entrySchema,
  status: 201,
  handler: ({ actor, params, body }) => createEntry(actor, { ...params, ...body }),
})
