import { mkdirSync, readFileSync, readdirSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import type { StoredMail } from './stored-mail'
import { addressOf } from './stored-mail'

/** The provider forgets an idempotency key after a day. */
const KEY_LIFE_MS = 24 * 60 * 60 * 1000

export interface MailFilter {
  to?: string
  subject?: string
}

/** Mails as files in one folder, a JSON file each and its attachments beside it: they outlive the server. */
export class MailStore {
  readonly #folder: string
  /** Oldest first. */
  readonly #mails: StoredMail[]

  constructor(folder: string) {
    this.#folder = folder
    mkdirSync(folder, { recursive: true })
    this.#mails = readdirSync(folder)
      .filter((name) => name.endsWith('.json'))
      .map((name) => JSON.parse(readFileSync(join(folder, name), 'utf8')) as StoredMail)
      .sort((a, b) => a.createdAt.localeCompare(b.createdAt))
  }

  #attachmentFile(id: string, index: number): string {
    return join(this.#folder, `${id}.${index}`)
  }

  #write(mail: StoredMail): void {
    const file = join(this.#folder, `${mail.id}.json`)
    writeFileSync(`${file}.new`, JSON.stringify(mail, null, 1))
    renameSync(`${file}.new`, file)
  }

  add(mail: StoredMail, attachments: Uint8Array[]): void {
    for (const [index, bytes] of attachments.entries()) writeFileSync(this.#attachmentFile(mail.id, index), bytes)
    this.#write(mail)
    this.#mails.push(mail)
  }

  /** Keeps what has changed about a mail; does nothing for one that has been thrown away meanwhile. */
  save(mail: StoredMail): void {
    if (this.#mails.includes(mail)) this.#write(mail)
  }

  get(id: string): StoredMail | undefined {
    return this.#mails.find((mail) => mail.id === id)
  }

  /** Newest first. */
  list({ to, subject }: MailFilter = {}): StoredMail[] {
    return this.#mails
      .filter(
        (mail) =>
          (to === undefined || [...mail.to, ...mail.cc, ...mail.bcc].some((mailbox) => addressOf(mailbox) === to.toLowerCase())) &&
          (subject === undefined || mail.subject.includes(subject)),
      )
      .reverse()
  }

  attachment(mail: StoredMail, index: number): Buffer | null {
    return index in mail.attachments ? readFileSync(this.#attachmentFile(mail.id, index)) : null
  }

  byIdempotencyKey(key: string, now: Date): StoredMail | undefined {
    return this.#mails.find((mail) => mail.idempotency?.key === key && now.getTime() - Date.parse(mail.createdAt) < KEY_LIFE_MS)
  }

  clear(): void {
    for (const mail of this.#mails.splice(0)) {
      for (const index of mail.attachments.keys()) rmSync(this.#attachmentFile(mail.id, index), { force: true })
      rmSync(join(this.#folder, `${mail.id}.json`), { force: true })
    }
  }
}
