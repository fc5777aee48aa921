import { lendRoleSchema, lentRoleSchema } from '@/lib/contracts/member'
import { defineRoute } from '@/lib/server/http/define-route'
import { lendRole } from '@/lib/server/members/lend-role'

export const POST = defineRoute({
  body: lendRoleSchema,
  response: lentRoleSchema,
  status: 201,
  handler: ({ actor, body }) => lendRole(actor, body),
})
