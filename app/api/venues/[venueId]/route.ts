import { z } from 'zod'
import { idSchema, removeSchema } from '@/lib/contracts/common'
import { updateVenueSchema, venueSchema } from '@/lib/contracts/directory'
import { changeVenue, removeVenue } from '@/lib/server/directory/venues'
import { defineRoute } from '@/lib/server/http/define-route'

const params = z.object({ venueId: idSchema })

export const PATCH = defineRoute({
  params,
  body: updateVenueSchema,
  response: venueSchema,
  handler: ({ actor, params, body }) => changeVenue(actor, { ...params, ...body }),
})

export const DELETE = defineRoute({
  params,
  body: removeSchema,
  response: venueSchema,
  handler: ({ actor, params, body }) => removeVenue(actor, { ...params, ...body }),
})
