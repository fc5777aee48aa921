import { and, desc, eq } from 'drizzle-orm'
import { db } from '@/db/client'
import { mail } from '@/db/schema/mail'
import { fillLinkPlaces } from '@/lib/server/mail/link-place'

/** The latest mail to an address as its reader gets it, its address to press, and what the outbox itself holds. */
export async function latestMailTo(address: string, kind: 'sign-in' | 'reset' | 'invitation') {
  const rows = await db()
    .select({ subject: mail.subject, textBody: mail.textBody, partyId: mail.partyId })
    .from(mail)
    .where(and(eq(mail.toAddress, address), eq(mail.kind, kind)))
    .orderBy(desc(mail.createdAt))
    .limit(1)
  const row = rows[0]
  if (!row) return undefined
  const text = fillLinkPlaces(row.textBody)
  const link = /https?:\/\/\S+/.exec(text)?.[0]
  if (!link) throw new Error('the mail holds no address')
  return { subject: row.subject, partyId: row.partyId, text, stored: row.textBody, link: new URL(link) }
}

export async function countMailTo(address: string): Promise<number> {
  return (await db().select({ id: mail.id }).from(mail).where(eq(mail.toAddress, address))).length
}
