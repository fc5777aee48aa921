import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { doneSchema } from '@/lib/contracts/sign-in'
import { defineRoute } from '@/lib/server/http/define-route'
import { endLoan } from '@/lib/server/members/lend-role'

export const DELETE = defineRoute({
  params: z.object({ id: idSchema }),
  response: doneSchema,
  async handler({ actor, params }) {
    await endLoan(actor, params.id)
    return { done: true as const }
  },
})
