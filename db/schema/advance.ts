import { sql } from 'drizzle-orm'
import { bigserial, check, foreignKey, index, integer, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import { createdAtColumn, idColumn, instant, partyIdColumn } from './columns'
import { contact } from './directory'
import { blob } from './file'
import { grant, grantToken } from './grant'
import { hire } from './hire'
import { mail } from './mail'
import { person } from './person'
import { line, revision } from './revision'
import { show } from './tour'

/** What one recipient gets: the composed document and the very bytes of its PDF. */
export const pack = pgTable(
  'pack',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    revisionId: uuid('revision_id').notNull(),
    showId: uuid('show_id'),
    hireId: uuid('hire_id'),
    schemaVersion: integer('schema_version').notNull(),
    document: jsonb('document').notNull(),
    /** Null until the worker has made the PDF. */
    pdfBlobId: uuid('pdf_blob_id'),
    pdfPages: integer('pdf_pages'),
    createdAt: createdAtColumn(),
  },
  (t) => [
    unique('pack_party_key').on(t.partyId, t.id),
    foreignKey({ name: 'pack_revision_fk', columns: [t.partyId, t.revisionId], foreignColumns: [revision.partyId, revision.id] }),
    foreignKey({ name: 'pack_show_fk', columns: [t.partyId, t.showId], foreignColumns: [show.partyId, show.id] }),
    foreignKey({ name: 'pack_hire_fk', columns: [t.partyId, t.hireId], foreignColumns: [hire.partyId, hire.id] }),
    foreignKey({ name: 'pack_blob_fk', columns: [t.partyId, t.pdfBlobId], foreignColumns: [blob.partyId, blob.id] }),
    check('pack_of_one', sql`num_nonnulls(${t.showId}, ${t.hireId}) = 1`),
    index('pack_show_idx').on(t.partyId, t.showId),
    index('pack_hire_idx').on(t.partyId, t.hireId),
  ],
)

/** One sending of one pack to one recipient. Its standing is derived from its mail, that mail's events and the answers. */
export const dispatch = pgTable(
  'dispatch',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    packId: uuid('pack_id').notNull(),
    grantId: uuid('grant_id').notNull(),
    contactId: uuid('contact_id').notNull(),
    mailId: uuid('mail_id').notNull(),
    sentBy: uuid('sent_by')
      .notNull()
      .references(() => person.id),
    createdAt: createdAtColumn(),
  },
  (t) => [
    unique('dispatch_party_key').on(t.partyId, t.id),
    foreignKey({ name: 'dispatch_pack_fk', columns: [t.partyId, t.packId], foreignColumns: [pack.partyId, pack.id] }),
    foreignKey({ name: 'dispatch_grant_fk', columns: [t.partyId, t.grantId], foreignColumns: [grant.partyId, grant.id] }),
    foreignKey({ name: 'dispatch_contact_fk', columns: [t.partyId, t.contactId], foreignColumns: [contact.partyId, contact.id] }),
    foreignKey({ name: 'dispatch_mail_fk', columns: [t.partyId, t.mailId], foreignColumns: [mail.partyId, mail.id] }),
    index('dispatch_pack_idx').on(t.partyId, t.packId),
    index('dispatch_grant_idx').on(t.partyId, t.grantId),
  ],
)

/**
 * What a recipient said, append-only. `answer` speaks of one line at one hash; `close` is "that's all from us".
 * The id is made by the client, so a repeated request is the same answer. `sequence` orders everything ever said.
 */
