import { z } from 'zod'
import { lengthBound } from '@/lib/staging/length'
import { idSchema, nameSchema, versionSchema } from './common'
import { listQuerySchema } from './list'

export const hands = ['right', 'left'] as const
export type Hand = (typeof hands)[number]

/** Who sits behind the kit. */
export const playerInputSchema = z.object({
  name: nameSchema,
  hand: z.enum(hands, 'choose right or left'),
  /** Top of the seat over the floor, m. */
  throneHeightM: z
    .number('write a height such as 52 cm or 20 in')
    .min(0.3, `at least ${lengthBound(0.3)}`)
    .max(1, `at most ${lengthBound(1)}`)
    .nullable(),
})
export type PlayerInput = z.infer<typeof playerInputSchema>
export const createPlayerSchema = z.object({ id: idSchema.optional(), player: playerInputSchema })
export const updatePlayerSchema = z.object({ version: versionSchema, player: playerInputSchema })
export const playerSchema = playerInputSchema.extend({ id: idSchema, version: versionSchema })
export type Player = z.infer<typeof playerSchema>

export const playerListQuery = listQuerySchema(['name', 'hand'], ['all', 'right', 'left'])
export type PlayerListQuery = z.infer<typeof playerListQuery>
