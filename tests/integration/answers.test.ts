import { randomUUID } from 'node:crypto'
import { eq } from 'drizzle-orm'
import { beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { db, pool } from '@/db/client'
import { answerEvent, settlement } from '@/db/schema/advance'
import { auditEvent } from '@/db/schema/audit'
import { mail, mailEvent } from '@/db/schema/mail'
import type { MemberActor } from '@/lib/server/auth/actor'
import { readShowStandings } from '@/lib/server/advance/read-show-standings'
import type { Sent } from '../helpers/advance-fixture'
import { addStands, answerBody, asAsked, firstLine, give, issue, readReplyOf, send } from '../helpers/advance-fixture'
import { attackRoute, faultyFields } from '../helpers/attack-route'
import { stranger } from '../helpers/http-client'
import type { PartyFixture } from '../helpers/party-fixture'
import { makeParty } from '../helpers/party-fixture'
import type { TourFixture } from '../helpers/tour-fixture'
import { makeTour } from '../helpers/tour-fixture'

let party: PartyFixture
let other: PartyFixture
let tour: TourFixture
let revisionId: string
let sent: Sent

beforeAll(async () => {
  party = await makeParty()
  other = await makeParty()
})
beforeEach(async () => {
  tour = await makeTour(party)
  await addStands(party, tour, 8)
  revisionId = await issue(party, tour)
  sent = await send(party, tour, revisionId)
})

const manager = (): MemberActor => ({
  ...{ kind: 'person', personId: party.tourManager.personId, name: 'Manager', partyId: party.partyId },
  ...{ roles: ['tour-manager'], sessionId: party.tourManager.sessionId, address: '' },
})
const standings = async () => {
  const { shows, hires } = await readShowStandings(manager(), tour.tourId)
  return { show: shows[0], hire: hires[0] }
}
const messageOf = (answer: { body: unknown }) => (answer.body as { error: { message: string } }).error.message

describe('taking an answer down', () => {
  const body = async (more: object = {}) => {
    const line = firstLine(await readReplyOf(sent))
    return {
      ...{ id: randomUUID(), lineId: line.lineId, lineHash: line.hash, content: asAsked(1), remark: 'on the way' },
      ...{ from: 'Ib of the house', how: 'phone', at: new Date(Date.now() - 60_000).toISOString(), ...more },
    }
  }
  const path = () => `/api/shows/${tour.showId}/answers`

  it('is for a tour manager of the party, at shows and hires', async () => {
    const wanted = await body()
    await attackRoute({
      ...{ method: 'POST', path: path(), body: wanted },
      ...{ reader: party.drumTech.call, theirs: other.tourManager.call, ours: party.tourManager.call },
    })
    const hire = await send(party, tour, revisionId, 'hire')
    const drum = firstLine(await readReplyOf(hire))
    const atHire = { ...wanted, lineId: drum.lineId, lineHash: drum.hash }
    await attackRoute({
      ...{ method: 'POST', path: `/api/hires/${tour.hireId}/answers`, body: atHire },
      ...{ reader: party.viewer.call, theirs: other.tourManager.call, ours: party.tourManager.call },
    })
    expect((await party.tourManager.call('POST', path(), wanted)).status).toBe(200)
    expect((await party.tourManager.call('POST', `/api/hires/${tour.hireId}/answers`, { ...atHire, id: randomUUID() })).status).toBe(200)
  })

  it('says from whom, how and by whom, once, and the recipient sees it', async () => {
    const wanted = await body()
    for (let time = 0; time < 2; time++) expect((await party.tourManager.call('POST', path(), wanted)).status).toBe(200)
    const rows = await db().select().from(answerEvent).where(eq(answerEvent.showId, tour.showId))
    expect(rows).toMatchObject([
      { byName: 'Ib of the house', takenFrom: 'Ib of the house', takenHow: 'phone', personId: party.tourManager.personId, grantId: null, tokenId: null },
    ])
    expect(rows[0]?.at.toISOString()).toBe(wanted.at)
    expect(firstLine(await readReplyOf(sent))).toMatchObject({ state: 'answered', answer: { byName: 'Ib of the house' } })
    const trail = await db().select().from(auditEvent).where(eq(auditEvent.subjectId, wanted.id))
    expect(trail).toMatchObject([{ action: 'answer.take-down', actorKind: 'person' }])
  })

  it('refuses what is not asked there, other words, wrong counts, a time to come and a settled line', async () => {
    const by = party.tourManager.call
    const hire = await send(party, tour, revisionId, 'hire')
    const drum = firstLine(await readReplyOf(hire))
    expect((await by('POST', path(), await body({ lineId: drum.lineId, lineHash: drum.hash }))).status).toBe(404)
    expect((await by('POST', path(), await body({ lineHash: 'f'.repeat(64) }))).status).toBe(409)
    expect(faultyFields(await by('POST', path(), await body({ content: asAsked(2) })))).toEqual(['content'])
    expect(faultyFields(await by('POST', path(), await body({ at: new Date(Date.now() + 3_600_000).toISOString() })))).toEqual(['at'])
    expect(faultyFields(await by('POST', path(), await body({ how: 'telepathy' })))).toEqual(['how'])
    expect(faultyFields(await by('POST', path(), await body({ from: '' })))).toEqual(['from'])
    const wanted = await body()
    await by('POST', path(), wanted)
    const accept = { id: randomUUID(), lineId: wanted.lineId, answerEventId: wanted.id, decision: 'accept', remark: '' }
    expect((await by('POST', `/api/shows/${tour.showId}/settlements`, { decisions: [accept] })).status).toBe(200)
    const settled = await by('POST', path(), await body())
    expect(settled.status).toBe(409)
    expect(messageOf(settled)).toContain('settled')
    expect(await db().select().from(answerEvent).where(eq(answerEvent.showId, tour.showId))).toHaveLength(1)
  })
})

describe('settling', () => {
  const path = () => `/api/shows/${tour.showId}/settlements`
  const decide = (lineId: string, answerEventId: string, decision = 'accept') => ({ id: randomUUID(), lineId, answerEventId, decision, remark: '' })
  const settlements = () => db().select().from(settlement).where(eq(settlement.showId, tour.showId))

  it('is for a tour manager of the party, at shows and hires', async () => {
    const line = firstLine(await readReplyOf(sent))
    const answer = answerBody(line)
    await stranger('POST', `${sent.path}/answers`, answer)
    const attack = { decisions: [decide(line.lineId, answer.id)] }
    for (const of of [path(), `/api/hires/${tour.hireId}/settlements`]) {
      await attackRoute({
        ...{ method: 'POST', path: of, body: attack },
        ...{ reader: party.drumTech.call, theirs: other.tourManager.call, ours: party.tourManager.call },
      })
    }
    expect(await settlements()).toEqual([])
    // The answer is the show's, not the hire's.
    expect((await party.tourManager.call('POST', `/api/hires/${tour.hireId}/settlements`, attack)).status).toBe(404)
    expect((await party.tourManager.call('POST', path(), attack)).status).toBe(200)
  })

  it('happens to all lines or to none, and once', async () => {
    const reply = await readReplyOf(sent)
    const [ride, stands] = reply.lines
    if (!ride || !stands) throw new Error('two lines are asked')
    const [one, two] = [answerBody(ride), answerBody(stands)]
    await stranger('POST', `${sent.path}/answers`, one)
    const by = party.tourManager.call
    const early = await by('POST', path(), { decisions: [decide(ride.lineId, one.id), decide(stands.lineId, two.id)] })
    expect(early.status).toBe(404)
    expect(await settlements()).toEqual([])
    await stranger('POST', `${sent.path}/answers`, two)
    const body = { decisions: [decide(ride.lineId, one.id), decide(stands.lineId, two.id)] }
    const answers = await Promise.all([by('POST', path(), body), by('POST', path(), body)])
    expect(answers.map((answer) => answer.status)).toEqual([200, 200])
    expect(await settlements()).toHaveLength(2)
    // Settled is settled: another decision that says the same writes nothing.
    expect(await by('POST', path(), { decisions: [decide(ride.lineId, one.id)] })).toMatchObject({ status: 200, body: { saved: 0 } })
    expect(faultyFields(await by('POST', path(), { decisions: [decide(ride.lineId, one.id), decide(ride.lineId, one.id, 'reopen')] }))).toEqual(['decisions'])
  })

  it('does not settle an answer that another one has overtaken', async () => {
    const line = firstLine(await readReplyOf(sent))
    const [first, second] = [answerBody(line), answerBody(line, { ...asAsked(0), cant: 1 })]
    for (const body of [first, second]) await stranger('POST', `${sent.path}/answers`, body)
    const overtaken = await party.tourManager.call('POST', path(), { decisions: [decide(line.lineId, first.id)] })
    expect(overtaken.status).toBe(409)
    expect(await settlements()).toEqual([])
  })
})

describe('standings', () => {
  it('go from not sent over out, part answered and answered to settled, and the other recipients do not move', async () => {
    const fresh = await makeTour(party)
    const before = await readShowStandings(manager(), fresh.tourId)
    expect(before.shows).toMatchObject([{ sent: false, standing: 'not sent', counts: null, recipients: [{ name: 'House crew', standing: 'not sent' }] }])
    expect(before.hires).toMatchObject([{ sent: false, standing: 'not sent' }])

    await db().update(mail).set({ sentAt: new Date() }).where(eq(mail.id, sent.mailId))
    expect((await standings()).show).toMatchObject({ sent: true, standing: 'out', counts: { settled: 0, waiting: 2, changed: 0 } })
    expect((await standings()).hire).toMatchObject({ standing: 'not sent', counts: null })

    const lines = (await readReplyOf(sent)).lines
    const bodies = lines.map((line) => answerBody(line))
    await stranger('POST', `${sent.path}/answers`, bodies[0])
    expect((await standings()).show?.standing).toBe('part answered')
    await stranger('POST', `${sent.path}/answers`, bodies[1])
    expect((await standings()).show?.standing).toBe('answered')
    await party.tourManager.call('POST', `/api/shows/${tour.showId}/settlements`, {
      decisions: bodies.map((body) => ({ id: randomUUID(), lineId: body.lineId, answerEventId: body.id, decision: 'accept', remark: '' })),
    })
    expect((await standings()).show).toMatchObject({ standing: 'settled', counts: { settled: 2, waiting: 0, changed: 0 } })

    await addStands(party, tour, 2)
    await issue(party, tour, 'more stands')
    expect((await standings()).show).toMatchObject({ standing: 'changed since', counts: { settled: 2, waiting: 0, changed: 1 } })
  })

  it('say not delivered when the mail came back, until it is sent again', async () => {
    await db().update(mail).set({ sentAt: new Date() }).where(eq(mail.id, sent.mailId))
    await db().insert(mailEvent).values({ eventId: randomUUID(), mailId: sent.mailId, kind: 'bounced', detail: {}, at: new Date() })
    expect((await standings()).show?.standing).toBe('not delivered')
    const again = await send(party, tour, revisionId)
    await db().update(mail).set({ sentAt: new Date() }).where(eq(mail.id, again.mailId))
    expect((await standings()).show?.standing).toBe('out')
  })

  it('count a show’s own lines and those of the hire that covers it', async () => {
    const hire = await send(party, tour, revisionId, 'hire')
    await give(hire, firstLine(await readReplyOf(hire)))
    expect((await standings()).show).toMatchObject({ counts: { waiting: 2 }, allCounts: { settled: 0, waiting: 3, changed: 0 } })
  })

  it('are read in as many statements for three shows as for one', async () => {
    const statements = async () => {
      let count = 0
      const original = pool().query.bind(pool())
      const spied = pool() as unknown as { query: (...args: unknown[]) => unknown }
      spied.query = (...args) => {
        count += 1
        return (original as (...args: unknown[]) => unknown)(...args)
      }
      try {
        await readShowStandings(manager(), tour.tourId)
      } finally {
        spied.query = original as (...args: unknown[]) => unknown
      }
      return count
    }
    const one = await statements()
    const { show } = await import('@/db/schema/tour')
    const [row] = await db().select().from(show).where(eq(show.id, tour.showId))
    if (!row) throw new Error('no show')
    await db()
      .insert(show)
      .values([1, 2].map(() => ({ ...row, id: randomUUID() })))
    expect((await readShowStandings(manager(), tour.tourId)).shows).toHaveLength(3)
    expect(await statements()).toBe(one)
    expect(one).toBeLessThanOrEqual(7)
  })

  it('are not read by another party', async () => {
    const theirs = { ...manager(), partyId: other.partyId }
    expect(await readShowStandings(theirs, tour.tourId)).toEqual({ shows: [], hires: [] })
  })
})
