import { describe, expect, it } from 'vitest'
import type { ReplyEvent } from '@/lib/contracts/answer'
import { AppError } from '@/lib/errors'
import type { ReplyStorage } from './reply-queue'
import { createReplyQueue } from './reply-queue'

class Shelf implements ReplyStorage {
  readonly kept = new Map<string, string>()
  state: 'open' | 'full' | 'frozen' = 'open'
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
    if (this.state !== 'open') throw new Error('no room')
    this.kept.set(key, value)
  }
  removeItem(key: string) {
    if (this.state === 'frozen') throw new Error('frozen')
    this.kept.delete(key)
  }
}

const close = (id: string): ReplyEvent => ({ kind: 'close', id, byName: 'Ib' })

function makeQueue(shelf: ReplyStorage | null, place = 'link') {
  const server = { reach: true, seen: [] as string[], refusal: null as AppError | null, loseAnswer: false }
  const told = { answered: [] as string[], refused: [] as string[] }
  const queue = createReplyQueue<string>({
    storage: shelf,
    place,
    send: async (event) => {
      if (!server.reach) throw new AppError('unavailable', 'No connection.')
      if (server.refusal) throw server.refusal
      server.seen.push(event.id)
      if (server.loseAnswer) {
        server.loseAnswer = false
        throw new AppError('unavailable', 'No connection.')
      }
      return event.id
    },
    answered: (event) => told.answered.push(event.id),
    refused: (event) => told.refused.push(event.id),
    changed: () => undefined,
  })
  return { queue, server, told }
}
const ids = (events: ReplyEvent[]) => events.map((event) => event.id)

describe('the reply queue', () => {
  it('keeps answers without a connection and sends them later, once, in order', async () => {
    const shelf = new Shelf()
    const { queue, server, told } = makeQueue(shelf)
    server.reach = false
    for (const id of ['a', 'b', 'c']) expect(queue.add(close(id))).toBe(true)
    await queue.flush()
    expect(server.seen).toEqual([])
    expect(ids(queue.waiting())).toEqual(['a', 'b', 'c'])
    server.reach = true
    await Promise.all([queue.flush(), queue.flush()])
    expect(server.seen).toEqual(['a', 'b', 'c'])
    expect(told.answered).toEqual(['a', 'b', 'c'])
    expect(shelf.kept.size).toBe(0)
  })

  it('is found again by a page that was reloaded', async () => {
    const shelf = new Shelf()
    const before = makeQueue(shelf)
    before.server.reach = false
    before.queue.add(close('a'))
    await before.queue.flush()
    const after = makeQueue(shelf)
    expect(ids(after.queue.waiting())).toEqual(['a'])
    await after.queue.flush()
    expect(after.server.seen).toEqual(['a'])
  })

  it('sends again what was taken while its answer was lost, under the same id', async () => {
    const { queue, server } = makeQueue(new Shelf())
    server.loseAnswer = true
    queue.add(close('a'))
    await queue.flush()
    expect(ids(queue.waiting())).toEqual(['a'])
    await queue.flush()
    expect(server.seen).toEqual(['a', 'a'])
    expect(queue.waiting()).toEqual([])
  })

  it('drops what the server refuses and goes on, but waits out what can pass', async () => {
    const { queue, server, told } = makeQueue(new Shelf())
    server.refusal = new AppError('rate-limited', 'wait')
    queue.add(close('a'))
    await queue.flush()
    expect(ids(queue.waiting())).toEqual(['a'])
    server.refusal = new AppError('conflict', 'settled')
    queue.add(close('b'))
    await queue.flush()
    await queue.flush()
    expect(told.refused).toEqual(['a', 'b'])
    expect(queue.waiting()).toEqual([])
  })

  it('keeps the answers of two links apart', async () => {
    const shelf = new Shelf()
    const [one, two] = [makeQueue(shelf, 'one'), makeQueue(shelf, 'two')]
    one.server.reach = two.server.reach = false
    one.queue.add(close('a'))
    two.queue.add(close('b'))
    await Promise.all([one.queue.flush(), two.queue.flush()])
    expect(ids(one.queue.waiting())).toEqual(['a'])
    expect(ids(two.queue.waiting())).toEqual(['b'])
  })

  it.each(['full', null] as const)('says when the device will not keep it (%s), and sends it all the same', async (state) => {
    const shelf = state ? new Shelf() : null
    if (shelf && state) shelf.state = state
    const { queue, server } = makeQueue(shelf)
    expect(queue.add(close('a'))).toBe(false)
    await queue.flush()
    expect(server.seen).toEqual(['a'])
    expect(queue.waiting()).toEqual([])
  })

  it('does not send for ever what the device will not let go of', async () => {
    const shelf = new Shelf()
    const { queue, server } = makeQueue(shelf)
    server.reach = false
    queue.add(close('a'))
    await queue.flush()
    shelf.state = 'frozen'
    server.reach = true
    await queue.flush()
    expect(server.seen).toEqual(['a'])
  })

  it('leaves alone what lies there and is no answer', () => {
    const shelf = new Shelf()
    shelf.kept.set('hoopwright reply link 1', '{"half":')
    shelf.kept.set('something else', 'x')
    expect(makeQueue(shelf).queue.waiting()).toEqual([])
    expect(shelf.kept.size).toBe(2)
  })
})
