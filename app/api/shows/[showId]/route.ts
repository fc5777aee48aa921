import { z } from 'zod'
import { idSchema, removeSchema } from '@/lib/contracts/common'
import { showSchema, updateShowSchema } from '@/lib/contracts/tour'
import { defineRoute } from '@/lib/server/http/define-route'
import { changeShow, removeShow } from '@/lib/server/tours/shows'

const params = z.object({ showId: idSchema })

export const PATCH = defineRoute({
  params,
  body: updateShowSchema,
  response: showSchema,
  handler: ({ actor, params, body }) => changeShow(actor, { ...params, ...body }),
})

export const DELETE = defineRoute({
  params,
  body: removeSchema,
  response: showSchema,
  handler: ({ actor, params, body }) => removeShow(actor, { ...params, ...body }),
})
