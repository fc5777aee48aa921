import { sendOutcomesSchema, sendSchema } from '@/lib/contracts/dispatch'
import { sendPacks } from '@/lib/server/dispatch/send-packs'
import { defineRoute } from '@/lib/server/http/define-route'

export const POST = defineRoute({
  body: sendSchema,
  response: sendOutcomesSchema,
  handler: ({ actor, body }) => sendPacks(actor, body),
})
