import { randomUUID } from 'node:crypto'
import { db } from '@/db/client'
import type { Db } from '@/db/client'
import { countShowsOfDay, lockDay, makeShowDay } from '@/db/queries/day'
import { findPlayer } from '@/db/queries/player'
import { findRig } from '@/db/queries/rig'
import { withdrawGrantsOfShow } from '@/db/queries/grant'
import type { ShowRow } from '@/db/queries/show'
import { deleteShow, findShow, findShowHangers, insertShow, lockShow, updateShow } from '@/db/queries/show'
import { findStageVenue } from '@/db/queries/stage'
import { findTour } from '@/db/queries/tour'
import type { Show, ShowInput } from '@/lib/contracts/tour'
import { audit } from '@/lib/server/audit/audit'
import type { Actor, MemberActor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { extendLinksOfShow } from '@/lib/server/grants/extend-links'
import { notifyLive } from '@/lib/server/live/notify-live'
import { changedOr, fieldFault, notThere, stillInUse, thereAlready } from '@/lib/server/refusals'
import { instantOfWallTime } from '@/lib/staging/wall-time'
import { showAnswer } from './show-answer'

export async function readShow(actor: Actor, showId: string): Promise<Show> {
  assertCan(actor, 'party:read')
  const row = await findShow(db(), actor, showId)
  if (!row) throw notThere('show')
  return showAnswer(row)
}

export async function createShow(
  actor: Actor,
  input: { tourId: string; id?: string | undefined; show: ShowInput },
): Promise<Show> {
  assertCan(actor, 'show:edit')
  return db().transaction(async (tx) => {
    if (!(await findTour(tx, actor, input.tourId))) throw notThere('tour')
    const id = input.id ?? randomUUID()
    const there = await findShow(tx, actor, id)
    if (there) return showAnswer(there)
    const { values } = await checkShow(tx, actor, input.tourId, input.show, null)
    if (!(await insertShow(tx, actor, { ...values, id, tourId: input.tourId }))) return thereAlready<Show>(undefined)
    await makeShowDay(tx, actor, values.dayId)
    await audit(tx, actor, 'show.added', { type: 'show', id }, { tourId: input.tourId, ...input.show })
    await notifyLive(tx, actor.partyId, [`run:${input.tourId}`])
    return showAnswer(await shownNow(tx, actor, id))
  })
}

export async function changeShow(
  actor: Actor,
  input: { showId: string; version: number; show: ShowInput },
): Promise<Show> {
  assertCan(actor, 'show:edit')
  return db().transaction(async (tx) => {
    const before = await findShow(tx, actor, input.showId)
    if (!before) throw notThere('show')
    const { values, venueId } = await checkShow(tx, actor, before.tourId, input.show, before.id)
    if (venueId !== before.venueId) await leaveHouse(tx, actor, before)
    const changed = await updateShow(tx, actor, { id: before.id, version: input.version, show: values })
    const now = showAnswer(await shownNow(tx, actor, before.id))
    await changedOr('show', changed ? now : undefined, () => Promise.resolve(now))
    if (before.dayId !== values.dayId) {
      await makeShowDay(tx, actor, values.dayId)
      await extendLinksOfShow(tx, actor, before.id)
    }
    await audit(
      tx,
      actor,
      'show.changed',
      { type: 'show', id: before.id },
      { from: showAnswer(before), to: input.show },
    )
    await notifyLive(tx, actor.partyId, [`run:${before.tourId}`, `advance:${before.id}`, `bench:${before.id}`])
    return now
  })
}

export async function removeShow(actor: Actor, input: { showId: string; version: number }): Promise<Show> {
  assertCan(actor, 'show:edit')
  return db().transaction(async (tx) => {
    const row = await findShow(tx, actor, input.showId)
    if (!row) throw notThere('show')
    await lockShow(tx, actor, row.id)
    const show = showAnswer(row)
    const hangers = await findShowHangers(tx, actor, row.id)
    if (hangers?.hires) throw stillInUse(`A hire covers ${row.venueName}. Take this show off the hire first.`)
    if (hangers?.packs || hangers?.grants || hangers?.answers) {
      throw stillInUse(`A pack of ${row.venueName} was made or sent, and what was asked and answered is kept.`)
    }
    if (hangers?.readings || hangers?.signOffs) {
      throw stillInUse(`Readings or sign-offs were logged at ${row.venueName}, and they are kept.`)
    }
    if (hangers?.moves) throw stillInUse(`${row.venueName} has moves of its own on the plot, and they are kept.`)
    const gone = await deleteShow(tx, actor, { id: row.id, version: input.version })
    await changedOr('show', gone ? show : undefined, async () => showAnswer(await shownNow(tx, actor, row.id)))
    await audit(tx, actor, 'show.removed', { type: 'show', id: row.id }, { was: show })
    await notifyLive(tx, actor.partyId, [`run:${row.tourId}`])
    return show
  })
}

/**
 * A show that moves to another venue: the links that the first house has must not show what the second one says, and what
 * the first one said must not count for the second.
 */
async function leaveHouse(tx: Db, actor: MemberActor, show: ShowRow): Promise<void> {
  await lockShow(tx, actor, show.id)
  const hangers = await findShowHangers(tx, actor, show.id)
  if (hangers?.answers) {
    throw stillInUse(
      `${show.venueName} has answered for this show, and what it said is kept. Add a show at the other venue to this day instead.`,
    )
  }
  for (const { id, purpose } of await withdrawGrantsOfShow(tx, actor, show.id))
    await audit(tx, actor, 'link.withdraw', { type: 'grant', id }, { purpose })
}

async function shownNow(tx: Db, actor: MemberActor, id: string): Promise<ShowRow> {
  const row = await findShow(tx, actor, id)
  if (!row) throw notThere('show')
  return row
}

/** Checks what a show names against the tour and the directory; answers the row's values with the instant derived. */
async function checkShow(tx: Db, actor: MemberActor, tourId: string, show: ShowInput, exceptShowId: string | null) {
  const { answersDue, ...same } = show
  const day = await lockDay(tx, actor, show.dayId)
  if (day?.tourId !== tourId) throw fieldFault('show.dayId', 'choose a day of this run')
  if ((await countShowsOfDay(tx, actor, day.id, exceptShowId)) >= 2) {
    throw fieldFault('show.dayId', 'this day holds two shows already')
  }
  const rig = await findRig(tx, actor, show.rigId)
  if (rig?.tourId !== tourId) throw fieldFault('show.rigId', 'choose a rig of this tour')
  const stage = await findStageVenue(tx, actor, show.stageId)
  if (!stage) throw fieldFault('show.stageId', 'choose a stage from the directory')
  if (!(await findPlayer(tx, actor, show.playerId))) throw fieldFault('show.playerId', 'choose a player')
  const zone = show.zone ?? stage.zone
  if (answersDue && !zone) {
    throw fieldFault(
      'show.answersDue',
      'the zone is not known yet, so no moment follows from this; give the zone first',
    )
  }
  if (answersDue && answersDue.date > day.date) {
    throw fieldFault('show.answersDue', 'at the latest on the day of the show')
  }
  const values = { ...same, zone, answersDueAt: answersDue && zone ? instantOfWallTime(answersDue, zone) : null }
  return { values, venueId: stage.venueId }
}
