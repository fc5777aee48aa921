import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import {
  acceptedCommandsSchema,
  appendCommandsSchema,
  missedCommandsSchema,
  missedQuerySchema,
} from '@/lib/contracts/plot'
import { defineRoute } from '@/lib/server/http/define-route'
import { appendCommands } from '@/lib/server/plots/append-commands'
import { readMissedCommands } from '@/lib/server/plots/read-plot'

const params = z.object({ rigId: idSchema })

export const GET = defineRoute({
  params,
  query: missedQuerySchema,
  response: missedCommandsSchema,
  handler: ({ actor, params, query }) => readMissedCommands(actor, { ...params, ...query }),
})

export const POST = defineRoute({
  params,
  body: appendCommandsSchema,
  response: acceptedCommandsSchema,
  handler: ({ actor, params, body }) => appendCommands(actor, { ...params, ...body }),
})
