import { and, arrayOverlaps, asc, desc, eq, exists, inArray, isNull, notExists, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { dispatch, pack } from '@/db/schema/advance'
import { contact, stage, supplier, venue } from '@/db/schema/directory'
import { blob } from '@/db/schema/file'
import { hire, hireShow } from '@/db/schema/hire'
import { mail, mailEvent } from '@/db/schema/mail'
import { membership, player } from '@/db/schema/party'
import { person } from '@/db/schema/person'
import { revision } from '@/db/schema/revision'
import { day, rig, show } from '@/db/schema/tour'

/** A pack is of one show or of one hire. */
export type PackOf = { readonly showId: string } | { readonly hireId: string }

function ofThis(of: PackOf) {
  return 'showId' in of ? eq(pack.showId, of.showId) : eq(pack.hireId, of.hireId)
}

/** What a pack tells of shows, in the order in which they are played. */
export async function listPackShows(db: Db, scope: Scope, showIds: string[]) {
  if (showIds.length === 0) return []
  return db
    .select({
      id: show.id,
      tourId: show.tourId,
      rigId: show.rigId,
      rigName: rig.name,
      date: day.date,
      name: show.name,
      zone: sql<string | null>`coalesce(${show.zone}, ${venue.zone})`,
      loadInTime: show.loadInTime,
      showTime: show.showTime,
      showDayOffset: show.showDayOffset,
      answersDueAt: show.answersDueAt,
      slot: show.slot,
      sharedKit: show.sharedKit,
      venue: { id: venue.id, name: venue.name, town: venue.town, country: venue.country },
      stage: {
        name: stage.name,
        widthM: stage.widthM,
        depthM: stage.depthM,
        heightM: stage.heightM,
        access: stage.access,
        volts: stage.volts,
        mainsHz: stage.mainsHz,
        inlets: stage.inlets,
      },
      player: { name: player.name, hand: player.hand, throneHeightM: player.throneHeightM, mixes: player.mixes },
    })
    .from(show)
    .innerJoin(day, and(eq(day.partyId, show.partyId), eq(day.id, show.dayId)))
    .innerJoin(rig, and(eq(rig.partyId, show.partyId), eq(rig.id, show.rigId)))
    .innerJoin(stage, and(eq(stage.partyId, show.partyId), eq(stage.id, show.stageId)))
    .innerJoin(venue, and(eq(venue.partyId, stage.partyId), eq(venue.id, stage.venueId)))
    .innerJoin(player, and(eq(player.partyId, show.partyId), eq(player.id, show.playerId)))
    .where(and(eq(show.partyId, scope.partyId), inArray(show.id, showIds)))
    .orderBy(asc(day.date), sql`${show.showTime} asc nulls last`, asc(show.id))
    .limit(showIds.length)
}

/** Names of the suppliers hired for a show. */
export async function listSupplierNames(db: Db, scope: Scope, showId: string): Promise<string[]> {
  const rows = await db
    .selectDistinct({ name: supplier.name })
    .from(hireShow)
    .innerJoin(hire, and(eq(hire.partyId, hireShow.partyId), eq(hire.id, hireShow.hireId)))
    .innerJoin(supplier, and(eq(supplier.partyId, hire.partyId), eq(supplier.id, hire.supplierId)))
    .where(and(eq(hireShow.partyId, scope.partyId), eq(hireShow.showId, showId)))
    .orderBy(asc(supplier.name))
    .limit(20)
  return rows.map((row) => row.name)
}

/** What a pack tells of a hire: no price, no rate, no tax is read here. */
export async function findPackHire(db: Db, scope: Scope, hireId: string) {
  const rows = await db
    .select({
      id: hire.id,
      tourId: hire.tourId,
      zone: hire.zone,
      deliveryDate: hire.deliveryDate,
      deliveryFrom: hire.deliveryFrom,
      deliveryUntil: hire.deliveryUntil,
      collectionDate: hire.collectionDate,
      collectionFrom: hire.collectionFrom,
      collectionUntil: hire.collectionUntil,
      receiver: hire.receiver,
      conditionOnReturn: hire.conditionOnReturn,
      poNumber: hire.poNumber,
      answersDueAt: hire.answersDueAt,
      supplier: { id: supplier.id, name: supplier.name, town: supplier.town, country: supplier.country },
    })
    .from(hire)
    .innerJoin(supplier, and(eq(supplier.partyId, hire.partyId), eq(supplier.id, hire.supplierId)))
    .where(and(eq(hire.partyId, scope.partyId), eq(hire.id, hireId)))
    .limit(1)
  return rows[0]
}

export async function listHireShowIds(db: Db, scope: Scope, hireId: string): Promise<string[]> {
  const rows = await db
    .select({ showId: hireShow.showId })
    .from(hireShow)
    .where(and(eq(hireShow.partyId, scope.partyId), eq(hireShow.hireId, hireId)))
    .orderBy(asc(hireShow.showId))
    .limit(200)
  return rows.map((row) => row.showId)
}

/** The contacts of one house. */
export async function listHouseContacts(db: Db, scope: Scope, house: { venueId: string } | { supplierId: string }) {
  return db
    .select({ name: contact.name, email: contact.email, phone: contact.phone, duties: contact.duties })
    .from(contact)
    .where(
      and(
        eq(contact.partyId, scope.partyId),
        'venueId' in house ? eq(contact.venueId, house.venueId) : eq(contact.supplierId, house.supplierId),
      ),
    )
    .orderBy(asc(contact.name), asc(contact.id))
    .limit(50)
}

/** The party's own people whom a recipient may ask: tour managers and drum techs. */
export async function listPartyCrew(db: Db, scope: Scope) {
  return db
    .select({ name: person.name, email: person.email, roles: membership.roles })
    .from(membership)
    .innerJoin(person, eq(person.id, membership.personId))
    .where(and(eq(membership.partyId, scope.partyId), arrayOverlaps(membership.roles, ['tour-manager', 'drum-tech'])))
    .orderBy(asc(person.name), asc(person.id))
    .limit(12)
}

/** The revision of a rig in the last pack that went out to a recipient; a mail that was stopped or came back told nobody anything. */
export async function findLastSentRevision(
  db: Db,
  scope: Scope,
  { of, rigId, contactId }: { of: PackOf; rigId: string; contactId?: string | undefined },
) {
  const rows = await db
    .select({ number: revision.number, document: revision.document })
    .from(dispatch)
    .innerJoin(pack, and(eq(pack.partyId, dispatch.partyId), eq(pack.id, dispatch.packId)))
    .innerJoin(revision, and(eq(revision.partyId, pack.partyId), eq(revision.id, pack.revisionId)))
    .innerJoin(mail, and(eq(mail.partyId, dispatch.partyId), eq(mail.id, dispatch.mailId)))
    .where(
      and(
        eq(dispatch.partyId, scope.partyId),
        ofThis(of),
        eq(revision.rigId, rigId),
        contactId === undefined ? undefined : eq(dispatch.contactId, contactId),
        isNull(mail.cancelledAt),
        isNull(mail.failedAt),
        notExists(
          db
            .select({ one: sql`1` })
            .from(mailEvent)
            .where(and(eq(mailEvent.mailId, mail.id), inArray(mailEvent.kind, ['bounced', 'failed']))),
        ),
      ),
    )
    .orderBy(desc(dispatch.createdAt), desc(dispatch.id))
    .limit(1)
  return rows[0]
}

export async function insertPack(
  db: Db,
  scope: Scope,
  row: Omit<typeof pack.$inferInsert, 'partyId' | 'createdAt' | 'pdfBlobId' | 'pdfPages'>,
): Promise<string | undefined> {
  const rows = await db
    .insert(pack)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: pack.id })
    .returning({ id: pack.id })
  return rows[0]?.id
}

