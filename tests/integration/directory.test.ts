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
const attack = (method: string, path: string, body: unknown, theirs = true) =>
  attackRoute({
    method,
    path,
    body,
    reader: party.viewer.call,
    theirs: theirs ? other.tourManager.call : null,
    ours: manager(),
  })

const venue = { name: 'Salle Nord', town: 'Arvic', country: 'Norland', zone: 'Europe/Paris', remark: '' }
const stage = {
  name: 'Main',
  widthM: 10,
  depthM: 8,
  heightM: 1.2,
  access: ['dock'],
  volts: 230,
  mainsHz: 50,
  inlets: '32 A three phase',
}
const supplier = {
  name: 'Northline hire',
  town: 'Lisby',
  country: 'Norland',
  zone: 'Europe/Oslo',
  currency: 'EUR',
  remark: '',
}
const contact = {
  name: 'Crew desk',
  email: 'Desk@Northline.Example',
  phone: '+47 00 00 00',
  duties: ['backline', 'delivery'],
}
const player = { name: 'Ines', hand: 'left', throneHeightM: 0.52 }

const routes = (): [method: string, path: string, body: unknown][] => [
  ['POST', '/api/venues', { venue }],
  ['PATCH', `/api/venues/${made.venueId}`, { version: 1, venue }],
  ['DELETE', `/api/venues/${made.venueId}`, { version: 1 }],
  ['POST', `/api/venues/${made.venueId}/stages`, { stage }],
  ['PATCH', `/api/stages/${made.stageId}`, { version: 1, stage }],
  ['DELETE', `/api/stages/${made.stageId}`, { version: 1 }],
  ['POST', `/api/venues/${made.venueId}/contacts`, { contact }],
  ['POST', '/api/suppliers', { supplier }],
  ['PATCH', `/api/suppliers/${made.supplierId}`, { version: 1, supplier }],
  ['DELETE', `/api/suppliers/${made.supplierId}`, { version: 1 }],
  ['POST', `/api/suppliers/${made.supplierId}/contacts`, { contact }],
  ['PATCH', `/api/contacts/${made.contactId}`, { version: 1, contact }],
  ['DELETE', `/api/contacts/${made.contactId}`, { version: 1 }],
  ['POST', '/api/players', { player }],
  ['PATCH', `/api/players/${party.playerId}`, { version: 1, player }],
  ['DELETE', `/api/players/${party.playerId}`, { version: 1 }],
]
it.each(Array.from({ length: 16 }, (_, index) => index))(
  'route %i keeps strangers, readers and other sites out',
  async (index) => {
    const [method, path, body] = routes()[index] ?? ['', '', '']
    await attack(method, path, body, path.split('/').length > 3)
  },
)

it('a drum tech keeps players, not the directory', async () => {
  expect((await party.drumTech.call('POST', '/api/venues', { venue })).status).toBe(403)
  expect((await party.drumTech.call('POST', '/api/suppliers', { supplier })).status).toBe(403)
  expect((await party.drumTech.call('POST', '/api/players', { player })).status).toBe(201)
})

describe('what is made twice by one request is made once', () => {
  it.each([
    ['/api/venues', () => ({ venue })],
    ['/api/suppliers', () => ({ supplier })],
    ['/api/players', () => ({ player })],
  ])('%s', async (path, body) => {
    const request = { id: randomUUID(), ...body() }
    const first = await manager()('POST', path, request)
    const again = await manager()('POST', path, request)
    expect([first.status, again.status]).toEqual([201, 201])
    expect(again.body).toEqual(first.body)
    const stolen = await other.tourManager.call('POST', path, request)
    expect(stolen.status).toBe(409)
  })

  it('stages and contacts', async () => {
    for (const [path, body] of [
      [`/api/venues/${made.venueId}/stages`, { id: randomUUID(), stage }],
      [`/api/venues/${made.venueId}/contacts`, { id: randomUUID(), contact }],
      [`/api/suppliers/${made.supplierId}/contacts`, { id: randomUUID(), contact }],
    ] as const) {
      const first = await manager()('POST', path, body)
      expect(first.status).toBe(201)
      expect((await manager()('POST', path, body)).body).toEqual(first.body)
    }
  })
})

