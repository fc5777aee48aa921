import { freshLinkSchema, freshLinkSentSchema } from '@/lib/contracts/grant'
import { mailFreshLink } from '@/lib/server/grants/mail-fresh-link'
import { defineOpenRoute } from '@/lib/server/http/define-public-route'

export const POST = defineOpenRoute({
  body: freshLinkSchema,
  response: freshLinkSentSchema,
  limit: { name: 'fresh-link-address', points: 10, seconds: 3600 },
  handler: ({ body, address }) => mailFreshLink({ token: body.token, address }),
})
