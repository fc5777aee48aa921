import { and, eq, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { party } from '@/db/schema/party'
import type { Party, PartySettings } from '@/lib/contracts/party'

const columns = {
  id: party.id,
  name: party.name,
  units: party.units,
  referenceHz: party.referenceHz,
  paper: party.paper,
  // The column is plain text; only the contract's locales are ever written to it.
  locale: sql<Party['locale']>`${party.locale}`,
  version: party.version,
}

/** Makes a party, or answers undefined when that id is taken. */
export async function insertParty(db: Db, row: { id: string; name: string }): Promise<Party | undefined> {
  const rows = await db.insert(party).values(row).onConflictDoNothing({ target: party.id }).returning(columns)
  return rows[0]
}

export async function findParty(db: Db, scope: Scope): Promise<Party | undefined> {
  const rows = await db.select(columns).from(party).where(eq(party.id, scope.partyId)).limit(1)
  return rows[0]
}

/** Holds the party's row, so that changes of who its owners are come one after the other. */
export async function lockParty(db: Db, scope: Scope): Promise<void> {
  await db.select({ id: party.id }).from(party).where(eq(party.id, scope.partyId)).for('update').limit(1)
}

/** Undefined when the version is stale. */
export async function updateParty(
  db: Db,
  scope: Scope,
  input: { version: number; settings: PartySettings },
): Promise<Party | undefined> {
  const rows = await db
    .update(party)
    .set({ ...input.settings, version: sql`${party.version} + 1` })
    .where(and(eq(party.id, scope.partyId), eq(party.version, input.version)))
    .returning(columns)
  return rows[0]
}
