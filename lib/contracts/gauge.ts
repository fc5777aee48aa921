import { z } from 'zod'
import { MOST_PAIRS } from '@/lib/tuning/gauge-calibration'
import { readingLimits } from '@/lib/tuning/reading-limits'
import { idSchema, nameSchema, remarkSchema, versionSchema } from './common'
import { drumSpecSchema, headSchema } from './kit'

/** A party's gauges and the pairs that calibrate them. */

/** More than any party carries; beyond it something has gone wrong. */
export const gaugeLimit = 40
/** Standing pairs of one gauge; struck ones do not count. */
export const gaugePairLimit = MOST_PAIRS

const dial = (what: string) => z.number(what).min(-1000, 'at least −1000').max(10_000, 'at most 10000')

export const gaugeScaleSchema = z
  .object({
    min: dial('write where the dial begins'),
    max: dial('write where the dial ends'),
    /** One division of the dial. */
    step: z.number('write one division of the dial').min(0.001, 'at least 0.001').max(1000, 'at most 1000'),
  })
  .superRefine(({ min, max, step }, context) => {
    const fault = (path: string, message: string) => context.addIssue({ code: 'custom', path: [path], message })
    if (max <= min) fault('max', 'the dial ends over where it begins')
    else if (step > max - min) fault('step', 'one division is no longer than the dial')
  })

export const gaugeInputSchema = z.object({ name: nameSchema, scale: gaugeScaleSchema, remark: remarkSchema })
export type GaugeInput = z.infer<typeof gaugeInputSchema>
export const createGaugeSchema = z.object({ id: idSchema.optional(), gauge: gaugeInputSchema })
export const updateGaugeSchema = z.object({ version: versionSchema, gauge: gaugeInputSchema })

const { min: leastHz, max: mostHz } = readingLimits.Hz

export const gaugePairInputSchema = z.object({
  reading: dial('write what the gauge read'),
  diameterIn: drumSpecSchema.shape.diameterIn,
  depthIn: drumSpecSchema.shape.depthIn,
  plyMils: headSchema.shape.plyMils,
  film: headSchema.shape.film,
  coatingGPerM2: headSchema.shape.coatingGPerM2,
  /** Pitch of a tap near a lug, the other head damped. */
  tapHz: z
    .number('write the tap in Hz, such as 251.5')
    .min(leastHz, `at least ${leastHz} Hz`)
    .max(mostHz, `at most ${mostHz} Hz`),
  temperatureC: z.number('write degrees').min(-30, 'at least −30 °C').max(60, 'at most 60 °C').nullable(),
  /** Which head it was, in its reader's words. */
  remark: z.string().trim().max(200, 'at most 200 characters'),
})
export type GaugePairInput = z.infer<typeof gaugePairInputSchema>
export const addGaugePairSchema = z.object({ id: idSchema.optional(), pair: gaugePairInputSchema })

export const gaugePairSchema = gaugePairInputSchema.extend({
  id: idSchema,
  gaugeId: idSchema,
  at: z.string(),
  byName: z.string(),
  struck: z.boolean(),
})
export type GaugePairRow = z.infer<typeof gaugePairSchema>

export const gaugeSchema = gaugeInputSchema.extend({
  id: idSchema,
  version: versionSchema,
  toursGauge: z.boolean(),
  removed: z.boolean(),
})
export type Gauge = z.infer<typeof gaugeSchema>

/** A gauge with all its pairs, oldest first, struck ones too. */
export const gaugeWithPairsSchema = z.object({ gauge: gaugeSchema, pairs: z.array(gaugePairSchema) })
export type GaugeWithPairs = z.infer<typeof gaugeWithPairsSchema>

/** Every gauge of the party, each with how many pairs stand. */
export const gaugesSchema = z.object({ gauges: z.array(gaugeSchema.extend({ pairs: z.number().int() })) })
export type Gauges = z.infer<typeof gaugesSchema>

/** Which gauge goes on tour; null: none does. The last choice holds. */
export const chooseToursGaugeSchema = z.object({ gaugeId: idSchema.nullable() })

/** A head that a pair or a question can name by its drum, out of the party's kits. */
export type KnownHead = {
  /** Its drum, size and film; no two are alike. */
  readonly words: string
  readonly diameterIn: number
  readonly depthIn: number
  readonly plyMils: number[]
  readonly film: GaugePairInput['film']
  readonly coatingGPerM2: number
  /** On a ported drum or one with a single head. */
  readonly openShell: boolean
  /** The tap that its note asks for, Hz; null while it has no note. */
  readonly tapHz: number | null
}
