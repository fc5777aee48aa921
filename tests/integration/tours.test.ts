import { randomUUID } from 'node:crypto'
import { beforeAll, describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { auditEvent } from '@/db/schema/audit'
import { grant } from '@/db/schema/grant'
import { and, eq } from 'drizzle-orm'
import { attackRoute, faultyFields } from '../helpers/attack-route'
import type { PartyFixture } from '../helpers/party-fixture'
import { makeParty } from '../helpers/party-fixture'
import type { TourFixture } from '../helpers/tour-fixture'
import { makeTour } from '../helpers/tour-fixture'

let party: PartyFixture
let other: PartyFixture
let made: TourFixture
let others: TourFixture

beforeAll(async () => {
  party = await makeParty()
  other = await makeParty()
  made = await makeTour(party)
  others = await makeTour(other)
})

const manager = () => party.tourManager.call
const attack = (method: string, path: string, body: unknown, theirs = true) =>
  attackRoute({
    method,
    path,
    body,
    reader: party.viewer.call,
    theirs: theirs ? other.tourManager.call : null,
    ours: manager(),
  })

const newTour = {
  name: 'Autumn run',
  rigName: 'full rig',
  playerName: null,
  firstDate: '2031-09-01',
  lastDate: '2031-09-03',
}
const showOf = (over: Record<string, unknown> = {}) => ({
  name: '',
  dayId: made.dayId,
  rigId: made.rigId,
  stageId: made.stageId,
  playerId: party.playerId,
  zone: null,
  loadInTime: '14:00',
  showTime: '21:30',
  showDayOffset: 0,
  answersDue: null,
  slot: null,
  sharedKit: null,
  ...over,
})

async function addDays(firstDate: string, lastDate: string, tourId = made.tourId) {
  const answer = await manager()('POST', `/api/tours/${tourId}/days`, {
    days: { firstDate, lastDate, kind: 'off', remark: '' },
  })
  expect(answer.status).toBe(201)
  return answer.body as { days: { id: string; date: string; version: number }[]; alreadyThere: number }
}

async function addShow(over: Record<string, unknown>) {
  const answer = await manager()('POST', `/api/tours/${made.tourId}/shows`, { show: showOf(over) })
  expect(answer.status, JSON.stringify(answer.body)).toBe(201)
  return answer.body as { id: string; version: number; zone: string | null; answersDueAt: string | null }
}

describe('a tour', () => {
  const routes = (): [method: string, path: string, body: unknown][] => [
    ['POST', '/api/tours', { tour: newTour }],
    ['PATCH', `/api/tours/${made.tourId}`, { version: 1, tour: { name: 'Taken' } }],
    ['DELETE', `/api/tours/${made.tourId}`, { version: 1 }],
    ['POST', `/api/tours/${made.tourId}/rigs`, { rig: { name: 'fly rig', position: 1 } }],
    ['PATCH', `/api/rigs/${made.rigId}`, { version: 1, rig: { name: 'taken', position: 1 } }],
    [
      'POST',
      `/api/tours/${made.tourId}/days`,
      { days: { firstDate: '2031-10-20', lastDate: '2031-10-20', kind: 'off', remark: '' } },
    ],
    ['PATCH', `/api/days/${made.dayId}`, { version: 1, day: { kind: 'show', remark: 'taken' } }],
    ['DELETE', `/api/days/${made.dayId}`, { version: 1 }],
    ['POST', `/api/tours/${made.tourId}/shows`, { show: showOf() }],
    ['PATCH', `/api/shows/${made.showId}`, { version: 1, show: showOf() }],
    ['DELETE', `/api/shows/${made.showId}`, { version: 1 }],
  ]
  it.each(Array.from({ length: 11 }, (_, index) => index))(
    'route %i keeps strangers, readers and other sites out',
    async (index) => {
      const [method, path, body] = routes()[index] ?? ['', '', '']
      await attack(method, path, body, path !== '/api/tours')
    },
  )

  it('is not changed by a drum tech, who may make rigs', async () => {
    const techs = party.drumTech.call
    expect((await techs('PATCH', `/api/tours/${made.tourId}`, { version: 1, tour: { name: 'Taken' } })).status).toBe(
      403,
    )
    expect((await techs('POST', `/api/tours/${made.tourId}/shows`, { show: showOf() })).status).toBe(403)
    expect(
      (await techs('POST', `/api/tours/${made.tourId}/rigs`, { rig: { name: 'tech rig', position: 5 } })).status,
    ).toBe(201)
  })

  it('is made once however often it is asked for, with its rig and its days', async () => {
    const request = { id: randomUUID(), rigId: randomUUID(), tour: newTour }
    const first = await manager()('POST', '/api/tours', request)
    const again = await manager()('POST', '/api/tours', request)
    expect([first.status, again.status]).toEqual([201, 201])
    expect(again.body).toEqual(first.body)
    expect(await addDays('2031-09-01', '2031-09-04', request.id)).toMatchObject({
      alreadyThere: 3,
      days: [{ date: '2031-09-04' }],
    })
    const audited = await db()
      .select({ action: auditEvent.action, actorId: auditEvent.actorId })
      .from(auditEvent)
      .where(
        and(
          eq(auditEvent.partyId, party.partyId),
          eq(auditEvent.subjectId, request.id),
          eq(auditEvent.action, 'tour.added'),
        ),
      )
    expect(audited).toEqual([{ action: 'tour.added', actorId: party.tourManager.personId }])
  })

  it("does not hand out another party's tour under its id", async () => {
    const answer = await manager()('POST', '/api/tours', { id: others.tourId, tour: newTour })
    expect(answer.status).toBe(409)
    expect(JSON.stringify(answer.body)).not.toContain('Test run')
  })

  it.each([
    ['no name', { name: ' ' }, ['tour.name']],
    ['a date that no calendar has', { firstDate: '2031-02-30' }, ['tour.firstDate']],
    ['days that run backwards', { firstDate: '2031-09-03', lastDate: '2031-09-01' }, ['tour.lastDate']],
    ['a slip of the year', { lastDate: '2041-09-01' }, ['tour.lastDate']],
  ])('names the field: %s', async (_why, over, fields) => {
    expect(faultyFields(await manager()('POST', '/api/tours', { tour: { ...newTour, ...over } }))).toEqual(fields)
  })

  it('asks a party without players for one', async () => {
    const fresh = await makeParty()
    await db().execute(`delete from player where party_id = '${fresh.partyId}'`)
    expect(faultyFields(await fresh.tourManager.call('POST', '/api/tours', { tour: newTour }))).toEqual([
      'tour.playerName',
    ])
    expect(
      (await fresh.tourManager.call('POST', '/api/tours', { tour: { ...newTour, playerName: 'Ines' } })).status,
    ).toBe(201)
  })

  it('refuses a stale change with what stands now, and changes nothing', async () => {
    const tour = (await manager()('POST', '/api/tours', { tour: newTour })).body as { id: string }
    const path = `/api/tours/${tour.id}`
    expect((await manager()('PATCH', path, { version: 1, tour: { name: 'Winter run' } })).status).toBe(200)
    const stale = await manager()('PATCH', path, { version: 1, tour: { name: 'Spring run' } })
    expect(stale).toMatchObject({
      status: 409,
      body: { error: { code: 'stale', details: { current: { name: 'Winter run', version: 2 } } } },
    })
    expect((await manager()('DELETE', path, { version: 1 })).status).toBe(409)
    expect((await manager()('DELETE', path, { version: 2 })).status).toBe(200)
    expect((await manager()('PATCH', path, { version: 2, tour: { name: 'Gone' } })).status).toBe(404)
  })

  it('with shows on it is kept', async () => {
    const answer = await manager()('DELETE', `/api/tours/${made.tourId}`, { version: 1 })
    expect(answer).toMatchObject({ status: 409, body: { error: { code: 'conflict' } } })
  })
})

describe('a rig', () => {
  it('has a name of its own in its tour', async () => {
    const path = `/api/tours/${made.tourId}/rigs`
    const request = { id: randomUUID(), rig: { name: 'fly rig', position: 1 } }
    expect((await manager()('POST', path, request)).status).toBe(201)
    expect((await manager()('POST', path, request)).body).toMatchObject({ id: request.id })
    expect(faultyFields(await manager()('POST', path, { rig: { name: 'fly rig', position: 2 } }))).toEqual(['rig.name'])
    expect(
      faultyFields(
        await manager()('PATCH', `/api/rigs/${request.id}`, { version: 1, rig: { name: 'full rig', position: 1 } }),
      ),
    ).toEqual(['rig.name'])
    expect(
      (await manager()('PATCH', `/api/rigs/${request.id}`, { version: 1, rig: { name: 'small rig', position: 3 } }))
        .body,
    ).toMatchObject({ version: 2 })
    expect(
      (await manager()('PATCH', `/api/rigs/${request.id}`, { version: 1, rig: { name: 'tiny rig', position: 3 } }))
        .status,
    ).toBe(409)
    expect(
      faultyFields(
        await manager()('PATCH', `/api/rigs/${request.id}`, { version: 2, rig: { name: 'x', position: -1 } }),
      ),
    ).toEqual(['rig.position'])
  })
})

describe('a day', () => {
  it('holds two shows and no third, and is a show day while it does', async () => {
    const { days } = await addDays('2031-11-01', '2031-11-01')
    const dayId = days[0]?.id ?? ''
    await addShow({ dayId, name: 'Matinee' })
    const second = await addShow({ dayId, name: 'Evening' })
    expect(
      faultyFields(await manager()('POST', `/api/tours/${made.tourId}/shows`, { show: showOf({ dayId }) })),
    ).toEqual(['show.dayId'])
    const toOff = await manager()('PATCH', `/api/days/${dayId}`, { version: 2, day: { kind: 'off', remark: '' } })
    expect(toOff).toMatchObject({ status: 409, body: { error: { code: 'conflict' } } })
    expect(
      (await manager()('PATCH', `/api/days/${dayId}`, { version: 2, day: { kind: 'show', remark: 'Fair' } })).body,
    ).toMatchObject({ kind: 'show', version: 3 })
    expect((await manager()('DELETE', `/api/days/${dayId}`, { version: 3 })).status).toBe(409)
    expect((await manager()('DELETE', `/api/shows/${second.id}`, { version: second.version })).status).toBe(200)
  })

  it('without a show can be taken off the run, by the version that was seen', async () => {
    const { days } = await addDays('2031-11-03', '2031-11-03')
    const day = days[0]
    expect(
      (await manager()('PATCH', `/api/days/${day?.id}`, { version: 1, day: { kind: 'travel', remark: 'ferry' } }))
        .status,
    ).toBe(200)
    expect((await manager()('DELETE', `/api/days/${day?.id}`, { version: 1 })).body).toMatchObject({
      error: { code: 'stale', details: { current: { remark: 'ferry' } } },
    })
    expect((await manager()('DELETE', `/api/days/${day?.id}`, { version: 2 })).status).toBe(200)
    expect((await manager()('DELETE', `/api/days/${day?.id}`, { version: 2 })).status).toBe(404)
  })

  it('two shows added to its last place at once: one is refused', async () => {
    const { days } = await addDays('2031-11-05', '2031-11-05')
    const dayId = days[0]?.id ?? ''
    await addShow({ dayId })
    const answers = await Promise.all(
      ['one', 'two', 'three'].map((name) =>
        manager()('POST', `/api/tours/${made.tourId}/shows`, { show: showOf({ dayId, name }) }),
      ),
    )
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 422, 422])
  })

  it('is of a known kind', async () => {
    const days = { firstDate: '2031-11-09', lastDate: '2031-11-09', kind: 'party', remark: '' }
    expect(faultyFields(await manager()('POST', `/api/tours/${made.tourId}/days`, { days }))).toEqual(['days.kind'])
  })
})

