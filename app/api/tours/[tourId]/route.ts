import { z } from 'zod'
import { idSchema, removeSchema } from '@/lib/contracts/common'
import { tourSchema, updateTourSchema } from '@/lib/contracts/tour'
import { defineRoute } from '@/lib/server/http/define-route'
import { changeTour, removeTour } from '@/lib/server/tours/tours'

const params = z.object({ tourId: idSchema })

export const PATCH = defineRoute({
  params,
  body: updateTourSchema,
  response: tourSchema,
  handler: ({ actor, params, body }) => changeTour(actor, { ...params, ...body }),
})

export const DELETE = defineRoute({
  params,
  body: removeSchema,
  response: tourSchema,
  handler: ({ actor, params, body }) => removeTour(actor, { ...params, ...body }),
})
