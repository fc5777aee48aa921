import { chooseToursGaugeSchema, gaugesSchema } from '@/lib/contracts/gauge'
import { chooseToursGauge } from '@/lib/server/gauges/change-gauge'
import { defineRoute } from '@/lib/server/http/define-route'

export const PUT = defineRoute({
  body: chooseToursGaugeSchema,
  response: gaugesSchema,
  handler: ({ actor, body }) => chooseToursGauge(actor, body),
})
