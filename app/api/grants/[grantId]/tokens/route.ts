import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { printedLinkSchema } from '@/lib/contracts/grant'
import { printLink } from '@/lib/server/grants/print-link'
import { defineRoute } from '@/lib/server/http/define-route'

export const POST = defineRoute({
  params: z.object({ grantId: idSchema }),
  response: printedLinkSchema,
  status: 201,
  handler: ({ actor, params }) => printLink(actor, params),
})
