import { db } from '@/db/client'
import { listMailAttachments, lockMail, markMailFailed, markMailSent, markMailTried } from '@/db/queries/mail'
import { env } from '@/lib/env'
import { log } from '@/lib/server/log'
import { fillLinkPlaces } from '@/lib/server/mail/link-place'
import { mailService } from '@/lib/server/mail/mail-service'
import { notifyMailChanged } from '@/lib/server/mail/notify-mail-changed'
import { blobStore } from '@/lib/server/storage/blob-store'

/**
 * The provider remembers an idempotency key for 24 h (published: its API reference, "Idempotency keys"). A mail still in
 * doubt near that age could go out twice if tried again, so a person decides.
 */
const keyMemoryMs = 23 * 60 * 60 * 1000

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
    },
    { idempotencyKey: mail.idempotencyKey },
  )
  if (answer.data) {
    const providerId = answer.data.id
    await db().transaction(async (tx) => {
      await markMailSent(tx, mail.id, providerId)
      await notifyMailChanged(tx, mail)
    })
    return
  }
  await refused(mail, answer.error)
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

type Refusal = { name: string; message: string; statusCode?: number | null } | null

async function refused(mail: Claimed, error: Refusal): Promise<void> {
  const status = error?.statusCode ?? null
  const passing = status === null || status === 408 || status === 409 || status === 429 || status >= 500
  log.warn({ mailId: mail.id, status, kind: error?.name }, 'the mail service refused')
  if (passing) throw new Error(`the mail service answered ${status ?? 'nothing'}; trying again later`)
  await db().transaction(async (tx) => {
    await markMailFailed(tx, mail.id, `The mail service refused it: ${error?.message ?? 'no reason given'}`)
    await notifyMailChanged(tx, mail)
  })
}
