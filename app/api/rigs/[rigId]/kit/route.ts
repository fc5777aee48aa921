import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { kitQuerySchema, kitSchema } from '@/lib/contracts/kit'
import { defineRoute } from '@/lib/server/http/define-route'
import { readKit } from '@/lib/server/kit/read-kit'

export const GET = defineRoute({
  params: z.object({ rigId: idSchema }),
  query: kitQuerySchema,
  response: kitSchema,
  handler: ({ actor, params, query }) => readKit(actor, { ...params, removedToo: query.removed === 'true' }),
})
