import { and, asc, count, eq, isNull, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { gauge, gaugePair } from '@/db/schema/gauge'
import { kitEntry } from '@/db/schema/kit'
import { person } from '@/db/schema/person'
import { rig, tour } from '@/db/schema/tour'
import type { Gauge, GaugeInput, GaugePairInput, GaugePairRow } from '@/lib/contracts/gauge'
import { gaugeLimit } from '@/lib/contracts/gauge'
import type { DrumSpec } from '@/lib/contracts/kit'

const columns = {
  id: gauge.id,
  name: gauge.name,
  scaleMin: gauge.scaleMin,
  scaleMax: gauge.scaleMax,
  scaleStep: gauge.scaleStep,
  remark: gauge.remark,
  toursGauge: gauge.toursGauge,
  removed: sql<boolean>`${gauge.removedAt} is not null`,
  version: gauge.version,
}
type Row = Omit<Gauge, 'scale'> & { scaleMin: number; scaleMax: number; scaleStep: number }

const gaugeOf = <More extends Row>({ scaleMin, scaleMax, scaleStep, ...row }: More) => ({
  ...row,
  scale: { min: scaleMin, max: scaleMax, step: scaleStep },
})
const rowOf = ({ name, scale, remark }: GaugeInput) => ({
  ...{ name, remark, scaleMin: scale.min, scaleMax: scale.max, scaleStep: scale.step },
})

/** Standing gauges: the tour's first, then by name. Each with how many pairs stand. */
export async function listGauges(db: Db, scope: Scope) {
  const rows = await db
    .select({ ...columns, pairs: count(gaugePair.id) })
    .from(gauge)
    .leftJoin(
      gaugePair,
      and(eq(gaugePair.partyId, gauge.partyId), eq(gaugePair.gaugeId, gauge.id), isNull(gaugePair.struckAt)),
    )
    .where(and(eq(gauge.partyId, scope.partyId), isNull(gauge.removedAt)))
    .groupBy(gauge.id)
    .orderBy(sql`${gauge.toursGauge} desc`, asc(sql`lower(${gauge.name})`), asc(gauge.id))
    .limit(gaugeLimit)
  return rows.map(gaugeOf)
}

export async function findGauge(db: Db, scope: Scope, id: string): Promise<Gauge | undefined> {
  const rows = await db
    .select(columns)
    .from(gauge)
    .where(and(eq(gauge.partyId, scope.partyId), eq(gauge.id, id)))
    .limit(1)
  return rows.map(gaugeOf)[0]
}

/** A gauge, held against other writers until the transaction ends. */
export async function lockGauge(db: Db, scope: Scope, id: string): Promise<Gauge | undefined> {
  const rows = await db
    .select(columns)
    .from(gauge)
    .where(and(eq(gauge.partyId, scope.partyId), eq(gauge.id, id)))
    .limit(1)
    .for('update')
  return rows.map(gaugeOf)[0]
}

export async function findToursGauge(db: Db, scope: Scope): Promise<Gauge | undefined> {
  const rows = await db
    .select(columns)
    .from(gauge)
    .where(and(eq(gauge.partyId, scope.partyId), eq(gauge.toursGauge, true)))
    .limit(1)
  return rows.map(gaugeOf)[0]
}

/** Undefined when the id is taken already. */
export async function insertGauge(db: Db, scope: Scope, row: { id?: string | undefined; gauge: GaugeInput }) {
  const rows = await db
    .insert(gauge)
    .values({ ...rowOf(row.gauge), id: row.id, partyId: scope.partyId })
    .onConflictDoNothing({ target: gauge.id })
    .returning(columns)
  return rows.map(gaugeOf)[0]
}

const seen = (scope: Scope, input: { id: string; version: number }) =>
  and(eq(gauge.partyId, scope.partyId), eq(gauge.id, input.id), eq(gauge.version, input.version))
const nextVersion = { version: sql`${gauge.version} + 1` }

/** Undefined when the version is no longer the one that was seen. */
export async function updateGauge(db: Db, scope: Scope, input: { id: string; version: number; gauge: GaugeInput }) {
  const rows = await db
    .update(gauge)
    .set({ ...rowOf(input.gauge), ...nextVersion })
    .where(and(seen(scope, input), isNull(gauge.removedAt)))
    .returning(columns)
  return rows.map(gaugeOf)[0]
}

/** Takes a gauge away or puts it back; one that is away is not the tour's. Undefined when the version is stale. */
export async function markGaugeRemoved(db: Db, scope: Scope, input: { id: string; version: number; removed: boolean }) {
  const rows = await db
    .update(gauge)
    .set({ removedAt: input.removed ? sql`now()` : null, toursGauge: false, ...nextVersion })
    .where(seen(scope, input))
    .returning(columns)
  return rows.map(gaugeOf)[0]
}

/** Makes one gauge the tour's, or none. The party must be locked: two at once would meet the unique index. */
export async function setToursGauge(db: Db, scope: Scope, gaugeId: string | null): Promise<void> {
  await db
    .update(gauge)
    .set({ toursGauge: false })
    .where(and(eq(gauge.partyId, scope.partyId), eq(gauge.toursGauge, true)))
  if (gaugeId === null) return
  await db
    .update(gauge)
    .set({ toursGauge: true })
    .where(and(eq(gauge.partyId, scope.partyId), eq(gauge.id, gaugeId)))
}

const pairColumns = {
  id: gaugePair.id,
  gaugeId: gaugePair.gaugeId,
  reading: gaugePair.reading,
  diameterIn: gaugePair.diameterIn,
  depthIn: gaugePair.depthIn,
  plyMils: gaugePair.plyMils,
  film: gaugePair.film,
  coatingGPerM2: gaugePair.coatingGPerM2,
  tapHz: gaugePair.tapHz,
  temperatureC: gaugePair.temperatureC,
  remark: gaugePair.remark,
  at: gaugePair.at,
  byName: person.name,
  struck: sql<boolean>`${gaugePair.struckAt} is not null`,
}
const pairOf = ({ at, ...row }: Omit<GaugePairRow, 'at'> & { at: Date }): GaugePairRow => ({
  ...row,
  at: at.toISOString(),
})

/** Struck pairs stay to be read, so there may be more than stand; past this many the oldest are left out. */
const pairReadLimit = 500

/** Oldest first; struck ones only when asked for. */
export async function listGaugePairs(db: Db, scope: Scope, input: { gaugeId: string; struckToo: boolean }) {
  const rows = await db
    .select(pairColumns)
    .from(gaugePair)
    .innerJoin(person, eq(person.id, gaugePair.byPersonId))
    .where(
      and(
        eq(gaugePair.partyId, scope.partyId),
        eq(gaugePair.gaugeId, input.gaugeId),
        input.struckToo ? undefined : isNull(gaugePair.struckAt),
      ),
    )
    .orderBy(sql`${gaugePair.sequence} desc`)
    .limit(pairReadLimit)
  return rows.reverse().map(pairOf)
}

export async function findGaugePair(db: Db, scope: Scope, id: string): Promise<GaugePairRow | undefined> {
  const rows = await db
    .select(pairColumns)
    .from(gaugePair)
    .innerJoin(person, eq(person.id, gaugePair.byPersonId))
    .where(and(eq(gaugePair.partyId, scope.partyId), eq(gaugePair.id, id)))
    .limit(1)
  return rows.map(pairOf)[0]
}

export async function countGaugePairs(db: Db, scope: Scope, gaugeId: string): Promise<number> {
  const rows = await db
    .select({ standing: count() })
    .from(gaugePair)
    .where(and(eq(gaugePair.partyId, scope.partyId), eq(gaugePair.gaugeId, gaugeId), isNull(gaugePair.struckAt)))
  return rows[0]?.standing ?? 0
}

/** False when the id is taken already. */
export async function insertGaugePair(
  db: Db,
  scope: Scope,
  row: { id: string; gaugeId: string; byPersonId: string; pair: GaugePairInput },
): Promise<boolean> {
  const { pair, ...ids } = row
  const rows = await db
    .insert(gaugePair)
    .values({ ...pair, ...ids, partyId: scope.partyId })
    .onConflictDoNothing({ target: gaugePair.id })
    .returning({ id: gaugePair.id })
  return rows.length > 0
}

/** The gauge of the pair must be locked. */
export async function markGaugePairStruck(db: Db, scope: Scope, input: { id: string; struck: boolean }): Promise<void> {
  await db
    .update(gaugePair)
    .set({ struckAt: input.struck ? sql`now()` : null })
    .where(and(eq(gaugePair.partyId, scope.partyId), eq(gaugePair.id, input.id)))
}

/** Every drum in the party's kits, newest tours first: heads that a gauge can be put on. */
export async function listPartyDrums(db: Db, scope: Scope) {
  const rows = await db
    .select({ id: kitEntry.id, name: kitEntry.name, rigName: rig.name, tourName: tour.name, spec: kitEntry.spec })
    .from(kitEntry)
    .innerJoin(rig, and(eq(rig.partyId, kitEntry.partyId), eq(rig.id, kitEntry.rigId)))
    .innerJoin(tour, and(eq(tour.partyId, rig.partyId), eq(tour.id, rig.tourId)))
    .where(and(eq(kitEntry.partyId, scope.partyId), eq(kitEntry.kind, 'drum'), isNull(kitEntry.removedAt)))
    .orderBy(
      sql`${tour.createdAt} desc`,
      asc(tour.id),
      asc(rig.position),
      asc(rig.id),
      asc(kitEntry.position),
      asc(kitEntry.id),
    )
    .limit(200)
  // The contract checked each spec against its kind on the way in; the two columns lose that tie.
  return rows.map((row) => ({ ...row, spec: row.spec as DrumSpec }))
}
