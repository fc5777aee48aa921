import { createGaugeSchema, gaugeSchema, gaugesSchema } from '@/lib/contracts/gauge'
import { createGauge } from '@/lib/server/gauges/change-gauge'
import { readGauges } from '@/lib/server/gauges/read-gauges'
import { defineRoute } from '@/lib/server/http/define-route'

export const GET = defineRoute({ response: gaugesSchema, handler: ({ actor }) => readGauges(actor) })

export const POST = defineRoute({
  body: createGaugeSchema,
  response: gaugeSchema,
  status: 201,
  handler: ({ actor, body }) => createGauge(actor, body),
})
