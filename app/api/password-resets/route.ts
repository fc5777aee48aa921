import { askResetSchema, doneSchema } from '@/lib/contracts/sign-in'
import { defineOpenRoute } from '@/lib/server/http/define-public-route'
import { askPasswordReset } from '@/lib/server/people/ask-password-reset'

export const POST = defineOpenRoute({
  body: askResetSchema,
  response: doneSchema,
  status: 202,
  limit: { name: 'ask-reset', points: 20, seconds: 3600 },
  async handler({ body, address }) {
    await askPasswordReset(body, address)
    return { done: true as const }
  },
})
