import { z } from 'zod'
import { idSchema, removeSchema } from '@/lib/contracts/common'
import { playerSchema, updatePlayerSchema } from '@/lib/contracts/player'
import { defineRoute } from '@/lib/server/http/define-route'
import { changePlayer, removePlayer } from '@/lib/server/players/players'

const params = z.object({ playerId: idSchema })

export const PATCH = defineRoute({
  params,
  body: updatePlayerSchema,
  response: playerSchema,
  handler: ({ actor, params, body }) => changePlayer(actor, { ...params, ...body }),
})

export const DELETE = defineRoute({
  params,
  body: removeSchema,
  response: playerSchema,
  handler: ({ actor, params, body }) => removePlayer(actor, { ...params, ...body }),
})