describe('a show', () => {
  it("takes its venue's zone, and its deadline becomes an instant by it", async () => {
    const { days } = await addDays('2031-12-01', '2031-12-01')
    const show = await addShow({ dayId: days[0]?.id, answersDue: { date: '2031-11-20', time: '18:00' } })
    expect(show).toMatchObject({ zone: 'Europe/Paris', answersDueAt: '2031-11-20T17:00:00.000Z' })
  })

  it('a deadline in the hour that clocks skip is moved on by the gap', async () => {
    const { days } = await addDays('2032-04-01', '2032-04-01')
    const show = await addShow({
      dayId: days[0]?.id,
      zone: 'America/New_York',
      // Clocks go from 02:00 to 03:00 on the second Sunday of March.
      answersDue: { date: '2032-03-14', time: '02:30' },
    })
    expect(show.answersDueAt).toBe('2032-03-14T07:30:00.000Z')
  })

  it('names only what is of its tour and its party', async () => {
    const post = (over: Record<string, unknown>) =>
      manager()('POST', `/api/tours/${made.tourId}/shows`, { show: showOf(over) })
    expect(faultyFields(await post({ dayId: others.dayId }))).toEqual(['show.dayId'])
    expect(faultyFields(await post({ rigId: others.rigId }))).toEqual(['show.rigId'])
    expect(faultyFields(await post({ stageId: others.stageId }))).toEqual(['show.stageId'])
    expect(faultyFields(await post({ playerId: other.playerId }))).toEqual(['show.playerId'])
  })

  it.each([
    ['a zone that nobody keeps', { zone: 'Europe/Arvic' }, ['show.zone']],
    ['a time past midnight', { showTime: '24:10' }, ['show.showTime']],
    ['a show after midnight on the day itself', { showTime: '00:30', showDayOffset: 0 }, ['show.showTime']],
    ['two days after', { showDayOffset: 2 }, ['show.showDayOffset']],
    ['a deadline after the show', { answersDue: { date: '2031-10-15', time: '10:00' } }, ['show.answersDue']],
    ['half a deadline', { answersDue: { date: '2031-10-01', time: '' } }, ['show.answersDue.time']],
    [
      'a slot of a day',
      { slot: { changeoverMin: 20, lineCheckMin: 1440, riserParking: '' } },
      ['show.slot.lineCheckMin'],
    ],
    ['a shared kit of nobody', { sharedKit: { owner: '', mayRetune: true, maySwap: '' } }, ['show.sharedKit.owner']],
    ['no day', { dayId: 'monday' }, ['show.dayId']],
  ])('names the field: %s', async (_why, over, fields) => {
    const answer = await manager()('PATCH', `/api/shows/${made.showId}`, { version: 1, show: showOf(over) })
    expect(faultyFields(answer)).toEqual(fields)
  })

  it('keeps a festival slot and a shared kit', async () => {
    const { days } = await addDays('2031-12-05', '2031-12-05')
    const slot = { changeoverMin: 25, lineCheckMin: 15, riserParking: 'stage left, behind the wall' }
    const sharedKit = { owner: 'The festival', mayRetune: true, maySwap: 'snare and cymbals' }
    const show = await addShow({ dayId: days[0]?.id, slot, sharedKit, showTime: '00:30', showDayOffset: 1 })
    expect(show).toMatchObject({ slot, sharedKit, showDayOffset: 1, rigName: 'full rig', venueName: 'Test Hall' })
  })

  it('without a known zone has no deadline, and gets its zone when the venue does', async () => {
    const venue = (
      await manager()('POST', '/api/venues', {
        venue: { name: 'Far Hall', town: 'Orrin', country: '', zone: null, remark: '' },
      })
    ).body as { id: string }
    const stage = (
      await manager()('POST', `/api/venues/${venue.id}/stages`, {
        stage: { name: 'Main', widthM: 9, depthM: 7, heightM: 1, access: [], volts: null, mainsHz: null, inlets: '' },
      })
    ).body as { id: string }
    const { days } = await addDays('2031-12-08', '2031-12-08')
    const over = { dayId: days[0]?.id, stageId: stage.id }
    const early = await manager()('POST', `/api/tours/${made.tourId}/shows`, {
      show: showOf({ ...over, answersDue: { date: '2031-12-01', time: '10:00' } }),
    })
    expect(faultyFields(early)).toEqual(['show.answersDue'])
    const show = await addShow(over)
    expect(show.zone).toBeNull()
    const input = { name: 'Far Hall', town: 'Orrin', country: '', zone: 'Asia/Tokyo', remark: '' }
    expect((await manager()('PATCH', `/api/venues/${venue.id}`, { version: 1, venue: input })).status).toBe(200)
    const due = { answersDue: { date: '2031-12-01', time: '10:00' } }
    const stale = await manager()('PATCH', `/api/shows/${show.id}`, { version: 1, show: showOf({ ...over, ...due }) })
    expect(stale).toMatchObject({
      status: 409,
      body: { error: { details: { current: { zone: 'Asia/Tokyo', version: 2 } } } },
    })
    const saved = await manager()('PATCH', `/api/shows/${show.id}`, { version: 2, show: showOf({ ...over, ...due }) })
    expect(saved.body).toMatchObject({ zone: 'Asia/Tokyo', answersDueAt: '2031-12-01T01:00:00.000Z' })
    // The wall at the venue says ten o'clock wherever the venue turns out to be.
    await manager()('PATCH', `/api/venues/${venue.id}`, { version: 2, venue: { ...input, zone: 'Asia/Kolkata' } })
    const moved = await manager()('PATCH', `/api/shows/${show.id}`, { version: 1, show: showOf(over) })
    expect(moved.body).toMatchObject({ error: { details: { current: { answersDueAt: '2031-12-01T04:30:00.000Z' } } } })
  })

  it('is kept while something hangs on it, with the reason', async () => {
    const covered = await manager()('DELETE', `/api/shows/${made.showId}`, { version: 1 })
    expect(covered).toMatchObject({
      status: 409,
      body: { error: { code: 'conflict', message: expect.stringContaining('hire') } },
    })
    const { days } = await addDays('2031-12-11', '2031-12-11')
    const show = await addShow({ dayId: days[0]?.id })
    await db()
      .insert(grant)
      .values({
        partyId: party.partyId,
        purpose: 'bench',
        showId: show.id,
        recipientName: 'Whoever stands there',
        expiresAt: new Date('2032-01-01T00:00:00Z'),
        createdBy: party.drumTech.personId,
      })
    const sent = await manager()('DELETE', `/api/shows/${show.id}`, { version: 1 })
    expect(sent).toMatchObject({
      status: 409,
      body: { error: { code: 'conflict', message: expect.stringContaining('kept') } },
    })
  })

  it('that was taken off the run can be put back as it was', async () => {
    const { days } = await addDays('2031-12-14', '2031-12-14')
    const id = randomUUID()
    const request = { id, show: showOf({ dayId: days[0]?.id, name: 'Late set' }) }
    const path = `/api/tours/${made.tourId}/shows`
    const first = await manager()('POST', path, request)
    expect((await manager()('POST', path, request)).body).toEqual(first.body)
    expect((await manager()('DELETE', `/api/shows/${id}`, { version: 1 })).status).toBe(200)
    expect((await manager()('POST', path, request)).body).toMatchObject({ id, name: 'Late set' })
  })
})
