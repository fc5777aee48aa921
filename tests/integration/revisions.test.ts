import { randomUUID } from 'node:crypto'
import { and, asc, eq } from 'drizzle-orm'
import { beforeAll, describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { auditEvent } from '@/db/schema/audit'
import { kitEntry } from '@/db/schema/kit'
import { line, revision, revisionLine } from '@/db/schema/revision'
import { rig } from '@/db/schema/tour'
import { newPiece } from '@/plots/model/document'
import { attackRoute, faultyFields } from '../helpers/attack-route'
import type { Answer } from '../helpers/http-client'
import { stranger } from '../helpers/http-client'
import type { PartyFixture } from '../helpers/party-fixture'
import { makeParty } from '../helpers/party-fixture'
import type { TourFixture } from '../helpers/tour-fixture'
import { makeTour, tomSpec } from '../helpers/tour-fixture'

type Summary = { id: string; number: number; note: string; lines: number; rigName: string; issuedBy: { name: string } }
type Detail = Summary & {
  documentHash: string
  asked: { lineId: string; hash: string; position: number; words: string; supply: string }[]
  carried: string[]
  pieces: number
  previousNumber: number | null
  changes: {
    added: { words: string }[]
    dropped: { words: string }[]
    changed: { name: string; differences: string[] }[]
    tuning: unknown[]
  } | null
}
const summaryOf = (answer: Answer) => answer.body as Summary
const messageOf = (answer: Answer) => (answer.body as { error: { message: string } }).error.message

describe('revisions of a rig', () => {
  let party: PartyFixture
  let other: PartyFixture
  let tour: TourFixture
  let path: string

  beforeAll(async () => {
    party = await makeParty()
    other = await makeParty()
  })
  const fresh = async () => {
    tour = await makeTour(party)
    path = `/api/rigs/${tour.rigId}/revisions`
  }
  const issue = (body: object) => party.drumTech.call('POST', path, body)
  const read = async (id: string) => (await party.viewer.call('GET', `/api/revisions/${id}`)).body as Detail
  const setTom = (change: Partial<typeof kitEntry.$inferInsert>) =>
    db().update(kitEntry).set(change).where(eq(kitEntry.id, tour.tomId))
  const count = async () =>
    (await db().select({ id: revision.id }).from(revision).where(eq(revision.rigId, tour.rigId))).length

  it('freeze kit, plot and lines, numbered from one, with who and why', async () => {
    await fresh()
    const placed = await party.drumTech.call('POST', `/api/rigs/${tour.rigId}/plot/commands`, {
      baseSequence: 0,
      commands: [
        {
          clientId: randomUUID(),
          type: 'place',
          pieces: [newPiece({ id: randomUUID(), kind: 'drum', kitEntryId: tour.tomId })],
        },
      ],
    })
    expect(placed.status).toBe(200)
    const answer = await issue({ note: '  First full spec.  ' })
    expect(answer.status).toBe(201)
    expect(summaryOf(answer)).toMatchObject({
      number: 1,
      note: 'First full spec.',
      lines: 2,
      rigName: 'full rig',
      issuedBy: { name: 'The drum-tech' },
    })
    const detail = await read(summaryOf(answer).id)
    expect(detail.asked.map(({ position, words, supply }) => [position, words, supply])).toEqual([
      [1, 'Tom 12, 12 in across, 8 deep (305 × 203 mm), 6 lugs', 'rented'],
      [2, 'Ride 21, 21 in (533 mm)', 'venue'],
    ])
    expect(detail).toMatchObject({ pieces: 1, previousNumber: null, changes: null, carried: [] })
    const events = await db()
      .select({ action: auditEvent.action, actorId: auditEvent.actorId })
      .from(auditEvent)
      .where(and(eq(auditEvent.partyId, party.partyId), eq(auditEvent.subjectId, detail.id)))
    expect(events).toEqual([{ action: 'revision.issue', actorId: party.drumTech.personId }])
  })

  it('keep a line’s hash through a new note, change it with the size, and never touch what was issued', async () => {
    await fresh()
    const first = await read(summaryOf(await issue({ note: 'one' })).id)
    const stored = async (id: string) =>
      (
        await db()
          .select({ document: revision.document, hash: revision.documentHash })
          .from(revision)
          .where(eq(revision.id, id))
      )[0]
    const before = await stored(first.id)

    await setTom({ spec: { ...tomSpec, note: { semitone: 52, cents: 0 }, toleranceCents: 5, muffling: 'one gel' } })
    const second = await read(summaryOf(await issue({ note: 'two' })).id)
    expect(second.asked.map(({ lineId, hash }) => [lineId, hash])).toEqual(
      first.asked.map(({ lineId, hash }) => [lineId, hash]),
    )
    expect(second.changes).toMatchObject({ added: [], dropped: [], changed: [] })
    expect(second.changes?.tuning).toHaveLength(1)

    await setTom({ spec: { ...tomSpec, diameterIn: 13 } })
    const third = await read(summaryOf(await issue({ note: 'three' })).id)
    expect(third.asked[0]?.lineId).toBe(first.asked[0]?.lineId)
    expect(third.asked[0]?.hash).not.toBe(first.asked[0]?.hash)
    expect(third.asked[1]).toEqual(first.asked[1])
    expect(third.changes?.changed).toMatchObject([
      {
        name: 'Tom 12',
        differences: ['size 12 in across, 8 deep (305 × 203 mm) → 13 in across, 8 deep (330 × 203 mm)'],
      },
    ])
    expect(await stored(first.id)).toEqual(before)
    const kept = await db()
      .select({ revisionId: revisionLine.revisionId, lineId: revisionLine.lineId, hash: revisionLine.hash })
      .from(revisionLine)
      .where(eq(revisionLine.revisionId, third.id))
      .orderBy(asc(revisionLine.position))
    expect(kept).toEqual(third.asked.map(({ lineId, hash }) => ({ revisionId: third.id, lineId, hash })))
  })

  it('give a thing that becomes another kind a new line that replaces the old one, and find the old one again', async () => {
    await fresh()
    const first = await read(summaryOf(await issue({ note: 'a drum' })).id)
    await setTom({ kind: 'cymbal', spec: { type: 'crash', diameterIn: 18 } })
    const second = await read(summaryOf(await issue({ note: 'a crash instead' })).id)
    const [drumLine, crashLine] = [first.asked[0]?.lineId ?? '', second.asked[0]?.lineId ?? '']
    expect(crashLine).not.toBe(drumLine)
    const rows = await db().select({ replaces: line.replacesLineId }).from(line).where(eq(line.id, crashLine))
    expect(rows).toEqual([{ replaces: drumLine }])
    await setTom({ kind: 'drum', spec: tomSpec })
    expect((await read(summaryOf(await issue({ note: 'a drum again' })).id)).asked[0]?.lineId).toBe(drumLine)
  })

  it('do not ask for what is carried or was taken out of the kit', async () => {
    await fresh()
    await issue({ note: 'all' })
    await setTom({ supply: 'carried' })
    await db().update(kitEntry).set({ removedAt: new Date() }).where(eq(kitEntry.id, tour.rideId))
    const detail = await read(summaryOf(await issue({ note: 'less' })).id)
    expect(detail).toMatchObject({ asked: [], carried: ['Tom 12'], lines: 0 })
    expect(detail.changes?.dropped).toHaveLength(2)
  })

  it('are refused when nothing changed or the kit is empty, and then nothing is issued', async () => {
    await fresh()
    await issue({ note: 'one' })
    const again = await issue({ note: 'two' })
    expect(again.status).toBe(409)
    expect(messageOf(again)).toContain('Nothing changed since revision 1')
    expect(await count()).toBe(1)
    await db().update(kitEntry).set({ removedAt: new Date() }).where(eq(kitEntry.rigId, tour.rigId))
    const empty = await issue({ note: 'nothing left' })
    expect(empty.status).toBe(409)
    expect(messageOf(empty)).toContain('empty')
    expect(await count()).toBe(1)
  })

  it('are the same revision when the same request comes again, even after the kit changed', async () => {
    await fresh()
    const id = randomUUID()
    const first = await issue({ id, note: 'once' })
    await setTom({ name: 'Rack tom' })
    const second = await issue({ id, note: 'once' })
    expect([first.status, second.status]).toEqual([201, 201])
    expect(second.body).toEqual(first.body)
    expect(await count()).toBe(1)
    const otherRig = (await makeTour(party)).rigId
    expect(
      (await party.drumTech.call('POST', `/api/rigs/${otherRig}/revisions`, { id, note: 'elsewhere' })).status,
    ).toBe(409)
  })

  it('get one number each when two are issued at once', async () => {
    await fresh()
    const answers = await Promise.all([issue({ note: 'mine' }), issue({ note: 'yours' }), issue({ note: 'theirs' })])
    // The first freezes the rig; for the others nothing has changed since.
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409])
    const id = randomUUID()
    await setTom({ name: 'Rack tom' })
    const same = await Promise.all([issue({ id, note: 'x' }), issue({ id, note: 'x' })])
    expect(same.map(({ status }) => status)).toEqual([201, 201])
    const numbers = await db()
      .select({ number: revision.number })
      .from(revision)
      .where(eq(revision.rigId, tour.rigId))
      .orderBy(asc(revision.number))
    expect(numbers).toEqual([{ number: 1 }, { number: 2 }])
  })

  it('of another party cannot take an id that is in use', async () => {
    await fresh()
    const id = randomUUID()
    await issue({ id, note: 'ours' })
    const theirs = await makeTour(other)
    const taken = await other.drumTech.call('POST', `/api/rigs/${theirs.rigId}/revisions`, { id, note: 'theirs' })
    expect(taken.status).toBe(409)
    expect((await other.drumTech.call('GET', `/api/revisions/${id}`)).status).toBe(404)
  })

  it('are refused to nobody, to readers, to tour managers, to other parties, when too large or unreadable', async () => {
    await fresh()
    const attack = { method: 'POST', path, body: { note: 'x' }, theirs: other.drumTech.call, ours: party.drumTech.call }
    await attackRoute({ ...attack, reader: party.viewer.call })
    await attackRoute({ ...attack, reader: party.tourManager.call })
    expect(await count()).toBe(0)
    expect((await issue({ note: 'x' })).status).toBe(201)
  })

  it('name the field at fault', async () => {
    await fresh()
    expect(faultyFields(await issue({}))).toEqual(['note'])
    expect(faultyFields(await issue({ note: '   ' }))).toEqual(['note'])
    expect(faultyFields(await issue({ note: 'x'.repeat(2001) }))).toEqual(['note'])
    expect(faultyFields(await issue({ id: 'seven', note: 'x' }))).toEqual(['id'])
    expect(faultyFields(await party.drumTech.call('POST', '/api/rigs/seven/revisions', { note: 'x' }))).toEqual([
      'rigId',
    ])
    expect(await count()).toBe(0)
  })

  it('are listed newest first, to members only', async () => {
    await fresh()
    await issue({ note: 'one' })
    await setTom({ name: 'Rack tom' })
    await issue({ note: 'two' })
    const list = await party.viewer.call('GET', path)
    expect(
      (list.body as { revisions: Summary[] }).revisions.map(({ number, note, lines }) => [number, note, lines]),
    ).toEqual([
      [2, 'two', 2],
      [1, 'one', 2],
    ])
    const [newest] = (list.body as { revisions: Summary[] }).revisions
    for (const at of [path, `/api/revisions/${newest?.id}`]) {
      expect((await stranger('GET', at)).status).toBe(401)
      expect((await other.drumTech.call('GET', at)).status).toBe(404)
    }
    expect((await party.viewer.call('GET', `/api/revisions/${randomUUID()}`)).status).toBe(404)
    expect((await party.viewer.call('GET', '/api/revisions/seven')).status).toBe(422)
  })

  it('stay readable when the rig gets another name', async () => {
    await fresh()
    const { id } = summaryOf(await issue({ note: 'one' }))
    await db().update(rig).set({ name: 'fly rig' }).where(eq(rig.id, tour.rigId))
    expect((await read(id)).rigName).toBe('fly rig')
    expect((await issue({ note: 'renamed' })).status).toBe(201)
  })
})
