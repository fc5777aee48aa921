import { auditPageSchema, auditQuerySchema } from '@/lib/contracts/member'
import { defineRoute } from '@/lib/server/http/define-route'
import { readAuditTrail } from '@/lib/server/party/read-audit-trail'

export const GET = defineRoute({
  query: auditQuerySchema,
  response: auditPageSchema,
  handler: ({ actor, query }) => readAuditTrail(actor, query),
})
