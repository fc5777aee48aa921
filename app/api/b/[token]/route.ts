import { benchSchema } from '@/lib/contracts/bench'
import { showOfLink } from '@/lib/server/bench/assert-at-bench'
import { readBench } from '@/lib/server/bench/read-bench'
import { definePublicRoute } from '@/lib/server/http/define-public-route'

export const GET = definePublicRoute({
  purpose: 'bench',
  response: benchSchema,
  handler: ({ actor }) => readBench(actor, { showId: showOfLink(actor) }),
})
