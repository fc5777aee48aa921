import { randomUUID } from 'node:crypto'
import { sql } from 'drizzle-orm'
import { beforeAll, describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { newPiece } from '@/plots/model/document'
import type { PlotAction } from '@/plots/model/command'
import { stranger } from '../helpers/http-client'
import type { Answer, HttpClient } from '../helpers/http-client'
import { makeParty, type PartyFixture } from '../helpers/party-fixture'
import { makeTour, type TourFixture } from '../helpers/tour-fixture'

type Refusal = { error: { code: string; message: string; details: Record<string, unknown> } }
type Plot = { rigId: string; sequence: number; document: { pieces: Record<string, Record<string, unknown>> } }
const refusal = (answer: Answer) => (answer.body as Refusal).error

const riser = () => newPiece({ id: randomUUID(), kind: 'riser', yM: 3, widthM: 2.4, depthM: 2.4 })
const command = <Action extends PlotAction>(action: Action) => ({ ...action, clientId: randomUUID() })

describe('the plot of a rig', () => {
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
    path = `/api/rigs/${tour.rigId}/plot`
  }
  const read = async (who: HttpClient = party.drumTech.call) => (await who('GET', path)).body as Plot
  const append = (who: HttpClient, baseSequence: number, commands: unknown) =>
    who('POST', `${path}/commands`, { baseSequence, commands })

  it('is empty before its first command, and reading it writes nothing', async () => {
    await fresh()
    expect(await read(party.viewer.call)).toMatchObject({ rigId: tour.rigId, sequence: 0, document: { pieces: {} } })
    const rows = await db().execute(sql`select count(*)::int as n from plot where rig_id = ${tour.rigId}`)
    expect(rows.rows).toEqual([{ n: 0 }])
  })

  it('keeps commands, and a drum refers to the kit without a copy of its data', async () => {
    await fresh()
    const drum = newPiece({ id: randomUUID(), kind: 'drum', kitEntryId: tour.tomId, xM: 0.2, yM: 3 })
    const answer = await append(party.drumTech.call, 0, [
      command({ type: 'place', pieces: [drum] }),
      command({ type: 'move', moves: [{ pieceId: drum.id, xM: 1.25, yM: 2 }] }),
    ])
    expect(answer.status).toBe(200)
    expect(answer.body).toMatchObject({ sequence: 2 })
    const plot = await read(party.viewer.call)
    expect(plot).toMatchObject({ sequence: 2, document: { pieces: { [drum.id]: { ...drum, xM: 1.25, yM: 2 } } } })
  })

  it('refuses a stale base, tells what was missed and by whom, and changes nothing', async () => {
    await fresh()
    const piece = riser()
    const first = command({ type: 'place', pieces: [piece] })
    await append(party.drumTech.call, 0, [first])
    const late = command({ type: 'setStage', stage: { widthM: 12, depthM: 9 } })
    const refused = await append(party.drumTech.call, 0, [late])
    expect(refused.status).toBe(409)
    expect(refusal(refused)).toMatchObject({
      code: 'stale',
      details: { sequence: 1, missed: [{ sequence: 1, command: first, by: 'The drum-tech' }] },
    })
    expect(await read()).toMatchObject({ sequence: 1, document: { stage: { widthM: 10, depthM: 8 } } })
    expect((await append(party.drumTech.call, 1, [late])).status).toBe(200)
    const missed = await party.viewer.call('GET', `${path}/commands?after=1`)
    expect(missed.body).toMatchObject({ sequence: 2, missed: [{ sequence: 2, command: late }] })
  })

  it('acknowledges a command that arrives again, and does it once', async () => {
    await fresh()
    const place = command({ type: 'place', pieces: [riser()] })
    const once = await append(party.drumTech.call, 0, [place])
    const again = await append(party.drumTech.call, 0, [place])
    expect(again.status).toBe(200)
    expect(again.body).toEqual(once.body)
    expect((await read()).sequence).toBe(1)
  })

  it('takes one of two writers at once and refuses the other as stale', async () => {
    await fresh()
    const answers = await Promise.all(
      Array.from({ length: 6 }, () => append(party.drumTech.call, 0, [command({ type: 'place', pieces: [riser()] })])),
    )
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409, 409, 409, 409, 409])
    const plot = await read()
    expect(plot.sequence).toBe(1)
    expect(Object.keys(plot.document.pieces)).toHaveLength(1)
  })

  it('refuses what the model refuses, names the command, and takes none of the batch', async () => {
    await fresh()
    const piece = riser()
    const drum = () => newPiece({ id: randomUUID(), kind: 'drum', kitEntryId: tour.tomId })
    const bad: [unknown, string][] = [
      [command({ type: 'move', moves: [{ pieceId: randomUUID(), xM: 1, yM: 1 }] }), 'commands.1'],
      [command({ type: 'place', pieces: [piece] }), 'commands.1'],
      [command({ type: 'place', pieces: [drum(), drum()] }), 'commands.1'],
      [command({ type: 'place', pieces: [{ ...drum(), kind: 'cymbal' }] }), 'commands.1'],
      [command({ type: 'place', pieces: [{ ...drum(), kitEntryId: randomUUID() }] }), 'commands.1'],
      [command({ type: 'move', moves: [{ pieceId: piece.id, xM: 200.5, yM: 1 }] }), 'commands.1.moves.0.xM'],
      [command({ type: 'edit', pieceId: piece.id, changes: { kind: 'x' } as never }), 'commands.1.changes'],
      [{ type: 'explode', clientId: randomUUID() }, 'commands.1.type'],
      [{ ...command({ type: 'remove', pieceIds: [piece.id] }), clientId: 'no uuid' }, 'commands.1.clientId'],
    ]
    for (const [one, field] of bad) {
      const answer = await append(party.drumTech.call, 0, [command({ type: 'place', pieces: [piece] }), one])
      expect(answer.status, JSON.stringify(one)).toBe(422)
      expect(Object.keys(refusal(answer).details['fields'] as object)).toContain(field)
    }
    expect((await read()).sequence).toBe(0)
  })

  it('refuses an entry of another rig’s kit', async () => {
    await fresh()
    const elsewhere = await makeTour(party)
    const drum = newPiece({ id: randomUUID(), kind: 'drum', kitEntryId: elsewhere.tomId })
    const answer = await append(party.drumTech.call, 0, [command({ type: 'place', pieces: [drum] })])
    expect(answer.status).toBe(422)
  })

  it('refuses malformed and oversized requests', async () => {
    await fresh()
    const call = party.drumTech.call
    expect((await call('POST', `${path}/commands`, '{"baseSequence":0', {})).status).toBe(422)
    expect((await append(call, 0, [])).status).toBe(422)
    expect((await append(call, -1, [command({ type: 'remove', pieceIds: [randomUUID()] })])).status).toBe(422)
    const many = Array.from({ length: 101 }, () => command({ type: 'place', pieces: [riser()] }))
    expect((await append(call, 0, many)).status).toBe(422)
    const twice = command({ type: 'place', pieces: [riser()] })
    expect((await append(call, 0, [twice, twice])).status).toBe(422)
    const huge = command({ type: 'place', pieces: [{ ...riser(), newerField: 'x'.repeat(300_000) } as never] })
    expect((await append(call, 0, [huge])).status).toBe(413)
    expect((await call('GET', '/api/rigs/none/plot')).status).toBe(422)
    expect((await call('GET', `${path}/commands?after=x`)).status).toBe(422)
    expect((await read()).sequence).toBe(0)
  })

  it('keeps an unknown kind and its properties through saving', async () => {
    await fresh()
    const ghost = { ...newPiece({ id: randomUUID(), kind: 'hologram', yM: 2 }), beams: [1, 2] }
    await append(party.drumTech.call, 0, [
      command({ type: 'place', pieces: [ghost] }),
      command({ type: 'rotate', turns: [{ pieceId: ghost.id, rotationDeg: 30 }] }),
    ])
    expect((await read()).document.pieces[ghost.id]).toMatchObject({ kind: 'hologram', beams: [1, 2], rotationDeg: 30 })
  })

  it('keeps a snapshot every hundred commands and reads the same with it', async () => {
    await fresh()
    const piece = riser()
    await append(party.drumTech.call, 0, [command({ type: 'place', pieces: [piece] })])
    let sequence = 1
    for (const count of [90, 60]) {
      const moves = Array.from({ length: count }, (_, index) =>
        command({ type: 'move', moves: [{ pieceId: piece.id, xM: (sequence + index) / 100, yM: 1 }] }),
      )
      expect((await append(party.drumTech.call, sequence, moves)).status).toBe(200)
      sequence += count
    }
    const rows = await db().execute(
      sql`select s.sequence from plot_snapshot s join plot p on p.id = s.plot_id where p.rig_id = ${tour.rigId}`,
    )
    expect(rows.rows).toEqual([{ sequence: 151 }])
    const more = await append(party.drumTech.call, sequence, [
      command({ type: 'move', moves: [{ pieceId: piece.id, xM: 7, yM: 7 }] }),
    ])
    expect(more.status).toBe(200)
    expect(await read()).toMatchObject({ sequence: 152, document: { pieces: { [piece.id]: { xM: 7, yM: 7 } } } })
  })

  it('says who changed it, in the same transaction', async () => {
    await fresh()
    await append(party.drumTech.call, 0, [command({ type: 'place', pieces: [riser()] })])
    const rows = await db().execute(
      sql`select actor_id, action, detail from audit_event where party_id = ${party.partyId} and subject_id = ${tour.rigId}`,
    )
    expect(rows.rows).toEqual([
      { actor_id: party.drumTech.personId, action: 'plot.changed', detail: { from: 1, to: 1, commands: ['place'] } },
    ])
  })

  it('is closed to strangers, wrong roles and other parties', async () => {
    await fresh()
    const place = () => [command({ type: 'place', pieces: [riser()] })]
    for (const [who, reading, writing] of [
      [stranger, 401, 401],
      [party.viewer.call, 200, 403],
      [party.tourManager.call, 200, 403],
      [party.owner.call, 200, 403],
      [other.drumTech.call, 404, 404],
    ] as const) {
      expect((await who('GET', path)).status).toBe(reading)
      expect((await who('GET', `${path}/commands?after=0`)).status).toBe(reading)
      expect((await append(who, 0, place())).status).toBe(writing)
    }
    expect((await read()).sequence).toBe(0)
  })
})
