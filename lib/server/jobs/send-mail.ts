import { db } from '@/db/client'
import { listMailAttachments, lockMail, markMailFailed, markMailSent, markMailTried } from '@/db/queries/mail'
import { env } from '@/lib/env'
import { log } from '@/lib/server/log'
import { fillLinkPlaces } from '@/lib/server/mail/link-place'
import { mailService, mailTag } from '@/lib/server/mail/mail-service'
import { notifyMailChanged } from '@/lib/server/mail/notify-mail-changed'
import type { SendError } from '@/lib/server/mail/send-refusal'
import { readRefusal } from '@/lib/server/mail/send-refusal'
import { blobStore } from '@/lib/server/storage/blob-store'

/**
 * The provider remembers an idempotency key for 24 h (published: its API reference, "Idempotency keys"). A mail still in
 * doubt near that age could go out twice if tried again, so a person decides.
 */
const keyMemoryMs = 23 * 60 * 60 * 1000
/** The SDK itself waits for ever. */
const answerWithinMs = 60_000

type Claimed = NonNullable<Awaited<ReturnType<typeof claim>>>

/** Sends one mail of the outbox. Throws to be tried again later, returns when there is nothing more to try. */
export async function sendMail(payload: { mailId: string }): Promise<void> {
  const mail = await claim(payload.mailId)
  if (!mail) return
  const answer = await mailService().emails.send(
    {
      from: env().MAIL_FROM,
      to: mail.toName ? `"${mail.toName.replace(/["\\\r\n]/g, ' ')}" <${mail.toAddress}>` : mail.toAddress,
      subject: mail.subject,
      text: fillLinkPlaces(mail.textBody),
      html: fillLinkPlaces(mail.htmlBody),
      attachments: mail.attachments,
      tags: [{ name: mailTag, value: mail.id }],
    },
    { idempotencyKey: mail.idempotencyKey, signal: AbortSignal.timeout(answerWithinMs) },
  )
  // An answer of 200 that names no mail proves nothing; the key makes trying again safe.
  const providerId: unknown = answer.data?.id
  if (typeof providerId !== 'string') return refused(mail, answer.error)
  await db().transaction(async (tx) => {
    await markMailSent(tx, mail.id, providerId)
    await notifyMailChanged(tx, mail)
  })
}

/** Takes the mail for one try and says so before the call goes out; undefined when it must not be sent (any more). */
async function claim(mailId: string) {
  const row = await db().transaction(async (tx) => {
    const found = await lockMail(tx, mailId)
    if (!found || found.sentAt || found.cancelledAt || found.failedAt) return undefined
    if (found.firstTriedAt && Date.now() - found.firstTriedAt.getTime() > keyMemoryMs) {
      await markMailFailed(tx, mailId, 'It was tried for a day and we cannot know whether it arrived. Ask the reader, then send it again.')
      await notifyMailChanged(tx, found)
      return undefined
    }
    await markMailTried(tx, mailId)
    await notifyMailChanged(tx, found)
    return found
  })
  if (!row) return undefined
  const files = row.partyId ? await listMailAttachments(db(), { partyId: row.partyId }, row.id) : []
  const attachments = await Promise.all(
    files.map(async (file) => ({
      filename: file.name,
      content: Buffer.from(await blobStore().get(file.sha256)),
      contentType: file.contentType,
    })),
  )
  return { ...row, attachments }
}

async function refused(mail: Claimed, error: SendError): Promise<void> {
  const refusal = readRefusal(error)
  const status = error?.statusCode ?? null
  log.warn({ mailId: mail.id, status, kind: error?.name }, 'the mail service refused')
  if (refusal.passing) throw new Error(`the mail service answered ${status ?? 'nothing'}; trying again later`)
  await db().transaction(async (tx) => {
    await markMailFailed(tx, mail.id, refusal.words)
    await notifyMailChanged(tx, mail)
  })
}
