import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { kitSchema, orderEntriesSchema } from '@/lib/contracts/kit'
import { defineRoute } from '@/lib/server/http/define-route'
import { orderEntries } from '@/lib/server/kit/order-entries'

export const PUT = defineRoute({
  params: z.object({ rigId: idSchema }),
  body: orderEntriesSchema,
  response: kitSchema,
  handler: ({ actor, params, body }) => orderEntries(actor, { ...params, ...body }),
})
