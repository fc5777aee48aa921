import { and, eq } from 'drizzle-orm'
import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { insertPerson } from '@/db/queries/person'
import { invitation, membership } from '@/db/schema/party'
import { person } from '@/db/schema/person'
import type { Role } from '@/lib/contracts/common'
import { hashPassword } from '@/lib/server/auth/password'
import { CookieJar } from '../helpers/cookie-jar'
import { countMailTo, latestMailTo } from '../helpers/outbox'
import type { PartyFixture } from '../helpers/party-fixture'
import { makeParty } from '../helpers/party-fixture'

const password = 'a long enough password'
const newAddress = () => `guest-${randomUUID()}@test.example`
const newcomer = { name: 'New Hand', password }

async function invited(fixture: PartyFixture, email = newAddress(), roles: Role[] = ['drum-tech', 'tour-manager']) {
  const made = await fixture.owner.call('POST', '/api/invitations', { email, roles })
  expect(made.status).toBe(201)
  const sent = await latestMailTo(email, 'invitation')
  const token = sent?.link.pathname.split('/').at(-1) ?? ''
  return { email, token, stored: sent?.stored ?? '', id: (made.body as { id: string }).id, path: `/invitation/${token}` }
}

const accept = (jar: CookieJar, token: string, more: object = {}) =>
  jar.send('POST', '/api/invitations/accept', { json: { token, ...more } })
const reasonOf = (body: unknown) => (body as { error: { details: { reason?: string } } }).error.details.reason
const membersOf = (fixture: PartyFixture) => db().select().from(membership).where(eq(membership.partyId, fixture.partyId))

