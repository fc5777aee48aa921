import { z } from 'zod'
import { benchSchema } from '@/lib/contracts/bench'
import { idSchema } from '@/lib/contracts/common'
import { readBench } from '@/lib/server/bench/read-bench'
import { defineRoute } from '@/lib/server/http/define-route'

export const GET = defineRoute({
  params: z.object({ showId: idSchema }),
  response: benchSchema,
  handler: ({ actor, params }) => readBench(actor, params),
})
