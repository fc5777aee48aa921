import { and, eq } from 'drizzle-orm'
import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { auditEvent } from '@/db/schema/audit'
import { membership, party, standIn } from '@/db/schema/party'
import type { Role } from '@/lib/contracts/common'
import { stranger } from '../helpers/http-client'
import type { Member, PartyFixture } from '../helpers/party-fixture'
import { makeParty } from '../helpers/party-fixture'

type MembersAnswer = {
  members: { personId: string; roles: Role[]; version: number; lent: { id: string; role: Role; mayEnd: boolean }[] }[]
  mayLend: Role[]
}

const members = async (who: Member) => (await who.call('GET', '/api/members')).body as MembersAnswer
const memberOf = async (who: Member, personId: string) => (await members(who)).members.find((row) => row.personId === personId)
const fieldsOf = (body: unknown) => Object.keys((body as { error: { details: { fields: object } } }).error.details.fields)
const inAnHour = () => new Date(Date.now() + 3_600_000).toISOString()
const auditOf = (fixture: PartyFixture, action: string) =>
  db().select().from(auditEvent).where(and(eq(auditEvent.partyId, fixture.partyId), eq(auditEvent.action, action)))

const settings = { name: 'Renamed', units: 'imperial', referenceHz: 442, paper: 'Letter', locale: 'de' }

describe('every route of the party’s people', () => {
  const someId = randomUUID()
  const routes: [method: string, path: string, body: unknown, may: Role[]][] = [
    ['GET', '/api/members', undefined, ['owner', 'drum-tech', 'tour-manager', 'viewer']],
    ['PATCH', `/api/members/${someId}`, { version: 1, roles: ['viewer'] }, ['owner']],
    ['DELETE', `/api/members/${someId}`, { version: 1 }, ['owner']],
    ['GET', '/api/invitations', undefined, ['owner']],
    ['POST', '/api/invitations', { email: `x-${someId}@test.example`, roles: ['viewer'] }, ['owner']],
    ['DELETE', `/api/invitations/${someId}`, undefined, ['owner']],
    ['POST', `/api/invitations/${someId}/mails`, undefined, ['owner']],
    ['POST', '/api/stand-ins', { personId: someId, role: 'drum-tech', untilAt: inAnHour() }, ['owner', 'drum-tech', 'tour-manager']],
    ['DELETE', `/api/stand-ins/${someId}`, undefined, ['owner', 'drum-tech', 'tour-manager', 'viewer']],
    ['GET', '/api/parties/current', undefined, ['owner', 'drum-tech', 'tour-manager', 'viewer']],
    ['PATCH', '/api/parties/current', { ...settings, version: 99 }, ['owner']],
    ['GET', '/api/audit', undefined, ['owner']],
  ]

  it.each(routes)('%s %s: nobody 401, a role without leave 403', async (method, path, body, may) => {
    expect((await stranger(method, path, body)).status).toBe(401)
    const fixture = await makeParty()
    const devices: [Role, Member][] = [
      ['owner', fixture.owner],
      ['drum-tech', fixture.drumTech],
      ['tour-manager', fixture.tourManager],
      ['viewer', fixture.viewer],
    ]
    for (const [role, device] of devices) {
      const { status } = await device.call(method, path, body)
      if (may.includes(role)) expect([200, 201, 403, 404, 409], `${role} may`).toContain(status)
      else expect(status, `${role} may not`).toBe(403)
    }
  })

  it('refuses a change sent by another site’s page with our cookie', async () => {
    const { owner } = await makeParty()
    const answer = await owner.call('PATCH', '/api/parties/current', { ...settings, version: 1 }, { origin: 'https://elsewhere.example' })
    expect(answer.status).toBe(403)
  })
})

