import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { addGaugePairSchema, gaugePairSchema } from '@/lib/contracts/gauge'
import { addGaugePair } from '@/lib/server/gauges/gauge-pairs'
import { defineRoute } from '@/lib/server/http/define-route'

export const POST = defineRoute({
  params: z.object({ gaugeId: idSchema }),
  body: addGaugePairSchema,
  response: gaugePairSchema,
  status: 201,
  handler: ({ actor, params, body }) => addGaugePair(actor, { ...params, ...body }),
})
