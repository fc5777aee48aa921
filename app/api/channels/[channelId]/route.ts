import { z } from 'zod'
import { channelSchema, removeChannelSchema, updateChannelSchema } from '@/lib/contracts/channel'
import { idSchema } from '@/lib/contracts/common'
import { defineRoute } from '@/lib/server/http/define-route'
import { changeChannel, removeChannel } from '@/lib/server/plots/channels'

const params = z.object({ channelId: idSchema })

export const PATCH = defineRoute({
  params,
  body: updateChannelSchema,
  response: channelSchema,
  handler: ({ actor, params, body }) => changeChannel(actor, { ...params, ...body }),
})

export const DELETE = defineRoute({
  params,
  body: removeChannelSchema,
  response: channelSchema,
  handler: ({ actor, params, body }) => removeChannel(actor, { ...params, ...body }),
})