describe('roles', () => {
  it('are a set, hold at the member’s next request, and are written down with both sides', async () => {
    const fixture = await makeParty()
    const { owner, viewer } = fixture
    const row = await memberOf(owner, viewer.personId)
    expect((await viewer.call('PATCH', '/api/parties/current', { ...settings, version: 1 })).status).toBe(403)
    const answer = await owner.call('PATCH', `/api/members/${viewer.personId}`, { version: row?.version, roles: ['owner', 'drum-tech'] })
    expect(answer).toMatchObject({ status: 200, body: { roles: ['owner', 'drum-tech'], version: 2 } })
    expect((await viewer.call('PATCH', '/api/parties/current', { ...settings, version: 1 })).status).toBe(200)
    const [event] = await auditOf(fixture, 'member.change-roles')
    expect(event).toMatchObject({ actorId: owner.personId, detail: { before: ['viewer'], after: ['owner', 'drum-tech'] } })
  })

  it('answer a stale version with the row that stands, and change nothing', async () => {
    const { owner, viewer } = await makeParty()
    const path = `/api/members/${viewer.personId}`
    await owner.call('PATCH', path, { version: 1, roles: ['drum-tech'] })
    const stale = await owner.call('PATCH', path, { version: 1, roles: ['tour-manager'] })
    expect(stale.status).toBe(409)
    expect(stale.body).toMatchObject({ error: { code: 'stale', details: { current: { roles: ['drum-tech'], version: 2 } } } })
    expect((await owner.call('DELETE', path, { version: 1 })).status).toBe(409)
    expect(await memberOf(owner, viewer.personId)).toMatchObject({ roles: ['drum-tech'], version: 2 })
  })

  it('name the field at fault', async () => {
    const { owner, viewer } = await makeParty()
    for (const roles of [[], ['king'], ['viewer', 'viewer'], 'viewer']) {
      const answer = await owner.call('PATCH', `/api/members/${viewer.personId}`, { version: 1, roles })
      expect(answer.status).toBe(422)
      expect(fieldsOf(answer.body)[0]).toMatch(/^roles/)
    }
  })

  it('never leave a party without an owner, even when two owners step down at once', async () => {
    const { owner, viewer } = await makeParty()
    const own = `/api/members/${owner.personId}`
    expect((await owner.call('PATCH', own, { version: 1, roles: ['viewer'] })).status).toBe(409)
    expect((await owner.call('DELETE', own, { version: 1 })).status).toBe(409)
    await owner.call('PATCH', `/api/members/${viewer.personId}`, { version: 1, roles: ['owner'] })
    const answers = await Promise.all([
      owner.call('PATCH', own, { version: 1, roles: ['viewer'] }),
      viewer.call('PATCH', `/api/members/${viewer.personId}`, { version: 2, roles: ['viewer'] }),
    ])
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409])
  })

  it('of another party’s member cannot be seen or set, whatever party the body names', async () => {
    const [ours, theirs] = [await makeParty(), await makeParty()]
    const path = `/api/members/${theirs.viewer.personId}`
    const body = { version: 1, roles: ['owner'], partyId: theirs.partyId }
    expect((await ours.owner.call('PATCH', path, body)).status).toBe(404)
    expect((await ours.owner.call('DELETE', path, body)).status).toBe(404)
    expect((await members(ours.owner)).members.map((row) => row.personId)).not.toContain(theirs.viewer.personId)
    expect(await memberOf(theirs.owner, theirs.viewer.personId)).toMatchObject({ roles: ['viewer'], version: 1 })
  })

  it('end with the membership: a member taken out is in no party at the next request', async () => {
    const { owner, drumTech } = await makeParty()
    expect((await owner.call('DELETE', `/api/members/${drumTech.personId}`, { version: 1 })).status).toBe(200)
    expect((await drumTech.call('GET', '/api/members')).status).toBe(404)
    expect((await drumTech.call('GET', '/api/sessions')).status).toBe(200)
  })
})

