import { addReadingsSchema, addedReadingsSchema } from '@/lib/contracts/bench'
import { addReadings } from '@/lib/server/bench/add-readings'
import { showOfLink } from '@/lib/server/bench/assert-at-bench'
import { definePublicRoute } from '@/lib/server/http/define-public-route'

export const POST = definePublicRoute({
  purpose: 'bench',
  body: addReadingsSchema,
  response: addedReadingsSchema,
  handler: ({ actor, body }) => addReadings(actor, { showId: showOfLink(actor), ...body }),
})
