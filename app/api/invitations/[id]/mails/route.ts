import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { invitationSchema } from '@/lib/contracts/member'
import { defineRoute } from '@/lib/server/http/define-route'
import { sendInvitationAgain } from '@/lib/server/members/invite'

export const POST = defineRoute({
  params: z.object({ id: idSchema }),
  response: invitationSchema,
  handler: ({ actor, params }) => sendInvitationAgain(actor, params.id),
})
