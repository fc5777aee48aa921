import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { rigSchema, updateRigSchema } from '@/lib/contracts/tour'
import { defineRoute } from '@/lib/server/http/define-route'
import { changeRig } from '@/lib/server/tours/rigs'

const params = z.object({ rigId: idSchema })

export const PATCH = defineRoute({
  params,
  body: updateRigSchema,
  response: rigSchema,
  handler: ({ actor, params, body }) => changeRig(actor, { ...params, ...body }),
})
