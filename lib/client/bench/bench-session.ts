import type { Bench, BenchReading, BenchSignOff, ReadingInput, SignOffInput } from '@/lib/contracts/bench'
import { AppError } from '@/lib/errors'
import type { BenchQueue, QueuedItem } from './bench-queue'
import type { BenchServer } from './bench-server'

/** Readings sent in one request at most; the contract's own limit. */
const BATCH = 200
const RETRY_MS = [1_000, 2_000, 5_000, 10_000, 30_000] as const
const LISTEN_AGAIN_MS = 10_000

export type BenchState = {
  /** What the server told, with what waits here on top. */
  readonly bench: Bench
  readonly waiting: number
  /** What the server would not take; it is kept here until it is let go. */
  readonly refused: readonly QueuedItem[]
  /** `waiting`: kept on this device, tried again by itself. `closed`: the link opens nothing any more. */
  readonly connection: 'sent' | 'sending' | 'waiting' | 'closed'
  /** Why it is not sent. */
  readonly problem: string | null
  /** False when this device keeps nothing: what waits lives only as long as the page. */
  readonly kept: boolean
}

export type NewReading = Omit<ReadingInput, 'id' | 'deviceId' | 'deviceSequence' | 'deviceAt'>

export interface BenchSession {
  subscribe(listener: () => void): () => void
  state(): BenchState
  log(reading: NewReading): BenchReading
  sign(signOff: Omit<SignOffInput, 'id'>): void
  letGo(sequence: number): void
  retryNow(): void
  start(): void
  stop(): void
}