describe('bad input names the field', () => {
  it.each([
    ['venue.name', { name: '' }],
    ['venue.name', { name: 'x'.repeat(121) }],
    ['venue.zone', { zone: 'Mars/Base' }],
    ['venue.remark', { remark: 'x'.repeat(2001) }],
    ['venue.town', { town: 7 }],
  ])('%s %#', async (field, over) => {
    expect(faultyFields(await manager()('POST', '/api/venues', { venue: { ...venue, ...over } }))).toEqual([field])
  })

  it.each([
    ['stage.widthM', { widthM: 0.5 }],
    ['stage.widthM', { widthM: '10' }],
    ['stage.depthM', { depthM: 101 }],
    ['stage.heightM', { heightM: -1 }],
    ['stage.access.0', { access: ['helicopter'] }],
    ['stage.access', { access: ['dock', 'dock'] }],
    ['stage.volts', { volts: 12 }],
    ['stage.mainsHz', { mainsHz: 55 }],
  ])('%s %#', async (field, over) => {
    const answer = await manager()('POST', `/api/venues/${made.venueId}/stages`, { stage: { ...stage, ...over } })
    expect(faultyFields(answer)).toEqual([field])
  })

  it.each([
    ['contact.email', { email: 'desk' }],
    ['contact.duties', { duties: [] }],
    ['contact.duties.0', { duties: ['catering'] }],
    ['contact.phone', { phone: 'call me' }],
  ])('%s %#', async (field, over) => {
    const answer = await manager()('POST', `/api/suppliers/${made.supplierId}/contacts`, {
      contact: { ...contact, ...over },
    })
    expect(faultyFields(answer)).toEqual([field])
  })

  it.each([
    ['supplier.currency', '/api/suppliers', { supplier: { ...supplier, currency: 'euro' } }],
    ['player.hand', '/api/players', { player: { ...player, hand: 'both' } }],
    ['player.throneHeightM', '/api/players', { player: { ...player, throneHeightM: 52 } }],
  ])('%s', async (field, path, body) => {
    expect(faultyFields(await manager()('POST', path, body))).toEqual([field])
  })
})

describe('a stale change is refused with what stands now', () => {
  const cases = () =>
    [
      [`/api/venues/${made.venueId}`, 'venue', venue, { remark: 'dock closes at noon' }],
      [`/api/stages/${made.stageId}`, 'stage', stage, { widthM: 11 }],
      [`/api/suppliers/${made.supplierId}`, 'supplier', supplier, { remark: 'rings back' }],
      [`/api/contacts/${made.contactId}`, 'contact', contact, { phone: '+47 11 11 11' }],
      [`/api/players/${party.playerId}`, 'player', player, { hand: 'right' }],
    ] as const
  it.each([0, 1, 2, 3, 4])('case %i', async (index) => {
    const [path, key, base, over] = cases()[index] ?? cases()[0]
    const first = await manager()('PATCH', path, { version: 1, [key]: { ...base, ...over } })
    expect(first).toMatchObject({ status: 200, body: { ...over, version: 2 } })
    const stale = await manager()('PATCH', path, { version: 1, [key]: base })
    expect(stale).toMatchObject({
      status: 409,
      body: { error: { code: 'stale', details: { current: { ...over, version: 2 } } } },
    })
    expect((await manager()('DELETE', path, { version: 1 })).status).toBe(409)
  })
})

it('a mail address is kept in small letters', async () => {
  const answer = await manager()('POST', `/api/suppliers/${made.supplierId}/contacts`, { contact })
  expect(answer.body).toMatchObject({ email: 'desk@northline.example', supplierId: made.supplierId, venueId: null })
})

describe('what is still in use is kept, with the reason', () => {
  it('a venue, a stage and a player of a show; a supplier with a hire', async () => {
    for (const path of [
      `/api/venues/${made.venueId}`,
      `/api/stages/${made.stageId}`,
      `/api/players/${party.playerId}`,
      `/api/suppliers/${made.supplierId}`,
    ]) {
      const answer = await manager()('DELETE', path, { version: 2 })
      expect(answer, path).toMatchObject({ status: 409, body: { error: { code: 'conflict' } } })
    }
  })

  it('a contact who has had a link', async () => {
    await db()
      .insert(grant)
      .values({
        partyId: party.partyId,
        purpose: 'reply',
        hireId: made.hireId,
        contactId: made.supplierContactId,
        recipientName: 'Hire desk',
        expiresAt: new Date('2032-01-01T00:00:00Z'),
        createdBy: party.tourManager.personId,
      })
    const answer = await manager()('DELETE', `/api/contacts/${made.supplierContactId}`, { version: 1 })
    expect(answer).toMatchObject({ status: 409, body: { error: { code: 'conflict' } } })
  })

  it('and what is not in use goes', async () => {
    const fresh = (await manager()('POST', '/api/venues', { venue })).body as { id: string }
    expect((await manager()('DELETE', `/api/venues/${fresh.id}`, { version: 1 })).status).toBe(200)
    expect((await manager()('DELETE', `/api/venues/${fresh.id}`, { version: 1 })).status).toBe(404)
  })
})

it("nothing is put into another party's venue", async () => {
  expect((await manager()('POST', `/api/venues/${others.venueId}/stages`, { stage })).status).toBe(404)
  expect((await manager()('POST', `/api/venues/${others.venueId}/contacts`, { contact })).status).toBe(404)
  expect((await manager()('POST', `/api/suppliers/${others.supplierId}/contacts`, { contact })).status).toBe(404)
})
