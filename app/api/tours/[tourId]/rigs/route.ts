import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { createRigSchema, rigSchema } from '@/lib/contracts/tour'
import { defineRoute } from '@/lib/server/http/define-route'
import { createRig } from '@/lib/server/tours/rigs'

const params = z.object({ tourId: idSchema })

export const POST = defineRoute({
  params,
  body: createRigSchema,
  response: rigSchema,
  status: 201,
  handler: ({ actor, params, body }) => createRig(actor, { ...params, ...body }),
})
