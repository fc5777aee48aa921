import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { issueRevisionSchema, revisionListSchema, revisionSummarySchema } from '@/lib/contracts/revision'
import { defineRoute } from '@/lib/server/http/define-route'
import { issueRevision } from '@/lib/server/revisions/issue-revision'
import { listRigRevisions } from '@/lib/server/revisions/list-revisions'

const params = z.object({ rigId: idSchema })

export const GET = defineRoute({
  params,
  response: revisionListSchema,
  handler: async ({ actor, params }) => ({ revisions: await listRigRevisions(actor, params) }),
})

export const POST = defineRoute({
  params,
  body: issueRevisionSchema,
  response: revisionSummarySchema,
  status: 201,
  maxBytes: 16 * 1024,
  handler: ({ actor, params, body }) => issueRevision(actor, { ...params, ...body }),
})
