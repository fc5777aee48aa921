import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { gaugePairSchema } from '@/lib/contracts/gauge'
import { restoreGaugePair } from '@/lib/server/gauges/gauge-pairs'
import { defineRoute } from '@/lib/server/http/define-route'

export const POST = defineRoute({
  params: z.object({ pairId: idSchema }),
  response: gaugePairSchema,
  handler: ({ actor, params }) => restoreGaugePair(actor, params),
})
