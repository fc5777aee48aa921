import { doneSchema, redeemResetSchema } from '@/lib/contracts/sign-in'
import { defineOpenRoute } from '@/lib/server/http/define-public-route'
import { redeemPasswordReset } from '@/lib/server/people/redeem-password-reset'

export const POST = defineOpenRoute({
  body: redeemResetSchema,
  response: doneSchema,
  limit: { name: 'redeem-reset', points: 20, seconds: 600 },
  async handler({ body, address }) {
    await redeemPasswordReset(body, address)
    return { done: true as const }
  },
})
