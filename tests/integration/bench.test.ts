import { randomUUID } from 'node:crypto'
import { eq } from 'drizzle-orm'
import { beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { answerEvent } from '@/db/schema/advance'
import { auditEvent } from '@/db/schema/audit'
import { physicalDrum, reading } from '@/db/schema/bench'
import { grant, grantToken } from '@/db/schema/grant'
import { kitEntry } from '@/db/schema/kit'
import { show } from '@/db/schema/tour'
import { hashToken, linkToken } from '@/lib/server/auth/link-token'
import type { Bench, BenchLink, BenchReading, ReadingInput } from '@/lib/contracts/bench'
import type { Answer } from '../helpers/http-client'
import { baseUrl, stranger } from '../helpers/http-client'
import { makeParty, type PartyFixture } from '../helpers/party-fixture'
import { makeTour, type TourFixture, tomSpec } from '../helpers/tour-fixture'

type Refusal = {
  error: { code: string; message: string; details: { fields?: Record<string, string>; reason?: string } }
}
const refusal = (answer: Answer) => (answer.body as Refusal).error
const fields = (answer: Answer) => refusal(answer).details.fields

let party: PartyFixture
let other: PartyFixture
let tour: TourFixture
let token: string
let deviceId: string
let sequence: number

beforeAll(async () => {
  party = await makeParty()
  other = await makeParty()
})

const issue = async (who: PartyFixture, rigId: string) => {
  const answer = await who.drumTech.call('POST', `/api/rigs/${rigId}/revisions`, { note: 'for the bench' })
  expect(answer.status).toBe(201)
  return answer.body as { id: string; number: number }
}
const print = async (who: PartyFixture, showId: string): Promise<string> => {
  const answer = await who.drumTech.call('POST', `/api/shows/${showId}/bench-links`)
  expect(answer.status).toBe(201)
  return new URL((answer.body as { href: string }).href).pathname.replace('/b/', '')
}
beforeEach(async () => {
  tour = await makeTour(party)
  await issue(party, tour.rigId)
  token = await print(party, tour.showId)
  deviceId = randomUUID()
  sequence = 0
})

const read = (lug: number, value: number, more: Partial<ReadingInput> = {}): ReadingInput => {
  sequence += 1
  return {
    ...{
      id: randomUUID(),
      entryId: tour.tomId,
      side: 'batter',
      lug,
      value,
      unit: 'Hz',
      method: 'tap-typed',
      targetHz: 256,
    },
    ...{
      deviceId,
      deviceSequence: sequence,
      deviceAt: '2031-10-14T16:00:00.000Z',
      otherHead: 'damped',
      onStand: false,
    },
    ...{ gauge: '', temperatureC: null, pass: 1, strikes: null, byName: 'Local hand' },
    ...more,
  }
}
const send = (readings: unknown, at = token) => stranger('POST', `/api/b/${at}/readings`, { readings })
const bench = async (at = token) => (await stranger('GET', `/api/b/${at}`)).body as Bench
const stored = () => db().select().from(reading).where(eq(reading.showId, tour.showId))

describe('opening a bench', () => {
  it('shows the drums of the night with targets, lugs, tolerance and the noted gauge', async () => {
    const answer = await bench()
    expect(answer).toMatchObject({
      show: {
        id: tour.showId,
        title: 'Test Hall',
        town: 'Arvic',
        date: '2031-10-14',
        zone: 'Europe/Paris',
        mustNotRetune: null,
      },
      sheet: { number: 1, from: 'issued', newestNumber: 1 },
      drums: [{ entryId: tour.tomId, name: 'Tom 12', lugCount: 6, toleranceCents: 10, instead: null, missing: false }],
      ...{ readings: [], signOffs: [] },
    })
    const [batter, resonant] = answer.drums[0]?.heads ?? []
    // D3 at A4 = 440 Hz: 440·2^(−19/12).
    expect(batter?.note).toMatchObject({ name: 'D3', cents: 0 })
    expect(batter?.note?.hz).toBeCloseTo(146.832, 3)
    expect(batter).toMatchObject({ side: 'batter', gauge: { kind: 'noted', reading: '75' }, without: null })
    expect(resonant?.side).toBe('resonant')
    const { hz = 0, lowHz = 0, highHz = 0 } = batter?.tap ?? {}
    // A tap lies above the ideal 1.593 of the note in open air and within its own bounds.
    expect(hz).toBeGreaterThan(146.832 * 1.593)
    expect([lowHz < hz, hz < highHz]).toEqual([true, true])
  })

  it('holds nothing that is not the bench’s: no price, no contact, no other show', async () => {
    const text = JSON.stringify(await bench())
    for (const secret of ['.example', 'House crew', 'Hire desk', 'Test Backline', tour.hireId, tour.contactId, 'EUR'])
      expect(text).not.toContain(secret)
  })

  it('changes nothing, however often it is opened', async () => {
    const drums = () =>
      db().select({ id: physicalDrum.id }).from(physicalDrum).where(eq(physicalDrum.partyId, party.partyId))
    const before = (await drums()).length
    await bench()
    const page = await fetch(new URL(`/b/${token}`, baseUrl()))
    expect(page.status).toBe(200)
    const rows = await db()
      .select({ used: grantToken.lastUsedAt, uses: grantToken.useCount })
      .from(grantToken)
      .where(eq(grantToken.tokenHash, hashToken(token)))
    expect(rows).toEqual([{ used: null, uses: 0 }])
    expect(await drums()).toHaveLength(before)
    expect(await stored()).toEqual([])
  })

  it('takes the revision that was issued; a kit that changes later changes no sheet', async () => {
    await db()
      .update(kitEntry)
      .set({ spec: { ...tomSpec, lugs: 8 } })
      .where(eq(kitEntry.id, tour.tomId))
    expect((await bench()).drums[0]?.lugCount).toBe(6)
    await issue(party, tour.rigId)
    expect(await bench()).toMatchObject({ sheet: { number: 2 }, drums: [{ lugCount: 8 }] })
  })

  it('says so when no revision was issued yet', async () => {
    const bare = await makeTour(party)
    const at = await print(party, bare.showId)
    expect(await bench(at)).toMatchObject({ sheet: null, drums: [] })
    const answer = await send([read(1, 250, { entryId: bare.tomId })], at)
    expect(answer.status).toBe(409)
    expect(refusal(answer).message).toContain('No revision was issued')
  })

  it('warns when the kit is shared and must stay as it is', async () => {
    await db()
      .update(show)
      .set({ sharedKit: { owner: 'the festival', mayRetune: false, maySwap: '' } })
      .where(eq(show.id, tour.showId))
    expect((await bench()).show.mustNotRetune).toBe('the festival')
  })

  it('follows what was settled: a drum of another size keeps its note and takes its lugs, and its readings begin anew', async () => {
    expect((await send([read(1, 250)])).status).toBe(200)
    const line = await lineOf(tour.tomId)
    const what = { kind: 'drum', diameterIn: 13, depthIn: 9, lugs: 8, words: 'birch' }
    const answerId = randomUUID()
    await db()
      .insert(answerEvent)
      .values({
        ...{
          id: answerId,
          partyId: party.partyId,
          hireId: tour.hireId,
          kind: 'answer',
          lineId: line.lineId,
          lineHash: line.hash,
        },
        ...{ revisionId: line.revisionId, content: { asAsked: 0, instead: [{ n: 1, what }], notYet: [], cant: 0 } },
        ...{ byName: 'Hire desk', personId: party.tourManager.personId, takenFrom: 'Hire desk', takenHow: 'phone' },
      })
    expect((await bench()).drums[0]).toMatchObject({ lugCount: 6, instead: null })
    await db().execute(
      `insert into settlement (id, party_id, hire_id, line_id, line_hash, answer_event_id, decision, person_id)
       values ('${randomUUID()}', '${party.partyId}', '${tour.hireId}', '${line.lineId}', '${line.hash}', '${answerId}', 'accept', '${party.tourManager.personId}')`,
    )
    const now = await bench()
    expect(now.drums[0]).toMatchObject({
      lugCount: 8,
      instead: { words: 'birch' },
      heads: [{ note: { name: 'D3' } }, {}],
    })
    expect(now.readings).toEqual([])
    expect((await send([read(8, 240)])).status).toBe(200)
    expect((await bench()).readings.map(({ lug }) => lug)).toEqual([8])
    expect(new Set((await stored()).map(({ physicalDrumId }) => physicalDrumId)).size).toBe(2)
  })
})

async function lineOf(entryId: string) {
  const { rows } = await db().execute(
    `select rl.line_id as "lineId", rl.hash, rl.revision_id as "revisionId" from revision_line rl join line l on l.id = rl.line_id where l.kit_entry_id = '${entryId}'`,
  )
  return rows[0] as { lineId: string; hash: string; revisionId: string }
}

describe('logging readings', () => {
  it('keeps them with both clocks, makes the physical drum once, and counts the link’s use', async () => {
    const first = read(1, 251.5)
    const answer = await send([first, read(4, 76, { method: 'gauge', unit: 'gauge', gauge: 'dial' })])
    expect(answer.status).toBe(200)
    await send([read(2, 249)])
    const { readings } = await bench()
    expect(readings).toHaveLength(3)
    expect(readings[0]).toMatchObject({
      id: first.id,
      lug: 1,
      value: 251.5,
      unit: 'Hz',
      byName: 'Local hand',
      via: 'link',
      deviceAt: first.deviceAt,
    })
    // The device's clock stands in 2031; the server's own stands beside it.
    expect(Math.abs(Date.parse(readings[0]?.serverAt ?? '') - Date.now())).toBeLessThan(60_000)
    expect(readings[1]).toMatchObject({ method: 'gauge', gauge: 'dial', targetHz: null })
    const rows = await stored()
    expect(new Set(rows.map(({ physicalDrumId }) => physicalDrumId)).size).toBe(1)
    const drums = await db()
      .select()
      .from(physicalDrum)
      .where(eq(physicalDrum.id, rows[0]?.physicalDrumId ?? ''))
    expect(drums).toMatchObject([{ diameterIn: 12, depthIn: 8, lugs: 6, supplierId: tour.supplierId }])
    const used = await db()
      .select({ uses: grantToken.useCount })
      .from(grantToken)
      .where(eq(grantToken.tokenHash, hashToken(token)))
    expect(used).toEqual([{ uses: 2 }])
    const trail = await db()
      .select({ action: auditEvent.action })
      .from(auditEvent)
      .where(eq(auditEvent.subjectId, tour.showId))
    expect(trail.filter(({ action }) => action === 'bench.read')).toHaveLength(2)
  })

  it('gives a repeated batch the same answer and keeps it once, also when both come at once', async () => {
    const batch = [read(1, 250), read(4, 251)]
    const answers = await Promise.all([send(batch), send(batch), send(batch)])
    expect(answers.map(({ status }) => status)).toEqual([200, 200, 200])
    expect((await send(batch)).body).toEqual(answers[0]?.body)
    expect(await stored()).toHaveLength(2)
    // With a new one beside the old, only that is added.
    expect((await send([...batch, read(2, 250)])).status).toBe(200)
    expect(await stored()).toHaveLength(3)
  })

  it('takes batches in any order', async () => {
    const [one, two, three] = [read(1, 250), read(4, 251), read(2, 252)]
    expect((await send([three])).status).toBe(200)
    expect((await send([two, one])).status).toBe(200)
    expect(await stored()).toHaveLength(3)
  })

  it.each<[string, Partial<ReadingInput> | Record<string, unknown>, string]>([
    ['a lug that the head does not have', { lug: 7 }, 'lug'],
    ['lug 0', { lug: 0 }, 'lug'],
    ['half a lug', { lug: 1.5 }, 'lug'],
    ['no number', { value: Number.NaN }, 'value'],
    ['a pitch no drum has', { value: 9000 }, 'value'],
    ['a pitch of nothing', { value: 0 }, 'value'],
    ['an endless number', { value: '1e999' }, 'value'],
    ['a gauge in Hz', { method: 'gauge' }, 'unit'],
    ['a tap in gauge units', { unit: 'gauge', value: 75 }, 'unit'],
    ['cents from nothing', { unit: 'cents', value: -12, targetHz: null }, 'targetHz'],
    ['a tap heard by nobody', { method: 'tap-heard' }, 'method'],
    ['a pass before the first', { pass: 0 }, 'pass'],
    ['a clock that is none', { deviceAt: 'five o’clock' }, 'deviceAt'],
    ['an unknown drum', { entryId: randomUUID() }, 'entryId'],
    ['an unknown side', { side: 'edge' }, 'side'],
    ['a stage on fire', { temperatureC: 500 }, 'temperatureC'],
    ['a name too long', { byName: 'x'.repeat(121) }, 'byName'],
    ['a correction of nothing', { strikes: randomUUID() }, 'strikes'],
  ])('refuses %s, names the field, and keeps nothing of the batch', async (_, fault, field) => {
    const answer = await send([read(1, 250), { ...read(2, 251), ...fault }])
    expect(answer.status).toBe(422)
    expect(Object.keys(fields(answer) ?? {})).toContain(`readings.1.${field}`)
    expect(await stored()).toEqual([])
  })

  it('refuses a cymbal, a head that is not there and another show’s drum', async () => {
    expect(fields(await send([read(1, 250, { entryId: tour.rideId })]))).toHaveProperty(['readings.0.entryId'])
    const elsewhere = await makeTour(party)
    await issue(party, elsewhere.rigId)
    expect(fields(await send([read(1, 250, { entryId: elsewhere.tomId })]))).toHaveProperty(['readings.0.entryId'])
    await db()
      .update(kitEntry)
      .set({ spec: { ...tomSpec, resonant: null } })
      .where(eq(kitEntry.id, tour.tomId))
    await issue(party, tour.rigId)
    expect(fields(await send([read(1, 250, { side: 'resonant' })]))).toHaveProperty(['readings.0.side'])
    expect(await stored()).toEqual([])
  })

  it('refuses two of one id, two of one device number, none, and too many at once', async () => {
    const one = read(1, 250)
    expect(fields(await send([one, { ...read(2, 250), id: one.id }]))).toHaveProperty(['readings.1.id'])
    expect(fields(await send([one, read(2, 250, { deviceSequence: one.deviceSequence })]))).toHaveProperty([
      'readings.1.deviceSequence',
    ])
    expect(fields(await send([]))).toHaveProperty('readings')
    expect(fields(await send(Array.from({ length: 201 }, () => read(1, 250))))).toHaveProperty('readings')
    expect((await send([read(1, 250, { gauge: 'x'.repeat(300_000) })])).status).toBe(413)
    expect((await stranger('POST', `/api/b/${token}/readings`, '{"readings": [')).status).toBe(422)
    expect(await stored()).toEqual([])
    expect((await send(Array.from({ length: 200 }, () => read(1, 250)))).status).toBe(200)
    expect(await stored()).toHaveLength(200)
  })

  it('refuses a number and an id that other readings have', async () => {
    const one = read(1, 250)
    await send([one])
    expect(fields(await send([read(2, 250, { deviceSequence: one.deviceSequence })]))).toHaveProperty([
      'readings.0.deviceSequence',
    ])
    expect(fields(await send([{ ...one, value: 260 }]))).toHaveProperty(['readings.0.id'])
    expect((await stored()).map(({ value }) => value)).toEqual([250])
  })

  it('will not let another party’s link take over an id', async () => {
    const one = read(1, 250)
    await send([one])
    const theirs = await makeTour(other)
    await issue(other, theirs.rigId)
    const at = await print(other, theirs.showId)
    const answer = await send([{ ...one, entryId: theirs.tomId }], at)
    expect(answer.status).toBe(409)
    expect(await db().select().from(reading).where(eq(reading.showId, theirs.showId))).toEqual([])
  })
})

describe('correcting a reading', () => {
  it('adds one that strikes the old, which stays in the log', async () => {
    const slip = read(1, 520)
    await send([slip])
    const mended = read(1, 252, { strikes: slip.id })
    expect((await send([mended])).status).toBe(200)
    const { readings } = await bench()
    expect(readings.map(({ id, value, strikes }) => ({ id, value, strikes }))).toEqual([
      { id: slip.id, value: 520, strikes: null },
      { id: mended.id, value: 252, strikes: slip.id },
    ])
  })

  it('may strike one of the same batch, but none that comes later in it', async () => {
    const slip = read(1, 520)
    const mended = read(1, 252, { strikes: slip.id })
    expect(fields(await send([mended, slip]))).toHaveProperty(['readings.0.strikes'])
    expect(await stored()).toEqual([])
    expect((await send([slip, mended])).status).toBe(200)
  })

  it('strikes once, and never a reading of another head or show', async () => {
    const [batter, resonant] = [read(1, 250), read(1, 255, { side: 'resonant' })]
    await send([batter, resonant])
    expect(fields(await send([read(1, 252, { strikes: resonant.id })]))).toHaveProperty(['readings.0.strikes'])
    expect((await send([read(1, 252, { strikes: batter.id })])).status).toBe(200)
    expect(fields(await send([read(1, 253, { strikes: batter.id })]))).toEqual({
      'readings.0.strikes': 'this reading was struck already',
    })
    const two = [read(2, 250), read(2, 251)]
    await send(two)
    const [first, second] = [
      read(2, 252, { strikes: two[0]?.id ?? null }),
      read(2, 253, { strikes: two[0]?.id ?? null }),
    ]
    expect(fields(await send([first, second]))).toHaveProperty(['readings.1.strikes'])
    const self = read(3, 250)
    expect(fields(await send([{ ...self, strikes: self.id }]))).toHaveProperty(['readings.0.strikes'])
    expect(await stored()).toHaveLength(5)
  })
})

describe('signing off', () => {
  const sign = (more: Record<string, unknown> = {}, at = token) =>
    stranger('POST', `/api/b/${at}/sign-offs`, {
      id: randomUUID(),
      entryId: tour.tomId,
      decision: 'signed',
      byName: 'Local hand',
      remark: '',
      ...more,
    })

  it('keeps name and remark, can be taken back, and the same request twice is one', async () => {
    const id = randomUUID()
    const answers = [await sign({ id, remark: 'new batter head' }), await sign({ id, remark: 'new batter head' })]
    expect(answers.map(({ status }) => status)).toEqual([200, 200])
    expect(answers[1]?.body).toEqual(answers[0]?.body)
    expect((await sign({ decision: 'taken-back' })).status).toBe(200)
    expect((await bench()).signOffs).toMatchObject([
      { id, decision: 'signed', byName: 'Local hand', remark: 'new batter head' },
      { decision: 'taken-back' },
    ])
    const trail = await db()
      .select({ action: auditEvent.action })
      .from(auditEvent)
      .where(eq(auditEvent.subjectId, tour.showId))
    expect(trail.map(({ action }) => action)).toEqual(expect.arrayContaining(['bench.sign-off', 'bench.take-back']))
  })

  it('needs a name and a drum of this sheet, and something to take back', async () => {
    expect(fields(await sign({ byName: '  ' }))).toHaveProperty('byName')
    expect(fields(await sign({ entryId: tour.rideId }))).toHaveProperty('entryId')
    expect(fields(await sign({ remark: 'x'.repeat(2001) }))).toHaveProperty('remark')
    expect(fields(await sign({ decision: 'perhaps' }))).toHaveProperty('decision')
    expect((await sign({ decision: 'taken-back' })).status).toBe(409)
    expect((await bench()).signOffs).toEqual([])
  })

  it('bears a signed-in person’s own name, whatever the request says', async () => {
    const path = `/api/shows/${tour.showId}/bench/sign-offs`
    const body = { id: randomUUID(), entryId: tour.tomId, decision: 'signed', byName: 'Somebody else', remark: '' }
    expect((await party.drumTech.call('POST', path, body)).body).toMatchObject({ byName: 'The drum-tech' })
  })
})

describe('a bench link', () => {
  const paths = (at: string): ['GET' | 'POST', string, unknown][] => [
    ['GET', `/api/b/${at}`, undefined],
    ['GET', `/api/b/${at}/live`, undefined],
    ['POST', `/api/b/${at}/readings`, { readings: [read(1, 250)] }],
    [
      'POST',
      `/api/b/${at}/sign-offs`,
      { id: randomUUID(), entryId: tour.tomId, decision: 'signed', byName: 'x', remark: '' },
    ],
  ]
  const statuses = async (at: string) => {
    const got: number[] = []
    for (const [method, path, body] of paths(at)) got.push((await stranger(method, path, body)).status)
    return got
  }
  const key = async (values: Partial<typeof grant.$inferInsert>) => {
    const [grantId, tokenId] = [randomUUID(), randomUUID()]
    await db()
      .insert(grant)
      .values({
        ...{ id: grantId, partyId: party.partyId, purpose: 'bench', showId: tour.showId, recipientName: 'Bench' },
        ...{ createdBy: party.drumTech.personId, expiresAt: new Date(Date.now() + 60_000) },
        ...values,
      })
    const secret = linkToken('grant', tokenId)
    await db()
      .insert(grantToken)
      .values({ id: tokenId, partyId: party.partyId, grantId, tokenHash: hashToken(secret), madeFor: 'print' })
    return secret
  }

  it('opens nothing without its token or with one made up', async () => {
    expect(await statuses('x')).toEqual([404, 404, 404, 404])
    expect(await statuses(linkToken('grant', randomUUID()))).toEqual([404, 404, 404, 404])
    expect((await fetch(new URL('/b/x', baseUrl()))).status).toBe(404)
  })

  it('opens nothing when it was made for replies', async () => {
    expect(await statuses(await key({ purpose: 'reply' }))).toEqual([404, 404, 404, 404])
  })

  it('says plainly that it was withdrawn or has run out, and takes nothing', async () => {
    const [withdrawn, expired] = [
      await key({ withdrawnAt: new Date() }),
      await key({ expiresAt: new Date(Date.now() - 1000) }),
    ]
    expect(await statuses(withdrawn)).toEqual([410, 410, 410, 410])
    expect(await statuses(expired)).toEqual([410, 410, 410, 410])
    expect(await (await fetch(new URL(`/b/${withdrawn}`, baseUrl()))).text()).toContain('was withdrawn')
    expect(await (await fetch(new URL(`/b/${expired}`, baseUrl()))).text()).toContain('has run out')
    expect(await stored()).toEqual([])
  })

  it('logs at its own show only', async () => {
    const elsewhere = await makeTour(party)
    await issue(party, elsewhere.rigId)
    const at = await print(party, elsewhere.showId)
    const answer = await send([read(1, 250)], at)
    expect(answer.status).toBe(422)
    expect((await stranger('GET', `/api/b/${at}`)).body).toMatchObject({ show: { id: elsewhere.showId } })
  })

  it('is printed anew each time, listed without its secret, and withdrawn with all its prints', async () => {
    const second = await print(party, tour.showId)
    expect(second).not.toBe(token)
    await send([read(1, 250)], second)
    const path = `/api/shows/${tour.showId}/bench-links`
    const listed = await party.viewer.call('GET', path)
    const links = (listed.body as { links: BenchLink[] }).links
    expect(links).toMatchObject([{ prints: 2, uses: 1, state: 'works' }])
    expect(links[0]?.lastUsedAt).not.toBeNull()
    for (const secret of [token, second]) expect(JSON.stringify(listed.body)).not.toContain(secret)
    const grantId = links[0]?.grantId ?? ''
    expect((await party.viewer.call('DELETE', `${path}/${grantId}`)).status).toBe(403)
    expect((await other.drumTech.call('DELETE', `${path}/${grantId}`)).status).toBe(404)
    expect((await party.drumTech.call('DELETE', `${path}/${grantId}`)).status).toBe(200)
    expect([...(await statuses(token)), ...(await statuses(second))]).toEqual(Array(8).fill(410))
    expect(((await party.viewer.call('GET', path)).body as { links: BenchLink[] }).links[0]?.state).toBe('withdrawn')
    // A print after that is another link.
    expect((await stranger('GET', `/api/b/${await print(party, tour.showId)}`)).status).toBe(200)
  })

  it('is withdrawn at its own show’s address, never a reply’s link there', async () => {
    const elsewhere = await makeTour(party)
    const links = (
      (await party.viewer.call('GET', `/api/shows/${tour.showId}/bench-links`)).body as { links: BenchLink[] }
    ).links
    expect(
      (await party.drumTech.call('DELETE', `/api/shows/${elsewhere.showId}/bench-links/${links[0]?.grantId}`)).status,
    ).toBe(404)
    const replyId = randomUUID()
    await db()
      .insert(grant)
      .values({
        ...{ id: replyId, partyId: party.partyId, purpose: 'reply', showId: tour.showId, recipientName: 'House crew' },
        ...{ createdBy: party.tourManager.personId, expiresAt: new Date(Date.now() + 60_000) },
      })
    expect((await party.drumTech.call('DELETE', `/api/shows/${tour.showId}/bench-links/${replyId}`)).status).toBe(404)
    expect((await stranger('GET', `/api/b/${token}`)).status).toBe(200)
  })
})

describe('the desk’s bench', () => {
  const path = () => `/api/shows/${tour.showId}/bench`
  const signOff = () => ({ id: randomUUID(), entryId: tour.tomId, decision: 'signed', byName: '', remark: '' })

  it('is read by everybody of the party, logged at by the drum tech only, and closed to the rest of the world', async () => {
    const tries = async (who: PartyFixture['owner']['call']) => [
      (await who('GET', path())).status,
      (await who('POST', `${path()}/readings`, { readings: [read(1, 250)] })).status,
      (await who('POST', `${path()}/sign-offs`, signOff())).status,
      (await who('GET', `${path()}-links`)).status,
      (await who('POST', `${path()}-links`)).status,
    ]
    expect(await tries(stranger)).toEqual([401, 401, 401, 401, 401])
    expect(await tries(party.viewer.call)).toEqual([200, 403, 403, 200, 403])
    expect(await tries(party.owner.call)).toEqual([200, 403, 403, 200, 403])
    expect(await tries(party.tourManager.call)).toEqual([200, 403, 403, 200, 201])
    expect(await stored()).toEqual([])
    expect(await tries(party.drumTech.call)).toEqual([200, 200, 200, 200, 201])
    expect(await tries(other.drumTech.call)).toEqual([404, 404, 404, 404, 404])
    const mine = (await party.viewer.call('GET', path())).body as Bench
    expect(mine.readings).toMatchObject([{ byName: 'The drum-tech', via: 'person' }])
    expect((await party.drumTech.call('GET', `/api/shows/not-an-id/bench`)).status).toBe(422)
  })

  it('tells two phones of each other', async () => {
    const controller = new AbortController()
    const response = await fetch(new URL(`/api/b/${token}/live`, baseUrl()), { signal: controller.signal })
    const reader = response.body?.pipeThrough(new TextDecoderStream()).getReader()
    if (!reader) throw new Error('no stream')
    const hear = async (wanted: string) => {
      for (let text = ''; !text.includes(wanted);) {
        const { done, value } = await reader.read()
        if (done) throw new Error(`the stream ended without ${wanted}`)
        text += value
      }
    }
    await hear('ready')
    const sent = await send([read(1, 250)], await print(party, tour.showId))
    expect((sent.body as { readings: BenchReading[] }).readings).toHaveLength(1)
    await hear(`bench:${tour.showId}`)
    controller.abort()
  })
})
