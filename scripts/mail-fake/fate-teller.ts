import { randomUUID } from 'node:crypto'
import type { MailStore } from './mail-store'
import type { Fate, MailEvent, StoredMail } from './stored-mail'
import { addressOf } from './stored-mail'
import { signedHeaders, webhookBody } from './webhook-message'

const ANSWER_WITHIN_MS = 10_000

export interface WebhookTarget {
  url: string
  secret: string
  /** How long after its acceptance a mail is said to have arrived. */
  delayMs: number
  /** How long after each failure the webhook is tried again; after the last it is given up. */
  retryDelaysMs: readonly number[]
}

/** Tells the app by webhook what became of its mails, and tries again until the app takes it. */
export class FateTeller {
  readonly #timers = new Set<NodeJS.Timeout>()
  readonly #underway = new Set<Promise<void>>()
  readonly #closing = new AbortController()

  constructor(
    private readonly store: MailStore,
    private readonly target: WebhookTarget,
  ) {}

  /** What becomes of a mail by itself: addresses with "bounce" before the @ do not exist, all others do. */
  fateOf(mail: StoredMail): Fate {
    return mail.to.some((mailbox) => addressOf(mailbox).split('@')[0]?.includes('bounce')) ? 'email.bounced' : 'email.delivered'
  }

  newEvent(type: Fate, at: Date): MailEvent {
    return { id: `msg_${randomUUID().replaceAll('-', '')}`, type, at: at.toISOString(), webhook: 'waiting', answer: null }
  }

  /** Tells of an event of a mail after a while. */
  schedule(mail: StoredMail, event: MailEvent, delayMs = this.target.delayMs): void {
    this.#later(delayMs, () => this.#tell(mail, event, 0))
  }

  /** Takes up again what an earlier server did not get across. */
  resume(): void {
    for (const mail of this.store.list()) {
      for (const event of mail.events.filter(({ webhook }) => webhook === 'waiting')) this.schedule(mail, event)
    }
  }

  /** Something happened to a mail because the reader of the mailbox page said so; told at once. */
  async happen(mail: StoredMail, type: Fate): Promise<MailEvent> {
    const event = this.newEvent(type, new Date())
    mail.events.push(event)
    this.store.save(mail)
    await this.#tell(mail, event, 0)
    return event
  }

  #later(delayMs: number, work: () => Promise<void>): void {
    if (this.#closing.signal.aborted) return
    const timer = setTimeout(() => {
      this.#timers.delete(timer)
      const done = work().finally(() => this.#underway.delete(done))
      this.#underway.add(done)
    }, delayMs)
    this.#timers.add(timer)
  }

  async #tell(mail: StoredMail, event: MailEvent, attempt: number): Promise<void> {
    const body = webhookBody(mail, event)
    let taken = false
    try {
      const response = await fetch(this.target.url, {
        method: 'POST',
        headers: { 'content-type': 'application/json', ...signedHeaders({ secret: this.target.secret, id: event.id, at: new Date(), body }) },
        body,
        redirect: 'manual',
        signal: AbortSignal.any([AbortSignal.timeout(ANSWER_WITHIN_MS), this.#closing.signal]),
      })
      await response.text()
      taken = response.ok
      event.answer = String(response.status)
    } catch (error) {
      // Broken off by our own closing: the next server takes it up again.
      if (this.#closing.signal.aborted) return
      event.answer = error instanceof Error ? ((error.cause as Error | undefined)?.message ?? error.message) : String(error)
    }
    const pauseMs = this.target.retryDelaysMs[attempt]
    event.webhook = taken ? 'taken' : pauseMs === undefined ? 'given up' : 'waiting'
    this.store.save(mail)
    if (event.webhook === 'waiting' && pauseMs !== undefined) this.#later(pauseMs, () => this.#tell(mail, event, attempt + 1))
  }

  async close(): Promise<void> {
    this.#closing.abort()
    for (const timer of this.#timers) clearTimeout(timer)
    await Promise.all(this.#underway)
  }
}
