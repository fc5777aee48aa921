import { z } from 'zod'
import { channelListSchema, channelSchema, createChannelSchema } from '@/lib/contracts/channel'
import { idSchema } from '@/lib/contracts/common'
import { defineRoute } from '@/lib/server/http/define-route'
import { createChannel, readChannels } from '@/lib/server/plots/channels'

const params = z.object({ rigId: idSchema })

export const GET = defineRoute({
  params,
  response: channelListSchema,
  handler: ({ actor, params }) => readChannels(actor, params),
})

export const POST = defineRoute({
  params,
  body: createChannelSchema,
  response: channelSchema,
  status: 201,
  handler: ({ actor, params, body }) => createChannel(actor, { ...params, ...body }),
})
