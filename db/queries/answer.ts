import { and, asc, desc, eq, inArray, or, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { answerEvent, settlement } from '@/db/schema/advance'
import { person } from '@/db/schema/person'
import { revision, revisionLine } from '@/db/schema/revision'

/** The shows and hires whose advance is read. */
export type Subjects = { readonly showIds: readonly string[]; readonly hireIds: readonly string[] }

/** Holds one show's or hire's answers until the transaction ends: an answer and its settling never cross. */
export async function lockAnswers(db: Db, scope: Scope, subjectId: string): Promise<void> {
  await db.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`answers ${scope.partyId} ${subjectId}`}, 0))`)
}

function ofSubjects<Table extends typeof answerEvent | typeof settlement>(table: Table, subjects: Subjects) {
  return or(inArray(table.showId, [...subjects.showIds]), inArray(table.hireId, [...subjects.hireIds]))
}

/** Everything said about some shows and hires, in the order in which it was said. */
export async function listAnswerEvents(db: Db, scope: Scope, subjects: Subjects) {
  return db
    .select({
      id: answerEvent.id,
      sequence: answerEvent.sequence,
      showId: answerEvent.showId,
      hireId: answerEvent.hireId,
      kind: answerEvent.kind,
      lineId: answerEvent.lineId,
      lineHash: answerEvent.lineHash,
      content: answerEvent.content,
      remark: answerEvent.remark,
      byName: answerEvent.byName,
      takenFrom: answerEvent.takenFrom,
      takenHow: answerEvent.takenHow,
      takenBy: person.name,
      at: answerEvent.at,
    })
    .from(answerEvent)
    .leftJoin(person, eq(person.id, answerEvent.personId))
    .where(and(eq(answerEvent.partyId, scope.partyId), ofSubjects(answerEvent, subjects)))
    .orderBy(asc(answerEvent.sequence))
    .limit(50_000)
}

/** Everything decided about some shows and hires, in order. */
export async function listSettlements(db: Db, scope: Scope, subjects: Subjects) {
  return db
    .select({
      id: settlement.id,
      sequence: settlement.sequence,
      showId: settlement.showId,
      hireId: settlement.hireId,
      lineId: settlement.lineId,
      answerEventId: settlement.answerEventId,
      decision: settlement.decision,
      remark: settlement.remark,
      byName: person.name,
      at: settlement.at,
    })
    .from(settlement)
    .innerJoin(person, eq(person.id, settlement.personId))
    .where(and(eq(settlement.partyId, scope.partyId), ofSubjects(settlement, subjects)))
    .orderBy(asc(settlement.sequence))
    .limit(50_000)
}

export async function findAnswerEvent(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select({
      id: answerEvent.id,
      showId: answerEvent.showId,
      hireId: answerEvent.hireId,
      kind: answerEvent.kind,
      lineId: answerEvent.lineId,
      lineHash: answerEvent.lineHash,
    })
    .from(answerEvent)
    .where(and(eq(answerEvent.partyId, scope.partyId), eq(answerEvent.id, id)))
    .limit(1)
  return rows[0]
}

/** How much was said about one show or hire. */
export async function countAnswerEvents(db: Db, scope: Scope, subject: { showId: string | null; hireId: string | null }): Promise<number> {
  const own = subject.showId === null ? eq(answerEvent.hireId, subject.hireId ?? '') : eq(answerEvent.showId, subject.showId)
  return db.$count(answerEvent, and(eq(answerEvent.partyId, scope.partyId), own))
}

/** False when an answer of that id is there already, whoever's it is. */
export async function insertAnswerEvent(db: Db, scope: Scope, row: Omit<typeof answerEvent.$inferInsert, 'partyId' | 'sequence'>): Promise<boolean> {
  const rows = await db
    .insert(answerEvent)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: answerEvent.id })
    .returning({ id: answerEvent.id })
  return rows.length === 1
}

/** False when a decision of that id is there already, whoever's it is. */
export async function insertSettlement(db: Db, scope: Scope, row: Omit<typeof settlement.$inferInsert, 'partyId' | 'sequence'>): Promise<boolean> {
  const rows = await db
    .insert(settlement)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: settlement.id })
    .returning({ id: settlement.id })
  return rows.length === 1
}

/** The subject and line of a decision that is there already. */
export async function findSettlement(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select({ showId: settlement.showId, hireId: settlement.hireId, lineId: settlement.lineId })
    .from(settlement)
    .where(and(eq(settlement.partyId, scope.partyId), eq(settlement.id, id)))
    .limit(1)
  return rows[0]
}

/** What lines said at certain hashes; the same words are kept once an issue, so one of them is enough. */
export async function listLineContents(db: Db, scope: Scope, wanted: { lineIds: readonly string[]; hashes: readonly string[] }) {
  if (wanted.lineIds.length === 0) return []
  return db
    .selectDistinctOn([revisionLine.lineId, revisionLine.hash], {
      lineId: revisionLine.lineId,
      hash: revisionLine.hash,
      content: revisionLine.content,
    })
    .from(revisionLine)
    .where(
      and(
        eq(revisionLine.partyId, scope.partyId),
        inArray(revisionLine.lineId, [...wanted.lineIds]),
        inArray(revisionLine.hash, [...wanted.hashes]),
      ),
    )
    .orderBy(asc(revisionLine.lineId), asc(revisionLine.hash))
    .limit(2000)
}

/** A line as some revision asked for it in these very words: the newest such revision, and the words. */
export async function findAskedLine(db: Db, scope: Scope, input: { lineId: string; hash: string }) {
  const rows = await db
    .select({ revisionId: revisionLine.revisionId, content: revisionLine.content })
    .from(revisionLine)
    .innerJoin(revision, and(eq(revision.partyId, revisionLine.partyId), eq(revision.id, revisionLine.revisionId)))
    .where(and(eq(revisionLine.partyId, scope.partyId), eq(revisionLine.lineId, input.lineId), eq(revisionLine.hash, input.hash)))
    .orderBy(desc(revision.number))
    .limit(1)
  return rows[0]
}
