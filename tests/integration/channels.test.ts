import { randomUUID } from 'node:crypto'
import { beforeAll, describe, expect, it } from 'vitest'
import { newPiece } from '@/plots/model/document'
import { stranger } from '../helpers/http-client'
import type { Answer } from '../helpers/http-client'
import { makeParty, type PartyFixture } from '../helpers/party-fixture'
import { makeTour, type TourFixture } from '../helpers/tour-fixture'

type Channel = { id: string; number: number; name: string; version: number; pieceId: string | null; output: string }
const channelOf = (answer: Answer) => answer.body as Channel
const errorOf = (answer: Answer) => (answer.body as { error: { code: string; details: Record<string, unknown> } }).error

describe('the channels of a rig', () => {
  let party: PartyFixture
  let other: PartyFixture
  let tour: TourFixture
  let playbackId: string
  let path: string

  beforeAll(async () => {
    party = await makeParty()
    other = await makeParty()
  })
  const fresh = async () => {
    tour = await makeTour(party)
    path = `/api/rigs/${tour.rigId}/channels`
    playbackId = randomUUID()
    const placed = await party.drumTech.call('POST', `/api/rigs/${tour.rigId}/plot/commands`, {
      baseSequence: 0,
      commands: [{ clientId: randomUUID(), type: 'place', pieces: [newPiece({ id: playbackId, kind: 'playback' })] }],
    })
    expect(placed.status).toBe(200)
  }
  const channel = (number: number, output = 'L', rest: object = {}) => ({
    number,
    name: `Playback ${output}`,
    pieceId: playbackId,
    output,
    stand: '',
    phantom: false,
    ...rest,
  })
  const add = (body: object) => party.drumTech.call('POST', path, body)
  const list = async () => ((await party.viewer.call('GET', path)).body as { channels: Channel[] }).channels

  it('take outputs of pieces on the plot and are read in order of number', async () => {
    await fresh()
    expect((await add({ channel: channel(12, 'R') })).status).toBe(201)
    expect((await add({ channel: channel(11, 'L') })).status).toBe(201)
    expect((await add({ channel: channel(1, '', { pieceId: null, name: 'Spare' }) })).status).toBe(201)
    expect((await list()).map((row) => [row.number, row.output])).toEqual([
      [1, ''],
      [11, 'L'],
      [12, 'R'],
    ])
  })

  it('answer the channel that is there when the same request comes again', async () => {
    await fresh()
    const id = randomUUID()
    const once = await add({ id, channel: channel(5) })
    const again = await add({ id, channel: channel(5) })
    expect(again.body).toEqual(once.body)
    expect(await list()).toHaveLength(1)
  })

  it('refuse a number twice, an output twice, and an output that is not there', async () => {
    await fresh()
    await add({ channel: channel(5) })
    const cases: [object, number, string][] = [
      [channel(5, 'R'), 409, 'number'],
      [channel(6, 'L'), 409, 'pieceId'],
      [channel(6, 'mic'), 422, 'output'],
      [channel(6, 'L', { pieceId: randomUUID() }), 422, 'pieceId'],
      [channel(0, 'R'), 422, 'channel.number'],
      [channel(513, 'R'), 422, 'channel.number'],
      [channel(6, '', {}), 422, 'channel.output'],
      [channel(6, 'R', { name: 'x'.repeat(61) }), 422, 'channel.name'],
    ]
    for (const [body, status, field] of cases) {
      const answer = await add({ channel: body })
      expect(answer.status, JSON.stringify(body)).toBe(status)
      expect(errorOf(answer).details['fields']).toHaveProperty([field])
    }
    expect(await list()).toHaveLength(1)
  })

  it('change by version; a stale one is refused with the row as it is', async () => {
    await fresh()
    const made = channelOf(await add({ channel: channel(5) }))
    const change = (version: number, name: string) =>
      party.drumTech.call('PATCH', `/api/channels/${made.id}`, { version, channel: channel(5, 'L', { name }) })
    expect(channelOf(await change(1, 'Tracks left'))).toMatchObject({ name: 'Tracks left', version: 2 })
    const stale = await change(1, 'Other')
    expect(stale.status).toBe(409)
    expect(errorOf(stale)).toMatchObject({ code: 'stale', details: { current: { name: 'Tracks left', version: 2 } } })
    const remove = (version: number) => party.drumTech.call('DELETE', `/api/channels/${made.id}`, { version })
    expect((await remove(1)).status).toBe(409)
    expect((await remove(2)).status).toBe(200)
    expect((await remove(2)).status).toBe(404)
    expect(await list()).toEqual([])
  })

  it('are closed to strangers, wrong roles and other parties', async () => {
    await fresh()
    const made = channelOf(await add({ channel: channel(5) }))
    for (const [who, reading, writing] of [
      [stranger, 401, 401],
      [party.viewer.call, 200, 403],
      [party.tourManager.call, 200, 403],
      [other.drumTech.call, 404, 404],
    ] as const) {
      expect((await who('GET', path)).status).toBe(reading)
      expect((await who('POST', path, { channel: channel(6, 'R') })).status).toBe(writing)
      expect((await who('PATCH', `/api/channels/${made.id}`, { version: 1, channel: channel(7) })).status).toBe(writing)
      expect((await who('DELETE', `/api/channels/${made.id}`, { version: 1 })).status).toBe(writing)
    }
    // Nor can another party's id be taken over under a rig of one's own.
    const theirs = await makeTour(other)
    const claimed = await other.drumTech.call('POST', `/api/rigs/${theirs.rigId}/channels`, {
      id: made.id,
      channel: channel(5, '', { pieceId: null }),
    })
    expect(claimed.status).toBe(409)
    expect(await list()).toMatchObject([{ id: made.id, number: 5, version: 1 }])
  })
})
