import { randomUUID } from 'node:crypto'
import { eq, inArray, sql } from 'drizzle-orm'
import { beforeAll, describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { dispatch } from '@/db/schema/advance'
import { auditEvent } from '@/db/schema/audit'
import { contact } from '@/db/schema/directory'
import { grant, grantToken } from '@/db/schema/grant'
import { mail } from '@/db/schema/mail'
import type { SendOutcomes } from '@/lib/contracts/dispatch'
import { hashToken, linkToken } from '@/lib/server/auth/link-token'
import { fillLinkPlaces } from '@/lib/server/mail/link-place'
import { addStands, issue, recipientOf, send, sentAs } from '../helpers/advance-fixture'
import { attackRoute, faultyFields } from '../helpers/attack-route'
import { stranger } from '../helpers/http-client'
import type { PartyFixture } from '../helpers/party-fixture'
import { makeParty } from '../helpers/party-fixture'
import type { TourFixture } from '../helpers/tour-fixture'
import { makeTour } from '../helpers/tour-fixture'

const outcomesOf = (answer: { body: unknown }) => (answer.body as SendOutcomes).outcomes
const messageOf = (answer: { body: unknown }) => (answer.body as { error: { message: string } }).error.message

describe('sending packs', () => {
  let party: PartyFixture
  let other: PartyFixture
  let tour: TourFixture
  let revisionId: string

  beforeAll(async () => {
    party = await makeParty()
    other = await makeParty()
    tour = await makeTour(party)
    revisionId = await issue(party, tour)
  })
  const post = (body: object, by = party.tourManager) => by.call('POST', '/api/dispatches', body)
  const mailOf = async (mailId: string) => {
    const [row] = await db().select().from(mail).where(eq(mail.id, mailId))
    if (!row) throw new Error('no mail')
    return row
  }
  const countOf = async (dispatchIds: string[]) => (await db().select({ id: dispatch.id }).from(dispatch).where(inArray(dispatch.id, dispatchIds))).length

  it('lets nobody send but a tour manager of the party', async () => {
    const recipient = recipientOf(tour, 'show')
    const body = { revisionId, holdBack: false, recipients: [recipient] }
    await attackRoute({
      ...{ method: 'POST', path: '/api/dispatches', body },
      ...{ reader: party.drumTech.call, theirs: other.tourManager.call, ours: party.tourManager.call },
    })
    expect(await countOf([recipient.dispatchId])).toBe(0)
  })

  it('writes pack, link, mail, sending and trail in one go', async () => {
    const sent = await send(party, tour, revisionId)
    const row = await mailOf(sent.mailId)
    expect(row.toAddress).toBe(`house-${tour.contactId}@venue.example`)
    expect(row.subject).toContain('Test Hall')
    expect(row.textBody).not.toContain(sent.token)
    expect(fillLinkPlaces(row.textBody)).toContain(`/r/${sent.token}`)
    expect(fillLinkPlaces(row.textBody)).toContain('Thu 2 Oct 2031, 18:00 (Europe/Paris)')
    const [reply] = await db().select().from(grant).where(eq(grant.id, sent.grantId))
    expect(reply).toMatchObject({ purpose: 'reply', showId: tour.showId, contactId: tour.contactId })
    // The show is on 14 October; the link serves two weeks more.
    expect(reply?.expiresAt.toISOString()).toBe('2031-10-28T23:00:00.000Z')
    const keys = await db().select().from(grantToken).where(eq(grantToken.grantId, sent.grantId))
    expect(keys.map((key) => key.tokenHash)).toContain(hashToken(sent.token))
    expect(JSON.stringify(keys)).not.toContain(sent.token)
    const bench = await db().select().from(grant).where(eq(grant.showId, tour.showId))
    expect(bench.filter((entry) => entry.purpose === 'bench')).toHaveLength(1)
    const trail = await db().select().from(auditEvent).where(eq(auditEvent.subjectId, sent.dispatchId))
    expect(trail).toMatchObject([{ action: 'dispatch.send', actorId: party.tourManager.personId }])
    const jobs = await db().execute(sql`select payload from graphile_worker._private_jobs where payload->>'mailId' = ${sent.mailId}`)
    const pdf = await db().execute(sql`select pdf_blob_id from pack where id = ${sent.packId}`)
    expect(jobs.rows.length + pdf.rows.filter((found) => found['pdf_blob_id']).length).toBeGreaterThan(0)
  })

  it('is the same sending when it is asked again, and even when it is asked twice at once', async () => {
    const recipient = recipientOf(tour, 'hire')
    const body = { revisionId, holdBack: false, recipients: [recipient] }
    const answers = await Promise.all([post(body), post(body), post(body)])
    for (const answer of answers) expect(outcomesOf(answer)).toMatchObject([{ outcome: 'queued' }])
    expect(await countOf([recipient.dispatchId])).toBe(1)
    const mails = await db()
      .select({ id: mail.id })
      .from(mail)
      .where(eq(mail.toAddress, `desk-${tour.supplierContactId}@supplier.example`))
    expect(mails).toHaveLength(1)
    const misused = await post({ revisionId, holdBack: false, recipients: [recipientOf(tour, 'show', recipient.dispatchId)] })
    expect(outcomesOf(misused)).toMatchObject([{ outcome: 'refused', message: expect.stringContaining('another sending') }])
  })

  it('does not give an id away that another party uses', async () => {
    const theirs = await makeTour(other)
    const theirRevision = await issue(other, theirs)
    const sent = await send(other, theirs, theirRevision)
    const answer = await post({ revisionId, holdBack: false, recipients: [recipientOf(tour, 'show', sent.dispatchId)] })
    expect(outcomesOf(answer)).toMatchObject([{ outcome: 'refused', message: expect.stringContaining('taken') }])
  })

  it('sends to those it can and says why it cannot to others', async () => {
    const good = recipientOf(tour, 'show')
    const stray = { ...recipientOf(tour, 'show'), contactId: tour.supplierContactId }
    const nowhere = { ...recipientOf(tour, 'show'), showId: randomUUID() }
    const answer = await post({ revisionId, holdBack: false, recipients: [stray, good, nowhere] })
    expect(answer.status).toBe(200)
    expect(outcomesOf(answer).map((entry) => entry.outcome)).toEqual(['refused', 'queued', 'refused'])
    expect(outcomesOf(answer)[0]?.message).toContain('Test Hall')
    expect(await countOf([good.dispatchId, stray.dispatchId, nowhere.dispatchId])).toBe(1)
  })

  it('uses one link for one contact and show, with a key for each mail', async () => {
    const [first, second] = [await send(party, tour, revisionId), await send(party, tour, revisionId)]
    expect(second.grantId).toBe(first.grantId)
    const keys = await db().select({ id: grantToken.id }).from(grantToken).where(eq(grantToken.grantId, first.grantId))
    const statuses = await Promise.all(keys.map((key) => stranger('GET', `/api/r/${linkToken('grant', key.id)}`)))
    expect(statuses.length).toBeGreaterThanOrEqual(2)
    expect(new Set(statuses.map((answer) => answer.status))).toEqual(new Set([200]))
  })

  it('holds a mail back for 20 seconds, and stopping it really stops it', async () => {
    const recipient = recipientOf(tour, 'show')
    const before = Date.now()
    await post({ revisionId, holdBack: true, recipients: [recipient] })
    const sent = await sentAs(recipient.dispatchId)
    const held = await mailOf(sent.mailId)
    expect(held.sendAfter.getTime() - before).toBeGreaterThanOrEqual(19_000)
    expect(held.sendAfter.getTime() - before).toBeLessThan(30_000)
    const stopPath = `/api/dispatches/${recipient.dispatchId}/stop`
    expect((await stranger('POST', stopPath)).status).toBe(401)
    expect((await party.viewer.call('POST', stopPath)).status).toBe(403)
    expect((await other.tourManager.call('POST', stopPath)).status).toBe(404)
    expect((await mailOf(sent.mailId)).cancelledAt).toBeNull()
    expect((await party.tourManager.call('POST', stopPath)).status).toBe(200)
    const stopped = await mailOf(sent.mailId)
    expect(stopped.cancelledAt).not.toBeNull()
    expect(stopped.sentAt).toBeNull()
    expect((await party.tourManager.call('POST', stopPath)).status).toBe(200)
  })

  it('says that it is too late to stop what has left', async () => {
    const sent = await send(party, tour, revisionId)
    await db().update(mail).set({ firstTriedAt: new Date(), sentAt: new Date() }).where(eq(mail.id, sent.mailId))
    const answer = await party.tourManager.call('POST', `/api/dispatches/${sent.dispatchId}/stop`)
    expect(answer.status).toBe(409)
    expect(messageOf(answer)).toContain('too late')
  })

  it('writes to the mended address when it is sent again after a bounce', async () => {
    const sent = await send(party, tour, revisionId)
    const mended = `mended-${randomUUID()}@venue.example`
    await db().update(contact).set({ email: mended }).where(eq(contact.id, tour.contactId))
    const again = await send(party, tour, revisionId)
    expect((await mailOf(again.mailId)).toAddress).toBe(mended)
    expect(again.grantId).toBe(sent.grantId)
    const [link] = await db().select({ email: grant.recipientEmail }).from(grant).where(eq(grant.id, sent.grantId))
    expect(link?.email).toBe(mended)
  })

  it('tells the reader which lines changed since what that reader had', async () => {
    const fresh = await makeTour(party)
    const first = await issue(party, fresh)
    await send(party, fresh, first)
    await addStands(party, fresh, 8)
    const second = await issue(party, fresh, 'stands')
    const sent = await send(party, fresh, second)
    const { textBody } = await mailOf(sent.mailId)
    expect(textBody).toContain('Changed since revision 1')
    expect(textBody).toContain('New: 8 × Boom stands')
    const supplier = await send(party, fresh, second, 'hire')
    expect((await mailOf(supplier.mailId)).textBody).not.toContain('Changed since')
  })

  it.each([
    ['no recipient', { recipients: [] }, 'recipients'],
    ['neither show nor hire', { recipients: [{ dispatchId: randomUUID(), contactId: randomUUID(), showId: null, hireId: null }] }, 'recipients.0'],
    ['no revision', { revisionId: 'seven' }, 'revisionId'],
    ['no word on holding back', { holdBack: undefined }, 'holdBack'],
  ])('refuses %s and names the field', async (_, fault, field) => {
    const answer = await post({ revisionId, holdBack: false, recipients: [recipientOf(tour, 'show')], ...fault })
    expect(faultyFields(answer)).toEqual([field])
  })
})

describe('links', () => {
  let party: PartyFixture
  let other: PartyFixture
  let tour: TourFixture
  let revisionId: string

  beforeAll(async () => {
    party = await makeParty()
    other = await makeParty()
    tour = await makeTour(party)
    revisionId = await issue(party, tour)
  })

  it('are withdrawn with all their keys, by tour manager or drum tech only, and a new sending makes a new one', async () => {
    const sent = await send(party, tour, revisionId)
    const path = `/api/grants/${sent.grantId}/withdraw`
    expect((await stranger('POST', path)).status).toBe(401)
    expect((await party.viewer.call('POST', path)).status).toBe(403)
    expect((await other.tourManager.call('POST', path)).status).toBe(404)
    expect((await stranger('GET', sent.path)).status).toBe(200)
    expect((await party.drumTech.call('POST', path)).status).toBe(200)
    const gone = await stranger('GET', sent.path)
    expect(gone.status).toBe(410)
    expect(messageOf(gone)).toContain('withdrawn')
    expect((await party.tourManager.call('POST', path)).status).toBe(200)
    const again = await send(party, tour, revisionId)
    expect(again.grantId).not.toBe(sent.grantId)
    expect((await stranger('GET', again.path)).status).toBe(200)
    expect((await stranger('GET', sent.path)).status).toBe(410)
  })

  it('are printed again with another key, shown once', async () => {
    const sent = await send(party, tour, revisionId)
    const path = `/api/grants/${sent.grantId}/tokens`
    expect((await stranger('POST', path)).status).toBe(401)
    expect((await party.viewer.call('POST', path)).status).toBe(403)
    expect((await party.drumTech.call('POST', path)).status).toBe(403)
    expect((await other.tourManager.call('POST', path)).status).toBe(404)
    const printed = await party.tourManager.call('POST', path)
    expect(printed.status).toBe(201)
    const { href, qrSvg } = printed.body as { href: string; qrSvg: string }
    expect(qrSvg).toContain('<svg')
    const token = new URL(href).pathname.split('/')[2] ?? ''
    expect(token).not.toBe(sent.token)
    expect((await stranger('GET', `/api/r/${token}`)).status).toBe(200)
    const [stored] = await db().select().from(grantToken).where(eq(grantToken.tokenHash, hashToken(token)))
    expect(stored?.madeFor).toBe('print')
    await party.tourManager.call('POST', `/api/grants/${sent.grantId}/withdraw`)
    expect((await party.tourManager.call('POST', path)).status).toBe(409)
    expect((await stranger('GET', `/api/r/${token}`)).status).toBe(410)
  })

  it('that ran out offer a fresh one to the known address only, a few times a day', async () => {
    const sent = await send(party, tour, revisionId)
    // An address of its own: another run within the hour must not find its limit used up.
    const from = { 'x-forwarded-for': `fresh-${randomUUID()}` }
    const ask = (token: string, more: object = {}) => stranger('POST', '/api/grants/fresh-link', { token, ...more }, from)
    expect((await ask(sent.token)).status).toBe(409)
    expect((await ask('x'.repeat(43))).status).toBe(404)
    await db().update(grant).set({ expiresAt: new Date(Date.now() - 1000) }).where(eq(grant.id, sent.grantId))
    const gone = await stranger('GET', sent.path)
    expect(gone.status).toBe(410)
    expect((gone.body as { error: { details: { reason: string } } }).error.details.reason).toBe('expired')
    const asked = await ask(sent.token, { email: 'somebody@else.example' })
    expect(asked).toMatchObject({ status: 200, body: { sent: true } })
    const address = `house-${tour.contactId}@venue.example`
    const mails = await db().select().from(mail).where(eq(mail.toAddress, address))
    const fresh = mails.filter((row) => row.kind === 'fresh-link')
    expect(fresh).toHaveLength(1)
    const token = /\/r\/([\w-]{43})/.exec(fillLinkPlaces(fresh[0]?.textBody ?? ''))?.[1]
    expect((await stranger('GET', `/api/r/${token}`)).status).toBe(200)
    // Whoever holds the old key alone has not read the mail.
    expect((await stranger('GET', sent.path)).status).toBe(410)
    expect(await db().select({ id: mail.id }).from(mail).where(eq(mail.toAddress, 'somebody@else.example'))).toEqual([])
    const statuses = []
    for (let time = 0; time < 4; time++) {
      await db().update(grant).set({ expiresAt: new Date(Date.now() - 1000) }).where(eq(grant.id, sent.grantId))
      statuses.push((await ask(sent.token)).status)
    }
    expect(statuses).toEqual([200, 200, 429, 429])
  })
})
