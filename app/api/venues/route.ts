import { createVenueSchema, venueSchema } from '@/lib/contracts/directory'
import { createVenue } from '@/lib/server/directory/venues'
import { defineRoute } from '@/lib/server/http/define-route'

export const POST = defineRoute({
  body: createVenueSchema,
  response: venueSchema,
  status: 201,
  handler: ({ actor, body }) => createVenue(actor, body),
})
