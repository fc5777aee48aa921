import { partySchema, updatePartySchema } from '@/lib/contracts/party'
import { defineRoute } from '@/lib/server/http/define-route'
import { changePartySettings, readParty } from '@/lib/server/party/party-settings'

/** The party in hand: which one is the session's to say, never the request's. */
export const GET = defineRoute({ response: partySchema, handler: ({ actor }) => readParty(actor) })

export const PATCH = defineRoute({
  body: updatePartySchema,
  response: partySchema,
  handler: ({ actor, body }) => changePartySettings(actor, body),
})
