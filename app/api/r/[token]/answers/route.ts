import { replyAnsweredSchema, replyEventSchema } from '@/lib/contracts/answer'
import { recordReply } from '@/lib/server/answers/record-reply'
import { definePublicRoute } from '@/lib/server/http/define-public-route'

export const POST = definePublicRoute({
  purpose: 'reply',
  body: replyEventSchema,
  response: replyAnsweredSchema,
  maxBytes: 32 * 1024,
  handler: ({ actor, body }) => recordReply(actor, body),
})
