import { makePackSchema, packStateSchema } from '@/lib/contracts/pack'
import { defineRoute } from '@/lib/server/http/define-route'
import { makePackPreview } from '@/lib/server/packs/make-pack-preview'

export const POST = defineRoute({
  body: makePackSchema,
  response: packStateSchema,
  status: 201,
  maxBytes: 8 * 1024,
  handler: ({ actor, body }) => makePackPreview(actor, body),
})