describe('an invitation', () => {
  it('shows party, roles and who invites; a newcomer joins with a name and a password, once', async () => {
    const fixture = await makeParty()
    const { email, token, stored, path, id } = await invited(fixture)
    expect(token).toMatch(/^[\w-]{43}$/)
    expect(stored).not.toContain(token)
    const [row] = await db().select().from(invitation).where(eq(invitation.id, id))
    expect(JSON.stringify(row)).not.toContain(token)

    const page = (await new CookieJar().send('GET', path)).body as string
    for (const shown of [`Party ${fixture.partyId.slice(0, 8)}`, 'drum tech, tour manager', 'The owner', email]) expect(page).toContain(shown)
    // Opening it is not joining.
    expect(await membersOf(fixture)).toHaveLength(4)

    const jar = new CookieJar()
    const joined = await accept(jar, token, { newcomer, roles: ['owner'], partyId: randomUUID(), email: newAddress() })
    expect(joined).toMatchObject({ status: 200, body: { partyId: fixture.partyId, email, roles: ['drum-tech', 'tour-manager'] } })
    const [made] = await db().select().from(person).where(eq(person.email, email))
    expect(made?.emailVerifiedAt).toBeInstanceOf(Date)
    expect((await jar.signIn(email, password)).status).toBe(200)
    expect((await jar.send('GET', '/api/parties/current')).body).toMatchObject({ id: fixture.partyId })

    const again = await accept(new CookieJar(), token, { newcomer })
    expect([again.status, reasonOf(again.body)]).toEqual([410, 'used'])
    expect((await new CookieJar().send('GET', path)).body).toContain('accepted already')
    expect(await membersOf(fixture)).toHaveLength(5)
  })

  it('is joined by one of two who press at once', async () => {
    const fixture = await makeParty()
    const { token } = await invited(fixture)
    const answers = await Promise.all([accept(new CookieJar(), token, { newcomer }), accept(new CookieJar(), token, { newcomer })])
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 410])
    expect(await membersOf(fixture)).toHaveLength(5)
  })

  it('asks somebody known to sign in first: the link alone sets no password of theirs', async () => {
    const fixture = await makeParty()
    const email = newAddress()
    const known = await insertPerson(db(), { name: 'Known Hand', email, passwordHash: await hashPassword(password), emailVerifiedAt: new Date() })
    const { token, path } = await invited(fixture, email)
    const jar = new CookieJar()
    expect((await accept(jar, token)).status).toBe(401)
    expect((await accept(jar, token, { newcomer: { name: 'Thief', password: 'a password of the thief' } })).status).toBe(401)
    const [row] = await db().select().from(person).where(eq(person.id, known.id))
    expect(row).toMatchObject({ name: 'Known Hand', passwordHash: known.passwordHash })
    expect((await jar.send('GET', path)).body).toContain('Sign in to join')

    await jar.signIn(email, password, path)
    expect((await accept(jar, token)).status).toBe(200)
    expect((await jar.send('GET', '/api/parties/current')).body).toMatchObject({ id: fixture.partyId })
    const [joined] = await db().select().from(membership).where(and(eq(membership.partyId, fixture.partyId), eq(membership.personId, known.id)))
    expect(joined?.roles).toEqual(['drum-tech', 'tour-manager'])
  })

  it('is for its own address: somebody else who is signed in cannot take it', async () => {
    const fixture = await makeParty()
    const { token, email, path } = await invited(fixture)
    const other = newAddress()
    await insertPerson(db(), { name: 'Other Hand', email: other, passwordHash: await hashPassword(password), emailVerifiedAt: new Date() })
    const jar = new CookieJar()
    await jar.signIn(other, password)
    const refused = await accept(jar, token, { newcomer })
    expect(refused.status).toBe(403)
    expect(JSON.stringify(refused.body)).toContain(email)
    expect((await jar.send('GET', path)).body).toContain('Sign out and come back here')
    expect(await membersOf(fixture)).toHaveLength(4)
  })

  it('says when it was withdrawn, and lets nobody in', async () => {
    const fixture = await makeParty()
    const { token, id, path } = await invited(fixture)
    expect((await fixture.owner.call('DELETE', `/api/invitations/${id}`)).status).toBe(200)
    const refused = await accept(new CookieJar(), token, { newcomer })
    expect([refused.status, reasonOf(refused.body)]).toEqual([410, 'withdrawn'])
    expect((await new CookieJar().send('GET', path)).body).toContain('This invitation was withdrawn')
    expect((await fixture.owner.call('DELETE', `/api/invitations/${id}`)).status).toBe(404)
    expect((await fixture.owner.call('POST', `/api/invitations/${id}/mails`)).status).toBe(404)
    expect((await fixture.owner.call('GET', '/api/invitations')).body).toEqual({ invitations: [] })
  })

  it('says when it has run out; sent again it opens anew', async () => {
    const fixture = await makeParty()
    const { token, id, path, email } = await invited(fixture)
    await db().update(invitation).set({ expiresAt: new Date(Date.now() - 1000) }).where(eq(invitation.id, id))
    const late = await accept(new CookieJar(), token, { newcomer })
    expect([late.status, reasonOf(late.body)]).toEqual([410, 'expired'])
    expect((await new CookieJar().send('GET', path)).body).toContain('This invitation has run out')
    expect((await fixture.owner.call('GET', '/api/invitations')).body).toMatchObject({ invitations: [{ id, expired: true }] })
    expect((await fixture.owner.call('POST', `/api/invitations/${id}/mails`)).status).toBe(200)
    expect(await countMailTo(email)).toBe(2)
    expect((await accept(new CookieJar(), token, { newcomer })).status).toBe(200)
  })

  it('asked anew for one address ends the one before', async () => {
    const fixture = await makeParty()
    const first = await invited(fixture)
    const second = await invited(fixture, first.email, ['viewer'])
    expect(reasonOf((await accept(new CookieJar(), first.token, { newcomer })).body)).toBe('withdrawn')
    expect((await accept(new CookieJar(), second.token, { newcomer })).body).toMatchObject({ roles: ['viewer'] })
  })

  it('repeated with the same id is the same invitation: one mail', async () => {
    const fixture = await makeParty()
    const body = { id: randomUUID(), email: newAddress(), roles: ['viewer'] }
    const answers = [await fixture.owner.call('POST', '/api/invitations', body), await fixture.owner.call('POST', '/api/invitations', body)]
    expect(answers.map((answer) => answer.status)).toEqual([201, 201])
    expect(answers[1]?.body).toEqual(answers[0]?.body)
    expect(await countMailTo(body.email)).toBe(1)
  })

  it('of another party is not there: no withdrawing, no sending, no id taken over', async () => {
    const [ours, theirs] = [await makeParty(), await makeParty()]
    const { id, token } = await invited(theirs)
    expect((await ours.owner.call('DELETE', `/api/invitations/${id}`)).status).toBe(404)
    expect((await ours.owner.call('POST', `/api/invitations/${id}/mails`)).status).toBe(404)
    const taken = await ours.owner.call('POST', '/api/invitations', { id, email: newAddress(), roles: ['viewer'], partyId: theirs.partyId })
    expect(taken.status).toBe(409)
    expect((await accept(new CookieJar(), token, { newcomer })).body).toMatchObject({ partyId: theirs.partyId })
  })

  it('is refused for a member, and a bad form names its field', async () => {
    const { owner, viewer } = await makeParty()
    expect((await owner.call('POST', '/api/invitations', { email: viewer.email, roles: ['owner'] })).status).toBe(409)
    for (const [change, field] of [
      [{ email: 'nowhere' }, 'email'],
      [{ roles: [] }, 'roles'],
      [{ id: 'mine' }, 'id'],
    ] as const) {
      const answer = await owner.call('POST', '/api/invitations', { email: newAddress(), roles: ['viewer'], ...change })
      expect(answer.status).toBe(422)
      expect(answer.body).toMatchObject({ error: { details: { fields: { [field]: expect.any(String) } } } })
    }
  })

  it('takes no invented token, no short password, and no more than a few mails an hour to one address', async () => {
    const fixture = await makeParty()
    expect((await accept(new CookieJar(), 'A'.repeat(43), { newcomer })).status).toBe(404)
    expect((await accept(new CookieJar(), 'short', { newcomer })).status).toBe(422)
    const { id, token, email } = await invited(fixture)
    const weak = await accept(new CookieJar(), token, { newcomer: { name: 'New Hand', password: 'short' } })
    expect(weak.body).toMatchObject({ error: { details: { fields: { 'newcomer.password': 'at least 10 characters' } } } })
    for (let turn = 0; turn < 4; turn += 1) expect((await fixture.owner.call('POST', `/api/invitations/${id}/mails`)).status).toBe(200)
    expect((await fixture.owner.call('POST', `/api/invitations/${id}/mails`)).status).toBe(429)
    expect(await countMailTo(email)).toBe(5)
  })
})
