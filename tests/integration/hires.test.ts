import { randomUUID } from 'node:crypto'
import { beforeAll, describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { grant } from '@/db/schema/grant'
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
const hireOf = (over: Record<string, unknown> = {}) => ({
  supplierId: made.supplierId,
  name: 'One van',
  showIds: [made.showId],
  zone: 'Europe/Oslo',
  deliveryDate: '2031-10-13',
  deliveryFrom: '09:00',
  deliveryUntil: '11:00',
  collectionDate: '2031-10-15',
  collectionFrom: null,
  collectionUntil: null,
  receiver: 'Stage manager',
  conditionOnReturn: 'dry, in its cases',
  poNumber: 'PO-7',
  rateBasis: 'week',
  currency: 'EUR',
  transport: '1 250,50',
  taxPercent: 25,
  validUntil: '2031-09-30',
  answersDue: { date: '2031-10-01', time: '18:00' },
  confirmed: false,
  ...over,
})
const post = (over: Record<string, unknown> = {}) =>
  manager()('POST', `/api/tours/${made.tourId}/hires`, { hire: hireOf(over) })

it('strangers, readers, other parties and other sites are kept out of every route', async () => {
  for (const [method, path, body] of [
    ['POST', `/api/tours/${made.tourId}/hires`, { hire: hireOf() }],
    ['PATCH', `/api/hires/${made.hireId}`, { version: 1, hire: hireOf() }],
    ['DELETE', `/api/hires/${made.hireId}`, { version: 1 }],
  ] as const) {
    await attackRoute({
      method,
      path,
      body,
      reader: party.viewer.call,
      theirs: other.tourManager.call,
      ours: manager(),
    })
    expect((await party.drumTech.call(method, path, body)).status).toBe(403)
  }
})

it('keeps money in minor units, tax in hundredths of a percent and the deadline as an instant', async () => {
  const answer = await post()
  expect(answer).toMatchObject({
    status: 201,
    body: {
      transportMinor: 125_050,
      taxBasisPoints: 2500,
      // Oslo is two hours ahead of UTC on 1 October.
      answersDueAt: '2031-10-01T16:00:00.000Z',
      answersDue: { date: '2031-10-01', time: '18:00' },
      confirmedAt: null,
      showIds: [made.showId],
      supplierName: 'Test Backline',
    },
  })
  expect((await post({ currency: 'JPY', transport: '1250' })).body).toMatchObject({ transportMinor: 1250 })
})

it('made twice by one request is made once', async () => {
  const request = { id: randomUUID(), hire: hireOf() }
  const path = `/api/tours/${made.tourId}/hires`
  const first = await manager()('POST', path, request)
  expect((await manager()('POST', path, request)).body).toEqual(first.body)
})

describe('bad input names the field', () => {
  it.each([
    [['hire.transport'], { transport: 'a lot' }],
    [['hire.transport'], { currency: 'JPY', transport: '12.50' }],
    [['hire.currency'], { currency: null }],
    [['hire.currency'], { currency: 'E' }],
    [['hire.deliveryUntil'], { deliveryUntil: '08:00' }],
    [['hire.deliveryDate'], { deliveryDate: null }],
    [['hire.collectionDate'], { collectionDate: '2031-10-01' }],
    [['hire.taxPercent'], { taxPercent: 12.345 }],
    [['hire.showIds'], { showIds: [] }],
    [['hire.rateBasis'], { rateBasis: 'month' }],
  ])('%s %#', async (fields, over) => {
    expect(faultyFields(await post(over))).toEqual(fields)
  })

  it("another party's show or supplier", async () => {
    expect(faultyFields(await post({ showIds: [made.showId, others.showId] }))).toEqual(['hire.showIds'])
    expect(faultyFields(await post({ supplierId: others.supplierId }))).toEqual(['hire.supplierId'])
  })

  it('a deadline while neither hire nor supplier has a zone', async () => {
    expect(faultyFields(await post({ zone: null }))).toEqual(['hire.answersDue'])
  })
})

it('a stale change is refused with what stands now, and the shows it covers stay', async () => {
  const hire = (await post()).body as { id: string }
  const path = `/api/hires/${hire.id}`
  const first = await manager()('PATCH', path, { version: 1, hire: hireOf({ confirmed: true, poNumber: 'PO-8' }) })
  const { confirmedAt } = first.body as { confirmedAt: string }
  expect(Math.abs(Date.now() - Date.parse(confirmedAt))).toBeLessThan(60_000)
  const stale = await manager()('PATCH', path, { version: 1, hire: hireOf() })
  expect(stale).toMatchObject({
    status: 409,
    body: {
      error: {
        code: 'stale',
        details: { current: { poNumber: 'PO-8', confirmedAt, showIds: [made.showId], version: 2 } },
      },
    },
  })
  // Confirmed once: a later change does not move the moment.
  expect((await manager()('PATCH', path, { version: 2, hire: hireOf({ confirmed: true }) })).body).toMatchObject({
    confirmedAt,
  })
  expect((await manager()('DELETE', path, { version: 2 })).status).toBe(409)
  expect((await manager()('DELETE', path, { version: 3 })).status).toBe(200)
})

it('is kept once its supplier was asked', async () => {
  const hire = (await post()).body as { id: string }
  await db()
    .insert(grant)
    .values({
      partyId: party.partyId,
      purpose: 'reply',
      hireId: hire.id,
      contactId: made.supplierContactId,
      recipientName: 'Hire desk',
      expiresAt: new Date('2032-01-01T00:00:00Z'),
      createdBy: party.tourManager.personId,
    })
  const answer = await manager()('DELETE', `/api/hires/${hire.id}`, { version: 1 })
  expect(answer).toMatchObject({ status: 409, body: { error: { code: 'conflict' } } })
})
