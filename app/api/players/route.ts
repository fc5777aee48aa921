import { createPlayerSchema, playerSchema } from '@/lib/contracts/player'
import { defineRoute } from '@/lib/server/http/define-route'
import { createPlayer } from '@/lib/server/players/players'

export const POST = defineRoute({
  body: createPlayerSchema,
  response: playerSchema,
  status: 201,
  handler: ({ actor, body }) => createPlayer(actor, body),
})
