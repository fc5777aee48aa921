import { replySchema } from '@/lib/contracts/answer'
import { readReply } from '@/lib/server/answers/read-reply'
import { definePublicRoute } from '@/lib/server/http/define-public-route'

export const GET = definePublicRoute({
  purpose: 'reply',
  response: replySchema,
  handler: ({ actor }) => readReply(actor),
})
