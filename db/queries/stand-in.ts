import { and, asc, eq, gt, isNull, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { standIn } from '@/db/schema/party'
import { person } from '@/db/schema/person'

const columns = {
  id: standIn.id,
  personId: standIn.personId,
  role: standIn.role,
  lentBy: standIn.lentBy,
  lentByName: person.name,
  untilAt: standIn.untilAt,
}

const inForce = (scope: Scope) =>
  and(eq(standIn.partyId, scope.partyId), isNull(standIn.endedAt), gt(standIn.untilAt, sql`now()`))

/** False when that id is taken. */
export async function insertStandIn(
  db: Db,
  scope: Scope,
  row: Omit<typeof standIn.$inferInsert, 'partyId' | 'fromAt' | 'endedAt'>,
): Promise<boolean> {
  const rows = await db
    .insert(standIn)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: standIn.id })
    .returning({ id: standIn.id })
  return rows.length === 1
}

/** Every role that is lent now. */
export async function listStandIns(db: Db, scope: Scope) {
  return db
    .select(columns)
    .from(standIn)
    .innerJoin(person, eq(person.id, standIn.lentBy))
    .where(inForce(scope))
    .orderBy(asc(standIn.untilAt), asc(standIn.id))
    .limit(500)
}

export async function findStandIn(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select({ ...columns, endedAt: standIn.endedAt })
    .from(standIn)
    .innerJoin(person, eq(person.id, standIn.lentBy))
    .where(and(eq(standIn.partyId, scope.partyId), eq(standIn.id, id)))
    .limit(1)
  return rows[0]
}

/** False when it has ended already. */
export async function endStandIn(db: Db, scope: Scope, id: string): Promise<boolean> {
  const rows = await db
    .update(standIn)
    .set({ endedAt: sql`now()` })
    .where(and(inForce(scope), eq(standIn.id, id)))
    .returning({ id: standIn.id })
  return rows.length === 1
}
