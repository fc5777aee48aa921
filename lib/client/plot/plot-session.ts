import { z } from 'zod'
import { missedCommandsSchema } from '@/lib/contracts/plot'
import type { MissedCommand, PlotAnswer } from '@/lib/contracts/plot'
import { AppError } from '@/lib/errors'
import { apply } from '@/plots/model/apply'
import { piecesOf, type PlotAction, type PlotCommand } from '@/plots/model/command'
import type { Piece, PlotDocument } from '@/plots/model/document'
import { emptyHistory, record, redo, undo, type HistoryStep, type PlotHistory } from '@/plots/model/history'
import { PlotCommandError } from '@/plots/model/plot-command-error'
import { rebase, type RebaseOutcome } from '@/plots/model/rebase'
import type { PlotServer } from './plot-server'
import type { UnsentStore } from './unsent-store'

/** Commands sent in one request at most; the contract's own limit. */
const BATCH = 100
const RETRY_MS = [1_000, 2_000, 5_000, 10_000, 30_000] as const

/** Something of ours that did not come out as it was made, to be told. `pieces`: as they were, to name them by. */
export type PlotNews =
  | {
      readonly kind: 'outcome'
      readonly outcome: RebaseOutcome
      readonly by: readonly string[]
      readonly pieces: readonly Piece[]
    }
  | {
      readonly kind: 'refused'
      readonly command: PlotCommand
      readonly message: string
      readonly pieces: readonly Piece[]
    }
  | { readonly kind: 'recovered'; readonly count: number }
  | { readonly kind: 'not kept' }

export interface PlotSessionState {
  /** The server's document with our unsent commands on top: what is drawn. */
  readonly document: PlotDocument
  readonly unsentCount: number
  /** `kept`: not with the server, kept on this device, tried again by itself. */
  readonly saving: 'saved' | 'saving' | 'kept'
  /** Why it is not saved, in the server's or the connection's words. */
  readonly problem: string | null
  readonly canUndo: boolean
  readonly canRedo: boolean
  readonly news: readonly PlotNews[]
}

export interface PlotSession {
  subscribe(listener: () => void): () => void
  read(): PlotSessionState
  /** One step: applied at once, kept, and sent. Returns why it was refused, or null. */
  act(actions: readonly PlotAction[]): PlotCommandError | null
  undo(): boolean
  redo(): boolean
  /** Brings in what others did; called when the server says that something changed. */
  catchUp(): Promise<void>
  /** Takes over what closed pages left, then keeps sending. */
  start(): Promise<void>
  retryNow(): void
  dismissNews(): void
  stop(): void
}