describe('a stand-in', () => {
  it('holds the lent role at once, until its time, and both ends are written down', async () => {
    const fixture = await makeParty()
    const { owner, viewer } = fixture
    const change = (referenceHz: number, version: number) =>
      viewer.call('PATCH', '/api/parties/current', { ...settings, referenceHz, version })
    expect((await change(441, 1)).status).toBe(403)
    const id = randomUUID()
    const lend = { id, personId: viewer.personId, role: 'owner', untilAt: inAnHour() }
    expect((await owner.call('POST', '/api/stand-ins', lend)).status).toBe(201)
    expect((await change(441, 1)).status).toBe(200)
    expect((await memberOf(viewer, viewer.personId))?.lent).toMatchObject([{ id, role: 'owner', mayEnd: true }])

    // Its time comes.
    await db().update(standIn).set({ untilAt: new Date(Date.now() - 1000) }).where(eq(standIn.id, id))
    expect((await change(443, 2)).status).toBe(403)
    expect((await memberOf(owner, viewer.personId))?.lent).toEqual([])
    expect(await auditOf(fixture, 'stand-in.lend')).toMatchObject([{ actorId: owner.personId, detail: { role: 'owner' } }])
  })

  it('can be ended early by whoever lent, by whoever holds, by an owner, and by nobody else', async () => {
    const fixture = await makeParty()
    const { owner, drumTech, tourManager, viewer } = fixture
    const lend = async () =>
      ((await drumTech.call('POST', '/api/stand-ins', { personId: viewer.personId, role: 'drum-tech', untilAt: inAnHour() })).body as { id: string }).id
    const refusedTo = await lend()
    expect((await tourManager.call('DELETE', `/api/stand-ins/${refusedTo}`)).status).toBe(403)
    expect((await drumTech.call('DELETE', `/api/stand-ins/${refusedTo}`)).status).toBe(200)
    expect((await viewer.call('DELETE', `/api/stand-ins/${await lend()}`)).status).toBe(200)
    const last = await lend()
    expect((await owner.call('DELETE', `/api/stand-ins/${last}`)).status).toBe(200)
    expect((await owner.call('DELETE', `/api/stand-ins/${last}`)).status).toBe(409)
    expect(await auditOf(fixture, 'stand-in.end')).toHaveLength(3)
  })

  it('is lent only roles of the lender’s own, and never a lent one', async () => {
    const { owner, drumTech, tourManager, viewer } = await makeParty()
    expect((await members(drumTech)).mayLend).toEqual(['drum-tech'])
    const ask = (who: Member, personId: string, role: Role) =>
      who.call('POST', '/api/stand-ins', { personId, role, untilAt: inAnHour() })
    expect((await ask(drumTech, viewer.personId, 'tour-manager')).status).toBe(403)
    expect((await ask(drumTech, viewer.personId, 'owner')).status).toBe(403)
    expect((await ask(owner, drumTech.personId, 'tour-manager')).status).toBe(201)
    expect((await ask(drumTech, viewer.personId, 'tour-manager')).status).toBe(403)
    expect((await ask(tourManager, viewer.personId, 'tour-manager')).status).toBe(201)
  })

  it('as owner cannot make itself, or anybody, an owner for good, nor unmake one', async () => {
    const { owner, viewer, drumTech } = await makeParty()
    await owner.call('POST', '/api/stand-ins', { personId: viewer.personId, role: 'owner', untilAt: inAnHour() })
    expect((await viewer.call('PATCH', `/api/members/${viewer.personId}`, { version: 1, roles: ['owner'] })).status).toBe(403)
    expect((await viewer.call('PATCH', `/api/members/${owner.personId}`, { version: 1, roles: ['viewer'] })).status).toBe(409)
    await owner.call('PATCH', `/api/members/${drumTech.personId}`, { version: 1, roles: ['owner'] })
    expect((await viewer.call('PATCH', `/api/members/${owner.personId}`, { version: 1, roles: ['viewer'] })).status).toBe(403)
    expect((await viewer.call('DELETE', `/api/members/${owner.personId}`, { version: 1 })).status).toBe(403)
    expect((await viewer.call('POST', '/api/invitations', { email: `o-${randomUUID()}@test.example`, roles: ['owner'] })).status).toBe(403)
    expect((await viewer.call('POST', '/api/stand-ins', { personId: viewer.personId, role: 'drum-tech', untilAt: inAnHour() })).status).toBe(403)
  })

  it('names the field: a time gone by or too far, a role held already', async () => {
    const { owner, viewer } = await makeParty()
    const ask = (change: object) =>
      owner.call('POST', '/api/stand-ins', { personId: viewer.personId, role: 'drum-tech', untilAt: inAnHour(), ...change })
    for (const [change, field] of [
      [{ untilAt: new Date(Date.now() - 60_000).toISOString() }, 'untilAt'],
      [{ untilAt: new Date(Date.now() + 32 * 86_400_000).toISOString() }, 'untilAt'],
      [{ untilAt: 'tonight' }, 'untilAt'],
      [{ role: 'viewer' }, 'role'],
      [{ role: 'king' }, 'role'],
      [{ personId: 'me' }, 'personId'],
    ] as const) {
      const answer = await ask(change)
      expect([answer.status, fieldsOf(answer.body)]).toEqual([422, [field]])
    }
    expect((await members(owner)).members.flatMap((row) => row.lent)).toEqual([])
  })

  it('is lent once for a repeated request, and never twice the same', async () => {
    const { owner, viewer } = await makeParty()
    const body = { id: randomUUID(), personId: viewer.personId, role: 'drum-tech', untilAt: inAnHour() }
    const [first, again] = [await owner.call('POST', '/api/stand-ins', body), await owner.call('POST', '/api/stand-ins', body)]
    expect([first.status, again.status]).toEqual([201, 201])
    expect((await owner.call('POST', '/api/stand-ins', { ...body, id: randomUUID() })).status).toBe(409)
    expect((await memberOf(owner, viewer.personId))?.lent).toHaveLength(1)
  })

  it('comes from the lender’s own party only', async () => {
    const [ours, theirs] = [await makeParty(), await makeParty()]
    const body = { personId: theirs.viewer.personId, role: 'drum-tech', untilAt: inAnHour(), partyId: theirs.partyId }
    expect((await ours.owner.call('POST', '/api/stand-ins', body)).status).toBe(404)
    const lent = await theirs.owner.call('POST', '/api/stand-ins', body)
    const { id } = lent.body as { id: string }
    expect((await ours.owner.call('DELETE', `/api/stand-ins/${id}`)).status).toBe(404)
  })
})

