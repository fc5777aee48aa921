import type { Db } from '@/db/client'
import { insertMail, insertMailAttachment } from '@/db/queries/mail'
import { enqueue } from '@/lib/server/jobs/enqueue'

export type OutgoingMail = {
  partyId: string | null
  kind: 'sign-in' | 'reset' | 'invitation' | 'pack' | 'fresh-link'
  to: { address: string; name: string }
  subject: string
  /** Both parts may hold link places made by `linkPlace`; the secret is filled in when the mail goes out. */
  text: string
  html: string
  attachments?: { blobId: string; name: string }[]
  /** Seconds to hold it back; until then it can be stopped. */
  holdSeconds?: number
  /** A pack's mail is not queued until its PDF is attached: `make-pack-pdf`, told the mail's id, queues it then. */
  awaitsPdf?: boolean
}

/** Writes a mail into the outbox and its job into the queue, in the caller's transaction. Returns the mail's id. */
export async function queueMail(tx: Db, outgoing: OutgoingMail): Promise<string> {
  const sendAfter = new Date(Date.now() + (outgoing.holdSeconds ?? 0) * 1000)
  const mailId = await insertMail(tx, {
    partyId: outgoing.partyId,
    kind: outgoing.kind,
    toAddress: outgoing.to.address,
    toName: outgoing.to.name,
    subject: outgoing.subject.replace(/[\r\n]+/g, ' '),
    textBody: outgoing.text,
    htmlBody: outgoing.html,
    sendAfter,
  })
  for (const attachment of outgoing.attachments ?? []) {
    if (!outgoing.partyId) throw new Error('only a party’s mail carries files')
    await insertMailAttachment(tx, { partyId: outgoing.partyId, mailId, ...attachment })
  }
  if (!outgoing.awaitsPdf) await enqueueMail(tx, { id: mailId, sendAfter })
  return mailId
}

/** Queues a mail of the outbox for when it may go, and not before. Queued again, it is still one job. */
export async function enqueueMail(tx: Db, mail: { id: string; sendAfter: Date }): Promise<void> {
  await enqueue(tx, 'send-mail', { mailId: mail.id }, { runAt: mail.sendAfter, key: `mail:${mail.id}` })
}
