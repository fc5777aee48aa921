import { describe, expect, it } from 'vitest'
import type { Bench, BenchReading, BenchSignOff, ReadingInput, SignOffInput } from '@/lib/contracts/bench'
import { AppError } from '@/lib/errors'
import type { KeyValueStorage } from './bench-queue'
import { createBenchQueue } from './bench-queue'
import type { NewReading } from './bench-session'
import { createBenchSession } from './bench-session'

class Shelf implements KeyValueStorage {
  readonly kept = new Map<string, string>()
  full = false
  get length() {
    return this.kept.size
  }
  key(index: number) {
    return [...this.kept.keys()][index] ?? null
  }
  getItem(key: string) {
    return this.kept.get(key) ?? null
  }
  setItem(key: string, value: string) {
    if (this.full) throw new Error('the storage is full')
    this.kept.set(key, value)
  }
  removeItem(key: string) {
    this.kept.delete(key)
  }
}

/** A server that keeps what it is sent once, as the real one does, and can be out of reach. */
class FakeServer {
  reach: 'there' | 'no signal' | 'withdrawn' = 'there'
  readonly readings: BenchReading[] = []
  readonly signOffs: BenchSignOff[] = []
  readonly requests: string[] = []
  /** Loses the next answer on its way back: stored, but the phone does not learn of it. */
  loseAnswer = false
  refuse: ((readings: readonly ReadingInput[]) => AppError | null) | null = null
  changed = () => undefined as void

  private meet() {
    if (this.reach === 'no signal') throw new AppError('unavailable', 'No signal.')
    if (this.reach === 'withdrawn') throw new AppError('gone', 'This link was withdrawn.')
  }
  async read(): Promise<Bench> {
    this.meet()
    return { ...empty, readings: [...this.readings], signOffs: [...this.signOffs] }
  }
  async addReadings(readings: readonly ReadingInput[]): Promise<BenchReading[]> {
    this.meet()
    const refusal = this.refuse?.(readings)
    if (refusal) throw refusal
    this.requests.push(`readings ${readings.map(({ value }) => value).join(' ')}`)
    for (const reading of readings) {
      if (!this.readings.some(({ id }) => id === reading.id))
        this.readings.push({ ...reading, serverAt: '2031-10-14T16:00:01Z', via: 'link' })
    }
    if (this.loseAnswer) {
      this.loseAnswer = false
      throw new AppError('unavailable', 'No signal.')
    }
    return this.readings.filter(({ id }) => readings.some((reading) => reading.id === id))
  }
  async signOff(signOff: SignOffInput): Promise<BenchSignOff> {
    this.meet()
    this.requests.push(`sign-off ${signOff.byName}`)
    const stored = { ...signOff, at: '2031-10-14T16:00:02Z' }
    this.signOffs.push(stored)
    return stored
  }
  listen(changed: () => void) {
    this.changed = changed
    return () => undefined
  }
}

const empty: Bench = {
  show: { id: 's', title: 'Test Hall', town: 'Arvic', date: '2031-10-14', zone: null, mustNotRetune: null },
  ...{ party: 'A party', rig: 'full rig', sheet: null, drums: [], readings: [], signOffs: [] },
}
const tap = (value: number): NewReading => ({
  ...{ entryId: 'tom', side: 'batter', lug: 1, method: 'tap-typed', value, unit: 'Hz', targetHz: 250 },
  ...{ otherHead: 'damped', onStand: false, gauge: '', temperatureC: null, pass: 1, strikes: null, byName: 'Somebody' },
})

let ids = 0
const newId = () => `id-${(ids += 1)}`

function open(server: FakeServer, shelf: Shelf | null) {
  const timers: { run: () => void; ms: number }[] = []
  const session = createBenchSession({
    ...{ initial: empty, server, newId, now: () => Date.parse('2031-10-14T16:00:00Z') },
    queue: createBenchQueue(shelf, 'link s', newId),
    later: (run, ms) => {
      const timer = { run, ms }
      timers.push(timer)
      return () => void timers.splice(timers.indexOf(timer) >>> 0, 1)
    },
  })
  return {
    session,
    timers,
    /** Lets everything that is under way come to its end. */
    settle: async () => {
      for (let turn = 0; turn < 200; turn += 1) await Promise.resolve()
    },
    fire: () => timers.splice(0).forEach(({ run }) => run()),
  }
}

