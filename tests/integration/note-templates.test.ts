import { randomUUID } from 'node:crypto'
import { and, asc, eq } from 'drizzle-orm'
import { beforeEach, describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { auditEvent } from '@/db/schema/audit'
import { attackRoute, faultyFields } from '../helpers/attack-route'
import { stranger } from '../helpers/http-client'
import type { Answer } from '../helpers/http-client'
import { makeParty, type PartyFixture } from '../helpers/party-fixture'

type Row = { id: string; name: string; version: number; steps: Record<string, unknown>; resonantCents: number }
const rowOf = (answer: Answer) => answer.body as Row

const jazz = {
  name: 'High and open',
  steps: { kind: 'per-pair', semitones: [5, 4, 3] },
  resonantCents: 300,
  kickBelowLowestTom: [7, 12],
}

describe('a party’s own note templates', () => {
  let party: PartyFixture
  const path = '/api/note-templates'
  const tech = (method: string, where: string, body?: unknown) => party.drumTech.call(method, where, body)
  const make = async (over: object = {}) => {
    const answer = await tech('POST', path, { template: { ...jazz, ...over } })
    expect(answer.status, JSON.stringify(answer.body)).toBe(201)
    return rowOf(answer)
  }
  const names = async (call = party.viewer.call) =>
    ((await call('GET', path)).body as { templates: Row[] }).templates.map(({ name }) => name)

  beforeEach(async () => {
    party = await makeParty()
  })

  it('are made, read back by every member by name, changed and taken away', async () => {
    const made = await make()
    expect(made).toEqual({ id: made.id, version: 1, ...jazz })
    await make({ name: 'a low set', steps: { kind: 'equal-feel' }, kickBelowLowestTom: [] })
    for (const member of [party.owner, party.drumTech, party.tourManager, party.viewer])
      expect(await names(member.call)).toEqual(['a low set', 'High and open'])

    const template = { ...jazz, name: 'Open', steps: { kind: 'per-inch', semitonesPerInch: 1.75 } }
    const changed = await tech('PATCH', `${path}/${made.id}`, { version: 1, template })
    expect(rowOf(changed)).toEqual({ id: made.id, version: 2, ...template })
    const gone = await tech('DELETE', `${path}/${made.id}`, { version: 2 })
    expect(gone.status).toBe(200)
    expect(await names()).toEqual(['a low set'])
    expect((await tech('PATCH', `${path}/${made.id}`, { version: 2, template })).status).toBe(404)
    const trail = await db()
      .select({ action: auditEvent.action, subjectId: auditEvent.subjectId })
      .from(auditEvent)
      .where(and(eq(auditEvent.partyId, party.partyId), eq(auditEvent.subjectId, made.id)))
      .orderBy(asc(auditEvent.id))
    expect(trail.map(({ action }) => action)).toEqual([
      'note-template.added',
      'note-template.changed',
      'note-template.removed',
    ])
  })

  it('are made once however often the same request comes, and never under another party’s id', async () => {
    const request = { id: randomUUID(), template: jazz }
    const first = await tech('POST', path, request)
    const again = await tech('POST', path, request)
    expect([first.status, again.status]).toEqual([201, 201])
    expect(rowOf(again)).toEqual(rowOf(first))
    expect(await names()).toEqual(['High and open'])
    const other = await makeParty()
    const taken = await other.drumTech.call('POST', path, request)
    expect(taken.status).toBe(409)
    expect(JSON.stringify(taken.body)).not.toContain('High and open')
    expect(await names(other.viewer.call)).toEqual([])
  })

  it('refuse a change to what somebody else changed meanwhile, and show it', async () => {
    const made = await make()
    await tech('PATCH', `${path}/${made.id}`, { version: 1, template: { ...jazz, resonantCents: -200 } })
    for (const method of ['PATCH', 'DELETE']) {
      const stale = await tech(method, `${path}/${made.id}`, { version: 1, template: jazz })
      expect(stale.status).toBe(409)
      expect(stale.body).toMatchObject({
        error: { code: 'stale', details: { current: { version: 2, resonantCents: -200 } } },
      })
    }
    expect(await names()).toEqual(['High and open'])
  })

  it('take each name once, however it is written', async () => {
    const made = await make()
    const second = await make({ name: 'Other' })
    expect(faultyFields(await tech('POST', path, { template: { ...jazz, name: ' HIGH and open ' } }))).toEqual([
      'template.name',
    ])
    const renamed = { version: 1, template: { ...jazz, name: 'high and Open' } }
    expect(faultyFields(await tech('PATCH', `${path}/${second.id}`, renamed))).toEqual(['template.name'])
    expect((await tech('PATCH', `${path}/${made.id}`, renamed)).status).toBe(200)
  })

  it('name the field at fault', async () => {
    const wrong: [over: object, fields: string[]][] = [
      [{ name: ' ' }, ['template.name']],
      [{ name: 'x'.repeat(121) }, ['template.name']],
      [{ steps: { kind: 'by-moon' } }, ['template.steps.kind']],
      [{ steps: { kind: 'per-inch', semitonesPerInch: -1 } }, ['template.steps.semitonesPerInch']],
      [{ steps: { kind: 'per-inch', semitonesPerInch: 'two' } }, ['template.steps.semitonesPerInch']],
      [{ steps: { kind: 'per-pair', semitones: [] } }, ['template.steps.semitones']],
      [{ steps: { kind: 'per-pair', semitones: [5, 2.5] } }, ['template.steps.semitones.1']],
      [{ steps: { kind: 'per-pair', semitones: Array(12).fill(2) } }, ['template.steps.semitones']],
      [{ resonantCents: 1201 }, ['template.resonantCents']],
      [{ kickBelowLowestTom: [5, 37] }, ['template.kickBelowLowestTom.1']],
    ]
    for (const [over, fields] of wrong)
      expect(faultyFields(await tech('POST', path, { template: { ...jazz, ...over } })), JSON.stringify(over)).toEqual(
        fields,
      )
    expect(faultyFields(await tech('POST', path, { id: 'x', template: jazz }))).toEqual(['id'])
    expect(await names()).toEqual([])
  })

  it('are at most forty', async () => {
    for (let count = 0; count < 40; count += 1) await make({ name: `Number ${count}` })
    const more = await tech('POST', path, { template: jazz })
    expect(more.status).toBe(409)
    expect(more.body).toMatchObject({ error: { code: 'conflict' } })
    expect(await names()).toHaveLength(40)
  })

  it('are closed to strangers, readers, other parties, other sites, and to what is too large', async () => {
    const other = await makeParty()
    const made = await make()
    expect((await stranger('GET', path)).status).toBe(401)
    for (const [method, where, body] of [
      ['POST', path, { template: { ...jazz, name: 'New' } }],
      ['PATCH', `${path}/${made.id}`, { version: 1, template: jazz }],
      ['DELETE', `${path}/${made.id}`, { version: 1 }],
    ] as const) {
      await attackRoute({
        ...{ method, path: where, body, reader: party.viewer.call, ours: party.drumTech.call },
        theirs: method === 'POST' ? null : other.drumTech.call,
      })
      for (const member of [party.owner, party.tourManager])
        expect((await member.call(method, where, body)).status).toBe(403)
    }
    expect(await names()).toEqual(['High and open'])
    expect(await names(other.drumTech.call)).toEqual([])
  })
})
