import { doneSchema, switchPartySchema } from '@/lib/contracts/sign-in'
import { definePersonRoute } from '@/lib/server/http/define-person-route'
import { takePartyInHand } from '@/lib/server/people/own-parties'

export const POST = definePersonRoute({
  body: switchPartySchema,
  response: doneSchema,
  async handler({ person, body }) {
    await takePartyInHand(person, body.partyId)
    return { done: true as const }
  },
})
