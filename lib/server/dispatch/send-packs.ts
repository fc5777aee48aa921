import { db } from '@/db/client'
import type { Db } from '@/db/client'
import { findDispatch, findRecipient, insertDispatch, listAdvanceHires, listAdvanceShows, lockDispatchId } from '@/db/queries/dispatch'
import { findRevision } from '@/db/queries/revision'
import type { Send, SendOutcomes, SendRecipient } from '@/lib/contracts/dispatch'
import { holdBackSeconds } from '@/lib/contracts/dispatch'
import { env } from '@/lib/env'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor, MemberActor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { grantExpiry } from '@/lib/server/grants/grant-expiry'
import { lastDayOfHire } from '@/lib/server/grants/last-day-of-hire'
import { makeGrantToken, openGrant } from '@/lib/server/grants/open-grant'
import { enqueue } from '@/lib/server/jobs/enqueue'
import { notifyLive } from '@/lib/server/live/notify-live'
import { letterHtml, letterText } from '@/lib/server/mail/letter'
import { linkPlace } from '@/lib/server/mail/link-place'
import { queueMail } from '@/lib/server/mail/queue-mail'
import { storePack } from '@/lib/server/packs/store-pack'
import { packLetter } from './pack-letter'

type Revision = { id: string; rigId: string }

/**
 * Sends one revision to several recipients, each in a transaction of its own: what cannot be sent is told for that recipient and
 * does not hold up the others. The same sending again is the same sending.
 */
export async function sendPacks(actor: Actor, input: Send): Promise<SendOutcomes> {
  assertCan(actor, 'advance:send')
  const revision = await findRevision(db(), actor, input.revisionId)
  if (!revision) throw new AppError('not-found', 'There is no such revision in this party. Nothing was sent.')
  const outcomes: SendOutcomes['outcomes'] = []
  for (const recipient of input.recipients) {
    const { dispatchId, contactId } = recipient
    try {
      await db().transaction((tx) => sendOne(tx, actor, revision, recipient, input.holdBack ? holdBackSeconds : 0))
      outcomes.push({ dispatchId, contactId, outcome: 'queued', message: '' })
    } catch (error) {
      if (!(error instanceof AppError) || error.code === 'internal') throw error
      outcomes.push({ dispatchId, contactId, outcome: 'refused', message: error.message })
    }
  }
  return { outcomes }
}

async function sendOne(tx: Db, actor: MemberActor, revision: Revision, recipient: SendRecipient, holdSeconds: number): Promise<void> {
  const { dispatchId, showId, hireId } = recipient
  await lockDispatchId(tx, dispatchId)
  const repeated = await findDispatch(tx, actor, dispatchId)
  if (repeated) return assertSame(repeated, recipient, revision)
  const subject = await readSubject(tx, actor, recipient)
  const contact = await findRecipient(tx, actor, recipient.contactId)
  if (!contact || contact.duties.length === 0 || (contact.venueId ?? contact.supplierId) !== subject.houseId) {
    throw new AppError('not-found', `There is no such contact with a duty at ${subject.houseName}.`)
  }
  const of = showId === null ? { hireId: hireId ?? '' } : { showId }
  const pack = await storePack(tx, actor, { of, revisionId: revision.id, rigId: revision.rigId, contactId: contact.id, locale: contact.locale })
  const expiresAt = grantExpiry({ lastDate: subject.lastDate, zone: subject.zone, now: new Date() })
  const grantId = await openGrant(tx, actor, {
    ...{ purpose: 'reply', showId, hireId, contactId: contact.id },
    ...{ recipientName: contact.name, recipientEmail: contact.email, expiresAt },
  })
  const replyTokenId = await makeGrantToken(tx, actor, grantId, 'dispatch')
  const benchTokenId = showId ? await makeBenchToken(tx, actor, { showId, name: subject.houseName, expiresAt }) : null
  const href = `${new URL('r/', env().APP_URL).href}${linkPlace('grant', replyTokenId)}`
  const { subject: subjectLine, letter } = packLetter(pack.document, contact, href)
  const mailId = await queueMail(tx, {
    ...{ partyId: actor.partyId, kind: 'pack', to: { address: contact.email, name: contact.name } },
    ...{ subject: subjectLine, text: letterText(letter), html: letterHtml(letter) },
    ...{ holdSeconds, awaitsPdf: true },
  })
  const made = await insertDispatch(tx, actor, {
    ...{ id: dispatchId, packId: pack.packId, grantId, contactId: contact.id, mailId, sentBy: actor.personId },
  })
  // Only an id of another party is taken and yet not found above.
  if (!made) throw new AppError('conflict', 'This id is taken. Please send it again with another one.')
  await enqueue(
    tx,
    'make-pack-pdf',
    { packId: pack.packId, partyId: actor.partyId, mailId, replyTokenId, benchTokenId },
    { priority: 2 },
  )
  await audit(tx, actor, 'dispatch.send', { type: 'dispatch', id: dispatchId }, {
    ...{ ...of, contactId: contact.id, revisionId: revision.id, number: pack.revisionNumber, holdSeconds },
  })
  await notifyLive(tx, actor.partyId, [`advance:${subject.id}`, `run:${subject.tourId}`])
}

function assertSame(found: NonNullable<Awaited<ReturnType<typeof findDispatch>>>, recipient: SendRecipient, revision: Revision): void {
  const same =
    found.contactId === recipient.contactId &&
    found.showId === recipient.showId &&
    found.hireId === recipient.hireId &&
    found.revisionId === revision.id
  if (!same) throw new AppError('conflict', 'This id belongs to another sending. Nothing was sent.')
}

/** The show or hire that is written about: whose house it is, and the last day that its link serves. */
async function readSubject(tx: Db, actor: MemberActor, recipient: SendRecipient) {
  if (recipient.showId !== null) {
    const [show] = await listAdvanceShows(tx, actor, { showId: recipient.showId })
    if (!show) throw new AppError('not-found', 'There is no such show in this party.')
    const { id, tourId, zone } = show
    return { id, tourId, zone, houseId: show.venueId, houseName: show.venueName, lastDate: show.date }
  }
  const [hire] = await listAdvanceHires(tx, actor, { hireId: recipient.hireId ?? '' })
  if (!hire) throw new AppError('not-found', 'There is no such hire in this party.')
  const { id, tourId, zone } = hire
  return { id, tourId, zone, houseId: hire.supplierId, houseName: hire.supplierName, lastDate: lastDayOfHire(hire) }
}

/** The key behind the QR code on the sheets: for whoever tunes at that show. */
async function makeBenchToken(tx: Db, actor: MemberActor, show: { showId: string; name: string; expiresAt: Date }): Promise<string> {
  const grantId = await openGrant(tx, actor, {
    ...{ purpose: 'bench', showId: show.showId, hireId: null, contactId: null },
    ...{ recipientName: `Bench at ${show.name}`, recipientEmail: null, expiresAt: show.expiresAt },
  })
  return makeGrantToken(tx, actor, grantId, 'dispatch')
}
