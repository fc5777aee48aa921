import { invitationSchema, invitationsSchema, inviteSchema } from '@/lib/contracts/member'
import { defineRoute } from '@/lib/server/http/define-route'
import { invite, readInvitations } from '@/lib/server/members/invite'

export const GET = defineRoute({
  response: invitationsSchema,
  handler: async ({ actor }) => ({ invitations: await readInvitations(actor) }),
})

export const POST = defineRoute({
  body: inviteSchema,
  response: invitationSchema,
  status: 201,
  handler: ({ actor, body }) => invite(actor, body),
})
