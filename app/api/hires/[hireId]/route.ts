import { z } from 'zod'
import { idSchema, removeSchema } from '@/lib/contracts/common'
import { hireSchema, updateHireSchema } from '@/lib/contracts/hire'
import { changeHire, removeHire } from '@/lib/server/hires/hires'
import { defineRoute } from '@/lib/server/http/define-route'

const params = z.object({ hireId: idSchema })

export const PATCH = defineRoute({
  params,
  body: updateHireSchema,
  response: hireSchema,
  handler: ({ actor, params, body }) => changeHire(actor, { ...params, ...body }),
})

export const DELETE = defineRoute({
  params,
  body: removeSchema,
  response: hireSchema,
  handler: ({ actor, params, body }) => removeHire(actor, { ...params, ...body }),
})
