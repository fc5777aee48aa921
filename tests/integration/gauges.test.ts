import { randomUUID } from 'node:crypto'
import { and, eq } from 'drizzle-orm'
import { beforeAll, describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { auditEvent } from '@/db/schema/audit'
import { gauge as gaugeTable } from '@/db/schema/gauge'
import { revision } from '@/db/schema/revision'
import type { RevisionDocument } from '@/lib/advance/revision-document'
import type { Gauge, GaugePairRow, Gauges, GaugeWithPairs } from '@/lib/contracts/gauge'
import { attackRoute, faultyFields } from '../helpers/attack-route'
import type { Answer } from '../helpers/http-client'
import { issue } from '../helpers/advance-fixture'
import type { PartyFixture } from '../helpers/party-fixture'
import { makeParty } from '../helpers/party-fixture'
import { makeTour } from '../helpers/tour-fixture'

const gauge = { name: 'Brass gauge', scale: { min: 0, max: 100, step: 1 }, remark: 'Jory’s hand' }
const pair = {
  ...{ reading: 75, diameterIn: 12, depthIn: 8, plyMils: [10], film: 'coated', coatingGPerM2: 0 },
  ...{ tapHz: 256, temperatureC: 20, remark: 'Tom 12 batter' },
}

let party: PartyFixture
let other: PartyFixture
beforeAll(async () => {
  party = await makeParty()
  other = await makeParty()
})

const rowOf = (answer: Answer) => answer.body as Gauge
const pairOf = (answer: Answer) => answer.body as GaugePairRow
const errorOf = (answer: Answer) =>
  (answer.body as { error: { code: string; message: string; details: Record<string, unknown> } }).error

async function made(who: PartyFixture = party, name = `Gauge ${randomUUID().slice(0, 8)}`): Promise<Gauge> {
  const answer = await who.drumTech.call('POST', '/api/gauges', { gauge: { ...gauge, name } })
  expect(answer.status).toBe(201)
  return rowOf(answer)
}

async function listed(who: PartyFixture): Promise<Gauges['gauges']> {
  return ((await who.viewer.call('GET', '/api/gauges')).body as Gauges).gauges
}

const addPair = (gaugeId: string, body: object, who: PartyFixture = party) =>
  who.drumTech.call('POST', `/api/gauges/${gaugeId}/pairs`, body)

describe('every gauge route', () => {
  it('refuses nobody, a reader, a tour manager, another party, a large body, broken JSON and another site', async () => {
    const ours = await made()
    const theirPair = pairOf(await addPair(ours.id, { pair }))
    const changing: [method: string, path: string, body: unknown, named: boolean][] = [
      ['POST', '/api/gauges', { gauge: { ...gauge, name: 'Attacked' } }, false],
      ['PATCH', `/api/gauges/${ours.id}`, { version: 1, gauge }, true],
      ['DELETE', `/api/gauges/${ours.id}`, { version: 1 }, true],
      ['POST', `/api/gauges/${ours.id}/restore`, { version: 1 }, true],
      ['POST', `/api/gauges/${ours.id}/pairs`, { pair }, true],
      ['PUT', '/api/gauges/tours-gauge', { gaugeId: ours.id }, true],
    ]
    for (const [method, path, body, named] of changing) {
      await attackRoute({
        ...{ method, path, body, reader: party.viewer.call, ours: party.drumTech.call },
        theirs: named ? other.drumTech.call : null,
      })
      expect((await party.tourManager.call(method, path, body)).status, `${method} ${path}`).toBe(403)
    }
    // These two read no body, so that a large or broken one is no matter.
    for (const path of [`/api/gauge-pairs/${theirPair.id}/strike`, `/api/gauge-pairs/${theirPair.id}/restore`]) {
      expect((await party.viewer.call('POST', path)).status).toBe(403)
      expect((await party.owner.call('POST', path)).status).toBe(403)
      expect((await other.drumTech.call('POST', path)).status).toBe(404)
    }
    expect((await other.drumTech.call('GET', `/api/gauges/${ours.id}`)).status).toBe(404)
    expect((await other.drumTech.call('GET', '/api/gauges/no-id')).status).toBe(422)
    const after = (await party.viewer.call('GET', `/api/gauges/${ours.id}`)).body as GaugeWithPairs
    expect(after.gauge).toEqual(ours)
    expect(after.pairs).toEqual([theirPair])
    expect(await listed(other)).toEqual([])
  })

  it('names the field at fault of a gauge, and makes none', async () => {
    const before = await listed(party)
    const dial = (scale: object) => ({ gauge: { ...gauge, scale: { ...gauge.scale, ...scale } } })
    const cases: [body: object, field: string][] = [
      [{}, 'gauge'],
      [{ gauge: { ...gauge, name: ' ' } }, 'gauge.name'],
      [{ gauge: { ...gauge, name: 'x'.repeat(121) } }, 'gauge.name'],
      [dial({ max: 0 }), 'gauge.scale.max'],
      [dial({ min: 90, max: 10 }), 'gauge.scale.max'],
      [dial({ step: 0 }), 'gauge.scale.step'],
      [dial({ step: 200 }), 'gauge.scale.step'],
      [dial({ min: null }), 'gauge.scale.min'],
      [{ gauge: { ...gauge, remark: 'x'.repeat(2001) } }, 'gauge.remark'],
      [{ id: 'no', gauge }, 'id'],
    ]
    for (const [body, field] of cases)
      expect(faultyFields(await party.drumTech.call('POST', '/api/gauges', body)), field).toEqual([field])
    expect(await listed(party)).toEqual(before)
  })

  it('names the field at fault of a pair, and keeps none of them', async () => {
    const { id } = await made()
    const cases: [change: object, field: string][] = [
      [{ reading: 'high' }, 'pair.reading'],
      [{ reading: 101 }, 'pair.reading'],
      [{ reading: -1 }, 'pair.reading'],
      [{ diameterIn: 0.3048 }, 'pair.diameterIn'],
      [{ diameterIn: 305 }, 'pair.diameterIn'],
      [{ diameterIn: 12.1 }, 'pair.diameterIn'],
      [{ depthIn: 2 }, 'pair.depthIn'],
      [{ plyMils: [] }, 'pair.plyMils'],
      [{ plyMils: [254] }, 'pair.plyMils.0'],
      [{ film: 'brass' }, 'pair.film'],
      [{ coatingGPerM2: -1 }, 'pair.coatingGPerM2'],
      [{ tapHz: 0 }, 'pair.tapHz'],
      [{ tapHz: 2001 }, 'pair.tapHz'],
      // No film on a 12 in drum holds what this takes.
      [{ tapHz: 1900 }, 'pair.tapHz'],
      [{ temperatureC: 293 }, 'pair.temperatureC'],
      [{ remark: 'x'.repeat(201) }, 'pair.remark'],
    ]
    for (const [change, field] of cases) {
      const answer = await addPair(id, { pair: { ...pair, ...change } })
      expect(faultyFields(answer), JSON.stringify(change)).toEqual([field])
    }
    const { pairs } = (await party.viewer.call('GET', `/api/gauges/${id}`)).body as GaugeWithPairs
    expect(pairs).toEqual([])
  })
})

describe('a gauge', () => {
  it('is made once for one id, and an id of another party is refused without a word about it', async () => {
    const id = randomUUID()
    const name = `Once ${id.slice(0, 8)}`
    const body = { id, gauge: { ...gauge, name } }
    const [one, two] = await Promise.all([1, 2].map(() => party.drumTech.call('POST', '/api/gauges', body)))
    expect([one?.status, two?.status]).toEqual([201, 201])
    expect(rowOf(one!).id).toBe(rowOf(two!).id)
    expect((await listed(party)).filter((row) => row.name === name)).toHaveLength(1)
    const theirs = await other.drumTech.call('POST', '/api/gauges', { id, gauge })
    expect([theirs.status, errorOf(theirs).code]).toEqual([409, 'conflict'])
    expect(JSON.stringify(theirs.body)).not.toContain(name)
  })

  it('has a name of its own in its party', async () => {
    const { name } = await made()
    const again = await party.drumTech.call('POST', '/api/gauges', { gauge: { ...gauge, name: name.toUpperCase() } })
    expect(faultyFields(again)).toEqual(['gauge.name'])
    const second = await made()
    const renamed = await party.drumTech.call('PATCH', `/api/gauges/${second.id}`, {
      version: second.version,
      gauge: { ...gauge, name },
    })
    expect(faultyFields(renamed)).toEqual(['gauge.name'])
  })

  it('changes by version; a stale change is told what stands, a repeated one is answered', async () => {
    const { id } = await made()
    const change = (version: number, name: string) =>
      party.drumTech.call('PATCH', `/api/gauges/${id}`, { version, gauge: { ...gauge, name } })
    const name = `Renamed ${id.slice(0, 8)}`
    const first = await change(1, name)
    expect(rowOf(first)).toMatchObject({ name, version: 2 })
    expect(rowOf(await change(1, name))).toEqual(rowOf(first))
    const stale = await change(1, `Late ${id.slice(0, 8)}`)
    expect(stale.status).toBe(409)
    expect(errorOf(stale)).toMatchObject({ code: 'stale', details: { current: { name, version: 2 } } })
  })

  it('keeps a dial that shows every reading of its pairs', async () => {
    const { id, name } = await made()
    await addPair(id, { pair })
    const dial = (max: number) =>
      party.drumTech.call('PATCH', `/api/gauges/${id}`, {
        version: 1,
        gauge: { ...gauge, name, scale: { ...gauge.scale, max } },
      })
    expect(faultyFields(await dial(60))).toEqual(['gauge.scale.max'])
    expect((await dial(80)).status).toBe(200)
  })

  it('is taken away and put back with its pairs, and takes none meanwhile', async () => {
    const { id } = await made()
    const kept = pairOf(await addPair(id, { pair }))
    const path = `/api/gauges/${id}`
    expect((await party.drumTech.call('DELETE', path, { version: 9 })).status).toBe(409)
    const gone = await party.drumTech.call('DELETE', path, { version: 1 })
    expect(rowOf(gone)).toMatchObject({ removed: true, version: 2 })
    expect(rowOf(await party.drumTech.call('DELETE', path, { version: 1 }))).toEqual(rowOf(gone))
    expect((await listed(party)).some((row) => row.id === id)).toBe(false)
    expect((await addPair(id, { pair })).status).toBe(404)
    expect((await party.drumTech.call('POST', `/api/gauge-pairs/${kept.id}/strike`)).status).toBe(404)
    expect((await party.drumTech.call('PATCH', path, { version: 2, gauge })).status).toBe(404)
    const back = await party.drumTech.call('POST', `${path}/restore`, { version: 2 })
    expect(rowOf(back)).toMatchObject({ removed: false, version: 3 })
    const { pairs } = (await party.viewer.call('GET', path)).body as GaugeWithPairs
    expect(pairs).toEqual([kept])
  })

  it('is not put back under a name that another has taken', async () => {
    const { id, name } = await made()
    await party.drumTech.call('DELETE', `/api/gauges/${id}`, { version: 1 })
    await made(party, name)
    const back = await party.drumTech.call('POST', `/api/gauges/${id}/restore`, { version: 2 })
    expect([back.status, errorOf(back).code]).toEqual([409, 'conflict'])
  })
})

describe('the tour’s gauge', () => {
  const toursOf = async (who: PartyFixture) =>
    (await listed(who)).filter((row) => row.toursGauge).map(({ name }) => name)

  it('is the first, then the chosen one, never two, and none when it is taken away or left off', async () => {
    const fresh = await makeParty()
    const choose = (gaugeId: string | null) => fresh.drumTech.call('PUT', '/api/gauges/tours-gauge', { gaugeId })
    const one = await made(fresh, 'One')
    expect(one.toursGauge).toBe(true)
    const two = await made(fresh, 'Two')
    expect(two.toursGauge).toBe(false)
    expect(await toursOf(fresh)).toEqual(['One'])
    const both = await Promise.all([choose(two.id), choose(two.id), choose(one.id), choose(two.id)])
    expect(both.map(({ status }) => status)).toEqual([200, 200, 200, 200])
    await choose(two.id)
    expect(await toursOf(fresh)).toEqual(['Two'])
    const held = await db()
      .select({ id: gaugeTable.id })
      .from(gaugeTable)
      .where(and(eq(gaugeTable.partyId, fresh.partyId), eq(gaugeTable.toursGauge, true)))
    expect(held).toHaveLength(1)
    await fresh.drumTech.call('DELETE', `/api/gauges/${two.id}`, { version: two.version })
    expect(await toursOf(fresh)).toEqual([])
    expect((await choose(two.id)).status).toBe(404)
    await choose(one.id)
    expect(((await choose(null)).body as Gauges).gauges.some((row) => row.toursGauge)).toBe(false)
    expect(faultyFields(await fresh.drumTech.call('PUT', '/api/gauges/tours-gauge', {}))).toEqual(['gaugeId'])
  })

  it('goes into the next revision with its standing pairs, and what was issued stays as it was', async () => {
    const fresh = await makeParty()
    const tour = await makeTour(fresh)
    const documentOf = async (id: string) => {
      const [row] = await db().select({ document: revision.document }).from(revision).where(eq(revision.id, id))
      return row?.document as RevisionDocument
    }
    const first = await issue(fresh, tour)
    expect((await documentOf(first)).gauge).toBeNull()

    const { id } = await made(fresh, 'Tour brass')
    await addPair(id, { pair }, fresh)
    const struck = pairOf(await addPair(id, { pair: { ...pair, reading: 60 } }, fresh))
    await fresh.drumTech.call('POST', `/api/gauge-pairs/${struck.id}/strike`)
    const second = await issue(fresh, tour, 'with a gauge')
    const { reading, diameterIn, depthIn, plyMils, coatingGPerM2, tapHz, temperatureC } = pair
    expect((await documentOf(second)).gauge).toEqual({
      ...{ id, name: 'Tour brass', scale: gauge.scale },
      pairs: [{ reading, diameterIn, depthIn, plyMils, coatingGPerM2, tapHz, temperatureC }],
    })

    await addPair(id, { pair: { ...pair, tapHz: 290, reading: 80 } }, fresh)
    expect((await documentOf(second)).gauge?.pairs).toHaveLength(1)
    const third = await issue(fresh, tour, 'read again')
    const detail = (await fresh.viewer.call('GET', `/api/revisions/${third}`)).body as { changes: { gauge: string[] } }
    expect(detail.changes.gauge).toEqual(['Gauge Tour brass: calibrated again, 1 → 2 pairs'])
    const same = await fresh.drumTech.call('POST', `/api/rigs/${tour.rigId}/revisions`, { note: 'nothing new' })
    expect(same.status).toBe(409)
  })
})

describe('a pair', () => {
  it('is kept as it was typed, by whom and when, once for one id', async () => {
    const { id: gaugeId } = await made()
    const id = randomUUID()
    const [one, two] = await Promise.all([addPair(gaugeId, { id, pair }), addPair(gaugeId, { id, pair })])
    expect([one.status, two.status]).toEqual([201, 201])
    expect(pairOf(one)).toMatchObject({ ...pair, id, gaugeId, byName: 'The drum-tech', struck: false })
    expect(pairOf(two)).toEqual(pairOf(one))
    const otherGauge = await made()
    expect((await addPair(otherGauge.id, { id, pair })).status).toBe(409)
    const theirs = await made(other)
    expect((await addPair(theirs.id, { id, pair }, other)).status).toBe(409)
  })

  it('is struck and counts again, each once, and each is written down', async () => {
    const { id: gaugeId, name } = await made()
    const { id } = pairOf(await addPair(gaugeId, { pair }))
    const mark = (what: string) => party.drumTech.call('POST', `/api/gauge-pairs/${id}/${what}`)
    const both = await Promise.all([mark('strike'), mark('strike')])
    expect(both.map(({ status, body }) => [status, (body as GaugePairRow).struck])).toEqual([
      [200, true],
      [200, true],
    ])
    expect((await listed(party)).find((row) => row.id === gaugeId)?.pairs).toBe(0)
    expect(pairOf(await mark('restore')).struck).toBe(false)
    expect(pairOf(await mark('restore')).struck).toBe(false)
    const events = await db()
      .select({ action: auditEvent.action, detail: auditEvent.detail, actorId: auditEvent.actorId })
      .from(auditEvent)
      .where(and(eq(auditEvent.partyId, party.partyId), eq(auditEvent.subjectId, gaugeId)))
    expect(events.map(({ action }) => action).sort()).toEqual([
      'gauge.added',
      'gauge.pair-added',
      'gauge.pair-restored',
      'gauge.pair-struck',
    ])
    expect(events.every(({ actorId }) => actorId === party.drumTech.personId)).toBe(true)
    expect(events.find(({ action }) => action === 'gauge.pair-struck')?.detail).toMatchObject({
      ...{ name, pairId: id, reading: 75, tapHz: 256 },
    })
    const trail = (await party.owner.call('GET', '/api/audit?action=gauge.pair-struck')).body as {
      lines: { sentence: string }[]
    }
    expect(trail.lines[0]?.sentence).toBe(`struck a pair of the gauge ${name}: 75 at a tap of 256 Hz`)
  })

  it('that was never made is not there', async () => {
    expect((await party.drumTech.call('POST', `/api/gauge-pairs/${randomUUID()}/strike`)).status).toBe(404)
    expect((await party.drumTech.call('POST', '/api/gauge-pairs/no/strike')).status).toBe(422)
  })

  it('is refused past what a gauge keeps, and a struck one makes room', async () => {
    const { id: gaugeId } = await made()
    const ids = []
    for (let i = 0; i < 60; i++) ids.push(pairOf(await addPair(gaugeId, { pair })).id)
    const more = await addPair(gaugeId, { pair })
    expect([more.status, errorOf(more).message]).toEqual([409, expect.stringContaining('at most 60 pairs')])
    await party.drumTech.call('POST', `/api/gauge-pairs/${ids[0]}/strike`)
    expect((await addPair(gaugeId, { pair })).status).toBe(201)
    expect((await party.drumTech.call('POST', `/api/gauge-pairs/${ids[0]}/restore`)).status).toBe(409)
  })
})
