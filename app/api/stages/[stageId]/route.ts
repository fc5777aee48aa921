import { z } from 'zod'
import { idSchema, removeSchema } from '@/lib/contracts/common'
import { stageSchema, updateStageSchema } from '@/lib/contracts/directory'
import { changeStage, removeStage } from '@/lib/server/directory/stages'
import { defineRoute } from '@/lib/server/http/define-route'

const params = z.object({ stageId: idSchema })

export const PATCH = defineRoute({
  params,
  body: updateStageSchema,
  response: stageSchema,
  handler: ({ actor, params, body }) => changeStage(actor, { ...params, ...body }),
})

export const DELETE = defineRoute({
  params,
  body: removeSchema,
  response: stageSchema,
  handler: ({ actor, params, body }) => removeStage(actor, { ...params, ...body }),
})
