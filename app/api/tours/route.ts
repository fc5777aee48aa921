import { createTourSchema, tourSchema } from '@/lib/contracts/tour'
import { defineRoute } from '@/lib/server/http/define-route'
import { createTour } from '@/lib/server/tours/tours'

export const POST = defineRoute({
  body: createTourSchema,
  response: tourSchema,
  status: 201,
  handler: ({ actor, body }) => createTour(actor, body),
})
