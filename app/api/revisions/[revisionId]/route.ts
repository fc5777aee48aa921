import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { revisionDetailSchema } from '@/lib/contracts/revision'
import { defineRoute } from '@/lib/server/http/define-route'
import { readRevision } from '@/lib/server/revisions/read-revision'

export const GET = defineRoute({
  params: z.object({ revisionId: idSchema }),
  response: revisionDetailSchema,
  handler: ({ actor, params }) => readRevision(actor, params),
})
