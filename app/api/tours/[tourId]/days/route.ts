import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { createDaysSchema, madeDaysSchema } from '@/lib/contracts/tour'
import { defineRoute } from '@/lib/server/http/define-route'
import { createDays } from '@/lib/server/tours/days'

const params = z.object({ tourId: idSchema })

export const POST = defineRoute({
  params,
  body: createDaysSchema,
  response: madeDaysSchema,
  status: 201,
  handler: ({ actor, params, body }) => createDays(actor, { ...params, ...body }),
})
