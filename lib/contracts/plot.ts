import { z } from 'zod'
import type { PlotCommand } from '@/plots/model/command'
import { PLOT_LIMITS, pieceSets } from '@/plots/model/document'
import type { Piece, PlotDocument } from '@/plots/model/document'
import { idSchema } from './common'

/**
 * The plot of a rig over HTTP: the document at a sequence, and commands on top of it. The values' own rules (a drum
 * stands once, a piece must be there) are the model's; this is the shape and the size.
 */

const coordinateSchema = z
  .number('write metres')
  .min(-PLOT_LIMITS.coordinateM, `at least -${PLOT_LIMITS.coordinateM} m`)
  .max(PLOT_LIMITS.coordinateM, `at most ${PLOT_LIMITS.coordinateM} m`)
const sizeSchema = z
  .number('write metres')
  .min(PLOT_LIMITS.sizeMinM, `at least ${PLOT_LIMITS.sizeMinM} m`)
  .max(PLOT_LIMITS.sizeMaxM, `at most ${PLOT_LIMITS.sizeMaxM} m`)
  .nullable()
const heightSchema = z
  .number('write metres')
  .min(0, 'at least 0 m')
  .max(PLOT_LIMITS.heightMaxM, `at most ${PLOT_LIMITS.heightMaxM} m`)
  .nullable()
const angleSchema = z.number('write degrees').min(-3600, 'at least -3600°').max(3600, 'at most 3600°')
const labelSchema = z.string().max(PLOT_LIMITS.labelLength, `at most ${PLOT_LIMITS.labelLength} characters`)
const setSchema = z.enum(pieceSets, 'choose ours, support or changeover')
const outputsSchema = z
  .array(z.string().trim().min(1, 'name the output').max(PLOT_LIMITS.outputLength))
  .max(PLOT_LIMITS.outputs, `at most ${PLOT_LIMITS.outputs} outputs`)
  .nullable()
const stageSizeSchema = z.number('write metres').min(PLOT_LIMITS.stageMinM).max(PLOT_LIMITS.stageMaxM)

/** Loose: what a newer release knows of a piece passes through unread and is kept. */
export const pieceSchema: z.ZodType<Piece> = z.looseObject({
  id: idSchema,
  kind: z.string().min(1).max(40),
  kitEntryId: idSchema.nullable(),
  xM: coordinateSchema,
  yM: coordinateSchema,
  rotationDeg: angleSchema,
  zM: heightSchema,
  widthM: sizeSchema,
  depthM: sizeSchema,
  heightM: heightSchema,
  label: labelSchema,
  aim: z.object({ pieceId: idSchema }).nullable(),
  set: setSchema,
  locked: z.boolean(),
  outputs: outputsSchema,
})

const list = <Item extends z.ZodType>(item: Item) =>
  z
    .array(item)
    .min(1, 'name a piece')
    .max(PLOT_LIMITS.piecesPerCommand, `at most ${PLOT_LIMITS.piecesPerCommand} pieces at once`)
const maker = { clientId: idSchema }

export const plotCommandSchema: z.ZodType<PlotCommand> = z.discriminatedUnion('type', [
  z.strictObject({ ...maker, type: z.literal('place'), pieces: list(pieceSchema) }),
  z.strictObject({ ...maker, type: z.literal('remove'), pieceIds: list(idSchema) }),
  z.strictObject({
    ...maker,
    type: z.literal('move'),
    moves: list(z.strictObject({ pieceId: idSchema, xM: coordinateSchema, yM: coordinateSchema })),
  }),
  z.strictObject({
    ...maker,
    type: z.literal('rotate'),
    turns: list(z.strictObject({ pieceId: idSchema, rotationDeg: angleSchema })),
  }),
  z.strictObject({
    ...maker,
    type: z.literal('edit'),
    pieceId: idSchema,
    changes: z
      .strictObject({
        label: labelSchema,
        zM: heightSchema,
        widthM: sizeSchema,
        depthM: sizeSchema,
        heightM: heightSchema,
        set: setSchema,
        locked: z.boolean(),
        outputs: outputsSchema,
      })
      .partial(),
  }),
  z.strictObject({ ...maker, type: z.literal('aim'), pieceId: idSchema, at: idSchema.nullable() }),
  z.strictObject({
    ...maker,
    type: z.literal('setStage'),
    stage: z.strictObject({ widthM: stageSizeSchema, depthM: stageSizeSchema }),
  }),
])

const sequenceSchema = z.number().int().min(0)

export const appendCommandsSchema = z.object({
  /** The sequence of the document that the commands were made on. */
  baseSequence: sequenceSchema,
  commands: z
    .array(plotCommandSchema)
    .min(1, 'send at least one command')
    .max(100, 'at most 100 commands at once')
    .refine((commands) => new Set(commands.map((command) => command.clientId)).size === commands.length, {
      message: 'each command has its own clientId',
    }),
})
export type AppendCommands = z.infer<typeof appendCommandsSchema>

export const acceptedCommandsSchema = z.object({
  /** The plot's sequence now. */
  sequence: sequenceSchema,
  accepted: z.array(z.object({ clientId: idSchema, sequence: sequenceSchema })),
})

export const plotDocumentSchema: z.ZodType<PlotDocument> = z.looseObject({
  schemaVersion: z.number().int().min(1),
  stage: z.looseObject({ widthM: z.number(), depthM: z.number() }),
  pieces: z.record(z.string(), pieceSchema),
})

export const plotSchema = z.object({ rigId: idSchema, sequence: sequenceSchema, document: plotDocumentSchema })
export type PlotAnswer = z.infer<typeof plotSchema>

export const missedCommandSchema = z.object({
  sequence: sequenceSchema,
  command: plotCommandSchema,
  /** Who did it, by name. */
  by: z.string(),
})
export type MissedCommand = z.infer<typeof missedCommandSchema>

/** The most commands told at once; a reader further behind reads the document instead. */
export const MISSED_LIMIT = 500

export const missedCommandsSchema = z.object({
  sequence: sequenceSchema,
  /** Null when there are more than can be told: read the document again. */
  missed: z.array(missedCommandSchema).nullable(),
})
export type MissedCommands = z.infer<typeof missedCommandsSchema>

export const missedQuerySchema = z.object({
  after: z.coerce.number('write a sequence').int().min(0).max(2_147_483_647),
})
