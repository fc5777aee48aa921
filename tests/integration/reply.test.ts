import { randomUUID } from 'node:crypto'
import { eq } from 'drizzle-orm'
import { beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { answerEvent } from '@/db/schema/advance'
import { auditEvent } from '@/db/schema/audit'
import { grant, grantToken } from '@/db/schema/grant'
import { kitEntry } from '@/db/schema/kit'
import { mail } from '@/db/schema/mail'
import type { Reply, ReplyAnswered } from '@/lib/contracts/answer'
import { linkToken } from '@/lib/server/auth/link-token'
import { takeFromLinkLimit } from '@/lib/server/http/link-limit'
import { makePackPdf } from '@/lib/server/jobs/make-pack-pdf'
import type { Sent } from '../helpers/advance-fixture'
import { addStands, answerBody, asAsked, firstLine, give, issue, readReplyOf, recipientOf, send, sentAs } from '../helpers/advance-fixture'
import { faultyFields } from '../helpers/attack-route'
import { baseUrl, stranger } from '../helpers/http-client'
import type { PartyFixture } from '../helpers/party-fixture'
import { makeParty } from '../helpers/party-fixture'
import type { TourFixture } from '../helpers/tour-fixture'
import { makeTour, tomSpec } from '../helpers/tour-fixture'

const errorOf = (answer: { body: unknown }) => (answer.body as { error: { code: string; message: string; details: Record<string, unknown> } }).error
const thirteen = { kind: 'drum', diameterIn: 13, depthIn: 9, lugs: 6, words: 'birch' } as const

describe('a reply link', () => {
  let party: PartyFixture
  let tour: TourFixture
  let revisionId: string
  let sent: Sent

  beforeAll(async () => {
    party = await makeParty()
  })
  beforeEach(async () => {
    tour = await makeTour(party)
    await addStands(party, tour, 8)
    revisionId = await issue(party, tour)
    sent = await send(party, tour, revisionId)
  })
  const answersOf = (showId: string) => db().select().from(answerEvent).where(eq(answerEvent.showId, showId))

  it('shows a venue the lines of its show and a supplier those of its hire', async () => {
    const venue = await readReplyOf(sent)
    expect(venue.title).toContain('Test Hall')
    expect(venue.due).toBe('Thu 2 Oct 2031, 18:00 (Europe/Paris)')
    expect(venue.lines.map((line) => [line.kind, line.count, line.state])).toEqual([
      ['cymbal', 1, 'unanswered'],
      ['hardware', 8, 'unanswered'],
    ])
    const supplier = await readReplyOf(await send(party, tour, revisionId, 'hire'))
    expect(supplier.recipient).toBe('Test Backline')
    expect(supplier.lines.map((line) => [line.kind, line.size])).toEqual([['drum', { diameterIn: 12, depthIn: 8, lugs: 6 }]])
  })

  it('changes nothing by being opened, however often', async () => {
    const page = `${baseUrl()}/r/${sent.token}`
    const rows = async () => ({
      tokens: await db().select().from(grantToken).where(eq(grantToken.grantId, sent.grantId)),
      grants: await db().select().from(grant).where(eq(grant.id, sent.grantId)),
      answers: await answersOf(tour.showId),
      trail: await db().select({ id: auditEvent.id }).from(auditEvent).where(eq(auditEvent.partyId, party.partyId)),
    })
    const before = await rows()
    for (let time = 0; time < 2; time++) {
      expect((await fetch(page)).status).toBe(200)
      expect((await fetch(page, { method: 'HEAD' })).status).toBe(200)
      expect((await stranger('GET', sent.path)).status).toBe(200)
      await stranger('GET', `${sent.path}/pdf?pack=${sent.packId}`)
    }
    expect(await rows()).toEqual(before)
    expect(before.tokens[0]).toMatchObject({ useCount: 0, lastUsedAt: null })
  })

  it('keeps an answer once, however often it is sent, and counts the use', async () => {
    const line = firstLine(await readReplyOf(sent))
    const body = answerBody(line)
    const answers = await Promise.all([1, 2, 3].map(() => stranger('POST', `${sent.path}/answers`, body)))
    for (const answer of answers) {
      expect(answer.status).toBe(200)
      expect((answer.body as ReplyAnswered).line).toMatchObject({ lineId: line.lineId, state: 'answered' })
    }
    const rows = await answersOf(tour.showId)
    expect(rows).toHaveLength(1)
    expect(rows[0]).toMatchObject({ id: body.id, byName: 'Ib of the house', grantId: sent.grantId, personId: null })
    const [token] = await db().select().from(grantToken).where(eq(grantToken.id, rows[0]?.tokenId ?? ''))
    expect(token?.useCount).toBe(1)
    const trail = await db().select().from(auditEvent).where(eq(auditEvent.subjectId, body.id))
    expect(trail).toMatchObject([{ actorKind: 'link', actorId: sent.grantId, action: 'answer.give' }])
  })

  it('keeps what two people say at once, and lets the later stand', async () => {
    const line = firstLine(await readReplyOf(sent))
    const [one, two] = [answerBody(line, asAsked(1), { byName: 'One' }), answerBody(line, { ...asAsked(0), cant: 1 }, { byName: 'Two' })]
    const answers = await Promise.all([one, two].map((body) => stranger('POST', `${sent.path}/answers`, body)))
    expect(answers.map((answer) => answer.status)).toEqual([200, 200])
    const rows = (await answersOf(tour.showId)).sort((a, b) => a.sequence - b.sequence)
    expect(rows.map((row) => row.byName).sort()).toEqual(['One', 'Two'])
    expect(firstLine(await readReplyOf(sent)).answer?.byName).toBe(rows.at(-1)?.byName)
  })

  it('takes a count apart, and refuses one that does not come out', async () => {
    const stands = (await readReplyOf(sent)).lines[1]
    if (!stands) throw new Error('no stands')
    const good = { asAsked: 5, instead: [{ n: 1, what: { kind: 'other' as const, words: 'a straight one' } }], notYet: [{ n: 1, by: '2031-10-06' }], cant: 1 }
    const kept = await give(sent, stands, good)
    expect(kept.status).toBe(200)
    expect((kept.body as ReplyAnswered).line?.answer?.content).toEqual(good)
    for (const wrong of [asAsked(7), asAsked(9), { ...good, cant: 2 }]) {
      const refused = await give(sent, stands, wrong)
      expect(faultyFields(refused)).toEqual(['content'])
      expect(errorOf(refused).message).toContain('8')
    }
    expect(await answersOf(tour.showId)).toHaveLength(1)
  })

  it('refuses every answer that is not one, names the field and keeps nothing', async () => {
    const line = firstLine(await readReplyOf(sent))
    const post = (fault: object) => stranger('POST', `${sent.path}/answers`, { ...answerBody(line), ...fault })
    const instead = (what: object) => ({ content: { asAsked: 0, instead: [{ n: 1, what }], notYet: [], cant: 0 } })
    expect(faultyFields(await post({ byName: ' ' }))).toEqual(['byName'])
    expect(faultyFields(await post({ id: 'mine' }))).toEqual(['id'])
    expect(faultyFields(await post({ kind: 'price' }))).toEqual(['kind'])
    expect(faultyFields(await post({ content: asAsked(-1) }))).toEqual(['content.asAsked'])
    expect(faultyFields(await post({ content: { ...asAsked(0), notYet: [{ n: 1, by: 'Monday' }] } }))).toEqual(['content.notYet.0.by'])
    expect(faultyFields(await post(instead({ kind: 'cymbal', diameterIn: 90, words: '' })))).toEqual(['content.instead.0.what.diameterIn'])
    // A drum in place of a cymbal is a drum well told, but no cymbal.
    expect(faultyFields(await post(instead(thirteen)))).toEqual(['content'])
    expect((await post({ remark: 'x'.repeat(2001) })).status).toBe(422)
    expect((await stranger('POST', `${sent.path}/answers`, { padding: 'x'.repeat(40_000) })).status).toBe(413)
    expect((await stranger('POST', `${sent.path}/answers`, '{"half":')).status).toBe(422)
    const crossSite = await stranger('POST', `${sent.path}/answers`, answerBody(line), { origin: 'https://other.example' })
    expect(crossSite.status).toBe(403)
    expect(await answersOf(tour.showId)).toEqual([])
  })

  it('lets nobody answer for lines that were not asked of them', async () => {
    const hire = await send(party, tour, revisionId, 'hire')
    const drum = firstLine(await readReplyOf(hire))
    expect((await give(sent, drum)).status).toBe(404)
    const theirs = await makeParty()
    const foreign = await makeTour(theirs)
    const elsewhere = await send(theirs, foreign, await issue(theirs, foreign))
    expect((await give(elsewhere, firstLine(await readReplyOf(sent)))).status).toBe(404)
    expect((await give(sent, { ...drum, lineId: randomUUID() })).status).toBe(404)
    expect(await answersOf(tour.showId)).toEqual([])
  })

  it('does not take an answer’s id for another answer', async () => {
    const [ride, stands] = (await readReplyOf(sent)).lines
    if (!ride || !stands) throw new Error('two lines are asked')
    const body = answerBody(ride)
    expect((await stranger('POST', `${sent.path}/answers`, body)).status).toBe(200)
    expect((await stranger('POST', `${sent.path}/answers`, answerBody(stands, asAsked(8), { id: body.id }))).status).toBe(409)
    const theirs = await makeParty()
    const foreign = await makeTour(theirs)
    const elsewhere = await send(theirs, foreign, await issue(theirs, foreign))
    const taken = await give(elsewhere, firstLine(await readReplyOf(elsewhere)), undefined, { id: body.id })
    expect(taken.status).toBe(409)
  })

  it('asks again about a line that changed, with what changed, and refuses an answer to the old words', async () => {
    const hire = await send(party, tour, revisionId, 'hire')
    const before = firstLine(await readReplyOf(hire))
    expect((await give(hire, before, { ...asAsked(0), instead: [{ n: 1, what: thirteen }] })).status).toBe(200)
    await db()
      .update(kitEntry)
      .set({ spec: { ...tomSpec, depthIn: 9 } })
      .where(eq(kitEntry.id, tour.tomId))
    const again = await send(party, tour, await issue(party, tour, 'deeper tom'), 'hire')
    const stale = await give(again, before)
    expect(stale.status).toBe(409)
    expect(errorOf(stale)).toMatchObject({ code: 'stale', details: { line: { lineId: before.lineId, state: 'changed since' } } })
    const now = firstLine(await readReplyOf(again))
    expect(now.hash).not.toBe(before.hash)
    expect(now.state).toBe('changed since')
    expect(now.answer?.content.instead).toEqual([{ n: 1, what: thirteen }])
    expect(now.changes.join(' ')).toMatch(/8 deep.*→.*9 deep/)
    expect(await give(again, now)).toMatchObject({ status: 200, body: { line: { state: 'answered', changes: [] } } })
    // Both links of one contact open the same, newest pack.
    expect((await readReplyOf(hire)).lines).toEqual((await readReplyOf(again)).lines)
  })

  it('carries an answer over to a new revision that says the same', async () => {
    const line = firstLine(await readReplyOf(sent))
    await give(sent, line)
    await db()
      .update(kitEntry)
      .set({ spec: { ...tomSpec, diameterIn: 13 } })
      .where(eq(kitEntry.id, tour.tomId))
    const again = await send(party, tour, await issue(party, tour, 'wider tom'))
    expect(firstLine(await readReplyOf(again))).toMatchObject({ hash: line.hash, state: 'answered' })
  })

  it('shows what was settled and locks it, until it is asked again', async () => {
    const line = firstLine(await readReplyOf(sent))
    const body = answerBody(line)
    await stranger('POST', `${sent.path}/answers`, body)
    const decide = (decision: 'accept' | 'reopen', remark = '') =>
      party.tourManager.call('POST', `/api/shows/${tour.showId}/settlements`, {
        decisions: [{ id: randomUUID(), lineId: line.lineId, answerEventId: body.id, decision, remark }],
      })
    expect((await decide('accept')).status).toBe(200)
    expect(firstLine(await readReplyOf(sent)).state).toBe('settled')
    const locked = await give(sent, line, { ...asAsked(0), cant: 1 })
    expect(locked.status).toBe(409)
    expect(errorOf(locked)).toMatchObject({ code: 'conflict', details: { line: { state: 'settled' } } })
    expect((await decide('reopen', 'is it 21 in?')).status).toBe(200)
    expect(firstLine(await readReplyOf(sent))).toMatchObject({ state: 'unanswered', askedAgain: { remark: 'is it 21 in?' } })
    expect((await give(sent, line)).status).toBe(200)
    expect(firstLine(await readReplyOf(sent)).state).toBe('answered')
  })

  it('takes “that’s all from us”', async () => {
    const id = randomUUID()
    for (let time = 0; time < 2; time++) {
      expect(await stranger('POST', `${sent.path}/answers`, { kind: 'close', id, byName: 'Ib' })).toMatchObject({
        status: 200,
        body: { line: null, closed: { byName: 'Ib' } },
      })
    }
    expect((await answersOf(tour.showId)).map((row) => row.kind)).toEqual(['close'])
    expect((await readReplyOf(sent)).closed).toMatchObject({ byName: 'Ib' })
  })

  it('never shows what another recipient said, nor prices, addresses or contacts', async () => {
    const hire = await send(party, tour, revisionId, 'hire')
    await give(hire, firstLine(await readReplyOf(hire)), { ...asAsked(0), instead: [{ n: 1, what: { ...thirteen, words: 'secret of the supplier' } }] })
    const body = JSON.stringify(await readReplyOf(sent))
    for (const hidden of ['secret of the supplier', 'supplier.example', 'venue.example', 'Hire desk', tour.supplierContactId, 'price', 'Minor']) {
      expect(body).not.toContain(hidden)
    }
  })

  it('still shows the pack before while a newer one is held back, and again when that one was stopped', async () => {
    await addStands(party, tour, 3)
    const newer = await issue(party, tour, 'more stands')
    const recipient = recipientOf(tour, 'show')
    await party.tourManager.call('POST', '/api/dispatches', { revisionId: newer, holdBack: true, recipients: [recipient] })
    expect((await readReplyOf(sent)).spec).toContain('revision 1')
    const held = await sentAs(recipient.dispatchId)
    await db().update(mail).set({ sendAfter: new Date(Date.now() - 1000) }).where(eq(mail.id, held.mailId))
    expect((await readReplyOf(sent)).spec).toContain('revision 2')
    await db().update(mail).set({ cancelledAt: new Date() }).where(eq(mail.id, held.mailId))
    expect((await readReplyOf(sent)).spec).toContain('revision 1')
  })

  it('gives out the PDF of its own packs and of no other', async () => {
    const path = (packId: string) => `${sent.path}/pdf?pack=${packId}`
    await makePackPdf(
      { packId: sent.packId, partyId: party.partyId, mailId: null, replyTokenId: null, benchTokenId: null },
      { attempts: 1 },
    )
    const response = await fetch(`${baseUrl()}${path(sent.packId)}`)
    expect(response.status).toBe(200)
    expect(response.headers.get('content-type')).toBe('application/pdf')
    expect(Buffer.from(await response.arrayBuffer()).subarray(0, 5).toString()).toBe('%PDF-')
    expect((await readReplyOf(sent)).pdfs.map((pdf) => pdf.packId)).toEqual([sent.packId])
    const hire = await send(party, tour, revisionId, 'hire')
    expect((await stranger('GET', path(hire.packId))).status).toBe(404)
    expect((await stranger('GET', path('all'))).status).toBe(422)
    // What was sent holds the key that answers in its reader's name; on the desk only whoever may send gets it.
    const desk = `/api/packs/${sent.packId}`
    for (const [member, status, mayOpen] of [
      [party.viewer, 403, false],
      [party.drumTech, 403, false],
      [party.tourManager, 200, true],
    ] as const) {
      expect((await member.call('GET', `${desk}/pdf`)).status).toBe(status)
      expect((await member.call('GET', desk)).body).toMatchObject({ pdf: 'ready', mayOpen })
    }
  })

  it('opens nothing for a made-up key, for a bench key, or once it is withdrawn or has run out', async () => {
    const line = firstLine(await readReplyOf(sent))
    const bench = await db().select({ id: grantToken.id, purpose: grant.purpose }).from(grantToken).innerJoin(grant, eq(grant.id, grantToken.grantId)).where(eq(grant.showId, tour.showId))
    const benchKey = linkToken('grant', bench.find((row) => row.purpose === 'bench')?.id ?? '')
    const parts = (path: string) => [
      () => stranger('GET', path),
      () => stranger('POST', `${path}/answers`, answerBody(line)),
      () => stranger('GET', `${path}/pdf?pack=${sent.packId}`),
      () => stranger('GET', `${path}/live`),
    ]
    for (const key of ['x'.repeat(43), 'short', benchKey]) {
      for (const ask of parts(`/api/r/${key}`)) expect((await ask()).status).toBe(404)
      expect((await fetch(`${baseUrl()}/r/${key}`)).status).toBe(404)
    }
    await db().update(grant).set({ expiresAt: new Date(Date.now() - 1000) }).where(eq(grant.id, sent.grantId))
    for (const ask of parts(sent.path)) expect((await ask()).status).toBe(410)
    await db().update(grant).set({ withdrawnAt: new Date() }).where(eq(grant.id, sent.grantId))
    for (const ask of parts(sent.path)) expect((await ask()).status).toBe(410)
    expect(await answersOf(tour.showId)).toEqual([])
  })

  it('is not opened without end from one address, neither its pages nor its streams', async () => {
    const address = `flood-${randomUUID()}`
    for (let batch = 0; batch < 60; batch++) await Promise.all(Array.from({ length: 10 }, () => takeFromLinkLimit(address)))
    const bench = sent.path.replace('/api/r/', '/api/b/')
    for (const path of [sent.path, `${sent.path}/live`, `${sent.path}/pdf?pack=${sent.packId}`, bench, `${bench}/live`]) {
      expect((await stranger('GET', path, undefined, { 'x-forwarded-for': address })).status, path).toBe(429)
    }
  })

  it('hears of its own show and of nothing else', async () => {
    const hire = await send(party, tour, revisionId, 'hire')
    const stream = await fetch(`${baseUrl()}${sent.path}/live`)
    const reader = stream.body?.pipeThrough(new TextDecoderStream()).getReader()
    if (!reader) throw new Error('no stream')
    let heard = (await reader.read()).value ?? ''
    await give(hire, firstLine(await readReplyOf(hire)))
    await give(sent, firstLine(await readReplyOf(sent)))
    while (!heard.includes('advance:')) heard += (await reader.read()).value ?? ''
    await reader.cancel()
    const topics = [...heard.matchAll(/^data: (.*)$/gm)].flatMap((match) => JSON.parse(match[1] ?? '[]') as string[])
    expect(topics.filter((topic) => topic !== 'ready')).toEqual([`advance:${tour.showId}`])
  })

  it('shows the same to everybody who holds a key of it', async () => {
    const printed = await party.tourManager.call('POST', `/api/grants/${sent.grantId}/tokens`)
    const other = `/api/r/${new URL((printed.body as { href: string }).href).pathname.split('/')[2]}`
    await give({ path: other }, firstLine(await readReplyOf(sent)))
    expect(firstLine(await readReplyOf(sent)) satisfies Reply['lines'][number]).toMatchObject({ state: 'answered' })
  })
})
