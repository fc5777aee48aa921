import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { createStageSchema, stageSchema } from '@/lib/contracts/directory'
import { createStage } from '@/lib/server/directory/stages'
import { defineRoute } from '@/lib/server/http/define-route'

const params = z.object({ venueId: idSchema })

export const POST = defineRoute({
  params,
  body: createStageSchema,
  response: stageSchema,
  status: 201,
  handler: ({ actor, params, body }) => createStage(actor, { ...params, ...body }),
})
