import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest'
import { listenForTaps } from './listen-for-taps'
import type { ListeningEnd } from './listen-for-taps'
import { listeningTroubleWords } from './listening-trouble'
import type { TapNews, TapOrder } from './tap-session'

/** The browser's parts, as far as listening touches them, and what became of each. */
const made: { contexts: FakeContext[]; workers: FakeWorker[]; tracks: FakeTrack[]; asked: unknown[] } = {
  contexts: [],
  workers: [],
  tracks: [],
  asked: [],
}
let rates: number[]
let wakes: boolean
let microphone: () => Promise<unknown>

class FakeContext extends EventTarget {
  state = 'suspended'
  sampleRate: number
  destination = {}
  audioWorklet = { addModule: () => Promise.resolve() }
  constructor({ sampleRate }: { sampleRate?: number }) {
    super()
    this.sampleRate = sampleRate ?? rates.shift() ?? 48_000
    made.contexts.push(this)
  }
  resume() {
    if (wakes) this.state = 'running'
    return wakes ? Promise.resolve() : new Promise(() => undefined)
  }
  close() {
    this.state = 'closed'
    return Promise.resolve()
  }
  createMediaStreamSource() {
    return { connect: (next: unknown) => next }
  }
}

class FakeNode {
  port = { postMessage: () => undefined }
  connect(next: unknown) {
    return next
  }
}

class FakeTrack extends EventTarget {
  stopped = false
  stop() {
    this.stopped = true
  }
}

class FakeWorker extends EventTarget {
  orders: TapOrder[] = []
  terminated = false
  constructor() {
    super()
    made.workers.push(this)
  }
  postMessage(order: TapOrder) {
    this.orders.push(order)
  }
  terminate() {
    this.terminated = true
  }
  say(news: TapNews) {
    this.dispatchEvent(new MessageEvent('message', { data: news }))
  }
}

beforeEach(() => {
  Object.assign(made, { contexts: [], workers: [], tracks: [], asked: [] })
  rates = []
  wakes = true
  microphone = () => {
    const track = new FakeTrack()
    made.tracks.push(track)
    return Promise.resolve({ getTracks: () => [track] })
  }
  vi.stubGlobal('AudioContext', FakeContext)
  vi.stubGlobal('AudioWorkletNode', FakeNode)
  vi.stubGlobal('GainNode', FakeNode)
  vi.stubGlobal('Worker', FakeWorker)
  vi.stubGlobal('navigator', {
    mediaDevices: {
      getUserMedia: (asked: unknown) => {
        made.asked.push(asked)
        return microphone()
      },
    },
  })
})
afterEach(() => {
  vi.unstubAllGlobals()
  vi.useRealTimers()
})

const calls = () => ({ onListening: vi.fn(), onTap: vi.fn(), onRefusal: vi.fn(), onLevel: vi.fn() })

/** Begins to listen and waits until the microphone is open. */
async function begun(hears = calls()) {
  const stop = new AbortController()
  let ended: Promise<ListeningEnd> | null = null
  await new Promise<void>((resolve) => {
    ended = listenForTaps({ ...hears, options: { expectHz: 150 }, signal: stop.signal, onListening: resolve })
  })
  return { stop, hears, ended: ended as unknown as Promise<ListeningEnd>, worker: made.workers[0] as FakeWorker }
}

function allLetGo() {
  expect(made.tracks.every(({ stopped }) => stopped)).toBe(true)
  expect(made.contexts.every(({ state }) => state === 'closed')).toBe(true)
  expect(made.workers.every(({ terminated }) => terminated)).toBe(true)
}

