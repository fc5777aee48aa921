import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { withdrawnSchema } from '@/lib/contracts/grant'
import { withdrawBenchLink } from '@/lib/server/bench/bench-links'
import { defineRoute } from '@/lib/server/http/define-route'

export const DELETE = defineRoute({
  params: z.object({ showId: idSchema, grantId: idSchema }),
  response: withdrawnSchema,
  handler: ({ actor, params }) => withdrawBenchLink(actor, params),
})
