import { db } from '@/db/client'
import { countShowsOfDay, deleteDay, findDay, insertDays, lockDay, updateDay } from '@/db/queries/day'
import { lockTour } from '@/db/queries/tour'
import type { Day, DayInput, NewDaysInput } from '@/lib/contracts/tour'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'
import { changedOr, notThere, stillInUse } from '@/lib/server/refusals'
import { datesOf, dateWords } from '@/lib/staging/calendar'

/** Adds the days of a span that the run does not have yet; asking again adds nothing. */
export async function createDays(
  actor: Actor,
  input: { tourId: string; days: NewDaysInput },
): Promise<{ days: Day[]; alreadyThere: number }> {
  assertCan(actor, 'tour:edit')
  const { firstDate, lastDate, kind, remark } = input.days
  return db().transaction(async (tx) => {
    if (!(await lockTour(tx, actor, input.tourId))) throw notThere('tour')
    const dates = datesOf(firstDate, lastDate)
    const days = await insertDays(tx, actor, { tourId: input.tourId, dates, kind, remark })
    await audit(
      tx,
      actor,
      'days.added',
      { type: 'tour', id: input.tourId },
      { firstDate, lastDate, kind, made: days.length },
    )
    await notifyLive(tx, actor.partyId, [`run:${input.tourId}`])
    return { days, alreadyThere: dates.length - days.length }
  })
}

export async function changeDay(actor: Actor, input: { dayId: string; version: number; day: DayInput }): Promise<Day> {
  assertCan(actor, 'tour:edit')
  return db().transaction(async (tx) => {
    const before = await lockDay(tx, actor, input.dayId)
    if (!before) throw notThere('day')
    if (input.day.kind !== 'show' && (await countShowsOfDay(tx, actor, before.id, null)) > 0) {
      throw stillInUse(`${dateWords(before.date)} holds a show, so it stays a show day. Move the show first.`)
    }
    const changed = await updateDay(tx, actor, { id: before.id, version: input.version, day: input.day })
    const day = await changedOr('day', changed, () => findDay(tx, actor, before.id))
    await audit(tx, actor, 'day.changed', { type: 'day', id: day.id }, { from: before, to: input.day })
    await notifyLive(tx, actor.partyId, [`run:${day.tourId}`])
    return day
  })
}

export async function removeDay(actor: Actor, input: { dayId: string; version: number }): Promise<Day> {
  assertCan(actor, 'tour:edit')
  return db().transaction(async (tx) => {
    const day = await lockDay(tx, actor, input.dayId)
    if (!day) throw notThere('day')
    if ((await countShowsOfDay(tx, actor, day.id, null)) > 0) {
      throw stillInUse(
        `${dateWords(day.date)} holds a show. Move the show to another day or take it off the run first.`,
      )
    }
    const gone = await deleteDay(tx, actor, { id: day.id, version: input.version })
    await changedOr('day', gone ? day : undefined, () => findDay(tx, actor, day.id))
    await audit(tx, actor, 'day.removed', { type: 'day', id: day.id }, { was: day })
    await notifyLive(tx, actor.partyId, [`run:${day.tourId}`])
    return day
  })
}