describe('listening by the microphone', () => {
  test('asks for sound as it is: no echo cancelling, no noise suppression, no automatic gain', async () => {
    const { stop, ended } = await begun()
    expect(made.asked).toEqual([
      { audio: { echoCancellation: false, noiseSuppression: false, autoGainControl: false, channelCount: 1 } },
    ])
    stop.abort()
    await ended
  })

  test('taps, refusals and levels are handed on; stopping lets go of everything', async () => {
    const { stop, ended, worker, hears } = await begun()
    expect(worker.orders[0]).toMatchObject({ kind: 'start', sampleRateHz: 48_000, options: { expectHz: 150 } })
    worker.say({ kind: 'level', peak: 0.25 })
    worker.say({ kind: 'tap', heard: { report: { outcome: 'refused', kind: 'silent', onsetS: null }, latencyS: 1 } })
    expect(hears.onLevel).toHaveBeenCalledWith(0.25)
    expect(hears.onRefusal).toHaveBeenCalledWith({ outcome: 'refused', kind: 'silent', onsetS: null })
    expect(hears.onTap).not.toHaveBeenCalled()
    stop.abort()
    expect(await ended).toEqual({ ended: 'stopped' })
    allLetGo()
  })

  test('a sound system at another rate is opened again at 48 kHz', async () => {
    rates = [16_000]
    const { stop, ended, worker } = await begun()
    expect(worker.orders[0]).toMatchObject({ sampleRateHz: 48_000 })
    stop.abort()
    await ended
    allLetGo()
  })

  test.each([
    ['NotAllowedError', 'not-allowed'],
    ['NotFoundError', 'no-microphone'],
    ['NotReadableError', 'busy'],
  ])('%s is told as %s, and nothing stays open', async (name, trouble) => {
    microphone = () => Promise.reject(new DOMException('refused', name))
    expect(await listenForTaps({ ...calls(), signal: new AbortController().signal })).toEqual({
      ended: 'trouble',
      trouble,
    })
    allLetGo()
  })

  test('sound that the browser keeps asleep', async () => {
    wakes = false
    vi.useFakeTimers()
    const ended = listenForTaps({ ...calls(), signal: new AbortController().signal })
    await vi.advanceTimersByTimeAsync(5000)
    expect(await ended).toEqual({ ended: 'trouble', trouble: 'asleep' })
    allLetGo()
  })

  test('a microphone pulled out, a context put to sleep, a worker that breaks', async () => {
    const lost = await begun()
    made.tracks[0]?.dispatchEvent(new Event('ended'))
    expect(await lost.ended).toEqual({ ended: 'trouble', trouble: 'lost' })
    allLetGo()

    made.workers.length = 0
    const broken = await begun()
    broken.worker.say({ kind: 'fault', message: 'Sample 3 is not a finite number.' })
    expect(await broken.ended).toEqual({ ended: 'trouble', trouble: 'broken' })
    allLetGo()

    made.workers.length = 0
    const asleep = await begun()
    const context = made.contexts[made.contexts.length - 1] as FakeContext
    context.state = 'interrupted'
    context.dispatchEvent(new Event('statechange'))
    expect(await asleep.ended).toEqual({ ended: 'trouble', trouble: 'asleep' })
    allLetGo()
  })

  test('stopped while the microphone is still being asked for', async () => {
    const stop = new AbortController()
    const open = microphone
    microphone = async () => {
      stop.abort()
      return open()
    }
    expect(await listenForTaps({ ...calls(), signal: stop.signal })).toEqual({ ended: 'stopped' })
    allLetGo()
  })

  test('a browser without microphones', async () => {
    vi.stubGlobal('navigator', {})
    expect(await listenForTaps({ ...calls(), signal: new AbortController().signal })).toEqual({
      ended: 'trouble',
      trouble: 'unsupported',
    })
  })

  test('every trouble says what to do', () => {
    for (const trouble of [
      'not-allowed',
      'no-microphone',
      'busy',
      'asleep',
      'lost',
      'unsupported',
      'broken',
    ] as const) {
      expect(listeningTroubleWords(trouble)).toMatch(/^[A-Z].*\. .*\.$/)
    }
  })
})
