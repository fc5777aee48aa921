import { createPartySchema, partySchema } from '@/lib/contracts/party'
import { definePersonRoute } from '@/lib/server/http/define-person-route'
import { createParty } from '@/lib/server/party/create-party'

export const POST = definePersonRoute({
  body: createPartySchema,
  response: partySchema,
  status: 201,
  handler: ({ person, body }) => createParty(person, body),
})
