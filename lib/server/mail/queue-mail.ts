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
  await enqueue(tx, 'send-mail', { mailId }, { runAt: sendAfter, key: `mail:${mailId}` })
  return mailId
}
