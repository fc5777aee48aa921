import { randomUUID } from 'node:crypto'
import { eq, sql } from 'drizzle-orm'
import { beforeAll, describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { answerEvent } from '@/db/schema/advance'
import { reading, signOff } from '@/db/schema/bench'
import { mostAnswers } from '@/lib/server/answers/record-reply'
import { benchLimit } from '@/lib/server/bench/bench-limit'
import { answerBody, firstLine, issue, readReplyOf, send } from '../helpers/advance-fixture'
import type { Answer } from '../helpers/http-client'
import { stranger } from '../helpers/http-client'
import { makeParty, type PartyFixture } from '../helpers/party-fixture'
import { makeTour, type TourFixture } from '../helpers/tour-fixture'

const messageOf = (answer: Answer) => (answer.body as { error: { message: string } }).error.message

describe('whoever holds a link cannot bury what was said through it', () => {
  let party: PartyFixture
  let tour: TourFixture

  beforeAll(async () => {
    party = await makeParty()
    tour = await makeTour(party)
  })

  it('neither by answers', async () => {
    const sent = await send(party, tour, await issue(party, tour))
    const line = firstLine(await readReplyOf(sent))
    const first = answerBody(line)
    const answer = (body: object) => stranger('POST', `${sent.path}/answers`, body)
    expect((await answer(first)).status).toBe(200)
    await db().execute(sql`insert into answer_event
      (id, party_id, show_id, kind, line_id, line_hash, revision_id, content, by_name, grant_id, token_id)
      select gen_random_uuid(), party_id, show_id, kind, line_id, line_hash, revision_id, content, by_name, grant_id, token_id
      from answer_event, generate_series(1, ${mostAnswers - 2}::int) where id = ${first.id}`)
    expect((await answer(answerBody(line))).status).toBe(200)
    const refused = await answer(answerBody(line))
    expect(refused.status).toBe(409)
    expect(messageOf(refused)).toContain('More was said')
    expect(await db().$count(answerEvent, eq(answerEvent.showId, tour.showId))).toBe(mostAnswers)
    // What is there already is the same answer still.
    expect((await answer(first)).status).toBe(200)
  })

  it('nor by readings and sign-offs', async () => {
    const printed = await party.drumTech.call('POST', `/api/shows/${tour.showId}/bench-links`)
    const path = new URL((printed.body as { href: string }).href).pathname.replace('/b/', '/api/b/')
    const deviceId = randomUUID()
    const read = (deviceSequence: number) => ({
      ...{ id: randomUUID(), entryId: tour.tomId, side: 'batter', lug: 1, deviceId, deviceSequence },
      ...{ deviceAt: '2031-10-14T16:00:00.000Z', method: 'tap-typed', value: 250, unit: 'Hz', targetHz: 256 },
      ...{ otherHead: 'damped', onStand: false, gauge: '', temperatureC: null, pass: 1, strikes: null, byName: '' },
    })
    const log = (...readings: object[]) => stranger('POST', `${path}/readings`, { readings })
    const first = read(1)
    expect((await log(first)).status).toBe(200)
    await db().execute(sql`insert into reading
      (id, party_id, show_id, kit_entry_id, physical_drum_id, side, lug, device_id, device_sequence, device_at, method, value, unit, target_hz, other_head, on_stand, pass, by_name)
      select gen_random_uuid(), party_id, show_id, kit_entry_id, physical_drum_id, side, lug, device_id, 1 + n, device_at, method, value, unit, target_hz, other_head, on_stand, pass, by_name
      from reading, generate_series(1, ${benchLimit.readings - 2}::int) n where id = ${first.id}`)
    const full = await log(read(20_001), read(20_002))
    expect(full.status).toBe(409)
    expect(messageOf(full)).toContain('This bench is full')
    expect((await log(read(20_003))).status).toBe(200)
    expect((await log(read(20_004))).status).toBe(409)
    expect((await log(first)).status).toBe(200)
    expect(await db().$count(reading, eq(reading.showId, tour.showId))).toBe(benchLimit.readings)

    const sign = () =>
      stranger('POST', `${path}/sign-offs`, { id: randomUUID(), entryId: tour.tomId, decision: 'signed', byName: 'Local hand', remark: '' })
    expect((await sign()).status).toBe(200)
    await db().execute(sql`insert into sign_off (id, party_id, show_id, kit_entry_id, decision, by_name)
      select gen_random_uuid(), party_id, show_id, kit_entry_id, decision, by_name
      from sign_off, generate_series(1, ${benchLimit.signOffs - 1}::int) where show_id = ${tour.showId}`)
    expect((await sign()).status).toBe(409)
    expect(await db().$count(signOff, eq(signOff.showId, tour.showId))).toBe(benchLimit.signOffs)
  }, 30_000)
})
