import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { createHireSchema, hireSchema } from '@/lib/contracts/hire'
import { createHire } from '@/lib/server/hires/hires'
import { defineRoute } from '@/lib/server/http/define-route'

const params = z.object({ tourId: idSchema })

export const POST = defineRoute({
  params,
  body: createHireSchema,
  response: hireSchema,
  status: 201,
  handler: ({ actor, params, body }) => createHire(actor, { ...params, ...body }),
})
