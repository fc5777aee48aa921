import { newId } from '@/lib/client/bench/new-id'
import { listenLive } from '@/lib/client/live-events'
import { plainCall } from '@/lib/client/plain-call'
import type { AnswerContent } from '@/lib/advance/answer'
import type { Reply, ReplyAnswered, ReplyEvent, ReplyLine } from '@/lib/contracts/answer'
import type { AppError } from '@/lib/errors'
import type { ReplyStorage } from './reply-queue'
import { createReplyQueue } from './reply-queue'

export interface ReplyState {
  readonly reply: Reply
  /** What the server does not have yet, oldest first. */
  readonly waiting: readonly ReplyEvent[]
  /** Why the last answer to a line was not taken, by line id; "" speaks of the whole. */
  readonly refusals: Readonly<Record<string, string>>
  /** False when this device keeps nothing past this page. */
  readonly keeps: boolean
  /** The link was withdrawn or has run out while the page was open. */
  readonly ended: string | null
}

export interface ReplySession {
  state(): ReplyState
  subscribe(changed: () => void): () => void
  answer(line: ReplyLine, said: { content: AnswerContent; remark: string; byName: string }): void
  close(byName: string): void
  start(): () => void
}

const retryMs = 15_000

/** One open reply page: what the server told, what waits on this device, and the way to answer. */
export function createReplySession(input: { initial: Reply; token: string; storage: ReplyStorage | null }): ReplySession {
  const base = `/api/r/${input.token}`
  const listeners = new Set<() => void>()
  let state: ReplyState = { reply: input.initial, waiting: [], refusals: {}, keeps: true, ended: null }
  const set = (more: Partial<ReplyState>) => {
    state = { ...state, ...more }
    listeners.forEach((listener) => listener())
  }
  const queue = createReplyQueue<ReplyAnswered>({
    storage: input.storage,
    place: input.token.slice(0, 16),
    send: (event) => plainCall(`${base}/answers`, event),
    answered: (event, { line, closed }) => {
      set({ reply: { ...withLine(state.reply, line), closed }, refusals: without(state.refusals, lineOf(event)) })
    },
    refused: (event, error) => {
      set({ reply: withLine(state.reply, lineIn(error)), refusals: { ...state.refusals, [lineOf(event)]: error.message } })
      if (error.code === 'gone') set({ ended: error.message })
    },
    changed: () => set({ waiting: queue.waiting() }),
  })
  const add = (event: ReplyEvent) => {
    set({ refusals: without(state.refusals, lineOf(event)) })
    if (!queue.add(event)) set({ keeps: false })
  }
  const readAgain = async () => {
    try {
      set({ reply: await plainCall<Reply>(base) })
    } catch (error) {
      const told = error as AppError
      if (told.code === 'gone') set({ ended: told.message })
    }
  }
  return {
    state: () => state,
    subscribe(changed) {
      listeners.add(changed)
      return () => listeners.delete(changed)
    },
    answer: (line, said) => add({ kind: 'answer', id: newId(), lineId: line.lineId, lineHash: line.hash, ...said }),
    close: (byName) => add({ kind: 'close', id: newId(), byName }),
    start() {
      set({ waiting: queue.waiting() })
      void queue.flush()
      const again = () => void queue.flush()
      const timer = setInterval(() => {
        if (queue.waiting().length > 0) again()
      }, retryMs)
      window.addEventListener('online', again)
      const stopListening = listenLive(
        `${base}/live`,
        () => {
          again()
          void readAgain()
        },
        () => void readAgain(),
      )
      return () => {
        clearInterval(timer)
        window.removeEventListener('online', again)
        stopListening()
      }
    },
  }
}

function lineOf(event: ReplyEvent): string {
  return event.kind === 'answer' ? event.lineId : ''
}

/** The line as it is now, when a refusal brings it. */
function lineIn(error: AppError): ReplyLine | null {
  return (error.details?.['line'] as ReplyLine | undefined) ?? null
}

function withLine(reply: Reply, line: ReplyLine | null): Reply {
  return line ? { ...reply, lines: reply.lines.map((old) => (old.lineId === line.lineId ? line : old)) } : reply
}

function without(refusals: Readonly<Record<string, string>>, key: string): Record<string, string> {
  return Object.fromEntries(Object.entries(refusals).filter(([other]) => other !== key))
}

/** The lines as this device knows them: what waits to be sent already counts as said here. */
export function linesWithWaiting(reply: Reply, waiting: readonly ReplyEvent[]): (ReplyLine & { unsent: boolean })[] {
  return reply.lines.map((line) => {
    const own = waiting.findLast((event) => event.kind === 'answer' && event.lineId === line.lineId)
    if (own?.kind !== 'answer' || line.state === 'settled') return { ...line, unsent: false }
    const { content, remark, byName } = own
    return { ...line, state: 'answered', answer: { content, remark, byName }, askedAgain: null, changes: [], unsent: true }
  })
}
