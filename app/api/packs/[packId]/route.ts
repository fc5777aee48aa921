import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { packStateSchema } from '@/lib/contracts/pack'
import { defineRoute } from '@/lib/server/http/define-route'
import { readPackState } from '@/lib/server/packs/read-pack'

export const GET = defineRoute({
  params: z.object({ packId: idSchema }),
  response: packStateSchema,
  handler: ({ actor, params }) => readPackState(actor, params),
})
