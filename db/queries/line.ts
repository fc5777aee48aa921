import { and, asc, eq } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { line, revisionLine } from '@/db/schema/revision'

/** Every line that a rig ever asked, oldest first. */
export async function listLines(db: Db, scope: Scope, rigId: string) {
  return db
    .select({ id: line.id, kitEntryId: line.kitEntryId, kind: line.kind })
    .from(line)
    .where(and(eq(line.partyId, scope.partyId), eq(line.rigId, rigId)))
    .orderBy(asc(line.createdAt), asc(line.id))
    .limit(5000)
}

export async function insertLines(
  db: Db,
  scope: Scope,
  rows: Omit<typeof line.$inferInsert, 'partyId' | 'createdAt'>[],
): Promise<void> {
  if (rows.length > 0) await db.insert(line).values(rows.map((row) => ({ ...row, partyId: scope.partyId })))
}

export async function insertRevisionLines(
  db: Db,
  scope: Scope,
  rows: Omit<typeof revisionLine.$inferInsert, 'partyId'>[],
): Promise<void> {
  if (rows.length > 0) await db.insert(revisionLine).values(rows.map((row) => ({ ...row, partyId: scope.partyId })))
}