export function createPlotSession(input: {
  readonly initial: PlotAnswer
  readonly server: PlotServer
  readonly store: UnsentStore
  readonly newId: () => string
  /** Timers, so that a test can hold them. */
  readonly later?: (run: () => void, ms: number) => () => void
}): PlotSession {
  const { server, store, newId } = input
  const later = input.later ?? laterByTimer
  let base: { sequence: number; document: PlotDocument } = input.initial
  let unsent: readonly PlotCommand[] = []
  let history: PlotHistory = emptyHistory
  let news: readonly PlotNews[] = []
  let document = base.document
  let saving: PlotSessionState['saving'] = 'saved'
  let problem: string | null = null
  let failures = 0
  let batchSize = BATCH
  let cancelRetry: () => void = () => undefined
  let queue: Promise<void> = Promise.resolve()
  let pumping = false
  let stopped = false
  const listeners = new Set<() => void>()
  let state = snapshot()

  function snapshot(): PlotSessionState {
    return {
      document,
      unsentCount: unsent.length,
      saving,
      problem,
      canUndo: history.undo.length > 0,
      canRedo: history.redo.length > 0,
      news,
    }
  }

  function changed() {
    state = snapshot()
    for (const listener of listeners) listener()
  }

  function keep() {
    const kept = store.keep({ baseSequence: base.sequence, commands: unsent })
    if (!kept && !news.some((item) => item.kind === 'not kept')) news = [...news, { kind: 'not kept' }]
  }

  /** One at a time: two answers of the server must not both move the base. */
  function inTurn(work: () => Promise<void>): Promise<void> {
    queue = queue.then(work, work)
    return queue
  }

  function tell(outcomes: readonly RebaseOutcome[], by: readonly string[], before: PlotDocument) {
    const told = outcomes.filter((outcome) => outcome.became !== 'kept' && outcome.became !== 'arrived')
    news = [
      ...news,
      ...told.map((outcome): PlotNews => ({ kind: 'outcome', outcome, by, pieces: named(outcome.command, before) })),
    ]
  }

  function takeRemote(sequence: number, missed: readonly MissedCommand[]) {
    const next = rebase(
      base.document,
      missed.map((entry) => entry.command),
      unsent,
    )
    const ours = new Set(unsent.map((command) => command.clientId))
    const others = missed.filter((entry) => !ours.has(entry.command.clientId))
    tell(next.outcomes, [...new Set(others.map((entry) => entry.by))], document)
    base = { sequence, document: missed.reduce((at, entry) => apply(at, entry.command), base.document) }
    unsent = next.commands
    document = next.document
  }

  /** Too far behind to be told command by command: the whole document, and ours on top. */
  async function takeWhole(arrived: readonly string[]) {
    const whole = await server.read()
    const next = rebase(
      whole.document,
      [],
      unsent.filter((command) => !arrived.includes(command.clientId)),
    )
    tell(next.outcomes, [], document)
    base = whole
    unsent = next.commands
    document = next.document
  }

  async function bringIn() {
    const { sequence, missed } = await server.missed(base.sequence)
    if (missed === null) await takeWhole([])
    else if (sequence > base.sequence) takeRemote(sequence, missed)
    keep()
    changed()
  }

  async function sendOne() {
    const batch = unsent.slice(0, batchSize)
    try {
      const { sequence } = await server.append(base.sequence, batch)
      // Acknowledged again after a lost answer: others may have come between, so the log is read.
      if (sequence !== base.sequence + batch.length) return await bringIn()
      base = { sequence, document: batch.reduce<PlotDocument>((at, command) => apply(at, command), base.document) }
      unsent = unsent.slice(batch.length)
    } catch (error) {
      if (!(error instanceof AppError)) throw error
      if (error.code === 'stale') await takeStale(error)
      else if (error.code === 'too-large' && batch.length > 1) batchSize = Math.ceil(batch.length / 2)
      else if (error.code === 'invalid' || error.code === 'too-large') dropRefused(error, batch)
      else throw error
    }
  }

  async function takeStale(error: AppError) {
    const details = missedCommandsSchema.safeParse(error.details)
    const arrived = z.array(z.string()).catch([]).parse(error.details?.['arrived'])
    if (details.success && details.data.missed) takeRemote(details.data.sequence, details.data.missed)
    else await takeWhole(arrived)
  }

  function dropRefused(error: AppError, batch: readonly PlotCommand[]) {
    const fields = z.record(z.string(), z.string()).catch({}).parse(error.details?.['fields'])
    const [field, message] = Object.entries(fields)[0] ?? []
    const index = Number(field?.match(/^commands\.(\d+)/)?.[1] ?? 0)
    const command = batch[index] ?? batch[0]
    if (!command) return
    const rest = unsent.filter((other) => other.clientId !== command.clientId)
    const next = rebase(base.document, [], rest)
    news = [...news, { kind: 'refused', command, message: message ?? error.message, pieces: named(command, document) }]
    tell(next.outcomes, [], document)
    unsent = next.commands
    document = next.document
  }

  async function pump() {
    if (pumping) return
    pumping = true
    cancelRetry()
    try {
      while (unsent.length > 0 && !stopped) {
        saving = 'saving'
        changed()
        await sendOne()
        failures = 0
        keep()
      }
      saving = 'saved'
      problem = null
    } catch (error) {
      // Whatever it was, the commands are still kept here and are sent again; the server knows them by their ids.
      saving = 'kept'
      problem = error instanceof AppError ? error.message : 'The server’s answer could not be read.'
      const wait = RETRY_MS[Math.min(failures, RETRY_MS.length - 1)] ?? 30_000
      failures += 1
      cancelRetry = later(send, wait)
    } finally {
      pumping = false
      changed()
    }
  }

  function send() {
    if (!stopped) void inTurn(pump)
  }

  async function takeOver() {
    const { left, clear } = await store.takeOver()
    for (const { baseSequence, commands } of left) {
      const { missed } = await server.missed(baseSequence)
      const arrived = new Set(missed?.map((entry) => entry.command.clientId))
      const waiting = commands.filter((command) => !arrived.has(command.clientId))
      if (waiting.length === 0) continue
      const next = rebase(document, [], waiting)
      unsent = [...unsent, ...next.commands]
      news = [...news, { kind: 'recovered', count: waiting.length }]
      tell(next.outcomes, [], document)
      document = next.document
    }
    keep()
    clear()
    changed()
  }

  function push(actions: readonly PlotAction[]) {
    unsent = [...unsent, ...actions.map((action): PlotCommand => ({ ...action, clientId: newId() }))]
    document = actions.reduce((at, action) => apply(at, action), document)
    if (saving === 'saved') saving = 'saving'
    keep()
    changed()
    send()
  }

  function step(next: HistoryStep | null): boolean {
    if (!next) return false
    history = next.history
    push(next.actions)
    return true
  }

  return {
    subscribe(listener) {
      listeners.add(listener)
      return () => void listeners.delete(listener)
    },
    read: () => state,
    act(actions) {
      try {
        actions.reduce((at, action) => apply(at, action), document)
      } catch (error) {
        if (error instanceof PlotCommandError) return error
        throw error
      }
      history = record(history, document, actions)
      push(actions)
      return null
    },
    undo: () => step(undo(history, document)),
    redo: () => step(redo(history, document)),
    catchUp: () => inTurn(bringIn),
    async start() {
      stopped = false
      try {
        await inTurn(takeOver)
        send()
      } catch (error) {
        // Nothing was cleared: what closed pages left is still on the device, and is asked for again.
        problem = error instanceof AppError ? error.message : 'The server’s answer could not be read.'
        changed()
        cancelRetry = later(() => void this.start(), RETRY_MS[2])
      }
    },
    retryNow: send,
    dismissNews() {
      news = []
      changed()
    },
    stop() {
      stopped = true
      cancelRetry()
    },
  }
}

function named(command: PlotCommand, { pieces }: PlotDocument): Piece[] {
  if (command.type === 'place') return [...command.pieces]
  return piecesOf(command).flatMap((pieceId) => pieces[pieceId] ?? [])
}

function laterByTimer(run: () => void, ms: number): () => void {
  const timer = setTimeout(run, ms)
  return () => clearTimeout(timer)
}
