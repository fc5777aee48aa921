import { z } from 'zod'
import { daysBetween } from '@/lib/staging/calendar'
import { dateSchema, idSchema, nameSchema, remarkSchema, versionSchema, wallTimeSchema, zoneSchema } from './common'
import { listQuerySchema } from './list'

export const dayKinds = ['show', 'travel', 'off', 'rehearsal'] as const
export type DayKind = (typeof dayKinds)[number]
export const dayKindWords: Record<DayKind, string> = {
  show: 'show',
  travel: 'travel',
  off: 'day off',
  rehearsal: 'rehearsal',
}

/** A run can be a season long; a span past this is a slip of the year. */
const longestSpanDays = 400

const span = { firstDate: dateSchema, lastDate: dateSchema }

function checkSpan(input: { firstDate: string; lastDate: string }, context: z.RefinementCtx): void {
  const say = (message: string) => context.addIssue({ code: 'custom', path: ['lastDate'], message })
  if (input.lastDate < input.firstDate) say('on or after the first date')
  else if (daysBetween(input.firstDate, input.lastDate) >= longestSpanDays)
    say(`at most ${longestSpanDays} days at once`)
}

export const rigInputSchema = z.object({
  name: nameSchema,
  position: z.number('write its place in the order').int('whole numbers').min(0, 'from 0').max(99, 'up to 99'),
})
export type RigInput = z.infer<typeof rigInputSchema>
export const createRigSchema = z.object({ id: idSchema.optional(), rig: rigInputSchema })
export const updateRigSchema = z.object({ version: versionSchema, rig: rigInputSchema })
export const rigSchema = rigInputSchema.extend({ id: idSchema, tourId: idSchema, version: versionSchema })
export type Rig = z.infer<typeof rigSchema>

/** A tour begins with its first rig, the days between two dates and, in a new party, its player. */
export const newTourInputSchema = z
  .object({
    name: nameSchema,
    rigName: nameSchema,
    /** Makes a player of this name; null where the party's players are enough. */
    playerName: nameSchema.nullable(),
    ...span,
  })
  .superRefine(checkSpan)
export type NewTourInput = z.infer<typeof newTourInputSchema>
export const createTourSchema = z.object({
  id: idSchema.optional(),
  rigId: idSchema.optional(),
  tour: newTourInputSchema,
})
export const tourInputSchema = z.object({ name: nameSchema })
export type TourInput = z.infer<typeof tourInputSchema>
export const updateTourSchema = z.object({ version: versionSchema, tour: tourInputSchema })
export const tourSchema = z.object({ id: idSchema, name: z.string(), version: versionSchema })
export type Tour = z.infer<typeof tourSchema>

export const newDaysInputSchema = z
  .object({ ...span, kind: z.enum(dayKinds, 'choose what the days are'), remark: remarkSchema })
  .superRefine(checkSpan)
export type NewDaysInput = z.infer<typeof newDaysInputSchema>
export const createDaysSchema = z.object({ days: newDaysInputSchema })
export const dayInputSchema = z.object({ kind: z.enum(dayKinds, 'choose what the day is'), remark: remarkSchema })
export type DayInput = z.infer<typeof dayInputSchema>
export const updateDaySchema = z.object({ version: versionSchema, day: dayInputSchema })
export const daySchema = dayInputSchema.extend({
  id: idSchema,
  tourId: idSchema,
  date: z.string(),
  version: versionSchema,
})
export type Day = z.infer<typeof daySchema>
/** The days that were made; those that were there already are left as they are. */
export const madeDaysSchema = z.object({ days: z.array(daySchema), alreadyThere: z.number().int() })

const minutes = z.number('write minutes').int('whole minutes').min(0, 'from 0').max(240, 'up to 240 minutes')

/** A festival slot: minutes, and where a rolling riser may wait. */
export const slotSchema = z.object({
  changeoverMin: minutes,
  lineCheckMin: minutes,
  riserParking: z.string().trim().max(200, 'at most 200 characters'),
})
export type Slot = z.infer<typeof slotSchema>

/** A kit shared with other acts: whose it is and what may be done to it. */
export const sharedKitSchema = z.object({
  owner: nameSchema,
  mayRetune: z.boolean(),
  maySwap: z.string().trim().max(200, 'at most 200 characters'),
})
export type SharedKit = z.infer<typeof sharedKitSchema>

/** A date and a time as the wall at the place shows them. */
export const wallSchema = z.object({ date: dateSchema, time: wallTimeSchema })

export const showInputSchema = z
  .object({
    name: z.string().trim().max(120, 'at most 120 characters'),
    dayId: z.uuid('choose a day of the run'),
    rigId: z.uuid('choose a rig of this tour'),
    stageId: z.uuid('choose a stage from the directory'),
    playerId: z.uuid('choose a player'),
    /** Null takes the venue's, and stays unknown while the venue's is. */
    zone: zoneSchema.nullable(),
    loadInTime: wallTimeSchema.nullable(),
    showTime: wallTimeSchema.nullable(),
    showDayOffset: z.union([z.literal(0), z.literal(1)], 'the same day or the day after'),
    answersDue: wallSchema.nullable(),
    slot: slotSchema.nullable(),
    sharedKit: sharedKitSchema.nullable(),
  })
  .superRefine(({ loadInTime, showTime, showDayOffset }, context) => {
    if (!loadInTime || !showTime || showDayOffset > 0 || showTime > loadInTime) return
    const message = `after the load-in at ${loadInTime}; a show after midnight falls on +1 day`
    context.addIssue({ code: 'custom', path: ['showTime'], message })
  })
export type ShowInput = z.infer<typeof showInputSchema>
export const createShowSchema = z.object({ id: idSchema.optional(), show: showInputSchema })
export const updateShowSchema = z.object({ version: versionSchema, show: showInputSchema })
/** A show with the names of what it stands on, so that no reader has to look them up. */
export const showSchema = z.object({
  id: idSchema,
  tourId: idSchema,
  dayId: idSchema,
  date: z.string(),
  name: z.string(),
  rigId: idSchema,
  rigName: z.string(),
  stageId: idSchema,
  stageName: z.string(),
  venueId: idSchema,
  venueName: z.string(),
  town: z.string(),
  playerId: idSchema,
  playerName: z.string(),
  zone: z.string().nullable(),
  loadInTime: z.string().nullable(),
  showTime: z.string().nullable(),
  showDayOffset: z.number().int(),
  /** The instant, derived; and what the wall at the place shows then. */
  answersDueAt: z.string().nullable(),
  answersDue: z.object({ date: z.string(), time: z.string() }).nullable(),
  slot: slotSchema.nullable(),
  sharedKit: sharedKitSchema.nullable(),
  version: versionSchema,
})
export type Show = z.infer<typeof showSchema>

/** A show as a form holds it and a route takes it. */
export function showInputOf(show: Show): ShowInput {
  const { name, dayId, rigId, stageId, playerId, zone, loadInTime, showTime, answersDue, slot, sharedKit } = show
  const showDayOffset = show.showDayOffset === 1 ? 1 : 0
  return {
    name,
    dayId,
    rigId,
    stageId,
    playerId,
    zone,
    loadInTime,
    showTime,
    showDayOffset,
    answersDue,
    slot,
    sharedKit,
  }
}

export const tourFilters = ['all', 'ahead', 'over'] as const
export const tourListQuery = listQuerySchema(['first', 'name'], tourFilters)
export type TourListQuery = z.infer<typeof tourListQuery>
export const runListQuery = listQuerySchema(['date', 'venue'], ['all', ...dayKinds, 'no-zone'])
export type RunListQuery = z.infer<typeof runListQuery>
