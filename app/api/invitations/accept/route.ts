import { acceptedInvitationSchema, acceptInvitationSchema } from '@/lib/contracts/sign-in'
import { currentPerson, currentSession } from '@/lib/server/auth/current-actor'
import { defineOpenRoute } from '@/lib/server/http/define-public-route'
import { acceptInvitation } from '@/lib/server/members/accept-invitation'

export const POST = defineOpenRoute({
  body: acceptInvitationSchema,
  response: acceptedInvitationSchema,
  limit: { name: 'accept-invitation', points: 30, seconds: 600 },
  async handler({ body, address }) {
    const signedIn = (await currentSession()) ? await currentPerson() : undefined
    return acceptInvitation(body, signedIn, address)
  },
})
