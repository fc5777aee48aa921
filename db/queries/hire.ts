import { and, asc, eq, exists, inArray, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { answerEvent, pack } from '@/db/schema/advance'
import { supplier } from '@/db/schema/directory'
import { grant } from '@/db/schema/grant'
import { hire, hireShow } from '@/db/schema/hire'
import { day, show } from '@/db/schema/tour'

const columns = {
  id: hire.id,
  tourId: hire.tourId,
  supplierId: hire.supplierId,
  supplierName: supplier.name,
  name: hire.name,
  zone: hire.zone,
  deliveryDate: hire.deliveryDate,
  deliveryFrom: hire.deliveryFrom,
  deliveryUntil: hire.deliveryUntil,
  collectionDate: hire.collectionDate,
  collectionFrom: hire.collectionFrom,
  collectionUntil: hire.collectionUntil,
  receiver: hire.receiver,
  conditionOnReturn: hire.conditionOnReturn,
  poNumber: hire.poNumber,
  rateBasis: hire.rateBasis,
  currency: hire.currency,
  transportMinor: hire.transportMinor,
  taxBasisPoints: hire.taxBasisPoints,
  validUntil: hire.validUntil,
  answersDueAt: hire.answersDueAt,
  confirmedAt: hire.confirmedAt,
  version: hire.version,
}

export type HireRow = Awaited<ReturnType<typeof listHires>>[number]

function hiresWithSupplier(db: Db) {
  return db
    .select(columns)
    .from(hire)
    .innerJoin(supplier, and(eq(supplier.partyId, hire.partyId), eq(supplier.id, hire.supplierId)))
    .$dynamic()
}

export async function listHires(db: Db, scope: Scope, tourId: string) {
  return hiresWithSupplier(db)
    .where(and(eq(hire.partyId, scope.partyId), eq(hire.tourId, tourId)))
    .orderBy(sql`${hire.deliveryDate} asc nulls last`, asc(supplier.name), asc(hire.id))
    .limit(200)
}

export async function findHire(db: Db, scope: Scope, id: string) {
  const rows = await hiresWithSupplier(db)
    .where(and(eq(hire.partyId, scope.partyId), eq(hire.id, id)))
    .limit(1)
  return rows[0]
}

/** Which shows each hire covers, in the order they are played. */
export async function listHireShows(db: Db, scope: Scope, hireIds: readonly string[]) {
  if (hireIds.length === 0) return []
  return db
    .select({ hireId: hireShow.hireId, showId: hireShow.showId, date: day.date })
    .from(hireShow)
    .innerJoin(show, and(eq(show.partyId, hireShow.partyId), eq(show.id, hireShow.showId)))
    .innerJoin(day, and(eq(day.partyId, show.partyId), eq(day.id, show.dayId)))
    .where(and(eq(hireShow.partyId, scope.partyId), inArray(hireShow.hireId, [...hireIds])))
    .orderBy(asc(day.date), asc(hireShow.showId), asc(hireShow.hireId))
    .limit(20_000)
}

type HireValues = Omit<typeof hire.$inferInsert, 'id' | 'partyId' | 'tourId' | 'version' | 'createdAt'>

/** False when the id is taken already. */
export async function insertHire(
  db: Db,
  scope: Scope,
  row: HireValues & { id: string; tourId: string },
): Promise<boolean> {
  const rows = await db
    .insert(hire)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: hire.id })
    .returning({ id: hire.id })
  return rows.length > 0
}

/** False when the version is no longer the one that was seen. */
export async function updateHire(
  db: Db,
  scope: Scope,
  input: { id: string; version: number; hire: HireValues },
): Promise<boolean> {
  const rows = await db
    .update(hire)
    .set({ ...input.hire, version: sql`${hire.version} + 1` })
    .where(and(eq(hire.partyId, scope.partyId), eq(hire.id, input.id), eq(hire.version, input.version)))
    .returning({ id: hire.id })
  return rows.length > 0
}

/** The hire covers exactly these shows from now on. */
export async function replaceHireShows(
  db: Db,
  scope: Scope,
  input: { hireId: string; showIds: readonly string[] },
): Promise<void> {
  await db.delete(hireShow).where(and(eq(hireShow.partyId, scope.partyId), eq(hireShow.hireId, input.hireId)))
  await db
    .insert(hireShow)
    .values(input.showIds.map((showId) => ({ partyId: scope.partyId, hireId: input.hireId, showId })))
}

/** False when the version is no longer the one that was seen. */
export async function deleteHire(db: Db, scope: Scope, input: { id: string; version: number }): Promise<boolean> {
  const rows = await db
    .delete(hire)
    .where(and(eq(hire.partyId, scope.partyId), eq(hire.id, input.id), eq(hire.version, input.version)))
    .returning({ id: hire.id })
  return rows.length > 0
}

/** What hangs on a hire and would be lost with it. */
export async function findHireHangers(db: Db, scope: Scope, id: string) {
  const { partyId } = scope
  const rows = await db
    .select({
      packs: sql<boolean>`${exists(
        db
          .select({ id: pack.id })
          .from(pack)
          .where(and(eq(pack.partyId, partyId), eq(pack.hireId, id))),
      )}`,
      grants: sql<boolean>`${exists(
        db
          .select({ id: grant.id })
          .from(grant)
          .where(and(eq(grant.partyId, partyId), eq(grant.hireId, id))),
      )}`,
      answers: sql<boolean>`${exists(
        db
          .select({ id: answerEvent.id })
          .from(answerEvent)
          .where(and(eq(answerEvent.partyId, partyId), eq(answerEvent.hireId, id))),
      )}`,
    })
    .from(hire)
    .where(and(eq(hire.partyId, partyId), eq(hire.id, id)))
    .limit(1)
  return rows[0]
}
