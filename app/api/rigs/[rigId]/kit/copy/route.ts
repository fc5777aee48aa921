import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { kitSchema, copyKitSchema } from '@/lib/contracts/kit'
import { defineRoute } from '@/lib/server/http/define-route'
import { copyKit } from '@/lib/server/kit/copy-kit'

export const POST = defineRoute({
  params: z.object({ rigId: idSchema }),
  body: copyKitSchema,
  response: kitSchema,
  status: 201,
  handler: ({ actor, params, body }) => copyKit(actor, { ...params, ...body }),
})
