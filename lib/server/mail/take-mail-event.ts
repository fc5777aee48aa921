import { z } from 'zod'
import { db } from '@/db/client'
import { findMail, findMailByProviderId, insertMailEvent } from '@/db/queries/mail'
import { env } from '@/lib/env'
import { AppError } from '@/lib/errors'
import { mailService, mailTag } from './mail-service'
import { notifyMailChanged } from './notify-mail-changed'

/** What the mail service tells that we keep; everything else it can tell is taken and let go. */
const kinds = {
  'email.delivered': 'delivered',
  'email.delivery_delayed': 'delayed',
  'email.bounced': 'bounced',
  'email.complained': 'complained',
  'email.failed': 'failed',
} as const

const eventSchema = z.object({
  type: z.string().min(1),
  created_at: z.coerce.date(),
  data: z.object({
    email_id: z.string().min(1).optional(),
    tags: z.record(z.string(), z.string()).optional(),
    bounce: z.object({ message: z.string().optional(), type: z.string().optional(), subType: z.string().optional() }).optional(),
    failed: z.object({ reason: z.string().optional() }).optional(),
  }),
})
type MailServiceEvent = z.infer<typeof eventSchema>

export type SignedMessage = { body: string; id: string | null; timestamp: string | null; signature: string | null }

/**
 * Takes a webhook of the mail service. A forged, altered or old one is refused; one that was taken before is taken again without
 * effect; one about a mail that is not ours, or of a kind that we do not keep, is taken and let go, so that it is not sent for ever.
 */
export async function takeMailEvent(message: SignedMessage): Promise<{ taken: boolean }> {
  const event = verify(message)
  const kind = Object.entries(kinds).find(([type]) => type === event.type)?.[1]
  if (!kind) return { taken: false }
  return db().transaction(async (tx) => {
    const tagged = z.uuid().safeParse(event.data.tags?.[mailTag])
    const mail = tagged.success
      ? await findMail(tx, tagged.data)
      : event.data.email_id
        ? await findMailByProviderId(tx, event.data.email_id)
        : undefined
    if (!mail) return { taken: false }
    const { bounce, failed } = event.data
    const taken = await insertMailEvent(tx, {
      ...{ eventId: message.id ?? '', mailId: mail.id, kind, at: event.created_at },
      detail: { ...(bounce ? { bounce } : {}), ...(failed ? { failed } : {}) },
    })
    if (taken) await notifyMailChanged(tx, mail)
    return { taken }
  })
}

function verify({ body, id, timestamp, signature }: SignedMessage): MailServiceEvent {
  if (!id || !timestamp || !signature) throw new AppError('signed-out', 'The message is not signed.')
  let payload: unknown
  try {
    payload = mailService().webhooks.verify({ payload: body, headers: { id, timestamp, signature }, webhookSecret: env().RESEND_WEBHOOK_SECRET })
  } catch (cause) {
    // The signature is checked before the body is read: only a signed body can fail to be JSON.
    if (cause instanceof SyntaxError) throw new AppError('invalid', 'The message is not readable JSON.', { cause })
    throw new AppError('signed-out', 'The signature of the message does not hold, or it is too old.', { cause })
  }
  const parsed = eventSchema.safeParse(payload)
  if (!parsed.success) throw new AppError('invalid', 'The message does not have the shape of a mail event.', { cause: parsed.error })
  return parsed.data
}
