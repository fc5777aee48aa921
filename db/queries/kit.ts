import { and, asc, eq, inArray, isNotNull, isNull, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { kitEntry } from '@/db/schema/kit'
import { rig, tour } from '@/db/schema/tour'
import { filledEntry } from '@/lib/contracts/filled-entry'
import type { Entry, EntryInput } from '@/lib/contracts/kit'

const columns = {
  id: kitEntry.id,
  rigId: kitEntry.rigId,
  kind: kitEntry.kind,
  name: kitEntry.name,
  supply: kitEntry.supply,
  count: kitEntry.count,
  remark: kitEntry.remark,
  spec: kitEntry.spec,
  position: kitEntry.position,
  version: kitEntry.version,
  removed: sql<boolean>`${kitEntry.removedAt} is not null`,
}

/** More than any kit holds, taken-out entries with it. */
const readLimit = 2000

// The contract checked each spec against its kind on the way in; the two columns lose that tie.
const entriesOf = (rows: object[]) => (rows as Entry[]).map(filledEntry)
const entryOf = (rows: object[]) => entriesOf(rows)[0]

/** In the order of the kit; taken-out entries too when asked for. */
export async function listEntries(
  db: Db,
  scope: Scope,
  input: { rigId: string; removedToo: boolean },
): Promise<Entry[]> {
  const rows = await db
    .select(columns)
    .from(kitEntry)
    .where(
      and(
        eq(kitEntry.partyId, scope.partyId),
        eq(kitEntry.rigId, input.rigId),
        input.removedToo ? undefined : isNull(kitEntry.removedAt),
      ),
    )
    .orderBy(asc(kitEntry.position), asc(kitEntry.id))
    .limit(readLimit)
  return entriesOf(rows)
}

export async function findEntry(db: Db, scope: Scope, id: string): Promise<Entry | undefined> {
  const rows = await db
    .select(columns)
    .from(kitEntry)
    .where(and(eq(kitEntry.partyId, scope.partyId), eq(kitEntry.id, id)))
    .limit(1)
  return entryOf(rows)
}

/** The entries of a rig among these, held against other writers until the transaction ends. */
export async function lockEntries(db: Db, scope: Scope, input: { rigId: string; ids: string[] }): Promise<Entry[]> {
  const rows = await db
    .select(columns)
    .from(kitEntry)
    .where(and(eq(kitEntry.partyId, scope.partyId), eq(kitEntry.rigId, input.rigId), inArray(kitEntry.id, input.ids)))
    .orderBy(asc(kitEntry.id))
    .limit(input.ids.length)
    .for('update')
  return entriesOf(rows)
}

/** How many entries stand in the kit, and the position after the last, taken-out ones counted. */
export async function kitEnd(db: Db, scope: Scope, rigId: string): Promise<{ standing: number; next: number }> {
  const rows = await db
    .select({
      standing: sql<number>`(count(*) filter (where ${kitEntry.removedAt} is null))::int`,
      next: sql<number>`coalesce(max(${kitEntry.position}) + 1, 0)::int`,
    })
    .from(kitEntry)
    .where(and(eq(kitEntry.partyId, scope.partyId), eq(kitEntry.rigId, rigId)))
  return rows[0] ?? { standing: 0, next: 0 }
}

export type NewEntryRow = EntryInput & { id: string; rigId: string; position: number }

/** Only the rows that were new: an id that is taken, in whatever party, is left alone. */
export async function insertEntries(db: Db, scope: Scope, rows: readonly NewEntryRow[]): Promise<Entry[]> {
  if (rows.length === 0) return []
  const made = await db
    .insert(kitEntry)
    .values(rows.map((row) => ({ ...row, partyId: scope.partyId })))
    .onConflictDoNothing({ target: kitEntry.id })
    .returning(columns)
  return entriesOf(made)
}

/** Undefined when the version is no longer the one that was seen, or the entry is out of the kit. */
export async function updateEntry(
  db: Db,
  scope: Scope,
  input: { id: string; version: number; entry: EntryInput },
): Promise<Entry | undefined> {
  const { name, supply, count, remark, spec } = input.entry
  const rows = await db
    .update(kitEntry)
    .set({ name, supply, count, remark, spec, version: sql`${kitEntry.version} + 1` })
    .where(
      and(
        eq(kitEntry.partyId, scope.partyId),
        eq(kitEntry.id, input.id),
        eq(kitEntry.version, input.version),
        isNull(kitEntry.removedAt),
      ),
    )
    .returning(columns)
  return entryOf(rows)
}

/** Takes an entry out of the kit or puts it back; undefined when it is not as the writer saw it. */
export async function markRemoved(
  db: Db,
  scope: Scope,
  input: { id: string; version: number; removed: boolean },
): Promise<Entry | undefined> {
  const rows = await db
    .update(kitEntry)
    .set({ removedAt: input.removed ? sql`now()` : null, version: sql`${kitEntry.version} + 1` })
    .where(
      and(
        eq(kitEntry.partyId, scope.partyId),
        eq(kitEntry.id, input.id),
        eq(kitEntry.version, input.version),
        input.removed ? isNull(kitEntry.removedAt) : isNotNull(kitEntry.removedAt),
      ),
    )
    .returning(columns)
  return entryOf(rows)
}

/** Gives entries the positions 0, 1, 2 … in the order of their ids. An order is not a change of an entry: versions stay. */
export async function placeEntries(db: Db, scope: Scope, input: { rigId: string; ids: string[] }): Promise<void> {
  await db
    .update(kitEntry)
    .set({ position: sql`array_position(${sql.param(input.ids)}::uuid[], ${kitEntry.id}) - 1` })
    .where(and(eq(kitEntry.partyId, scope.partyId), eq(kitEntry.rigId, input.rigId), inArray(kitEntry.id, input.ids)))
}

/** The party's other rigs that hold anything, newest tours first: what a kit can be copied from. */
export async function listKitSources(db: Db, scope: Scope, exceptRigId: string) {
  const entries = sql<number>`count(${kitEntry.id})::int`
  return db
    .select({ rigId: rig.id, rigName: rig.name, tourName: tour.name, entries })
    .from(rig)
    .innerJoin(tour, and(eq(tour.partyId, rig.partyId), eq(tour.id, rig.tourId)))
    .innerJoin(kitEntry, and(eq(kitEntry.partyId, rig.partyId), eq(kitEntry.rigId, rig.id), isNull(kitEntry.removedAt)))
    .where(and(eq(rig.partyId, scope.partyId), sql`${rig.id} <> ${exceptRigId}`))
    .groupBy(rig.id, rig.name, rig.position, tour.name, tour.createdAt)
    .orderBy(sql`${tour.createdAt} desc`, asc(rig.position), asc(rig.name), asc(rig.id))
    .limit(100)
}
