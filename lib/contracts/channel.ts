import { z } from 'zod'
import { idSchema, versionSchema } from './common'

/** A channel of a rig's patch: it takes one output of one piece on the plot, or waits for one. */
export const channelInputSchema = z
  .object({
    number: z.number('write a channel number').int('whole numbers').min(1, 'from 1').max(512, 'up to 512'),
    name: z.string().trim().max(60, 'at most 60 characters'),
    pieceId: idSchema.nullable(),
    output: z.string().trim().max(24, 'at most 24 characters'),
    stand: z.string().trim().max(60, 'at most 60 characters'),
    phantom: z.boolean(),
  })
  .refine((channel) => channel.pieceId === null || channel.output !== '', {
    path: ['output'],
    message: 'choose the output it takes',
  })
export type ChannelInput = z.infer<typeof channelInputSchema>

export const createChannelSchema = z.object({ id: idSchema.optional(), channel: channelInputSchema })
export const updateChannelSchema = z.object({ version: versionSchema, channel: channelInputSchema })
export const removeChannelSchema = z.object({ version: versionSchema })

export const channelSchema = z.object({
  id: idSchema,
  rigId: idSchema,
  number: z.number().int(),
  name: z.string(),
  pieceId: idSchema.nullable(),
  output: z.string(),
  stand: z.string(),
  phantom: z.boolean(),
  version: versionSchema,
})
export type Channel = z.infer<typeof channelSchema>

export const channelListSchema = z.object({ rigId: idSchema, channels: z.array(channelSchema) })
