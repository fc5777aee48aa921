export const FATES = ['email.delivered', 'email.bounced', 'email.complained'] as const

/** What becomes of a mail after it was accepted; the app hears of it by webhook. */
export type Fate = (typeof FATES)[number]

export interface MailEvent {
  /** Of the webhook message: the same each time it is tried again. */
  id: string
  type: Fate
  at: string
  /** Whether the app has taken the webhook. */
  webhook: 'waiting' | 'taken' | 'given up'
  /** What the app answered last. */
  answer: string | null
}

export interface StoredAttachment {
  filename: string
  contentType: string
  contentId: string | null
  sizeBytes: number
}

export interface StoredMail {
  id: string
  messageId: string
  createdAt: string
  from: string
  to: string[]
  cc: string[]
  bcc: string[]
  replyTo: string[]
  subject: string
  html: string | null
  text: string | null
  headers: Record<string, string>
  tags: { name: string; value: string }[]
  attachments: StoredAttachment[]
  idempotency: { key: string; bodyHash: string } | null
  events: MailEvent[]
}

/** The bare address of `Name <address>`, in lower case. */
export function addressOf(mailbox: string): string {
  return (/<([^<>]+)>\s*$/.exec(mailbox)?.[1] ?? mailbox).trim().toLowerCase()
}

/** The last thing known of a mail, as the provider's API words it. */
export function lastEventOf(mail: StoredMail): string {
  return mail.events.at(-1)?.type.replace('email.', '') ?? 'sent'
}
