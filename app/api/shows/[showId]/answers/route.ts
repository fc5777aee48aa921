import { z } from 'zod'
import { savedSchema, takeDownSchema } from '@/lib/contracts/answer'
import { idSchema } from '@/lib/contracts/common'
import { takeDown } from '@/lib/server/answers/take-down'
import { defineRoute } from '@/lib/server/http/define-route'

export const POST = defineRoute({
  params: z.object({ showId: idSchema }),
  body: takeDownSchema,
  response: savedSchema,
  handler: ({ actor, params, body }) => takeDown(actor, { ...body, of: params }),
})
