import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { stoppedSchema } from '@/lib/contracts/dispatch'
import { stopDispatch } from '@/lib/server/dispatch/stop-dispatch'
import { defineRoute } from '@/lib/server/http/define-route'

export const POST = defineRoute({
  params: z.object({ dispatchId: idSchema }),
  response: stoppedSchema,
  handler: ({ actor, params }) => stopDispatch(actor, params),
})
