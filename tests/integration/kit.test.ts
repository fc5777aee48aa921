import { randomUUID } from 'node:crypto'
import { asc, eq } from 'drizzle-orm'
import { beforeEach, describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { auditEvent } from '@/db/schema/audit'
import type { Answer } from '../helpers/http-client'
import { stranger } from '../helpers/http-client'
import { makeParty, type PartyFixture } from '../helpers/party-fixture'
import { makeTour, tomSpec, type TourFixture } from '../helpers/tour-fixture'

type Row = {
  id: string
  kind: string
  name: string
  version: number
  removed: boolean
  position: number
  spec: Record<string, unknown>
}
const rowOf = (answer: Answer) => answer.body as Row
const rowsOf = (answer: Answer) => (answer.body as { entries: Row[] }).entries
const errorOf = (answer: Answer) =>
  (
    answer.body as {
      error: { code: string; message: string; details: { fields?: Record<string, string>; current?: unknown } }
    }
  ).error
const names = (answer: Answer) => rowsOf(answer).map(({ name }) => name)

const common = { supply: 'rented', count: 1, remark: '' }
const drum = (name: string, spec: object = {}) => ({ kind: 'drum', name, ...common, spec: { ...tomSpec, ...spec } })
const mic = {
  kind: 'microphone',
  name: 'Clip-on',
  ...common,
  count: 3,
  spec: { type: 'clip-on', phantom: true, stand: 'clip' },
}

describe('the kit of a rig', () => {
  let party: PartyFixture
  let tour: TourFixture
  let kit: string

  beforeEach(async () => {
    party = await makeParty()
    tour = await makeTour(party)
    kit = `/api/rigs/${tour.rigId}/kit`
  })
  const tech = (method: string, path: string, body?: unknown) => party.drumTech.call(method, path, body)
  const read = () => party.viewer.call('GET', kit)
  const add = (entry: object, id?: string) => tech('POST', `${kit}/entries`, { ...(id ? { id } : {}), entry })

  it('is read by every member in its order', async () => {
    for (const member of [party.owner, party.drumTech, party.tourManager, party.viewer]) {
      const answer = await member.call('GET', kit)
      expect(answer.status).toBe(200)
      expect(names(answer)).toEqual(['Tom 12', 'Ride 21'])
    }
  })

  it('takes a new entry at its end, once, however often the same request comes', async () => {
    const id = randomUUID()
    const made = await add(drum('Tom 10', { diameterIn: 10 }), id)
    expect(made.status).toBe(201)
    expect(rowOf(made)).toMatchObject({
      id,
      name: 'Tom 10',
      version: 1,
      removed: false,
      position: 2,
      spec: { diameterIn: 10 },
    })
    const again = await add(drum('Tom 10', { diameterIn: 10 }), id)
    expect(rowOf(again)).toEqual(rowOf(made))
    expect(rowOf(await add(mic))).toMatchObject({ kind: 'microphone', count: 3, position: 3 })
    expect(names(await read())).toEqual(['Tom 12', 'Ride 21', 'Tom 10', 'Clip-on'])
  })

  it('does not hand out or take over an id of another rig or party', async () => {
    const other = await makeParty()
    const theirs = await makeTour(other)
    const answer = await add(drum('Mine'), theirs.tomId)
    expect([answer.status, errorOf(answer).code]).toEqual([409, 'conflict'])
    expect(JSON.stringify(answer.body)).not.toContain('Tom 12')
    const set = await tech('POST', `${kit}/set`, {
      entries: [
        { id: theirs.tomId, entry: mic },
        { id: randomUUID(), entry: mic },
      ],
    })
    expect(set.status).toBe(409)
    expect(names(await read())).toEqual(['Tom 12', 'Ride 21'])
    expect(names(await other.viewer.call('GET', `/api/rigs/${theirs.rigId}/kit`))).toEqual(['Tom 12', 'Ride 21'])
  })

  it('takes a whole set in one step, once', async () => {
    const entries = ['Kick 22', 'Snare 14', 'Floor 16'].map((name) => ({ id: randomUUID(), entry: drum(name) }))
    const made = await tech('POST', `${kit}/set`, { entries })
    expect([made.status, names(made)]).toEqual([201, ['Tom 12', 'Ride 21', 'Kick 22', 'Snare 14', 'Floor 16']])
    expect(names(await tech('POST', `${kit}/set`, { entries }))).toEqual(names(made))
    const twice = await tech('POST', `${kit}/set`, { entries: [entries[0], entries[0]] })
    expect(errorOf(twice).details.fields).toEqual({ entries: 'each id once' })
  })

  it('names the field at fault and what is allowed there, and changes nothing', async () => {
    const head = tomSpec.batter
    const cases: [object, string, RegExp][] = [
      [drum('', {}), 'entry.name', /give a name/],
      [drum('x'.repeat(121)), 'entry.name', /120/],
      [{ ...drum('A'), supply: 'stolen' }, 'entry.supply', /who brings it/],
      [{ ...drum('A'), count: 2 }, 'entry.count', /own entry/],
      [{ ...drum('A'), remark: 'x'.repeat(2001) }, 'entry.remark', /2000/],
      [drum('A', { diameterIn: 5.75 }), 'entry.spec.diameterIn', /at least 6 in/],
      [drum('A', { diameterIn: 28.25 }), 'entry.spec.diameterIn', /at most 28 in/],
      [drum('A', { diameterIn: 12.3 }), 'entry.spec.diameterIn', /quarter/],
      [drum('A', { depthIn: 2 }), 'entry.spec.depthIn', /at least 3 in/],
      [drum('A', { depthIn: '8' }), 'entry.spec.depthIn', /size in inches/],
      [drum('A', { lugs: 7 }), 'entry.spec.lugs', /4, 5, 6, 8, 10 or 12/],
      [drum('A', { role: 'gong' }), 'entry.spec.role', /choose/],
      [drum('A', { toleranceCents: 0 }), 'entry.spec.toleranceCents', /at least 1/],
      [drum('A', { headRelationCents: 1201 }), 'entry.spec.headRelationCents', /1200/],
      [drum('A', { batter: { ...head, plyMils: [] } }), 'entry.spec.batter.plyMils', /at least one ply/],
      [drum('A', { batter: { ...head, plyMils: [1] } }), 'entry.spec.batter.plyMils.0', /at least 2 mil/],
      [drum('A', { batter: { ...head, coatingGPerM2: 301 } }), 'entry.spec.batter.coatingGPerM2', /300/],
      [drum('A', { resonant: { ...head, gauge: 121 } }), 'entry.spec.resonant.gauge', /120/],
      [drum('A', { note: { semitone: 11, cents: 0 } }), 'entry.spec.note.semitone', /at least C0/],
      [drum('A', { note: { semitone: 50.5, cents: 0 } }), 'entry.spec.note.semitone', /whole/],
      [drum('A', { note: { semitone: 50, cents: 51 } }), 'entry.spec.note.cents', /50/],
      [
        drum('A', { insteadOf: { diameterMinIn: 13, diameterMaxIn: 12, depthMinIn: 7, depthMaxIn: 8 } }),
        'entry.spec.insteadOf.diameterMaxIn',
        /narrowest/,
      ],
      [{ ...mic, count: 0 }, 'entry.count', /at least 1/],
      [{ ...mic, count: 1.5 }, 'entry.count', /whole/],
      [{ ...mic, kind: 'cymbal' }, 'entry.spec.type', /choose a cymbal/],
      [{ ...mic, kind: 'triangle' }, 'entry.kind', /./],
    ]
    for (const [entry, field, said] of cases) {
      const answer = await add(entry)
      expect(
        [answer.status, Object.keys(errorOf(answer).details.fields ?? {})[0]],
        JSON.stringify(entry).slice(0, 80),
      ).toEqual([422, field])
      expect(errorOf(answer).details.fields?.[field]).toMatch(said)
    }
    expect((await tech('POST', `${kit}/entries`, 'not json {')).status).toBe(422)
    expect((await tech('POST', `${kit}/entries`, { entry: mic, pad: 'x'.repeat(300_000) })).status).toBe(413)
    expect(
      (
        await tech('POST', `${kit}/set`, {
          entries: [
            { id: randomUUID(), entry: mic },
            { id: 'no', entry: mic },
          ],
        })
      ).status,
    ).toBe(422)
    expect((await tech('GET', `${kit}?removed=maybe`)).status).toBe(422)
    expect(names(await read())).toEqual(['Tom 12', 'Ride 21'])
  })

  describe('an entry', () => {
    const change = (version: number, entry: object) =>
      tech('PATCH', `/api/kit-entries/${tour.tomId}`, { version, entry })

    it('changes by version; a stale change is refused with the row as it is, a repeated one is answered', async () => {
      const first = await change(1, drum('Tom 12', { depthIn: 7 }))
      expect(rowOf(first)).toMatchObject({ version: 2, spec: { depthIn: 7 } })
      expect(rowOf(await change(1, drum('Tom 12', { depthIn: 7 })))).toEqual(rowOf(first))
      const stale = await change(1, drum('Tom 12', { depthIn: 9 }))
      expect(stale.status).toBe(409)
      expect(errorOf(stale)).toMatchObject({
        code: 'stale',
        details: { current: { version: 2, spec: { depthIn: 7 } } },
      })
      const early = await change(3, drum('Tom 12', { depthIn: 9 }))
      expect(early.status).toBe(409)
      expect(rowsOf(await read())[0]).toMatchObject({ version: 2, spec: { depthIn: 7 } })
    })

    it('of two changes at once, one holds and the other is told', async () => {
      const both = await Promise.all([change(1, drum('Left', {})), change(1, drum('Right', {}))])
      expect(both.map(({ status }) => status).sort()).toEqual([200, 409])
      const held = both.find(({ status }) => status === 200)
      expect(rowsOf(await read())[0]).toMatchObject({ name: held && rowOf(held).name, version: 2 })
    })

    it('keeps its kind', async () => {
      const answer = await change(1, mic)
      expect([answer.status, Object.keys(errorOf(answer).details.fields ?? {})]).toEqual([422, ['entry.kind']])
    })

    it('is taken out and put back in its old place, its row kept', async () => {
      const path = `/api/kit-entries/${tour.tomId}`
      expect((await tech('DELETE', path, { version: 2 })).status).toBe(409)
      const out = await tech('DELETE', path, { version: 1 })
      expect(rowOf(out)).toMatchObject({ removed: true, version: 2 })
      expect(rowOf(await tech('DELETE', path, { version: 1 }))).toEqual(rowOf(out))
      expect(names(await read())).toEqual(['Ride 21'])
      expect(
        rowsOf(await party.viewer.call('GET', `${kit}?removed=true`)).map(({ name, removed }) => [name, removed]),
      ).toEqual([
        ['Tom 12', true],
        ['Ride 21', false],
      ])
      const changed = await change(2, drum('Ghost'))
      expect([changed.status, errorOf(changed).details.current]).toEqual([409, rowOf(out)])
      expect((await tech('POST', `${path}/restore`, { version: 1 })).status).toBe(409)
      const back = await tech('POST', `${path}/restore`, { version: 2 })
      expect(rowOf(back)).toMatchObject({ removed: false, version: 3 })
      expect(rowOf(await tech('POST', `${path}/restore`, { version: 2 }))).toEqual(rowOf(back))
      expect(names(await read())).toEqual(['Tom 12', 'Ride 21'])
      expect((await tech('DELETE', path, { version: 3 })).status).toBe(200)
    })
  })

  describe('its order', () => {
    it('names every entry once', async () => {
      const extra = rowOf(await add(mic)).id
      const wanted = [extra, tour.rideId, tour.tomId]
      const ordered = await tech('PUT', `${kit}/order`, { entryIds: wanted })
      expect(rowsOf(ordered).map(({ id }) => id)).toEqual(wanted)
      expect(rowsOf(await read()).map(({ id, version }) => [id, version])).toEqual(wanted.map((id) => [id, 1]))
    })

    it('is refused when it names too few, too many or strangers, with the kit as it is', async () => {
      const other = await makeTour(await makeParty())
      for (const entryIds of [[tour.tomId], [tour.tomId, tour.rideId, randomUUID()], [tour.tomId, other.tomId]]) {
        const answer = await tech('PUT', `${kit}/order`, { entryIds })
        expect([answer.status, names({ ...answer, body: errorOf(answer).details.current })]).toEqual([
          409,
          ['Tom 12', 'Ride 21'],
        ])
      }
      const twice = await tech('PUT', `${kit}/order`, { entryIds: [tour.tomId, tour.tomId] })
      expect([twice.status, errorOf(twice).details.fields]).toEqual([422, { entryIds: 'each entry once' }])
    })
  })

  describe('copied from another rig of the party', () => {
    it('is added once, as entries of its own', async () => {
      const from = await makeTour(party)
      const body = { copyId: randomUUID(), fromRigId: from.rigId }
      const copied = await tech('POST', `${kit}/copy`, body)
      expect([copied.status, names(copied)]).toEqual([201, ['Tom 12', 'Ride 21', 'Tom 12', 'Ride 21']])
      expect(new Set(rowsOf(copied).map(({ id }) => id)).size).toBe(4)
      expect(rowsOf(copied)[2]).toMatchObject({ version: 1, position: 2, spec: tomSpec })
      expect(names(await tech('POST', `${kit}/copy`, body))).toHaveLength(4)
      expect(names(await party.viewer.call('GET', `/api/rigs/${from.rigId}/kit`))).toHaveLength(2)
    })

    it('is refused from itself, from an empty kit and from another party', async () => {
      const self = await tech('POST', `${kit}/copy`, { copyId: randomUUID(), fromRigId: tour.rigId })
      expect([self.status, Object.keys(errorOf(self).details.fields ?? {})]).toEqual([422, ['fromRigId']])
      const emptied = await makeTour(party)
      for (const id of [emptied.tomId, emptied.rideId]) await tech('DELETE', `/api/kit-entries/${id}`, { version: 1 })
      const empty = await tech('POST', `${kit}/copy`, { copyId: randomUUID(), fromRigId: emptied.rigId })
      expect([empty.status, errorOf(empty).code]).toEqual([409, 'conflict'])
      const theirs = await makeTour(await makeParty())
      expect((await tech('POST', `${kit}/copy`, { copyId: randomUUID(), fromRigId: theirs.rigId })).status).toBe(404)
      expect((await tech('POST', `${kit}/copy`, { copyId: 'x', fromRigId: theirs.rigId })).status).toBe(422)
      expect(names(await read())).toHaveLength(2)
    })
  })

  describe('its notes', () => {
    const E2 = { semitone: 40, cents: 0 }
    const set = (notes: object[]) => tech('PUT', `${kit}/notes`, { notes })

    it('are set in one step, each against its version', async () => {
      const floor = rowOf(await add(drum('Floor 16', { role: 'floor-tom', diameterIn: 16, note: null })))
      const wanted = [
        { entryId: floor.id, version: 1, note: E2, noteLocked: true },
        { entryId: tour.tomId, version: 1, note: { semitone: 51, cents: -12 }, noteLocked: false },
      ]
      const answer = await set(wanted)
      expect(answer.status).toBe(200)
      const after = Object.fromEntries(rowsOf(answer).map((row) => [row.name, row]))
      expect(after['Floor 16']).toMatchObject({ version: 2, spec: { note: E2, noteLocked: true, diameterIn: 16 } })
      expect(after['Tom 12']).toMatchObject({
        version: 2,
        spec: { note: { semitone: 51, cents: -12 }, noteLocked: false },
      })
      // The same request again, its answer lost on the way.
      expect(rowsOf(await set(wanted)).map(({ version }) => version)).toEqual(
        rowsOf(answer).map(({ version }) => version),
      )
    })

    it('carry the relation of the heads where it is given and leave it where it is not', async () => {
      const wanted = { entryId: tour.tomId, version: 1, note: E2, noteLocked: false }
      const answer = await set([{ ...wanted, headRelationCents: 300 }])
      expect(answer.status).toBe(200)
      const [tom] = rowsOf(answer)
      expect(tom).toMatchObject({ version: 2, spec: { note: E2, headRelationCents: 300 } })
      // Another relation of the same note is a change, and needs the version that was seen.
      expect((await set([{ ...wanted, headRelationCents: 100 }])).status).toBe(409)
      const [left] = rowsOf(await set([{ ...wanted, version: 2, noteLocked: true }]))
      expect(left).toMatchObject({ version: 3, spec: { noteLocked: true, headRelationCents: 300 } })
      const wild = await set([{ ...wanted, version: 3, headRelationCents: 1201 }])
      expect(Object.keys(errorOf(wild).details.fields ?? {})).toEqual(['notes.0.headRelationCents'])
    })

    it('are all left when one drum is not as it was seen', async () => {
      const floor = rowOf(await add(drum('Floor 16', { note: null })))
      await tech('PATCH', `/api/kit-entries/${tour.tomId}`, { version: 1, entry: drum('Tom 12', { depthIn: 7 }) })
      const answer = await set([
        { entryId: floor.id, version: 1, note: E2, noteLocked: false },
        { entryId: tour.tomId, version: 1, note: E2, noteLocked: false },
      ])
      expect([answer.status, errorOf(answer).code]).toEqual([409, 'stale'])
      expect(errorOf(answer).message).toContain('Tom 12')
      expect(rowsOf({ ...answer, body: errorOf(answer).details.current })[2]).toMatchObject({
        version: 1,
        spec: { note: null },
      })
      await tech('DELETE', `/api/kit-entries/${floor.id}`, { version: 1 })
      expect((await set([{ entryId: floor.id, version: 2, note: E2, noteLocked: false }])).status).toBe(409)
    })

    it('name the drum at fault', async () => {
      const wanted = { version: 1, note: E2, noteLocked: false }
      for (const [entryId, field] of [
        [tour.rideId, 'notes.1.entryId'],
        [randomUUID(), 'notes.1.entryId'],
      ] as const) {
        const answer = await set([
          { entryId: tour.tomId, ...wanted },
          { entryId, ...wanted },
        ])
        expect([answer.status, Object.keys(errorOf(answer).details.fields ?? {})]).toEqual([422, [field]])
      }
      const twice = await set([
        { entryId: tour.tomId, ...wanted },
        { entryId: tour.tomId, ...wanted },
      ])
      expect(errorOf(twice).details.fields).toEqual({ notes: 'each drum once' })
      const high = await set([{ entryId: tour.tomId, ...wanted, note: { semitone: 97, cents: 0 } }])
      expect(Object.keys(errorOf(high).details.fields ?? {})).toEqual(['notes.0.note.semitone'])
      expect(rowsOf(await read())[0]).toMatchObject({ version: 1, spec: { note: tomSpec.note } })
    })
  })

  it('is closed to strangers, to roles that do not edit kits, and to other parties', async () => {
    const other = await makeParty()
    const calls: [string, string, object | undefined][] = [
      ['GET', kit, undefined],
      ['POST', `${kit}/entries`, { entry: mic }],
      ['POST', `${kit}/set`, { entries: [{ id: randomUUID(), entry: mic }] }],
      ['PUT', `${kit}/order`, { entryIds: [tour.rideId, tour.tomId] }],
      ['POST', `${kit}/copy`, { copyId: randomUUID(), fromRigId: tour.rigId }],
      ['PUT', `${kit}/notes`, { notes: [{ entryId: tour.tomId, version: 1, note: null, noteLocked: false }] }],
      ['PATCH', `/api/kit-entries/${tour.tomId}`, { version: 1, entry: drum('Mine') }],
      ['DELETE', `/api/kit-entries/${tour.tomId}`, { version: 1 }],
      ['POST', `/api/kit-entries/${tour.tomId}/restore`, { version: 1 }],
    ]
    for (const [method, path, body] of calls) {
      const status = async (call: typeof stranger) => (await call(method, path, body)).status
      expect(await status(stranger), `${method} ${path}`).toBe(401)
      expect(await status(other.drumTech.call), `${method} ${path}`).toBe(404)
      for (const member of [party.viewer, party.tourManager, party.owner])
        expect(await status(member.call), `${method} ${path}`).toBe(method === 'GET' ? 200 : 403)
    }
    const foreign = await party.drumTech.call(
      'PATCH',
      `/api/kit-entries/${tour.tomId}`,
      { version: 1, entry: drum('Mine') },
      { 'sec-fetch-site': 'cross-site' },
    )
    expect(foreign.status).toBe(403)
    expect(rowsOf(await read())).toMatchObject([{ name: 'Tom 12', version: 1 }, { name: 'Ride 21' }])
  })

  it('writes down who did what', async () => {
    const id = randomUUID()
    await add(mic, id)
    await add(mic, id)
    await tech('DELETE', `/api/kit-entries/${id}`, { version: 1 })
    const events = await db()
      .select()
      .from(auditEvent)
      .where(eq(auditEvent.partyId, party.partyId))
      .orderBy(asc(auditEvent.id))
    expect(events.map(({ action, actorId, subjectId }) => [action, actorId, subjectId])).toEqual([
      ['kit.added', party.drumTech.personId, id],
      ['kit.removed', party.drumTech.personId, id],
    ])
  })
})
