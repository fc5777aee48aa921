import { and, asc, eq, isNull, ne, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { kitEntry } from '@/db/schema/kit'
import { revision } from '@/db/schema/revision'
import { rig } from '@/db/schema/tour'
import type { RigInput } from '@/lib/contracts/tour'

const columns = { id: rig.id, tourId: rig.tourId, name: rig.name, position: rig.position, version: rig.version }

export async function listRigs(db: Db, scope: Scope, tourId: string) {
  return db
    .select(columns)
    .from(rig)
    .where(and(eq(rig.partyId, scope.partyId), eq(rig.tourId, tourId)))
    .orderBy(asc(rig.position), asc(rig.name), asc(rig.id))
    .limit(100)
}

/** Each rig with how many entries its kit holds and the newest revision's number. */
export async function listRigFacts(db: Db, scope: Scope, tourId: string) {
  const kits = db
    .select({ rigId: kitEntry.rigId, entries: sql<number>`count(*)::int`.as('entries') })
    .from(kitEntry)
    .where(and(eq(kitEntry.partyId, scope.partyId), isNull(kitEntry.removedAt)))
    .groupBy(kitEntry.rigId)
    .as('kits')
  const revisions = db
    .select({ rigId: revision.rigId, newest: sql<number>`max(${revision.number})`.as('newest') })
    .from(revision)
    .where(eq(revision.partyId, scope.partyId))
    .groupBy(revision.rigId)
    .as('revisions')
  return db
    .select({
      id: rig.id,
      name: rig.name,
      entries: sql<number>`coalesce(${kits.entries}, 0)`,
      revision: sql<number | null>`${revisions.newest}`,
    })
    .from(rig)
    .leftJoin(kits, eq(kits.rigId, rig.id))
    .leftJoin(revisions, eq(revisions.rigId, rig.id))
    .where(and(eq(rig.partyId, scope.partyId), eq(rig.tourId, tourId)))
    .orderBy(asc(rig.position), asc(rig.name), asc(rig.id))
    .limit(100)
}

export async function findRig(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select(columns)
    .from(rig)
    .where(and(eq(rig.partyId, scope.partyId), eq(rig.id, id)))
    .limit(1)
  return rows[0]
}

/** Another rig of the tour with this name. */
export async function rigNameTaken(
  db: Db,
  scope: Scope,
  input: { tourId: string; name: string; exceptId: string | null },
) {
  const rows = await db
    .select({ id: rig.id })
    .from(rig)
    .where(
      and(
        eq(rig.partyId, scope.partyId),
        eq(rig.tourId, input.tourId),
        eq(rig.name, input.name),
        input.exceptId === null ? undefined : ne(rig.id, input.exceptId),
      ),
    )
    .limit(1)
  return rows.length > 0
}

/** Undefined when the id is taken already. */
export async function insertRig(db: Db, scope: Scope, row: RigInput & { id?: string | undefined; tourId: string }) {
  const rows = await db
    .insert(rig)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: rig.id })
    .returning(columns)
  return rows[0]
}

/** Undefined when the version is no longer the one that was seen. */
export async function updateRig(db: Db, scope: Scope, input: { id: string; version: number; rig: RigInput }) {
  const rows = await db
    .update(rig)
    .set({ ...input.rig, version: sql`${rig.version} + 1` })
    .where(and(eq(rig.partyId, scope.partyId), eq(rig.id, input.id), eq(rig.version, input.version)))
    .returning(columns)
  return rows[0]
}
