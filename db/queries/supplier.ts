import { and, asc, desc, eq, ilike, inArray, isNull, notExists, or, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { physicalDrum } from '@/db/schema/bench'
import { contact, supplier } from '@/db/schema/directory'
import { hire } from '@/db/schema/hire'
import type { SupplierInput, SupplierListQuery } from '@/lib/contracts/directory'
import { pageSize } from '@/lib/contracts/list'
import { containing } from './containing'

const columns = {
  id: supplier.id,
  name: supplier.name,
  town: supplier.town,
  country: supplier.country,
  zone: supplier.zone,
  currency: supplier.currency,
  remark: supplier.remark,
  version: supplier.version,
}
const sorts = { name: supplier.name, town: supplier.town, country: supplier.country }

export async function listSuppliers(db: Db, scope: Scope, query: SupplierListQuery) {
  const contacts = db
    .select({ supplierId: contact.supplierId, contacts: sql<number>`count(*)::int`.as('contacts') })
    .from(contact)
    .where(eq(contact.partyId, scope.partyId))
    .groupBy(contact.supplierId)
    .as('contacts')
  const hires = db
    .select({ supplierId: hire.supplierId, hires: sql<number>`count(*)::int`.as('hires') })
    .from(hire)
    .where(eq(hire.partyId, scope.partyId))
    .groupBy(hire.supplierId)
    .as('hires')
  const pattern = containing(query.q)
  const filters = {
    all: undefined,
    'no-currency': isNull(supplier.currency),
    'no-contact': isNull(contacts.supplierId),
  }
  const way = query.order === 'up' ? asc : desc
  const rows = await db
    .select({
      ...columns,
      contacts: sql<number>`coalesce(${contacts.contacts}, 0)`,
      hires: sql<number>`coalesce(${hires.hires}, 0)`,
      total: sql<number>`(count(*) over ())::int`,
    })
    .from(supplier)
    .leftJoin(contacts, eq(contacts.supplierId, supplier.id))
    .leftJoin(hires, eq(hires.supplierId, supplier.id))
    .where(
      and(
        eq(supplier.partyId, scope.partyId),
        filters[query.filter],
        query.q
          ? or(ilike(supplier.name, pattern), ilike(supplier.town, pattern), ilike(supplier.country, pattern))
          : undefined,
      ),
    )
    .orderBy(way(sql`lower(${sorts[query.sort]})`), asc(supplier.name), asc(supplier.id))
    .limit(pageSize)
    .offset((query.page - 1) * pageSize)
  return { rows: rows.map(({ total: _total, ...row }) => row), total: rows[0]?.total ?? 0 }
}

/** Every supplier by name, for a choice. */
export async function listSupplierChoices(db: Db, scope: Scope) {
  return db
    .select({ id: supplier.id, name: supplier.name, zone: supplier.zone, currency: supplier.currency })
    .from(supplier)
    .where(eq(supplier.partyId, scope.partyId))
    .orderBy(asc(supplier.name), asc(supplier.id))
    .limit(2000)
}

export async function findSupplier(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select(columns)
    .from(supplier)
    .where(and(eq(supplier.partyId, scope.partyId), eq(supplier.id, id)))
    .limit(1)
  return rows[0]
}

/** Undefined when the id is taken already. */
export async function insertSupplier(db: Db, scope: Scope, row: SupplierInput & { id?: string | undefined }) {
  const rows = await db
    .insert(supplier)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: supplier.id })
    .returning(columns)
  return rows[0]
}

/** Undefined when the version is no longer the one that was seen. */
export async function updateSupplier(
  db: Db,
  scope: Scope,
  input: { id: string; version: number; supplier: SupplierInput },
) {
  const rows = await db
    .update(supplier)
    .set({ ...input.supplier, version: sql`${supplier.version} + 1` })
    .where(and(eq(supplier.partyId, scope.partyId), eq(supplier.id, input.id), eq(supplier.version, input.version)))
    .returning(columns)
  return rows[0]
}

/** False when the version is no longer the one that was seen. */
export async function deleteSupplier(db: Db, scope: Scope, input: { id: string; version: number }): Promise<boolean> {
  const rows = await db
    .delete(supplier)
    .where(and(eq(supplier.partyId, scope.partyId), eq(supplier.id, input.id), eq(supplier.version, input.version)))
    .returning({ id: supplier.id })
  return rows.length > 0
}

/** Whether a hire or a known drum names the supplier. */
export async function supplierIsNamed(db: Db, scope: Scope, supplierId: string): Promise<boolean> {
  const hires = await db
    .select({ id: hire.id })
    .from(hire)
    .where(and(eq(hire.partyId, scope.partyId), eq(hire.supplierId, supplierId)))
    .limit(1)
  if (hires.length > 0) return true
  const drums = await db
    .select({ id: physicalDrum.id })
    .from(physicalDrum)
    .where(and(eq(physicalDrum.partyId, scope.partyId), eq(physicalDrum.supplierId, supplierId)))
    .limit(1)
  return drums.length > 0
}

/** The suppliers of these that have nobody to write to. */
export async function listSuppliersWithoutContact(
  db: Db,
  scope: Scope,
  supplierIds: readonly string[],
): Promise<string[]> {
  if (supplierIds.length === 0) return []
  const rows = await db
    .select({ id: supplier.id })
    .from(supplier)
    .where(
      and(
        eq(supplier.partyId, scope.partyId),
        inArray(supplier.id, [...supplierIds]),
        notExists(
          db
            .select({ id: contact.id })
            .from(contact)
            .where(and(eq(contact.partyId, scope.partyId), eq(contact.supplierId, supplier.id))),
        ),
      ),
    )
    .orderBy(asc(supplier.id))
    .limit(1000)
  return rows.map((row) => row.id)
}