export const answerEvent = pgTable(
  'answer_event',
  {
    id: uuid('id').primaryKey(),
    sequence: bigserial('sequence', { mode: 'number' }).notNull().unique(),
    partyId: partyIdColumn(),
    showId: uuid('show_id'),
    hireId: uuid('hire_id'),
    kind: text('kind').$type<'answer' | 'close'>().notNull(),
    lineId: uuid('line_id'),
    lineHash: text('line_hash'),
    revisionId: uuid('revision_id').notNull(),
    content: jsonb('content'),
    remark: text('remark').notNull().default(''),
    byName: text('by_name').notNull(),
    /** Through a link … */
    grantId: uuid('grant_id'),
    tokenId: uuid('token_id'),
    /** … or taken down by a signed-in person: from whom and how. */
    personId: uuid('person_id').references(() => person.id),
    takenFrom: text('taken_from'),
    takenHow: text('taken_how'),
    at: instant('at').notNull().defaultNow(),
  },
  (t) => [
    unique('answer_event_party_key').on(t.partyId, t.id),
    foreignKey({ name: 'answer_event_show_fk', columns: [t.partyId, t.showId], foreignColumns: [show.partyId, show.id] }).onDelete('cascade'),
    foreignKey({ name: 'answer_event_hire_fk', columns: [t.partyId, t.hireId], foreignColumns: [hire.partyId, hire.id] }).onDelete('cascade'),
    foreignKey({ name: 'answer_event_line_fk', columns: [t.partyId, t.lineId], foreignColumns: [line.partyId, line.id] }),
    foreignKey({ name: 'answer_event_revision_fk', columns: [t.partyId, t.revisionId], foreignColumns: [revision.partyId, revision.id] }),
    foreignKey({ name: 'answer_event_grant_fk', columns: [t.partyId, t.grantId], foreignColumns: [grant.partyId, grant.id] }),
    foreignKey({ name: 'answer_event_token_fk', columns: [t.partyId, t.tokenId], foreignColumns: [grantToken.partyId, grantToken.id] }),
    check('answer_event_of_one', sql`num_nonnulls(${t.showId}, ${t.hireId}) = 1`),
    check('answer_event_by_one', sql`num_nonnulls(${t.tokenId}, ${t.personId}) = 1`),
    check('answer_event_line', sql`${t.kind} = 'close' or (${t.lineId} is not null and ${t.lineHash} is not null and ${t.content} is not null)`),
    index('answer_event_show_idx').on(t.partyId, t.showId, t.sequence),
    index('answer_event_hire_idx').on(t.partyId, t.hireId, t.sequence),
  ],
)

/** What the tour manager decided about an answer, append-only; the newest for a line stands while its answer does. */
export const settlement = pgTable(
  'settlement',
  {
    id: uuid('id').primaryKey(),
    sequence: bigserial('sequence', { mode: 'number' }).notNull().unique(),
    partyId: partyIdColumn(),
    showId: uuid('show_id'),
    hireId: uuid('hire_id'),
    lineId: uuid('line_id').notNull(),
    lineHash: text('line_hash').notNull(),
    answerEventId: uuid('answer_event_id').notNull(),
    decision: text('decision').$type<'accept' | 'reopen'>().notNull(),
    remark: text('remark').notNull().default(''),
    personId: uuid('person_id')
      .notNull()
      .references(() => person.id),
    at: instant('at').notNull().defaultNow(),
  },
  (t) => [
    unique('settlement_party_key').on(t.partyId, t.id),
    foreignKey({ name: 'settlement_show_fk', columns: [t.partyId, t.showId], foreignColumns: [show.partyId, show.id] }).onDelete('cascade'),
    foreignKey({ name: 'settlement_hire_fk', columns: [t.partyId, t.hireId], foreignColumns: [hire.partyId, hire.id] }).onDelete('cascade'),
    foreignKey({ name: 'settlement_line_fk', columns: [t.partyId, t.lineId], foreignColumns: [line.partyId, line.id] }),
    foreignKey({ name: 'settlement_answer_fk', columns: [t.partyId, t.answerEventId], foreignColumns: [answerEvent.partyId, answerEvent.id] }),
    check('settlement_of_one', sql`num_nonnulls(${t.showId}, ${t.hireId}) = 1`),
    index('settlement_show_idx').on(t.partyId, t.showId, t.sequence),
    index('settlement_hire_idx').on(t.partyId, t.hireId, t.sequence),
  ],
)
