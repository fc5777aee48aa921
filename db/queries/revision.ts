import { and, asc, count, desc, eq, isNull, lt } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { kitEntry } from '@/db/schema/kit'
import { party } from '@/db/schema/party'
import { person } from '@/db/schema/person'
import { revision, revisionLine } from '@/db/schema/revision'
import { rig, show, tour } from '@/db/schema/tour'

const summary = {
  id: revision.id,
  rigId: revision.rigId,
  rigName: rig.name,
  tourId: rig.tourId,
  number: revision.number,
  note: revision.note,
  issuedAt: revision.issuedAt,
  issuedById: revision.issuedBy,
  issuedByName: person.name,
}
const whole = { ...summary, document: revision.document, documentHash: revision.documentHash }

/** Holds the rig against other issues of it until the transaction ends; false when it is not the party's. */
export async function lockRig(db: Db, scope: Scope, rigId: string): Promise<boolean> {
  const rows = await db
    .select({ id: rig.id })
    .from(rig)
    .where(and(eq(rig.partyId, scope.partyId), eq(rig.id, rigId)))
    .limit(1)
    .for('update')
  return rows.length > 0
}

/** A rig with its tour and the party's settings: the head of every revision. */
export async function findRigHead(db: Db, scope: Scope, rigId: string) {
  const rows = await db
    .select({
      rig: { id: rig.id, name: rig.name },
      tour: { id: tour.id, name: tour.name },
      party: {
        id: party.id,
        name: party.name,
        locale: party.locale,
        units: party.units,
        referenceHz: party.referenceHz,
        paper: party.paper,
      },
    })
    .from(rig)
    .innerJoin(tour, and(eq(tour.partyId, rig.partyId), eq(tour.id, rig.tourId)))
    .innerJoin(party, eq(party.id, rig.partyId))
    .where(and(eq(rig.partyId, scope.partyId), eq(rig.id, rigId)))
    .limit(1)
  return rows[0]
}

/** The rigs of a tour in their order, each with how many shows play it. */
export async function listRigsWithShows(db: Db, scope: Scope, tourId: string) {
  return db
    .select({ id: rig.id, name: rig.name, shows: count(show.id) })
    .from(rig)
    .leftJoin(show, and(eq(show.partyId, rig.partyId), eq(show.rigId, rig.id)))
    .where(and(eq(rig.partyId, scope.partyId), eq(rig.tourId, tourId)))
    .groupBy(rig.id, rig.name, rig.position)
    .orderBy(asc(rig.position), asc(rig.name), asc(rig.id))
    .limit(50)
}

/** The kit of a rig as it is now, in its order; what was taken out is not in it. */
export async function listSpecEntries(db: Db, scope: Scope, rigId: string) {
  return db
    .select({
      id: kitEntry.id,
      position: kitEntry.position,
      kind: kitEntry.kind,
      name: kitEntry.name,
      supply: kitEntry.supply,
      count: kitEntry.count,
      remark: kitEntry.remark,
      spec: kitEntry.spec,
    })
    .from(kitEntry)
    .where(and(eq(kitEntry.partyId, scope.partyId), eq(kitEntry.rigId, rigId), isNull(kitEntry.removedAt)))
    .orderBy(asc(kitEntry.position), asc(kitEntry.id))
    .limit(1000)
}

/** Undefined when a revision of that id is there already. */
export async function insertRevision(
  db: Db,
  scope: Scope,
  row: Omit<typeof revision.$inferInsert, 'partyId' | 'issuedAt'>,
): Promise<string | undefined> {
  const rows = await db
    .insert(revision)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: revision.id })
    .returning({ id: revision.id })
  return rows[0]?.id
}

function revisions(db: Db) {
  return db
    .select(whole)
    .from(revision)
    .innerJoin(rig, and(eq(rig.partyId, revision.partyId), eq(rig.id, revision.rigId)))
    .innerJoin(person, eq(person.id, revision.issuedBy))
}

export async function findRevision(db: Db, scope: Scope, revisionId: string) {
  const rows = await revisions(db)
    .where(and(eq(revision.partyId, scope.partyId), eq(revision.id, revisionId)))
    .limit(1)
  return rows[0]
}

/** The newest revision of a rig, or the newest before a number. */
export async function findNewestRevision(db: Db, scope: Scope, input: { rigId: string; before?: number }) {
  const rows = await revisions(db)
    .where(
      and(
        eq(revision.partyId, scope.partyId),
        eq(revision.rigId, input.rigId),
        input.before === undefined ? undefined : lt(revision.number, input.before),
      ),
    )
    .orderBy(desc(revision.number))
    .limit(1)
  return rows[0]
}

/** Revisions of a rig, newest first, each with how many lines it asks. */
export async function listRevisions(db: Db, scope: Scope, input: { rigId: string }) {
  return db
    .select({ ...summary, lines: count(revisionLine.lineId) })
    .from(revision)
    .innerJoin(rig, and(eq(rig.partyId, revision.partyId), eq(rig.id, revision.rigId)))
    .innerJoin(person, eq(person.id, revision.issuedBy))
    .leftJoin(revisionLine, and(eq(revisionLine.partyId, revision.partyId), eq(revisionLine.revisionId, revision.id)))
    .where(and(eq(revision.partyId, scope.partyId), eq(revision.rigId, input.rigId)))
    .groupBy(revision.id, rig.id, person.id)
    .orderBy(desc(revision.number))
    .limit(500)
}