/** A pack with its document, and the bytes of its PDF once they are there. */
export async function findPack(db: Db, scope: Scope, packId: string) {
  const rows = await db
    .select({
      id: pack.id,
      revisionId: pack.revisionId,
      revisionNumber: revision.number,
      rigId: revision.rigId,
      tourId: rig.tourId,
      showId: pack.showId,
      hireId: pack.hireId,
      document: pack.document,
      pdfBlobId: pack.pdfBlobId,
      pdfSha256: blob.sha256,
      pdfPages: pack.pdfPages,
      /** Sent, or about to be: its PDF holds its reader's own key. */
      dispatched: sql<boolean>`${exists(
        db
          .select({ one: sql`1` })
          .from(dispatch)
          .where(and(eq(dispatch.partyId, pack.partyId), eq(dispatch.packId, pack.id))),
      )}`,
      createdAt: pack.createdAt,
    })
    .from(pack)
    .innerJoin(revision, and(eq(revision.partyId, pack.partyId), eq(revision.id, pack.revisionId)))
    .innerJoin(rig, and(eq(rig.partyId, revision.partyId), eq(rig.id, revision.rigId)))
    .leftJoin(blob, and(eq(blob.partyId, pack.partyId), eq(blob.id, pack.pdfBlobId)))
    .where(and(eq(pack.partyId, scope.partyId), eq(pack.id, packId)))
    .limit(1)
  return rows[0]
}

/** Holds the pack for the one job that writes its PDF; answers the PDF that is there already, if any. */
export async function lockPack(db: Db, scope: Scope, packId: string) {
  const rows = await db
    .select({ id: pack.id, pdfBlobId: pack.pdfBlobId })
    .from(pack)
    .where(and(eq(pack.partyId, scope.partyId), eq(pack.id, packId)))
    .limit(1)
    .for('update')
  return rows[0]
}

export async function setPackPdf(
  db: Db,
  scope: Scope,
  input: { packId: string; blobId: string; pages: number },
): Promise<void> {
  await db
    .update(pack)
    .set({ pdfBlobId: input.blobId, pdfPages: input.pages })
    .where(and(eq(pack.partyId, scope.partyId), eq(pack.id, input.packId)))
}
