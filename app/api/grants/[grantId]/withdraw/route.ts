import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { withdrawnSchema } from '@/lib/contracts/grant'
import { withdrawLink } from '@/lib/server/grants/withdraw-link'
import { defineRoute } from '@/lib/server/http/define-route'

export const POST = defineRoute({
  params: z.object({ grantId: idSchema }),
  response: withdrawnSchema,
  handler: ({ actor, params }) => withdrawLink(actor, params),
})
