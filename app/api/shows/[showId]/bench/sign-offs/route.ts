import { z } from 'zod'
import { benchSignOffSchema, signOffSchema } from '@/lib/contracts/bench'
import { idSchema } from '@/lib/contracts/common'
import { signOffDrum } from '@/lib/server/bench/sign-off'
import { defineRoute } from '@/lib/server/http/define-route'

export const POST = defineRoute({
  params: z.object({ showId: idSchema }),
  body: signOffSchema,
  response: benchSignOffSchema,
  handler: ({ actor, params, body }) => signOffDrum(actor, { ...params, signOff: body }),
})
