import { z } from 'zod'
import { idSchema, removeSchema } from '@/lib/contracts/common'
import { daySchema, updateDaySchema } from '@/lib/contracts/tour'
import { defineRoute } from '@/lib/server/http/define-route'
import { changeDay, removeDay } from '@/lib/server/tours/days'

const params = z.object({ dayId: idSchema })

export const PATCH = defineRoute({
  params,
  body: updateDaySchema,
  response: daySchema,
  handler: ({ actor, params, body }) => changeDay(actor, { ...params, ...body }),
})

export const DELETE = defineRoute({
  params,
  body: removeSchema,
  response: daySchema,
  handler: ({ actor, params, body }) => removeDay(actor, { ...params, ...body }),
})
