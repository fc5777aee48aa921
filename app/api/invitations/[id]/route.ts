import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { doneSchema } from '@/lib/contracts/sign-in'
import { defineRoute } from '@/lib/server/http/define-route'
import { takeInvitationBack } from '@/lib/server/members/invite'

export const DELETE = defineRoute({
  params: z.object({ id: idSchema }),
  response: doneSchema,
  async handler({ actor, params }) {
    await takeInvitationBack(actor, params.id)
    return { done: true as const }
  },
})
