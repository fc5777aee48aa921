import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { createShowSchema, showSchema } from '@/lib/contracts/tour'
import { defineRoute } from '@/lib/server/http/define-route'
import { createShow } from '@/lib/server/tours/shows'

const params = z.object({ tourId: idSchema })

export const POST = defineRoute({
  params,
  body: createShowSchema,
  response: showSchema,
  status: 201,
  handler: ({ actor, params, body }) => createShow(actor, { ...params, ...body }),
})
