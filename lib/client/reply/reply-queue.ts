import type { ReplyEvent } from '@/lib/contracts/answer'
import { AppError } from '@/lib/errors'

export type ReplyStorage = Pick<Storage, 'getItem' | 'setItem' | 'removeItem' | 'key' | 'length'>

export interface ReplyQueueOptions<Answered> {
  /** The device's storage; null where it has none. */
  storage: ReplyStorage | null
  /** Which link it is for: two links on one phone never mix. */
  place: string
  send: (event: ReplyEvent) => Promise<Answered>
  /** The server has it. */
  answered: (event: ReplyEvent, answer: Answered) => void
  /** The server will never take it; it is dropped. */
  refused: (event: ReplyEvent, error: AppError) => void
  /** What waits has changed. */
  changed: () => void
}

export interface ReplyQueue {
  /** Keeps an answer on the device and sends what waits. False when the device would not keep it past this page. */
  add(event: ReplyEvent): boolean
  /** Sends what waits, oldest first, one after the other; stops at the first that finds no connection. */
  flush(): Promise<void>
  /** What the server does not have yet, oldest first. */
  waiting(): ReplyEvent[]
}

/**
 * Answers on their way from a phone in poor signal. Each lies in the device's storage under its own key until the server has it,
 * and carries its own id, so that one that was sent twice is still one answer.
 */
export function createReplyQueue<Answered>(options: ReplyQueueOptions<Answered>): ReplyQueue {
  const prefix = `hoopwright reply ${options.place} `
  const unkept = new Map<string, ReplyEvent>()
  let last = 0
  let sending: Promise<void> | null = null

  function entries(): [string, ReplyEvent][] {
    const kept = storedKeys(options.storage, prefix).flatMap((key): [string, ReplyEvent][] => {
      const event = readEvent(options.storage?.getItem(key) ?? null)
      return event ? [[key, event]] : []
    })
    return [...kept, ...unkept].sort(([a], [b]) => (a < b ? -1 : 1))
  }

  function drop(key: string): void {
    unkept.delete(key)
    try {
      options.storage?.removeItem(key)
    } catch {
      // Storage that cannot be changed: the answer is sent again, and is one answer for its id.
    }
  }

  async function sendAll(): Promise<void> {
    for (let next = entries()[0]; next; next = entries()[0]) {
      const [key, event] = next
      try {
        const answer = await options.send(event)
        drop(key)
        options.answered(event, answer)
      } catch (error) {
        if (!(error instanceof AppError)) throw error
        if (mayPass(error)) return
        drop(key)
        options.refused(event, error)
      }
      options.changed()
      // Storage that will not let go of what was sent would be sent for ever.
      if (entries().some(([left]) => left === key)) return
    }
  }

  return {
    add(event) {
      last = Math.max(Date.now(), last + 1)
      const key = `${prefix}${String(last).padStart(15, '0')} ${event.id}`
      const kept = store(options.storage, key, event)
      if (!kept) unkept.set(key, event)
      options.changed()
      void this.flush()
      return kept
    },
    flush() {
      sending ??= sendAll().finally(() => {
        sending = null
      })
      return sending
    },
    waiting: () => entries().map(([, event]) => event),
  }
}

/** Whether sending the same again later can succeed. */
function mayPass(error: AppError): boolean {
  return error.code === 'unavailable' || error.code === 'internal' || error.code === 'rate-limited'
}

function store(storage: ReplyStorage | null, key: string, event: ReplyEvent): boolean {
  try {
    storage?.setItem(key, JSON.stringify(event))
    return storage !== null
  } catch {
    // Full or forbidden storage; the page says so.
    return false
  }
}

function storedKeys(storage: ReplyStorage | null, prefix: string): string[] {
  try {
    return Array.from({ length: storage?.length ?? 0 }, (_, index) => storage?.key(index) ?? '').filter((key) => key.startsWith(prefix))
  } catch {
    return []
  }
}

/** What this or an earlier page kept; the server checks every field of it again. */
function readEvent(stored: string | null): ReplyEvent | null {
  try {
    const value: unknown = JSON.parse(stored ?? 'null')
    return typeof value === 'object' && value !== null && 'kind' in value && 'id' in value ? (value as ReplyEvent) : null
  } catch {
    return null
  }
}
