import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { eventStream } from './event-stream'

const hub = vi.hoisted(() => ({ subscribe: vi.fn<(partyId: string, hear: (topics: string[]) => void) => Promise<() => void>>() }))
vi.mock('./hub', () => ({ liveHub: hub }))

const open = (over: { signal?: AbortSignal; stillAllowed?: () => Promise<boolean> } = {}) =>
  eventStream({
    partyId: 'a',
    signal: new AbortController().signal,
    wants: (topic) => topic === 'bench:own',
    stillAllowed: () => Promise.resolve(true),
    ...over,
  })

describe('an event stream', () => {
  const unsubscribe = vi.fn()
  beforeEach(() => {
    vi.useFakeTimers()
    unsubscribe.mockReset()
    hub.subscribe.mockReset().mockResolvedValue(unsubscribe)
  })
  afterEach(() => {
    vi.useRealTimers()
  })

  it('says its own topics and a lost connection, no other, and ends when it is no longer allowed', async () => {
    const stillAllowed = vi.fn().mockResolvedValueOnce(true).mockResolvedValue(false)
    const response = await open({ stillAllowed })
    const text = response.text()
    await vi.advanceTimersByTimeAsync(0)
    const hear = hub.subscribe.mock.calls[0]?.[1]
    hear?.(['bench:other'])
    hear?.(['bench:own', 'bench:other'])
    hear?.(['resync'])
    await vi.advanceTimersByTimeAsync(40_000)
    const said = [...(await text).matchAll(/^data: (.*)$/gm)].map((match) => match[1])
    expect(said).toEqual(['["ready"]', '["bench:own"]', '["resync"]'])
    expect(stillAllowed).toHaveBeenCalledTimes(2)
    expect(unsubscribe).toHaveBeenCalledOnce()
    expect(vi.getTimerCount()).toBe(0)
  })

  it.each(['its request ended', 'its body was let go'])('leaves nothing behind when %s while it was being opened', async (how) => {
    let opened: (unsubscribe: () => void) => void = () => undefined
    hub.subscribe.mockReturnValue(new Promise((resolve) => (opened = resolve)))
    const request = new AbortController()
    const response = await open({ signal: request.signal })
    if (how === 'its request ended') request.abort()
    else await response.body?.cancel()
    opened(unsubscribe)
    await vi.advanceTimersByTimeAsync(0)
    expect(unsubscribe).toHaveBeenCalledOnce()
    expect(vi.getTimerCount()).toBe(0)
  })

  it('does not fail its reader, nor the other readers, when it is let go', async () => {
    const response = await open()
    await vi.advanceTimersByTimeAsync(0)
    await expect(response.body?.cancel()).resolves.toBeUndefined()
    const hear = hub.subscribe.mock.calls[0]?.[1]
    expect(() => hear?.(['bench:own'])).not.toThrow()
    expect(unsubscribe).toHaveBeenCalledOnce()
  })
})
