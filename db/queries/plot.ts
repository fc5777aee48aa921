import { and, asc, desc, eq, gt, inArray, isNull, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { kitEntry } from '@/db/schema/kit'
import { person } from '@/db/schema/person'
import { plot, plotCommand, plotSnapshot } from '@/db/schema/plot'
import { rig } from '@/db/schema/tour'

const columns = { id: plot.id, rigId: plot.rigId, sequence: plot.sequence }

/** Whether the rig is the party's. */
export async function rigExists(db: Db, scope: Scope, rigId: string): Promise<boolean> {
  const rows = await db
    .select({ id: rig.id })
    .from(rig)
    .where(and(eq(rig.partyId, scope.partyId), eq(rig.id, rigId)))
    .limit(1)
  return rows.length > 0
}

/** The rig's own plot; undefined until its first command. */
export async function findRigPlot(db: Db, scope: Scope, rigId: string) {
  const rows = await db
    .select(columns)
    .from(plot)
    .where(and(eq(plot.partyId, scope.partyId), eq(plot.rigId, rigId), isNull(plot.showId)))
    .limit(1)
  return rows[0]
}

/** The rig's own plot, made if need be, held against other writers until the transaction ends. */
export async function lockRigPlot(db: Db, scope: Scope, rigId: string) {
  await db.insert(plot).values({ partyId: scope.partyId, rigId }).onConflictDoNothing()
  const rows = await db
    .select(columns)
    .from(plot)
    .where(and(eq(plot.partyId, scope.partyId), eq(plot.rigId, rigId), isNull(plot.showId)))
    .limit(1)
    .for('update')
  const found = rows[0]
  if (!found) throw new Error('the plot was just made')
  return found
}

export async function newestSnapshot(db: Db, scope: Scope, plotId: string) {
  const rows = await db
    .select({ sequence: plotSnapshot.sequence, document: plotSnapshot.document })
    .from(plotSnapshot)
    .where(and(eq(plotSnapshot.partyId, scope.partyId), eq(plotSnapshot.plotId, plotId)))
    .orderBy(desc(plotSnapshot.sequence))
    .limit(1)
  return rows[0]
}

/** Commands after a sequence, oldest first, with who made them. */
export async function listCommandsAfter(db: Db, scope: Scope, input: { plotId: string; after: number; limit: number }) {
  return db
    .select({ sequence: plotCommand.sequence, command: plotCommand.command, by: person.name })
    .from(plotCommand)
    .innerJoin(person, eq(person.id, plotCommand.personId))
    .where(
      and(
        eq(plotCommand.partyId, scope.partyId),
        eq(plotCommand.plotId, input.plotId),
        gt(plotCommand.sequence, input.after),
      ),
    )
    .orderBy(asc(plotCommand.sequence))
    .limit(input.limit)
}

/** Which of these commands the log holds already, and where. */
export async function findCommandsByClientId(db: Db, scope: Scope, input: { plotId: string; clientIds: string[] }) {
  return db
    .select({ clientId: plotCommand.clientId, sequence: plotCommand.sequence })
    .from(plotCommand)
    .where(
      and(
        eq(plotCommand.partyId, scope.partyId),
        eq(plotCommand.plotId, input.plotId),
        inArray(plotCommand.clientId, input.clientIds),
      ),
    )
    .orderBy(asc(plotCommand.sequence))
    .limit(input.clientIds.length)
}

/** Kit entries of the rig among these, taken out ones too, with their kind. */
export async function findRigEntryKinds(db: Db, scope: Scope, input: { rigId: string; entryIds: string[] }) {
  if (input.entryIds.length === 0) return []
  return db
    .select({ id: kitEntry.id, kind: kitEntry.kind })
    .from(kitEntry)
    .where(
      and(eq(kitEntry.partyId, scope.partyId), eq(kitEntry.rigId, input.rigId), inArray(kitEntry.id, input.entryIds)),
    )
    .orderBy(asc(kitEntry.id))
    .limit(input.entryIds.length)
}

export type PlotCommandRow = Omit<typeof plotCommand.$inferInsert, 'partyId' | 'at'>

/** Adds commands to the log and moves the plot to their last sequence. */
export async function appendToLog(db: Db, scope: Scope, input: { plotId: string; rows: PlotCommandRow[] }) {
  const last = input.rows[input.rows.length - 1]
  if (!last) return
  await db.insert(plotCommand).values(input.rows.map((row) => ({ ...row, partyId: scope.partyId })))
  await db
    .update(plot)
    .set({ sequence: last.sequence })
    .where(and(eq(plot.partyId, scope.partyId), eq(plot.id, input.plotId)))
}

export async function keepSnapshot(
  db: Db,
  scope: Scope,
  input: { plotId: string; sequence: number; document: unknown },
): Promise<void> {
  await db
    .insert(plotSnapshot)
    .values({ partyId: scope.partyId, ...input, document: sql`${JSON.stringify(input.document)}::jsonb` })
}
