import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { kitSchema, addEntriesSchema } from '@/lib/contracts/kit'
import { defineRoute } from '@/lib/server/http/define-route'
import { addEntries } from '@/lib/server/kit/add-entries'

export const POST = defineRoute({
  params: z.object({ rigId: idSchema }),
  body: addEntriesSchema,
  response: kitSchema,
  status: 201,
  handler: ({ actor, params, body }) => addEntries(actor, { ...params, ...body }),
})