describe('a bench without signal', () => {
  it('keeps what is logged, shows it at once, and sends it later, once and in order', async () => {
    const [server, shelf] = [new FakeServer(), new Shelf()]
    server.reach = 'no signal'
    const { session, settle, fire, timers } = open(server, shelf)
    session.start()
    for (const value of [251, 249, 252]) session.log(tap(value))
    session.sign({ entryId: 'tom', decision: 'signed', byName: 'Somebody', remark: '' })
    session.log(tap(248))
    await settle()
    expect(session.state()).toMatchObject({ waiting: 5, connection: 'waiting', kept: true })
    expect(session.state().bench.readings.map(({ value, serverAt }) => [value, serverAt])).toEqual([
      [251, null],
      [249, null],
      [252, null],
      [248, null],
    ])
    expect(session.state().bench.signOffs).toMatchObject([{ byName: 'Somebody', at: null }])
    expect(server.requests).toEqual([])
    server.reach = 'there'
    expect(timers).toHaveLength(1)
    fire()
    await settle()
    expect(server.requests).toEqual(['readings 251 249 252', 'sign-off Somebody', 'readings 248'])
    expect(session.state()).toMatchObject({ waiting: 0, connection: 'sent', problem: null })
    expect(session.state().bench.readings.map(({ value }) => value)).toEqual([251, 249, 252, 248])
  })

  it('waits longer between its tries, half a minute at most', async () => {
    const server = new FakeServer()
    server.reach = 'no signal'
    const { session, settle, fire, timers } = open(server, new Shelf())
    session.start()
    session.log(tap(251))
    await settle()
    const waits: (number | undefined)[] = []
    for (let turn = 0; turn < 6; turn += 1) {
      waits.push(timers[0]?.ms)
      fire()
      await settle()
    }
    expect(waits.toSorted((a = 0, b = 0) => a - b)).toEqual(waits)
    expect(waits.at(-1)).toBe(30_000)
  })

  it('finds everything again after the page was reloaded, and counts on', async () => {
    const [server, shelf] = [new FakeServer(), new Shelf()]
    server.reach = 'no signal'
    const first = open(server, shelf)
    first.session.start()
    first.session.log(tap(251))
    first.session.log(tap(249))
    await first.settle()
    first.session.stop()
    const second = open(server, shelf)
    expect(second.session.state().waiting).toBe(0)
    second.session.start()
    expect(second.session.state().bench.readings.map(({ value }) => value)).toEqual([251, 249])
    second.session.log(tap(252))
    await second.settle()
    server.reach = 'there'
    second.session.retryNow()
    await second.settle()
    expect(server.readings.map(({ value, deviceSequence }) => [value, deviceSequence])).toEqual([
      [251, 1],
      [249, 2],
      [252, 3],
    ])
    expect(new Set(server.readings.map(({ deviceId }) => deviceId)).size).toBe(1)
    expect([...shelf.kept.keys()]).toEqual(['hoopwright bench device'])
  })

  it('sends again what was stored though its answer was lost, and shows it once', async () => {
    const server = new FakeServer()
    const { session, settle, fire } = open(server, new Shelf())
    session.start()
    await settle()
    server.loseAnswer = true
    session.log(tap(251))
    await settle()
    expect(session.state()).toMatchObject({ waiting: 1, connection: 'waiting' })
    fire()
    await settle()
    expect(server.requests).toEqual(['readings 251', 'readings 251'])
    expect(session.state().bench.readings.map(({ value }) => value)).toEqual([251])
    expect(session.state().waiting).toBe(0)
  })

  it('sends many in batches of 200', async () => {
    const server = new FakeServer()
    server.reach = 'no signal'
    const { session, settle } = open(server, new Shelf())
    session.start()
    for (let turn = 0; turn < 450; turn += 1) session.log(tap(200 + turn / 10))
    await settle()
    server.reach = 'there'
    session.retryNow()
    await settle()
    expect(server.requests.map((request) => request.split(' ').length - 1)).toEqual([200, 200, 50])
  })
})

