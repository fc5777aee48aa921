import { z } from 'zod'
import { idSchema, removeSchema } from '@/lib/contracts/common'
import { gaugeSchema, gaugeWithPairsSchema, updateGaugeSchema } from '@/lib/contracts/gauge'
import { changeGauge, removeGauge } from '@/lib/server/gauges/change-gauge'
import { readGauge } from '@/lib/server/gauges/read-gauges'
import { defineRoute } from '@/lib/server/http/define-route'

const params = z.object({ gaugeId: idSchema })

export const GET = defineRoute({
  params,
  response: gaugeWithPairsSchema,
  handler: ({ actor, params }) => readGauge(actor, params.gaugeId),
})

export const PATCH = defineRoute({
  params,
  body: updateGaugeSchema,
  response: gaugeSchema,
  handler: ({ actor, params, body }) => changeGauge(actor, { ...params, ...body }),
})

export const DELETE = defineRoute({
  params,
  body: removeSchema,
  response: gaugeSchema,
  handler: ({ actor, params, body }) => removeGauge(actor, { ...params, ...body }),
})
