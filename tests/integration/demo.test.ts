import { execFile } from 'node:child_process'
import { randomUUID } from 'node:crypto'
import { promisify } from 'node:util'
import pg from 'pg'
import { afterAll, beforeAll, expect, test } from 'vitest'

/** The demo is made by the use cases; for one day it must come out the same every time, and show what it promises to show. */

const run = promisify(execFile)
const names = [1, 2].map(() => `hoopwright_demo_${randomUUID().slice(0, 8)}`)
const here = process.env['DATABASE_URL'] ?? ''
const addressOf = (name: string) => Object.assign(new URL(here), { pathname: `/${name}` }).href

async function ask<Row>(address: string, sql: string): Promise<Row[]> {
  const client = new pg.Client({ connectionString: address })
  await client.connect()
  try {
    return (await client.query(sql)).rows as Row[]
  } finally {
    await client.end()
  }
}

beforeAll(async () => {
  for (const name of names) await ask(here, `create database ${name}`)
  for (const name of names) {
    const env = { ...process.env, DATABASE_URL: addressOf(name), HOOPWRIGHT_TODAY: '2031-10-14' }
    await run(process.execPath, ['--import', 'tsx', 'db/migrate.ts'], { env })
    await run(process.execPath, ['--import', 'tsx', 'db/seed/demo.ts'], { env })
  }
}, 180_000)

afterAll(async () => {
  for (const name of names) await ask(here, `drop database if exists ${name} with (force)`)
})

/** What people would see of the demo, without the ids of mails and the moments it was made at. */
const seen: Record<string, string> = {
  people: `select p.name, p.email, m.roles from person p join membership m on m.person_id = p.id order by p.email`,
  run: `select d.date, d.kind, v.name, v.town, v.zone, r.name rig, s.show_time, s.show_day_offset, s.answers_due_at, s.slot, s.shared_kit
        from day d left join show s on s.day_id = d.id left join stage st on st.id = s.stage_id
        left join venue v on v.id = st.venue_id left join rig r on r.id = s.rig_id order by d.date`,
  hires: `select su.name, h.delivery_date, h.collection_date, h.currency, h.transport_minor,
          (select count(*)::int from hire_show x where x.hire_id = h.id) shows
          from hire h join supplier su on su.id = h.supplier_id order by su.name`,
  kit: `select id, name, kind, supply, count, spec, position from kit_entry order by id`,
  gauges: `select g.id, g.name, g.tours_gauge, p.id pair, p.reading, p.tap_hz, p.diameter_in, p.struck_at is not null struck
           from gauge g join gauge_pair p on p.gauge_id = g.id order by p.id`,
  plots: `select plot_id is not null drawn, sequence, command from plot_command order by command->>'clientId'`,
  channels: `select rig_id, number, name, piece_id, output, phantom from channel order by rig_id, number`,
  // A line's id is made when it is first issued; what it says is not.
  revisions: `select r.name, v.number, v.note, l.position, l.hash, l.content - 'lineId' content
              from revision v join rig r on r.id = v.rig_id join revision_line l on l.revision_id = v.id
              order by r.name, v.number, l.position`,
  answers: `select v.name venue, a.kind, a.line_hash, a.content, a.by_name from answer_event a
            left join show s on s.id = a.show_id left join stage st on st.id = s.stage_id left join venue v on v.id = st.venue_id
            order by v.name, a.line_hash, a.kind`,
  settlements: `select v.name venue, x.line_hash, x.decision from settlement x
                join show s on s.id = x.show_id join stage st on st.id = s.stage_id join venue v on v.id = st.venue_id
                order by v.name, x.line_hash`,
  readings: `select id, side, lug, value, unit, method, pass, device_at from reading order by id`,
  signOffs: `select id, decision, by_name from sign_off order by id`,
  mails: `select kind, to_address, subject from mail order by to_address, subject`,
}

test.each(Object.keys(seen))('two demos of one day have the same %s', async (what) => {
  const [one, other] = await Promise.all(names.map((name) => ask(addressOf(name), seen[what] ?? '')))
  expect(one?.length).toBeGreaterThan(0)
  expect(other).toEqual(one)
})

test('the demo holds what it promises', async () => {
  const address = addressOf(names[0] ?? '')
  const count = async (sql: string) => (await ask<{ n: number }>(address, `select count(*)::int n from ${sql}`))[0]?.n
  expect(await count('party')).toBe(1)
  expect(await count('tour')).toBe(1)
  expect(await count('rig')).toBe(2)
  expect(await count('day')).toBe(16)
  expect(await count('show')).toBe(9)
  expect(await count('show where slot is not null')).toBe(1)
  expect(await count('supplier')).toBe(2)
  expect(await count('hire')).toBe(2)
  expect(await count('person')).toBe(4)
  expect(await count('gauge where tours_gauge')).toBe(1)
  expect(await count('gauge_pair where struck_at is null')).toBe(11)
  expect(await count('gauge_pair where struck_at is not null')).toBe(1)
})

test('making the demo again changes nothing', async () => {
  const address = addressOf(names[0] ?? '')
  const rows = `select (select count(*) from audit_event) audit, (select count(*) from mail) mails, (select count(*) from plot_command) commands`
  const before = await ask(address, rows)
  const env = { ...process.env, DATABASE_URL: address, HOOPWRIGHT_TODAY: '2031-10-14' }
  const { stdout } = await run(process.execPath, ['--import', 'tsx', 'db/seed/demo.ts'], { env })
  expect(stdout).toContain('there already')
  expect(await ask(address, rows)).toEqual(before)
}, 60_000)