/** One bench on one device: everything logged is shown at once, kept, and sent once, in order, whenever there is signal. */
export function createBenchSession(input: {
  readonly initial: Bench
  readonly server: BenchServer
  readonly queue: BenchQueue
  readonly newId: () => string
  readonly now?: () => number
  /** Timers, so that a test can hold them. */
  readonly later?: (run: () => void, ms: number) => () => void
}): BenchSession {
  const { server, queue, newId } = input
  const now = input.now ?? Date.now
  const later = input.later ?? laterByTimer
  let told = input.initial
  let connection: BenchState['connection'] = 'sent'
  let problem: string | null = null
  let kept = true
  let failures = 0
  let running = false
  let batchSize = BATCH
  let inTurn: Promise<void> = Promise.resolve()
  let cancelRetry = () => undefined as void
  let stopListening = () => undefined as void
  let cancelListen = () => undefined as void
  const listeners = new Set<() => void>()
  // The page is first drawn as the server drew it; what waits here joins it at the start.
  let current: BenchState = { bench: told, waiting: 0, refused: [], connection, problem, kept }

  function changed() {
    const items = queue.items()
    const waiting = items.filter(({ refused }) => refused === null)
    current = {
      ...{ bench: withWaiting(told, waiting), waiting: waiting.length },
      ...{ refused: items.filter(({ refused }) => refused !== null), connection, problem, kept },
    }
    for (const listener of listeners) listener()
  }

  /** One at a time: an answer that was read before something was sent must not come after it. */
  function next(work: () => Promise<void>): void {
    inTurn = inTurn.then(work, work)
  }

  function failed(error: unknown) {
    const known =
      error instanceof AppError ? error : new AppError('unavailable', 'The answer could not be read.', { cause: error })
    problem = known.message
    connection = ['gone', 'not-found', 'forbidden'].includes(known.code) ? 'closed' : 'waiting'
    cancelRetry()
    if (connection === 'closed' || !running) return
    const wait = RETRY_MS[Math.min(failures, RETRY_MS.length - 1)] ?? 30_000
    failures += 1
    cancelRetry = later(catchUp, wait)
  }

  /** Brings in what others did, then sends what waits. */
  async function refreshAndSend() {
    try {
      told = await server.read()
      failures = 0
      connection = 'sent'
      problem = null
    } catch (error) {
      failed(error)
      return changed()
    }
    changed()
    await pump()
  }

  async function pump() {
    cancelRetry()
    try {
      for (
        let batch = nextBatch(queue.items(), batchSize);
        batch.length > 0;
        batch = nextBatch(queue.items(), batchSize)
      ) {
        connection = 'sending'
        changed()
        await send(batch)
        failures = 0
      }
      batchSize = BATCH
      if (connection === 'sending') {
        connection = 'sent'
        problem = null
      }
    } catch (error) {
      failed(error)
    }
    changed()
  }

  async function send(batch: readonly QueuedItem[]) {
    try {
      const [first] = batch
      if (first?.kind === 'sign-off') {
        const stored = await server.signOff(first.signOff)
        told = { ...told, signOffs: [...told.signOffs.filter(({ id }) => id !== stored.id), stored] }
      } else {
        const stored = await server.addReadings(
          batch.flatMap((item) => (item.kind === 'reading' ? [item.reading] : [])),
        )
        const ids = new Set(stored.map(({ id }) => id))
        told = { ...told, readings: [...told.readings.filter(({ id }) => !ids.has(id)), ...stored] }
      }
      for (const { sequence } of batch) queue.drop(sequence)
    } catch (error) {
      if (!(error instanceof AppError) || !['invalid', 'conflict', 'too-large'].includes(error.code)) throw error
      setAside(batch, error)
    }
  }

  /** The server takes all of a batch or none, and names what is wrong: that one is set aside, the rest is sent again. */
  function setAside(batch: readonly QueuedItem[], error: AppError) {
    const fields = Object.entries((error.details?.['fields'] ?? {}) as Record<string, string>)
    const named = fields.flatMap(([field, message]) => {
      const item = batch[Number(/^readings\.(\d+)/.exec(field)?.[1] ?? Number.NaN)]
      return item ? [{ ...item, refused: message }] : []
    })
    if (named.length === 0 && batch.length > 1) batchSize = 1
    else
      for (const item of named.length > 0 ? named : batch.map((one) => ({ ...one, refused: error.message })))
        kept = queue.keep(item) && kept
  }

  function sendNow() {
    if (running && connection !== 'closed') next(pump)
  }

  function catchUp() {
    if (running) next(refreshAndSend)
  }

  function listen() {
    stopListening = server.listen(catchUp, () => {
      // The stream was refused: reading says why, and a passing fault is listened to again.
      catchUp()
      cancelListen = later(() => {
        if (running && connection !== 'closed') listen()
      }, LISTEN_AGAIN_MS)
    })
  }

  function add(item: QueuedItem) {
    kept = queue.keep(item) && kept
    changed()
    sendNow()
  }

  return {
    subscribe(listener) {
      listeners.add(listener)
      return () => void listeners.delete(listener)
    },
    state: () => current,
    log(draft) {
      const { deviceId, sequence } = queue.next()
      const reading: ReadingInput = {
        ...draft,
        id: newId(),
        deviceId,
        deviceSequence: sequence,
        deviceAt: new Date(now()).toISOString(),
      }
      add({ kind: 'reading', sequence, refused: null, reading })
      return waitingReading(reading)
    },
    sign(draft) {
      add({ kind: 'sign-off', sequence: queue.next().sequence, refused: null, signOff: { ...draft, id: newId() } })
    },
    letGo(sequence) {
      queue.drop(sequence)
      changed()
    },
    retryNow: catchUp,
    start() {
      running = true
      changed()
      listen()
      catchUp()
    },
    stop() {
      running = false
      cancelRetry()
      cancelListen()
      stopListening()
    },
  }
}

/** What is sent next: the sign-off that is first in line, or the readings before it. */
export function nextBatch(items: readonly QueuedItem[], most: number): QueuedItem[] {
  const waiting = items.filter(({ refused }) => refused === null)
  if (waiting[0]?.kind === 'sign-off') return waiting.slice(0, 1)
  const signOff = waiting.findIndex(({ kind }) => kind === 'sign-off')
  return waiting.slice(0, Math.min(most, signOff === -1 ? waiting.length : signOff))
}

function withWaiting(told: Bench, waiting: readonly QueuedItem[]): Bench {
  const known = new Set([...told.readings, ...told.signOffs].map(({ id }) => id))
  const readings = waiting.flatMap((item) =>
    item.kind === 'reading' && !known.has(item.reading.id) ? [waitingReading(item.reading)] : [],
  )
  const signOffs = waiting.flatMap((item): BenchSignOff[] =>
    item.kind === 'sign-off' && !known.has(item.signOff.id) ? [{ ...item.signOff, at: null }] : [],
  )
  return { ...told, readings: [...told.readings, ...readings], signOffs: [...told.signOffs, ...signOffs] }
}

function waitingReading(reading: ReadingInput): BenchReading {
  return { ...reading, serverAt: null, via: 'link' }
}

function laterByTimer(run: () => void, ms: number): () => void {
  const timer = setTimeout(run, ms)
  return () => clearTimeout(timer)
}
