import { z } from 'zod'
import type { AnswerContent } from '@/lib/advance/answer'
import { idSchema, remarkSchema } from './common'
import { cymbalSpecSchema, drumSpecSchema } from './kit'

const count = z.number('write a count').int('whole pieces').min(0, 'from 0').max(999, 'at most 999')
const part = count.min(1, 'at least 1')
const words = z.string().trim().max(400, 'at most 400 characters')

const insteadSchema = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('drum'),
    diameterIn: drumSpecSchema.shape.diameterIn,
    depthIn: drumSpecSchema.shape.depthIn,
    lugs: drumSpecSchema.shape.lugs,
    words,
  }),
  z.object({ kind: z.literal('cymbal'), diameterIn: cymbalSpecSchema.shape.diameterIn, words }),
  z.object({ kind: z.literal('other'), words: words.min(1, 'say what comes instead') }),
])

/** One answer to one line. Whether its counts are the count asked for is checked against the line. */
export const answerContentSchema: z.ZodType<AnswerContent> = z.object({
  asAsked: count,
  instead: z.array(z.object({ n: part, what: insteadSchema })).max(20, 'at most 20 kinds instead'),
  notYet: z
    .array(z.object({ n: part, by: z.iso.date('give the date by which you know, as YYYY-MM-DD') }))
    .max(20, 'at most 20 dates'),
  cant: count,
})

const answererName = z.string().trim().min(1, 'say who answers').max(120, 'at most 120 characters')
const answered = {
  /** Made by the client: the same id again is the same answer. */
  id: idSchema,
  lineId: idSchema,
  lineHash: z.string().min(1).max(128),
  content: answerContentSchema,
  remark: remarkSchema,
}

/** What the reply page sends: one line's answer, or "that's all from us". */
export const replyEventSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('answer'), ...answered, byName: answererName }),
  z.object({ kind: z.literal('close'), id: idSchema, byName: answererName }),
])
export type ReplyEvent = z.infer<typeof replyEventSchema>

export const takenHows = ['phone', 'mail', 'in person'] as const
export const takenHowWords: Record<(typeof takenHows)[number], string> = {
  phone: 'by phone',
  mail: 'by mail',
  'in person': 'in person',
}

/** An answer that came some other way, taken down by a signed-in person. */
export const takeDownSchema = z.object({
  ...answered,
  from: z.string().trim().min(1, 'say who gave the answer').max(120, 'at most 120 characters'),
  how: z.enum(takenHows, 'choose how it came'),
  /** When it was said. */
  at: z.iso.datetime({ offset: true, error: 'give the time at which it was said' }),
})
export type TakeDown = z.infer<typeof takeDownSchema>

/** Decisions about answers; all of them or none. */
export const settleSchema = z.object({
  decisions: z
    .array(
      z.object({
        id: idSchema,
        lineId: idSchema,
        answerEventId: idSchema,
        decision: z.enum(['accept', 'reopen'], 'choose to settle or to ask again'),
        remark: remarkSchema,
      }),
    )
    .min(1, 'choose at least one line')
    .max(200, 'at most 200 lines at once')
    .refine((list) => new Set(list.map((entry) => entry.lineId)).size === list.length, 'each line once'),
})
export type Settle = z.infer<typeof settleSchema>

export const savedSchema = z.object({ saved: z.number().int() })

/** One line as its reader sees it. */
export const replyLineSchema = z.object({
  lineId: idSchema,
  hash: z.string(),
  number: z.number().int(),
  /** The rig and revision that ask for it: "fly rig, revision 1". */
  spec: z.string(),
  kind: z.string(),
  count: z.number().int(),
  words: z.string(),
  details: z.array(z.string()),
  insteadOf: z.string().nullable(),
  /** Sizes as asked, to begin an "instead" from. */
  size: z
    .object({ diameterIn: z.number(), depthIn: z.number().nullable(), lugs: z.number().int().nullable() })
    .nullable(),
  state: z.enum(['unanswered', 'answered', 'settled', 'changed since']),
  /** What stands, or stood before the line changed. */
  answer: z.object({ content: answerContentSchema, remark: z.string(), byName: z.string() }).nullable(),
  /** What changed since it was answered. */
  changes: z.array(z.string()),
  /** Why it is asked again; null when it is not. */
  askedAgain: z.object({ remark: z.string() }).nullable(),
})
export type ReplyLine = z.infer<typeof replyLineSchema>

/** All that a link shows: nothing of other recipients, no price. */
export const replySchema = z.object({
  party: z.string(),
  recipient: z.string(),
  title: z.string(),
  /** "Full rig, revision 7"; each of them where the shows play several rigs. */
  spec: z.string(),
  due: z.string().nullable(),
  shows: z.array(z.object({ title: z.string(), date: z.string() })),
  lines: z.array(replyLineSchema),
  closed: z.object({ byName: z.string(), at: z.string() }).nullable(),
  /** The packs whose PDF is made; several where the shows play several rigs, each with its `spec`. */
  pdfs: z.array(z.object({ packId: idSchema, spec: z.string(), pages: z.number().int().nullable() })),
})
export type Reply = z.infer<typeof replySchema>

export const replyAnsweredSchema = z.object({ line: replyLineSchema.nullable(), closed: replySchema.shape.closed })
export type ReplyAnswered = z.infer<typeof replyAnsweredSchema>
