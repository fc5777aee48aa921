import { z } from 'zod'
import { addReadingsSchema, addedReadingsSchema } from '@/lib/contracts/bench'
import { idSchema } from '@/lib/contracts/common'
import { addReadings } from '@/lib/server/bench/add-readings'
import { defineRoute } from '@/lib/server/http/define-route'

export const POST = defineRoute({
  params: z.object({ showId: idSchema }),
  body: addReadingsSchema,
  response: addedReadingsSchema,
  handler: ({ actor, params, body }) => addReadings(actor, { ...params, ...body }),
})