describe('the settings of the party', () => {
  it('are an owner’s to set, against the version seen, in the party in hand only', async () => {
    const [ours, theirs] = [await makeParty(), await makeParty()]
    const saved = await ours.owner.call('PATCH', '/api/parties/current', { ...settings, version: 1, id: theirs.partyId, partyId: theirs.partyId })
    expect(saved).toMatchObject({ status: 200, body: { ...settings, id: ours.partyId, version: 2 } })
    const [other] = await db().select().from(party).where(eq(party.id, theirs.partyId))
    expect(other).toMatchObject({ referenceHz: 440, version: 1 })
    const stale = await ours.owner.call('PATCH', '/api/parties/current', { ...settings, referenceHz: 440, version: 1 })
    expect(stale.status).toBe(409)
    expect(stale.body).toMatchObject({ error: { details: { current: { referenceHz: 442, version: 2 } } } })
  })

  it('name the field at fault', async () => {
    const { owner } = await makeParty()
    for (const [change, field] of [
      [{ referenceHz: 414.9 }, 'referenceHz'],
      [{ referenceHz: 466.1 }, 'referenceHz'],
      [{ referenceHz: '440' }, 'referenceHz'],
      [{ name: '' }, 'name'],
      [{ units: 'cubits' }, 'units'],
      [{ paper: 'A3' }, 'paper'],
      [{ locale: 'xx' }, 'locale'],
    ] as const) {
      const answer = await owner.call('PATCH', '/api/parties/current', { ...settings, version: 1, ...change })
      expect([answer.status, fieldsOf(answer.body)]).toEqual([422, [field]])
    }
    for (const referenceHz of [415, 466]) {
      const { version } = (await owner.call('GET', '/api/parties/current')).body as { version: number }
      expect((await owner.call('PATCH', '/api/parties/current', { ...settings, referenceHz, version })).status).toBe(200)
    }
  })
})

