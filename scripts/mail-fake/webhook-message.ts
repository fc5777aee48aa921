import { createHmac } from 'node:crypto'
import type { MailEvent, StoredMail } from './stored-mail'

/** The body of the webhook that tells of a mail's fate. */
export function webhookBody(mail: StoredMail, event: MailEvent): string {
  const data = {
    created_at: mail.createdAt,
    email_id: mail.id,
    message_id: mail.messageId,
    from: mail.from,
    to: mail.to,
    subject: mail.subject,
    ...(mail.tags.length > 0 && { tags: Object.fromEntries(mail.tags.map(({ name, value }) => [name, value])) }),
    ...(event.type === 'email.bounced' && {
      bounce: { message: "The recipient's mail server does not know this address.", type: 'Permanent', subType: 'General' },
    }),
  }
  return JSON.stringify({ type: event.type, created_at: event.at, data })
}

/**
 * The headers that prove a webhook came from the holder of the secret: HMAC-SHA256 over id, time and body (standardwebhooks.com, symmetric "v1").
 * @param secret `whsec_` and the key in base64
 */
export function signedHeaders({ secret, id, at, body }: { secret: string; id: string; at: Date; body: string }): Record<string, string> {
  const timestamp = String(Math.floor(at.getTime() / 1000))
  const key = Buffer.from(secret.replace(/^whsec_/, ''), 'base64')
  const signature = createHmac('sha256', key).update(`${id}.${timestamp}.${body}`).digest('base64')
  return { 'svix-id': id, 'svix-timestamp': timestamp, 'svix-signature': `v1,${signature}` }
}
