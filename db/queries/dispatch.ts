import { and, asc, desc, eq, exists, inArray, isNull, lte, or, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { dispatch, pack } from '@/db/schema/advance'
import { contact, stage, supplier, venue } from '@/db/schema/directory'
import { hire, hireShow } from '@/db/schema/hire'
import { mail, mailEvent } from '@/db/schema/mail'
import { person } from '@/db/schema/person'
import { revision, revisionLine } from '@/db/schema/revision'
import { day, rig, show } from '@/db/schema/tour'
import type { AnsweredLine } from '@/lib/advance/answer-state'
import type { Subjects } from './answer'

/** Where the advance is read from: a whole tour, or one show or hire. */
export type AdvancePlace = { readonly tourId: string } | { readonly showId: string } | { readonly hireId: string }

/** What a mail was sent for: the show or hire of its pack, and the tour. */
export async function findMailSubject(db: Db, scope: Scope, mailId: string) {
  const rows = await db
    .select({
      showId: pack.showId,
      hireId: pack.hireId,
      tourId: sql<string>`coalesce(${show.tourId}, ${hire.tourId})`,
    })
    .from(dispatch)
    .innerJoin(pack, and(eq(pack.partyId, dispatch.partyId), eq(pack.id, dispatch.packId)))
    .leftJoin(show, and(eq(show.partyId, pack.partyId), eq(show.id, pack.showId)))
    .leftJoin(hire, and(eq(hire.partyId, pack.partyId), eq(hire.id, pack.hireId)))
    .where(and(eq(dispatch.partyId, scope.partyId), eq(dispatch.mailId, mailId)))
    .limit(1)
  return rows[0]
}

/** The shows of a place with what the advance needs of them, in the order of the run. */
export async function listAdvanceShows(db: Db, scope: Scope, place: AdvancePlace) {
  if ('hireId' in place) return []
  return db
    .select({
      id: show.id,
      tourId: show.tourId,
      rigId: show.rigId,
      venueId: stage.venueId,
      name: show.name,
      venueName: venue.name,
      town: venue.town,
      date: day.date,
      zone: sql<string | null>`coalesce(${show.zone}, ${venue.zone})`,
      answersDueAt: show.answersDueAt,
      hired: sql<boolean>`${exists(
        db
          .select({ one: sql`1` })
          .from(hireShow)
          .where(and(eq(hireShow.partyId, show.partyId), eq(hireShow.showId, show.id))),
      )}`,
    })
    .from(show)
    .innerJoin(day, and(eq(day.partyId, show.partyId), eq(day.id, show.dayId)))
    .innerJoin(stage, and(eq(stage.partyId, show.partyId), eq(stage.id, show.stageId)))
    .innerJoin(venue, and(eq(venue.partyId, stage.partyId), eq(venue.id, stage.venueId)))
    .where(and(eq(show.partyId, scope.partyId), 'tourId' in place ? eq(show.tourId, place.tourId) : eq(show.id, place.showId)))
    .orderBy(asc(day.date), asc(show.createdAt), asc(show.id))
    .limit(1000)
}

/** The hires of a place, each with the shows it covers and their rigs. */
export async function listAdvanceHires(db: Db, scope: Scope, place: AdvancePlace) {
  if ('showId' in place) return []
  return db
    .select({
      id: hire.id,
      tourId: hire.tourId,
      supplierId: hire.supplierId,
      name: hire.name,
      supplierName: supplier.name,
      town: supplier.town,
      zone: sql<string | null>`coalesce(${hire.zone}, ${supplier.zone})`,
      answersDueAt: hire.answersDueAt,
      deliveryDate: hire.deliveryDate,
      collectionDate: hire.collectionDate,
      showIds: sql<string[]>`coalesce(array_agg(${show.id} order by ${day.date}, ${show.id}) filter (where ${show.id} is not null), '{}')`,
      rigIds: sql<string[]>`coalesce(array_agg(distinct ${show.rigId}) filter (where ${show.rigId} is not null), '{}')`,
      firstDate: sql<string | null>`min(${day.date})::text`,
      lastDate: sql<string | null>`max(${day.date})::text`,
    })
    .from(hire)
    .innerJoin(supplier, and(eq(supplier.partyId, hire.partyId), eq(supplier.id, hire.supplierId)))
    .leftJoin(hireShow, and(eq(hireShow.partyId, hire.partyId), eq(hireShow.hireId, hire.id)))
    .leftJoin(show, and(eq(show.partyId, hireShow.partyId), eq(show.id, hireShow.showId)))
    .leftJoin(day, and(eq(day.partyId, show.partyId), eq(day.id, show.dayId)))
    .where(and(eq(hire.partyId, scope.partyId), 'tourId' in place ? eq(hire.tourId, place.tourId) : eq(hire.id, place.hireId)))
    .groupBy(hire.id, supplier.id)
    .orderBy(asc(hire.deliveryDate), asc(hire.createdAt), asc(hire.id))
    .limit(1000)
}

/** Who can be sent a pack: people with a duty at some venues and suppliers. */
export async function listRecipients(db: Db, scope: Scope, at: { venueIds: readonly string[]; supplierIds: readonly string[] }) {
  return db
    .select({
      id: contact.id,
      venueId: contact.venueId,
      supplierId: contact.supplierId,
      name: contact.name,
      email: contact.email,
      duties: contact.duties,
    })
    .from(contact)
    .where(
      and(
        eq(contact.partyId, scope.partyId),
        sql`cardinality(${contact.duties}) > 0`,
        or(inArray(contact.venueId, [...at.venueIds]), inArray(contact.supplierId, [...at.supplierIds])),
      ),
    )
    .orderBy(asc(contact.name), asc(contact.id))
    .limit(5000)
}

export async function findRecipient(db: Db, scope: Scope, contactId: string) {
  const rows = await db
    .select({
      id: contact.id,
      venueId: contact.venueId,
      supplierId: contact.supplierId,
      name: contact.name,
      email: contact.email,
      duties: contact.duties,
      locale: contact.locale,
    })
    .from(contact)
    .where(and(eq(contact.partyId, scope.partyId), eq(contact.id, contactId)))
    .limit(1)
  return rows[0]
}

/** A line under the number that stands on paper. */
export type NumberedLine = AnsweredLine & { readonly number: number }

/** The lines of a pack that its reader is asked to answer. */
const askedLines = sql<NumberedLine[]>`coalesce((
  select jsonb_agg(
    jsonb_build_object('lineId', asked->>'lineId', 'hash', asked->>'hash', 'number', (asked->>'number')::int) order by (asked->>'number')::int
  )
  from jsonb_array_elements(${pack.document}->'lines') asked
  where (asked->>'asked')::boolean
), '[]'::jsonb)`

/** Every sending for some shows and hires, newest first, with what became of its mail. */
export async function listDispatches(db: Db, scope: Scope, subjects: Subjects) {
  return db
    .select({
      id: dispatch.id,
      contactId: dispatch.contactId,
      contactName: contact.name,
      grantId: dispatch.grantId,
      packId: pack.id,
      showId: pack.showId,
      hireId: pack.hireId,
      revisionId: pack.revisionId,
      revisionNumber: revision.number,
      rigId: revision.rigId,
      rigName: rig.name,
      pdfPages: pack.pdfPages,
      hasPdf: sql<boolean>`${pack.pdfBlobId} is not null`,
      lines: askedLines,
      sentByName: person.name,
      at: dispatch.createdAt,
      mailId: mail.id,
      toAddress: mail.toAddress,
      sendAfter: mail.sendAfter,
      firstTriedAt: mail.firstTriedAt,
      sentAt: mail.sentAt,
      cancelledAt: mail.cancelledAt,
      failedAt: mail.failedAt,
      failure: mail.failure,
      told: sql<string[]>`coalesce((
        select array_agg(${mailEvent.kind} order by ${mailEvent.at}, ${mailEvent.id}) from ${mailEvent} where ${mailEvent.mailId} = ${mail.id}
      ), '{}')`,
    })
    .from(dispatch)
    .innerJoin(pack, and(eq(pack.partyId, dispatch.partyId), eq(pack.id, dispatch.packId)))
    .innerJoin(revision, and(eq(revision.partyId, pack.partyId), eq(revision.id, pack.revisionId)))
    .innerJoin(rig, and(eq(rig.partyId, revision.partyId), eq(rig.id, revision.rigId)))
    .innerJoin(contact, and(eq(contact.partyId, dispatch.partyId), eq(contact.id, dispatch.contactId)))
    .innerJoin(mail, and(eq(mail.partyId, dispatch.partyId), eq(mail.id, dispatch.mailId)))
    .innerJoin(person, eq(person.id, dispatch.sentBy))
    .where(
      and(
        eq(dispatch.partyId, scope.partyId),
        or(inArray(pack.showId, [...subjects.showIds]), inArray(pack.hireId, [...subjects.hireIds])),
      ),
    )
    .orderBy(desc(dispatch.createdAt), desc(dispatch.id))
    .limit(5000)
}
export type DispatchRow = Awaited<ReturnType<typeof listDispatches>>[number]

/** What the newest revision of each rig asks for, in its order. */
export async function listNewestLines(db: Db, scope: Scope, rigIds: readonly string[]) {
  if (rigIds.length === 0) return []
  const newest = db
    .selectDistinctOn([revision.rigId], { id: revision.id, rigId: revision.rigId, number: revision.number })
    .from(revision)
    .where(and(eq(revision.partyId, scope.partyId), inArray(revision.rigId, [...rigIds])))
    .orderBy(revision.rigId, desc(revision.number))
    .as('newest')
  return db
    .select({
      revisionId: newest.id,
      rigId: newest.rigId,
      revisionNumber: newest.number,
      lineId: revisionLine.lineId,
      hash: revisionLine.hash,
      number: revisionLine.position,
      supply: sql<'rented' | 'venue'>`${revisionLine.content}->>'supply'`,
    })
    .from(newest)
    .innerJoin(revisionLine, and(eq(revisionLine.partyId, scope.partyId), eq(revisionLine.revisionId, newest.id)))
    .orderBy(asc(newest.rigId), asc(revisionLine.position), asc(revisionLine.lineId))
    .limit(10_000)
}

/** The revisions of some rigs that can be sent, newest first. */
export async function listSendableRevisions(db: Db, scope: Scope, rigIds: readonly string[]) {
  if (rigIds.length === 0) return []
  return db
    .select({ id: revision.id, rigId: revision.rigId, rigName: rig.name, number: revision.number, note: revision.note, issuedAt: revision.issuedAt })
    .from(revision)
    .innerJoin(rig, and(eq(rig.partyId, revision.partyId), eq(rig.id, revision.rigId)))
    .where(and(eq(revision.partyId, scope.partyId), inArray(revision.rigId, [...rigIds])))
    .orderBy(desc(revision.issuedAt), desc(revision.number), asc(revision.id))
    .limit(40)
}

/** Holds an id made by a client against the same request coming twice at once. */
export async function lockDispatchId(db: Db, dispatchId: string): Promise<void> {
  await db.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`dispatch ${dispatchId}`}, 0))`)
}

export async function findDispatch(db: Db, scope: Scope, dispatchId: string) {
  const rows = await db
    .select({
      id: dispatch.id,
      contactId: dispatch.contactId,
      grantId: dispatch.grantId,
      mailId: dispatch.mailId,
      showId: pack.showId,
      hireId: pack.hireId,
      revisionId: pack.revisionId,
    })
    .from(dispatch)
    .innerJoin(pack, and(eq(pack.partyId, dispatch.partyId), eq(pack.id, dispatch.packId)))
    .where(and(eq(dispatch.partyId, scope.partyId), eq(dispatch.id, dispatchId)))
    .limit(1)
  return rows[0]
}

/** False when a sending of that id is there already, in whatever party. */
export async function insertDispatch(db: Db, scope: Scope, row: Omit<typeof dispatch.$inferInsert, 'partyId'>): Promise<boolean> {
  const rows = await db
    .insert(dispatch)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: dispatch.id })
    .returning({ id: dispatch.id })
  return rows.length === 1
}

/** The packs behind a link: of each rig the newest that was not stopped and is no longer held back. */
export async function listPacksOfGrant(db: Db, scope: Scope, grantId: string) {
  return db
    .selectDistinctOn([revision.rigId], {
      packId: pack.id,
      revisionId: pack.revisionId,
      revisionNumber: revision.number,
      rigName: rig.name,
      document: pack.document,
      pdfBlobId: pack.pdfBlobId,
      pdfPages: pack.pdfPages,
      at: dispatch.createdAt,
    })
    .from(dispatch)
    .innerJoin(pack, and(eq(pack.partyId, dispatch.partyId), eq(pack.id, dispatch.packId)))
    .innerJoin(revision, and(eq(revision.partyId, pack.partyId), eq(revision.id, pack.revisionId)))
    .innerJoin(rig, and(eq(rig.partyId, revision.partyId), eq(rig.id, revision.rigId)))
    .innerJoin(mail, and(eq(mail.partyId, dispatch.partyId), eq(mail.id, dispatch.mailId)))
    .where(
      and(
        eq(dispatch.partyId, scope.partyId),
        eq(dispatch.grantId, grantId),
        isNull(mail.cancelledAt),
        lte(mail.sendAfter, sql`now()`),
      ),
    )
    .orderBy(revision.rigId, desc(dispatch.createdAt), desc(dispatch.id))
    .limit(20)
}