describe('making and switching parties', () => {
  it('makes its maker the owner, in hand on that device, once for a repeated request', async () => {
    const { viewer } = await makeParty()
    const id = randomUUID()
    const make = () => viewer.call('POST', '/api/parties', { id, name: 'Second party', roles: ['viewer'] })
    expect(await make()).toMatchObject({ status: 201, body: { id, name: 'Second party' } })
    expect((await make()).body).toMatchObject({ id, version: 1 })
    expect((await viewer.call('GET', '/api/parties/current')).body).toMatchObject({ id })
    expect(await memberOf(viewer, viewer.personId)).toMatchObject({ roles: ['owner'] })
    expect(await db().select().from(membership).where(eq(membership.partyId, id))).toHaveLength(1)
  })

  it('refuses an id that is somebody else’s party, and shows nothing of it', async () => {
    const [ours, theirs] = [await makeParty(), await makeParty()]
    const answer = await ours.owner.call('POST', '/api/parties', { id: theirs.partyId, name: 'Mine now' })
    expect(answer.status).toBe(409)
    expect(JSON.stringify(answer.body)).not.toContain(theirs.partyId)
  })

  it('switches between one’s own parties, each with its own roles, and into no other', async () => {
    const [ours, theirs] = [await makeParty(), await makeParty()]
    const { drumTech } = ours
    await db().insert(membership).values({ partyId: theirs.partyId, personId: drumTech.personId, roles: ['viewer'] })
    const take = (partyId: string) => drumTech.call('POST', '/api/sessions/party', { partyId })
    const lend = () => drumTech.call('POST', '/api/stand-ins', { personId: randomUUID(), role: 'drum-tech', untilAt: inAnHour() })
    expect((await take(theirs.partyId)).status).toBe(200)
    expect((await drumTech.call('GET', '/api/parties/current')).body).toMatchObject({ id: theirs.partyId })
    expect((await lend()).status).toBe(403)
    expect((await take((await makeParty()).partyId)).status).toBe(404)
    expect((await take(ours.partyId)).status).toBe(200)
    expect((await lend()).status).toBe(404)
    expect((await stranger('POST', '/api/sessions/party', { partyId: ours.partyId })).status).toBe(401)
    expect((await take('ours')).status).toBe(422)
  })
})

describe('the audit trail', () => {
  type Trail = { lines: { id: number; who: string; sentence: string }[]; older: number | null }

  it('reads as sentences, newest first, a page at a time, of one’s own party', async () => {
    const [ours, theirs] = [await makeParty(), await makeParty()]
    await theirs.owner.call('PATCH', '/api/parties/current', { ...settings, version: 1 })
    for (let version = 1; version <= 52; version += 1) {
      await ours.owner.call('PATCH', '/api/parties/current', { ...settings, referenceHz: 440 + (version % 2), version })
    }
    const page = (await ours.owner.call('GET', '/api/audit')).body as Trail
    expect(page.lines).toHaveLength(50)
    expect(page.lines[0]).toMatchObject({ who: 'The owner', sentence: 'changed the settings of the party: A4 in Hz 440' })
    const rest = (await ours.owner.call('GET', `/api/audit?before=${page.older}`)).body as Trail
    expect(rest.older).toBeNull()
    expect(rest.lines).toHaveLength(2)
    const ids = [...page.lines, ...rest.lines].map((line) => line.id)
    expect(ids).toEqual(ids.toSorted((a, b) => b - a))
  })

  it('narrows to a person and to an action, and names a filter it cannot use', async () => {
    const { owner, drumTech, viewer } = await makeParty()
    await owner.call('PATCH', '/api/parties/current', { ...settings, version: 1 })
    await drumTech.call('POST', '/api/stand-ins', { personId: viewer.personId, role: 'drum-tech', untilAt: inAnHour() })
    const read = async (query: string) => ((await owner.call('GET', `/api/audit?${query}`)).body as Trail).lines.map((line) => line.who)
    expect(await read(`person=${drumTech.personId}`)).toEqual(['The drum-tech'])
    expect(await read('action=party.change')).toEqual(['The owner'])
    expect(await read(`action=party.change&person=${drumTech.personId}`)).toEqual([])
    const wrong = await owner.call('GET', '/api/audit?person=somebody')
    expect([wrong.status, fieldsOf(wrong.body)]).toEqual([422, ['person']])
  })
})
