import { doneSchema, signUpSchema } from '@/lib/contracts/sign-in'
import { defineOpenRoute } from '@/lib/server/http/define-public-route'
import { signUp } from '@/lib/server/people/sign-up'

export const POST = defineOpenRoute({
  body: signUpSchema,
  response: doneSchema,
  status: 202,
  limit: { name: 'sign-up', points: 20, seconds: 3600 },
  async handler({ body, address }) {
    await signUp(body, address)
    return { done: true as const }
  },
})
