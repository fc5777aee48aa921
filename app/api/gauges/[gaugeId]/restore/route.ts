import { z } from 'zod'
import { idSchema, removeSchema } from '@/lib/contracts/common'
import { gaugeSchema } from '@/lib/contracts/gauge'
import { restoreGauge } from '@/lib/server/gauges/change-gauge'
import { defineRoute } from '@/lib/server/http/define-route'

export const POST = defineRoute({
  params: z.object({ gaugeId: idSchema }),
  body: removeSchema,
  response: gaugeSchema,
  handler: ({ actor, params, body }) => restoreGauge(actor, { ...params, ...body }),
})
