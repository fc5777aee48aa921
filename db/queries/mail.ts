import { and, asc, eq, isNull, sql } from 'drizzle-orm'
import { randomUUID } from 'node:crypto'
import type { Db, Scope } from '@/db/client'
import { blob } from '@/db/schema/file'
import { mail, mailAttachment, mailEvent } from '@/db/schema/mail'

type NewMail = Omit<typeof mail.$inferInsert, 'id' | 'idempotencyKey'>

export async function insertMail(db: Db, row: NewMail): Promise<string> {
  const id = randomUUID()
  await db.insert(mail).values({ ...row, id, idempotencyKey: `mail-${id}` })
  return id
}

export async function insertMailAttachment(
  db: Db,
  row: { partyId: string; mailId: string; blobId: string; name: string },
): Promise<void> {
  await db.insert(mailAttachment).values(row)
}

/** Locks the row for the one job that sends it; mail stands above parties because sign-in mail belongs to none. */
export async function lockMail(db: Db, mailId: string) {
  const rows = await db
    .select({
      id: mail.id,
      partyId: mail.partyId,
      kind: mail.kind,
      toAddress: mail.toAddress,
      toName: mail.toName,
      subject: mail.subject,
      textBody: mail.textBody,
      htmlBody: mail.htmlBody,
      idempotencyKey: mail.idempotencyKey,
      sendAfter: mail.sendAfter,
      firstTriedAt: mail.firstTriedAt,
      attempts: mail.attempts,
      sentAt: mail.sentAt,
      cancelledAt: mail.cancelledAt,
      failedAt: mail.failedAt,
    })
    .from(mail)
    .where(eq(mail.id, mailId))
    .for('update')
    .limit(1)
  return rows[0]
}

export async function listMailAttachments(db: Db, scope: Scope, mailId: string) {
  return db
    .select({ name: mailAttachment.name, sha256: blob.sha256, contentType: blob.contentType })
    .from(mailAttachment)
    .innerJoin(blob, and(eq(blob.partyId, mailAttachment.partyId), eq(blob.id, mailAttachment.blobId)))
    .where(and(eq(mailAttachment.partyId, scope.partyId), eq(mailAttachment.mailId, mailId)))
    .orderBy(asc(mailAttachment.name), asc(mailAttachment.id))
    .limit(20)
}

/** Written before the call goes out: whatever happens then, the row says that it was tried and when first. */
export async function markMailTried(db: Db, mailId: string): Promise<void> {
  await db
    .update(mail)
    .set({ attempts: sql`${mail.attempts} + 1`, firstTriedAt: sql`coalesce(${mail.firstTriedAt}, now())` })
    .where(eq(mail.id, mailId))
}

export async function markMailSent(db: Db, mailId: string, providerId: string): Promise<void> {
  await db
    .update(mail)
    .set({ sentAt: sql`coalesce(${mail.sentAt}, now())`, providerId, failure: null, failedAt: null })
    .where(eq(mail.id, mailId))
}

export async function markMailFailed(db: Db, mailId: string, failure: string): Promise<void> {
  await db.update(mail).set({ failedAt: sql`now()`, failure }).where(and(eq(mail.id, mailId), isNull(mail.sentAt)))
}

/** Stops a mail that is still held back; false when it was too late. */
export async function cancelHeldMail(db: Db, scope: Scope, mailId: string): Promise<boolean> {
  const rows = await db
    .update(mail)
    .set({ cancelledAt: sql`now()` })
    .where(
      and(
        eq(mail.partyId, scope.partyId),
        eq(mail.id, mailId),
        isNull(mail.cancelledAt),
        isNull(mail.firstTriedAt),
        isNull(mail.failedAt),
      ),
    )
    .returning({ id: mail.id })
  return rows.length === 1
}

export async function findMailByProviderId(db: Db, providerId: string) {
  const rows = await db
    .select({ id: mail.id, partyId: mail.partyId, kind: mail.kind })
    .from(mail)
    .where(eq(mail.providerId, providerId))
    .limit(1)
  return rows[0]
}

/** Keeps a webhook event once; false when it was here before. */
export async function insertMailEvent(db: Db, row: typeof mailEvent.$inferInsert): Promise<boolean> {
  const rows = await db
    .insert(mailEvent)
    .values(row)
    .onConflictDoNothing({ target: mailEvent.eventId })
    .returning({ id: mailEvent.id })
  return rows.length === 1
}

export async function findMailState(db: Db, scope: Scope, mailId: string) {
  const rows = await db
    .select({ sentAt: mail.sentAt, cancelledAt: mail.cancelledAt, failedAt: mail.failedAt })
    .from(mail)
    .where(and(eq(mail.partyId, scope.partyId), eq(mail.id, mailId)))
    .limit(1)
  return rows[0]
}

/** A mail by our own id, as the tag that went out with it says. Mail stands above parties because sign-in mail belongs to none. */
export async function findMail(db: Db, mailId: string) {
  const rows = await db
    .select({ id: mail.id, partyId: mail.partyId })
    .from(mail)
    .where(eq(mail.id, mailId))
    .limit(1)
  return rows[0]
}
