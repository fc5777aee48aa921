import { changePasswordSchema, doneSchema } from '@/lib/contracts/sign-in'
import { definePersonRoute } from '@/lib/server/http/define-person-route'
import { changePassword } from '@/lib/server/people/change-password'

/** A new password; every other device is signed out. */
export const PUT = definePersonRoute({
  body: changePasswordSchema,
  response: doneSchema,
  async handler({ person, body }) {
    await changePassword(person, body)
    return { done: true as const }
  },
})
