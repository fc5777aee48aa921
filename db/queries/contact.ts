import { and, asc, eq, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { dispatch } from '@/db/schema/advance'
import { contact } from '@/db/schema/directory'
import { grant } from '@/db/schema/grant'
import type { ContactInput } from '@/lib/contracts/directory'

const columns = {
  id: contact.id,
  venueId: contact.venueId,
  supplierId: contact.supplierId,
  name: contact.name,
  email: contact.email,
  phone: contact.phone,
  duties: contact.duties,
  version: contact.version,
}

/** Whom a contact belongs to: a venue or a supplier. */
export type ContactOf = { venueId: string } | { supplierId: string }

export async function listContacts(db: Db, scope: Scope, of: ContactOf) {
  return db
    .select(columns)
    .from(contact)
    .where(
      and(
        eq(contact.partyId, scope.partyId),
        'venueId' in of ? eq(contact.venueId, of.venueId) : eq(contact.supplierId, of.supplierId),
      ),
    )
    .orderBy(asc(contact.name), asc(contact.id))
    .limit(500)
}

export async function findContact(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select(columns)
    .from(contact)
    .where(and(eq(contact.partyId, scope.partyId), eq(contact.id, id)))
    .limit(1)
  return rows[0]
}

/** Undefined when the id is taken already. */
export async function insertContact(db: Db, scope: Scope, row: ContactInput & ContactOf & { id?: string | undefined }) {
  const rows = await db
    .insert(contact)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: contact.id })
    .returning(columns)
  return rows[0]
}

/** Undefined when the version is no longer the one that was seen. */
export async function updateContact(
  db: Db,
  scope: Scope,
  input: { id: string; version: number; contact: ContactInput },
) {
  const rows = await db
    .update(contact)
    .set({ ...input.contact, version: sql`${contact.version} + 1` })
    .where(and(eq(contact.partyId, scope.partyId), eq(contact.id, input.id), eq(contact.version, input.version)))
    .returning(columns)
  return rows[0]
}

/** False when the version is no longer the one that was seen. */
export async function deleteContact(db: Db, scope: Scope, input: { id: string; version: number }): Promise<boolean> {
  const rows = await db
    .delete(contact)
    .where(and(eq(contact.partyId, scope.partyId), eq(contact.id, input.id), eq(contact.version, input.version)))
    .returning({ id: contact.id })
  return rows.length > 0
}

/** Whether a mail went to the contact, or to anybody of a house, or a link was made for them. */
export async function wasWrittenTo(db: Db, scope: Scope, who: { contactId: string } | ContactOf): Promise<boolean> {
  const meant =
    'contactId' in who
      ? eq(contact.id, who.contactId)
      : 'venueId' in who
        ? eq(contact.venueId, who.venueId)
        : eq(contact.supplierId, who.supplierId)
  const grants = await db
    .select({ id: grant.id })
    .from(grant)
    .innerJoin(contact, and(eq(contact.partyId, grant.partyId), eq(contact.id, grant.contactId)))
    .where(and(eq(grant.partyId, scope.partyId), meant))
    .limit(1)
  if (grants.length > 0) return true
  const sent = await db
    .select({ id: dispatch.id })
    .from(dispatch)
    .innerJoin(contact, and(eq(contact.partyId, dispatch.partyId), eq(contact.id, dispatch.contactId)))
    .where(and(eq(dispatch.partyId, scope.partyId), meant))
    .limit(1)
  return sent.length > 0
}
