import { db } from '@/db/client'
import { insertDays } from '@/db/queries/day'
import { insertPlayer, listPlayerNames } from '@/db/queries/player'
import { insertRig } from '@/db/queries/rig'
import { deleteTour, findTour, findTourHangers, insertTour, listTours, lockTour, updateTour } from '@/db/queries/tour'
import type { NewTourInput, Tour, TourInput, TourListQuery } from '@/lib/contracts/tour'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'
import { changedOr, fieldFault, notThere, stillInUse, thereAlready } from '@/lib/server/refusals'
import { datesOf } from '@/lib/staging/calendar'

export async function readTours(actor: Actor, query: TourListQuery) {
  assertCan(actor, 'party:read')
  return listTours(db(), actor, { ...query, today: new Date().toISOString().slice(0, 10) })
}

/** A tour with its first rig and its days, all of them off until something is put on them; a new party's player with it. */
export async function createTour(
  actor: Actor,
  input: { id?: string | undefined; rigId?: string | undefined; tour: NewTourInput },
): Promise<Tour> {
  assertCan(actor, 'tour:edit')
  const { name, rigName, playerName, firstDate, lastDate } = input.tour
  return db().transaction(async (tx) => {
    const made = await insertTour(tx, actor, { id: input.id, name })
    if (!made) return thereAlready(input.id ? await findTour(tx, actor, input.id) : undefined)
    const rig = await insertRig(tx, actor, { id: input.rigId, tourId: made.id, name: rigName, position: 0 })
    if (!rig) throw fieldFault('rigId', 'this id is taken already')
    await insertDays(tx, actor, { tourId: made.id, dates: datesOf(firstDate, lastDate), kind: 'off', remark: '' })
    if (playerName !== null) {
      await insertPlayer(tx, actor, { name: playerName, hand: 'right', throneHeightM: null })
    } else if ((await listPlayerNames(tx, actor)).length === 0) {
      throw fieldFault('tour.playerName', 'give the name of who plays')
    }
    await audit(tx, actor, 'tour.added', { type: 'tour', id: made.id }, { name, rigName, firstDate, lastDate })
    await notifyLive(tx, actor.partyId, [`run:${made.id}`, `party:${actor.partyId}`, `directory:${actor.partyId}`])
    return made
  })
}

export async function changeTour(
  actor: Actor,
  input: { tourId: string; version: number; tour: TourInput },
): Promise<Tour> {
  assertCan(actor, 'tour:edit')
  return db().transaction(async (tx) => {
    const before = await findTour(tx, actor, input.tourId)
    if (!before) throw notThere('tour')
    const changed = await updateTour(tx, actor, { id: before.id, version: input.version, tour: input.tour })
    const tour = await changedOr('tour', changed, () => findTour(tx, actor, before.id))
    await audit(tx, actor, 'tour.changed', { type: 'tour', id: tour.id }, { from: before.name, to: tour.name })
    await notifyLive(tx, actor.partyId, [`run:${tour.id}`, `party:${actor.partyId}`])
    return tour
  })
}

export async function removeTour(actor: Actor, input: { tourId: string; version: number }): Promise<Tour> {
  assertCan(actor, 'tour:edit')
  return db().transaction(async (tx) => {
    const tour = await lockTour(tx, actor, input.tourId)
    if (!tour) throw notThere('tour')
    const hangers = await findTourHangers(tx, actor, tour.id)
    if (hangers?.shows) throw stillInUse(`${tour.name} has shows. Take them off the run first.`)
    if (hangers?.hires) throw stillInUse(`${tour.name} has hires. Take them away first.`)
    if (hangers?.revisions) throw stillInUse(`A revision of ${tour.name} was issued, and what was issued is kept.`)
    const gone = await deleteTour(tx, actor, { id: tour.id, version: input.version })
    await changedOr('tour', gone ? tour : undefined, () => findTour(tx, actor, tour.id))
    await audit(tx, actor, 'tour.removed', { type: 'tour', id: tour.id }, { was: tour })
    await notifyLive(tx, actor.partyId, [`run:${tour.id}`, `party:${actor.partyId}`])
    return tour
  })
}
