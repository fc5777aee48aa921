import { db } from '@/db/client'
import type { Db } from '@/db/client'
import { listContacts, wasWrittenTo } from '@/db/queries/contact'
import { lockShowsOfVenue, setShowZone } from '@/db/queries/show'
import { listStages } from '@/db/queries/stage'
import { deleteVenue, findVenue, insertVenue, listVenues, updateVenue, venueHasShows } from '@/db/queries/venue'
import type { Venue, VenueInput, VenueListQuery } from '@/lib/contracts/directory'
import { audit } from '@/lib/server/audit/audit'
import type { Actor, MemberActor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'
import { changedOr, notThere, stillInUse, thereAlready } from '@/lib/server/refusals'
import { instantOfWallTime, wallTimeOfInstant } from '@/lib/staging/wall-time'

export async function readVenues(actor: Actor, query: VenueListQuery) {
  assertCan(actor, 'party:read')
  return listVenues(db(), actor, query)
}

/** A venue with its stages and the people there. */
export async function readVenue(actor: Actor, venueId: string) {
  assertCan(actor, 'party:read')
  const venue = await findVenue(db(), actor, venueId)
  if (!venue) throw notThere('venue')
  const [stages, contacts] = await Promise.all([
    listStages(db(), actor, venueId),
    listContacts(db(), actor, { venueId }),
  ])
  return { venue, stages, contacts }
}

export async function createVenue(actor: Actor, input: { id?: string | undefined; venue: VenueInput }): Promise<Venue> {
  assertCan(actor, 'directory:edit')
  return db().transaction(async (tx) => {
    const made = await insertVenue(tx, actor, { ...input.venue, id: input.id })
    if (!made) return thereAlready(input.id ? await findVenue(tx, actor, input.id) : undefined)
    await audit(tx, actor, 'venue.added', { type: 'venue', id: made.id }, { name: made.name })
    await notifyLive(tx, actor.partyId, [`directory:${actor.partyId}`])
    return made
  })
}

/** Shows that go by the venue's zone follow it: their wall times stay, the instants move. */
export async function changeVenue(
  actor: Actor,
  input: { venueId: string; version: number; venue: VenueInput },
): Promise<Venue> {
  assertCan(actor, 'directory:edit')
  return db().transaction(async (tx) => {
    const before = await findVenue(tx, actor, input.venueId)
    if (!before) throw notThere('venue')
    const changed = await updateVenue(tx, actor, { id: before.id, version: input.version, venue: input.venue })
    const venue = await changedOr('venue', changed, () => findVenue(tx, actor, before.id))
    const tours = venue.zone && venue.zone !== before.zone ? await moveShows(tx, actor, venue, before.zone) : []
    await audit(tx, actor, 'venue.changed', { type: 'venue', id: venue.id }, { from: before, to: input.venue })
    await notifyLive(tx, actor.partyId, [`directory:${actor.partyId}`, ...tours.map((id) => `run:${id}` as const)])
    return venue
  })
}

async function moveShows(tx: Db, actor: MemberActor, venue: Venue, oldZone: string | null): Promise<string[]> {
  const shows = await lockShowsOfVenue(tx, actor, venue.id)
  const following = shows.filter((show) => show.zone === null || show.zone === oldZone)
  for (const { id, zone, answersDueAt } of following) {
    const due =
      answersDueAt && zone && venue.zone
        ? instantOfWallTime(wallTimeOfInstant(answersDueAt, zone), venue.zone)
        : answersDueAt
    await setShowZone(tx, actor, { id, zone: venue.zone, answersDueAt: due })
  }
  return [...new Set(following.map((show) => show.tourId))]
}

export async function removeVenue(actor: Actor, input: { venueId: string; version: number }): Promise<Venue> {
  assertCan(actor, 'directory:edit')
  return db().transaction(async (tx) => {
    const venue = await findVenue(tx, actor, input.venueId)
    if (!venue) throw notThere('venue')
    if (await venueHasShows(tx, actor, venue.id)) {
      throw stillInUse(`${venue.name} has shows. Give them another stage first, or take them off the run.`)
    }
    if (await wasWrittenTo(tx, actor, { venueId: venue.id })) {
      throw stillInUse(`Somebody at ${venue.name} has had mail or a link, and the record of it names them.`)
    }
    const gone = await deleteVenue(tx, actor, { id: venue.id, version: input.version })
    await changedOr('venue', gone ? venue : undefined, () => findVenue(tx, actor, venue.id))
    await audit(tx, actor, 'venue.removed', { type: 'venue', id: venue.id }, { was: venue })
    await notifyLive(tx, actor.partyId, [`directory:${actor.partyId}`])
    return venue
  })
}
