import pg from 'pg'
import { z } from 'zod'
import { env } from '@/lib/env'
import { log } from '@/lib/server/log'
import { liveChannel } from './notify-live'

const messageSchema = z.object({ partyId: z.string(), topics: z.array(z.string()) })
type Listener = (topics: string[]) => void

/**
 * One LISTEN connection a process, fanned out to its open event streams. It holds nothing that another process would
 * miss: after a lost connection every stream is told `resync`, and readers fetch again.
 */
class LiveHub {
  private readonly listeners = new Map<string, Set<Listener>>()
  private connecting: Promise<void> | undefined

  async subscribe(partyId: string, listener: Listener): Promise<() => void> {
    await this.connect()
    const set = this.listeners.get(partyId) ?? new Set()
    set.add(listener)
    this.listeners.set(partyId, set)
    return () => {
      set.delete(listener)
      if (set.size === 0) this.listeners.delete(partyId)
    }
  }

  private connect(): Promise<void> {
    this.connecting ??= this.open().catch((error: unknown) => {
      this.connecting = undefined
      throw error
    })
    return this.connecting
  }

  private async open(): Promise<void> {
    const client = new pg.Client({ connectionString: env().DATABASE_URL, keepAlive: true })
    let lost = false
    const reopen = () => {
      if (lost) return
      lost = true
      this.connecting = undefined
      if (this.listeners.size > 0) void this.recover()
    }
    client.on('error', reopen)
    client.on('end', reopen)
    client.on('notification', (message) => this.deliver(message.payload))
    await client.connect()
    await client.query(`listen ${liveChannel}`)
  }

  private async recover(): Promise<void> {
    for (let wait = 250; ; wait = Math.min(wait * 2, 10_000)) {
      try {
        await this.connect()
        for (const set of this.listeners.values()) for (const listener of set) listener(['resync'])
        return
      } catch (error) {
        log.warn({ error }, 'live connection is down')
        await new Promise((resolve) => setTimeout(resolve, wait))
      }
    }
  }

  private deliver(payload: string | undefined): void {
    const message = messageSchema.safeParse(safeJson(payload))
    if (!message.success) return
    for (const listener of this.listeners.get(message.data.partyId) ?? []) listener(message.data.topics)
  }
}

function safeJson(text: string | undefined): unknown {
  try {
    return JSON.parse(text ?? '')
  } catch {
    return undefined
  }
}

const kept = globalThis as typeof globalThis & { hoopwrightLiveHub?: LiveHub }
kept.hoopwrightLiveHub ??= new LiveHub()
export const liveHub = kept.hoopwrightLiveHub
