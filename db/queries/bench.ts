import { and, asc, eq, inArray, or, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { benchDrum, physicalDrum, reading, signOff } from '@/db/schema/bench'
import { hire, hireShow } from '@/db/schema/hire'
import { party } from '@/db/schema/party'
import { show } from '@/db/schema/tour'

/** Holds one show's bench until the transaction ends, so that a batch that arrives twice at once is stored once. */
export async function lockBench(db: Db, scope: Scope, showId: string): Promise<void> {
  await db.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`bench ${scope.partyId} ${showId}`}, 0))`)
}

export async function findPartyName(db: Db, scope: Scope): Promise<string | undefined> {
  const rows = await db.select({ name: party.name }).from(party).where(eq(party.id, scope.partyId)).limit(1)
  return rows[0]?.name
}

/** The hires that cover a show, each with its supplier. */
export async function listHiresOfShow(db: Db, scope: Scope, showId: string) {
  return db
    .select({ hireId: hire.id, supplierId: hire.supplierId })
    .from(hireShow)
    .innerJoin(hire, and(eq(hire.partyId, hireShow.partyId), eq(hire.id, hireShow.hireId)))
    .innerJoin(show, and(eq(show.partyId, hireShow.partyId), eq(show.id, hireShow.showId)))
    .where(and(eq(hireShow.partyId, scope.partyId), eq(hireShow.showId, showId)))
    .orderBy(asc(hire.createdAt), asc(hire.id))
    .limit(50)
}

/** The physical drums that stand for the kit's drums at a show, with their sizes. */
export async function listBenchDrums(db: Db, scope: Scope, showId: string) {
  return db
    .select({
      kitEntryId: benchDrum.kitEntryId,
      physicalDrumId: benchDrum.physicalDrumId,
      diameterIn: physicalDrum.diameterIn,
      depthIn: physicalDrum.depthIn,
      lugs: physicalDrum.lugs,
    })
    .from(benchDrum)
    .innerJoin(
      physicalDrum,
      and(eq(physicalDrum.partyId, benchDrum.partyId), eq(physicalDrum.id, benchDrum.physicalDrumId)),
    )
    .where(and(eq(benchDrum.partyId, scope.partyId), eq(benchDrum.showId, showId)))
    .orderBy(asc(benchDrum.kitEntryId))
    .limit(1000)
}

export async function insertPhysicalDrum(
  db: Db,
  scope: Scope,
  row: { id: string; supplierId: string | null; diameterIn: number; depthIn: number; lugs: number },
): Promise<void> {
  await db.insert(physicalDrum).values({ ...row, partyId: scope.partyId })
}

/** Says which drum stands at the bench for a kit drum; another one than before when what came is another size. */
export async function setBenchDrum(
  db: Db,
  scope: Scope,
  row: { showId: string; kitEntryId: string; physicalDrumId: string },
): Promise<void> {
  await db
    .insert(benchDrum)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoUpdate({
      target: [benchDrum.showId, benchDrum.kitEntryId],
      set: { physicalDrumId: row.physicalDrumId },
    })
}

const readingColumns = {
  id: reading.id,
  showId: reading.showId,
  kitEntryId: reading.kitEntryId,
  physicalDrumId: reading.physicalDrumId,
  side: reading.side,
  lug: reading.lug,
  method: reading.method,
  value: reading.value,
  unit: reading.unit,
  targetHz: reading.targetHz,
  otherHead: reading.otherHead,
  onStand: reading.onStand,
  gauge: reading.gauge,
  temperatureC: reading.temperatureC,
  pass: reading.pass,
  strikesReadingId: reading.strikesReadingId,
  deviceId: reading.deviceId,
  deviceSequence: reading.deviceSequence,
  deviceAt: reading.deviceAt,
  serverAt: reading.serverAt,
  byName: reading.byName,
  personId: reading.personId,
}

/** Everything read at a show, in the order of arrival. */
export async function listReadings(db: Db, scope: Scope, showId: string) {
  return db
    .select(readingColumns)
    .from(reading)
    .where(and(eq(reading.partyId, scope.partyId), eq(reading.showId, showId)))
    .orderBy(asc(reading.sequence))
    .limit(20_000)
}
export type ReadingRow = Awaited<ReturnType<typeof listReadings>>[number]

export async function findReadings(db: Db, scope: Scope, ids: readonly string[]): Promise<ReadingRow[]> {
  if (ids.length === 0) return []
  return db
    .select(readingColumns)
    .from(reading)
    .where(and(eq(reading.partyId, scope.partyId), inArray(reading.id, [...ids])))
    .orderBy(asc(reading.sequence))
    .limit(ids.length)
}

/** The party's readings that hold one of these device numbers already. */
export async function findDeviceNumbers(
  db: Db,
  scope: Scope,
  numbers: readonly { deviceId: string; deviceSequence: number }[],
) {
  if (numbers.length === 0) return []
  return db
    .select({ id: reading.id, deviceId: reading.deviceId, deviceSequence: reading.deviceSequence })
    .from(reading)
    .where(
      and(
        eq(reading.partyId, scope.partyId),
        or(
          ...numbers.map((number) =>
            and(eq(reading.deviceId, number.deviceId), eq(reading.deviceSequence, number.deviceSequence)),
          ),
        ),
      ),
    )
    .orderBy(asc(reading.sequence))
    .limit(numbers.length)
}

/** Which of these readings are struck already. */
export async function findStruck(db: Db, scope: Scope, ids: readonly string[]): Promise<string[]> {
  if (ids.length === 0) return []
  const rows = await db
    .select({ id: reading.strikesReadingId })
    .from(reading)
    .where(and(eq(reading.partyId, scope.partyId), inArray(reading.strikesReadingId, [...ids])))
    .orderBy(asc(reading.sequence))
    .limit(ids.length)
  return rows.flatMap(({ id }) => (id === null ? [] : [id]))
}

/** Answers how many were new; an id or a device number that is taken anywhere leaves its reading out. */
export async function insertReadings(
  db: Db,
  scope: Scope,
  rows: Omit<typeof reading.$inferInsert, 'partyId' | 'sequence' | 'serverAt'>[],
): Promise<number> {
  if (rows.length === 0) return 0
  const made = await db
    .insert(reading)
    .values(rows.map((row) => ({ ...row, partyId: scope.partyId })))
    .onConflictDoNothing()
    .returning({ id: reading.id })
  return made.length
}

const signOffColumns = {
  id: signOff.id,
  showId: signOff.showId,
  kitEntryId: signOff.kitEntryId,
  decision: signOff.decision,
  byName: signOff.byName,
  remark: signOff.remark,
  at: signOff.at,
}

/** Sign-offs and takings-back of a show, in order. */
export async function listSignOffs(db: Db, scope: Scope, showId: string) {
  return db
    .select(signOffColumns)
    .from(signOff)
    .where(and(eq(signOff.partyId, scope.partyId), eq(signOff.showId, showId)))
    .orderBy(asc(signOff.sequence))
    .limit(2000)
}
export type SignOffRow = Awaited<ReturnType<typeof listSignOffs>>[number]

export async function findSignOff(db: Db, scope: Scope, id: string): Promise<SignOffRow | undefined> {
  const rows = await db
    .select(signOffColumns)
    .from(signOff)
    .where(and(eq(signOff.partyId, scope.partyId), eq(signOff.id, id)))
    .limit(1)
  return rows[0]
}

/** How much a show's bench holds. */
export async function countBench(db: Db, scope: Scope, showId: string): Promise<{ readings: number; signOffs: number }> {
  const [readings, signOffs] = [
    await db.$count(reading, and(eq(reading.partyId, scope.partyId), eq(reading.showId, showId))),
    await db.$count(signOff, and(eq(signOff.partyId, scope.partyId), eq(signOff.showId, showId))),
  ]
  return { readings, signOffs }
}

/** False when the id is taken, whoever's it is. */
export async function insertSignOff(
  db: Db,
  scope: Scope,
  row: Omit<typeof signOff.$inferInsert, 'partyId' | 'sequence' | 'at'>,
): Promise<boolean> {
  const rows = await db
    .insert(signOff)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: signOff.id })
    .returning({ id: signOff.id })
  return rows.length === 1
}
