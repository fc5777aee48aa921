import { db } from '@/db/client'
import type { Db, Scope } from '@/db/client'
import { insertMailAttachment, listMailAttachments, lockMail, markMailFailed } from '@/db/queries/mail'
import { findPack, lockPack, setPackPdf } from '@/db/queries/pack'
import { upgradePackDocument } from '@/lib/advance/pack-document'
import type { PackDocument } from '@/lib/advance/pack-document'
import { env } from '@/lib/env'
import { linkToken } from '@/lib/server/auth/link-token'
import { log } from '@/lib/server/log'
import { notifyLive } from '@/lib/server/live/notify-live'
import { notifyMailChanged } from '@/lib/server/mail/notify-mail-changed'
import { enqueueMail } from '@/lib/server/mail/queue-mail'
import { PackTooLarge, renderInThread } from '@/lib/server/pdf/render-in-thread'
import { packFileName } from '@/lib/server/packs/pack-file-name'
import { keepFile } from '@/lib/server/storage/keep-file'
import type { TaskPayloads } from './task-names'

/** Tries before a mail is given up because its PDF cannot be made. */
const maxTries = 5

class TriedTooOften extends Error {}

type Payload = TaskPayloads['make-pack-pdf']
type Pack = NonNullable<Awaited<ReturnType<typeof findPack>>>

/**
 * Makes the PDF of a pack, keeps its bytes, and lets the mail that waits for it go. Run twice, it makes one PDF and queues
 * one mail. Throws to be tried again later.
 */
export async function makePackPdf(payload: Payload, { attempts }: { attempts: number }): Promise<void> {
  const scope: Scope = { partyId: payload.partyId }
  const pack = await findPack(db(), scope, payload.packId)
  if (!pack) return
  try {
    // The tries before this one ended with their process, so nothing below came to count them.
    if (attempts > maxTries) throw new TriedTooOften()
    const document = upgradePackDocument(pack.document)
    const rendering = pack.pdfBlobId ? null : await renderInThread({ pack: document, links: linksOf(payload) })
    await db().transaction(async (tx) => {
      const blobId = await keepPdf(tx, scope, pack, document, rendering)
      if (payload.mailId) await releaseMail(tx, scope, { mailId: payload.mailId, blobId, name: packFileName(document) })
    })
  } catch (error) {
    if (!(error instanceof PackTooLarge) && attempts < maxTries) throw error
    log.error({ error, packId: pack.id }, 'the PDF of a pack cannot be made')
    if (payload.mailId) await giveUp(payload.mailId)
  }
}

function linksOf({ replyTokenId, benchTokenId }: Payload) {
  const link = (path: 'r' | 'b', tokenId: string | null) =>
    tokenId ? new URL(`${path}/${linkToken('grant', tokenId)}`, env().APP_URL).href : null
  return { reply: link('r', replyTokenId), bench: link('b', benchTokenId) }
}

/** Keeps the PDF unless another run was first; answers the one that stands. */
async function keepPdf(
  tx: Db,
  scope: Scope,
  pack: Pack,
  document: PackDocument,
  rendering: { bytes: Uint8Array; pages: number } | null,
): Promise<string> {
  const locked = await lockPack(tx, scope, pack.id)
  if (locked?.pdfBlobId) return locked.pdfBlobId
  if (!rendering) throw new Error('the PDF of this pack is gone')
  const { blobId } = await keepFile(tx, scope, {
    ...{ bytes: rendering.bytes, contentType: 'application/pdf', name: packFileName(document), audience: 'recipient' },
    subject: { type: 'pack', id: pack.id },
  })
  await setPackPdf(tx, scope, { packId: pack.id, blobId, pages: rendering.pages })
  await notifyLive(tx, scope.partyId, [`advance:${pack.showId ?? pack.hireId ?? pack.id}`, `revision:${pack.rigId}`])
  return blobId
}

/** Attaches the PDF once and queues the mail for when it may go. A mail that was stopped meanwhile stays stopped. */
async function releaseMail(
  tx: Db,
  scope: Scope,
  input: { mailId: string; blobId: string; name: string },
): Promise<void> {
  const mail = await lockMail(tx, input.mailId)
  if (!mail || mail.partyId !== scope.partyId || mail.sentAt || mail.cancelledAt || mail.failedAt) return
  const attached = await listMailAttachments(tx, scope, mail.id)
  if (attached.length === 0) await insertMailAttachment(tx, { ...scope, ...input })
  await enqueueMail(tx, { id: mail.id, sendAfter: mail.sendAfter })
}

async function giveUp(mailId: string): Promise<void> {
  await db().transaction(async (tx) => {
    const mail = await lockMail(tx, mailId)
    if (!mail || mail.sentAt || mail.cancelledAt || mail.failedAt) return
    await markMailFailed(
      tx,
      mailId,
      'Its PDF could not be made, so it was not sent. Issue the revision again or take something out of the kit, then send it again.',
    )
    await notifyMailChanged(tx, mail)
  })
}
