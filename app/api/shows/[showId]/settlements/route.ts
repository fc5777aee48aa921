import { z } from 'zod'
import { savedSchema, settleSchema } from '@/lib/contracts/answer'
import { idSchema } from '@/lib/contracts/common'
import { settle } from '@/lib/server/answers/settle'
import { defineRoute } from '@/lib/server/http/define-route'

export const POST = defineRoute({
  params: z.object({ showId: idSchema }),
  body: settleSchema,
  response: savedSchema,
  handler: ({ actor, params, body }) => settle(actor, { ...body, of: params }),
})