describe('a bench whose device keeps nothing', () => {
  it.each([
    ['has no storage', () => null],
    ['has full storage', () => Object.assign(new Shelf(), { full: true })],
  ])('says so and still sends when it %s', async (_, shelf) => {
    const server = new FakeServer()
    server.reach = 'no signal'
    const { session, settle } = open(server, shelf())
    session.start()
    session.log(tap(251))
    session.log(tap(249))
    await settle()
    expect(session.state()).toMatchObject({ waiting: 2, kept: false })
    server.reach = 'there'
    session.retryNow()
    await settle()
    expect(server.readings.map(({ deviceSequence }) => deviceSequence)).toEqual([1, 2])
  })
})

describe('what the server refuses', () => {
  it('is set aside with the reason and kept until let go; the rest arrives', async () => {
    const [server, shelf] = [new FakeServer(), new Shelf()]
    server.refuse = (readings) => {
      const at = readings.findIndex(({ value }) => value === 999)
      return at === -1
        ? null
        : new AppError('invalid', 'no', { details: { fields: { [`readings.${at}.lug`]: 'this head has 6 lugs' } } })
    }
    server.reach = 'no signal'
    const { session, settle } = open(server, shelf)
    session.start()
    for (const value of [251, 999, 249]) session.log(tap(value))
    await settle()
    server.reach = 'there'
    session.retryNow()
    await settle()
    expect(server.readings.map(({ value }) => value)).toEqual([251, 249])
    const [refused] = session.state().refused
    expect(refused).toMatchObject({ refused: 'this head has 6 lugs', reading: { value: 999 } })
    expect(session.state()).toMatchObject({ waiting: 0, connection: 'sent' })
    expect(createBenchQueue(shelf, 'link s', newId).items()).toHaveLength(1)
    session.letGo(refused?.sequence ?? 0)
    expect(session.state().refused).toEqual([])
    expect(createBenchQueue(shelf, 'link s', newId).items()).toEqual([])
  })

  it('is found one by one when the server does not name it', async () => {
    const server = new FakeServer()
    server.refuse = (readings) =>
      readings.some(({ value }) => value === 999) ? new AppError('conflict', 'An id is taken.') : null
    server.reach = 'no signal'
    const { session, settle } = open(server, new Shelf())
    session.start()
    for (const value of [251, 999, 249]) session.log(tap(value))
    await settle()
    server.reach = 'there'
    session.retryNow()
    await settle()
    expect(server.readings.map(({ value }) => value)).toEqual([251, 249])
    expect(session.state().refused).toMatchObject([{ refused: 'An id is taken.' }])
  })
})

describe('a bench whose link was withdrawn', () => {
  it('says so, keeps what was logged, and stops trying', async () => {
    const [server, shelf] = [new FakeServer(), new Shelf()]
    const { session, settle, timers } = open(server, shelf)
    session.start()
    await settle()
    server.reach = 'withdrawn'
    session.log(tap(251))
    await settle()
    expect(session.state()).toMatchObject({ connection: 'closed', problem: 'This link was withdrawn.', waiting: 1 })
    expect(timers).toEqual([])
    expect(createBenchQueue(shelf, 'link s', newId).items()).toHaveLength(1)
  })
})

describe('two phones on one bench', () => {
  it('see each other’s readings', async () => {
    const server = new FakeServer()
    const [one, two] = [open(server, new Shelf()), open(server, new Shelf())]
    one.session.start()
    const heardByOne = server.changed
    two.session.start()
    await one.settle()
    two.session.log(tap(251))
    await two.settle()
    heardByOne()
    await one.settle()
    expect(one.session.state().bench.readings).toMatchObject([{ value: 251 }])
  })
})

describe('what lies in the storage', () => {
  it('is left alone when it is not ours or cannot be read', () => {
    const shelf = new Shelf()
    shelf.setItem('hoopwright bench link s 0000000001', '{"kind":"reading"')
    shelf.setItem('hoopwright bench link s 0000000002', '{"kind":"reading","sequence":2,"refused":null}')
    shelf.setItem(
      'hoopwright bench link other 0000000003',
      '{"kind":"sign-off","sequence":3,"refused":null,"signOff":{}}',
    )
    shelf.setItem('hoopwright bench device', '[1]')
    const queue = createBenchQueue(shelf, 'link s', newId)
    expect(queue.items()).toEqual([])
    expect(queue.next().sequence).toBe(1)
    expect(queue.next().sequence).toBe(2)
  })
})
