import { foreignKey, index, integer, jsonb, pgTable, primaryKey, text, unique, uuid } from 'drizzle-orm/pg-core'
import { createdAtColumn, idColumn, instant, partyIdColumn } from './columns'
import { kitEntry } from './kit'
import { person } from './person'
import { rig } from './tour'

/** One thing asked for, with a permanent id. What it says at a revision stands in revision_line. */
export const line = pgTable(
  'line',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    rigId: uuid('rig_id').notNull(),
    /** Null for a line made by hand. */
    kitEntryId: uuid('kit_entry_id'),
    kind: text('kind').notNull(),
    /** A line whose kind changes is a new line that replaces the old one. */
    replacesLineId: uuid('replaces_line_id'),
    createdAt: createdAtColumn(),
  },
  (t) => [
    unique('line_party_key').on(t.partyId, t.id),
    // One line an entry and kind: issuing twice finds the same line again.
    unique('line_entry_key').on(t.kitEntryId, t.kind),
    foreignKey({ name: 'line_rig_fk', columns: [t.partyId, t.rigId], foreignColumns: [rig.partyId, rig.id] }).onDelete('cascade'),
    foreignKey({ name: 'line_entry_fk', columns: [t.partyId, t.kitEntryId], foreignColumns: [kitEntry.partyId, kitEntry.id] }),
    foreignKey({ name: 'line_replaces_fk', columns: [t.partyId, t.replacesLineId], foreignColumns: [t.partyId, t.id] }),
    index('line_rig_idx').on(t.partyId, t.rigId),
  ],
)

/** The frozen spec of a rig: a schema-versioned document that is never written again. */
export const revision = pgTable(
  'revision',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    rigId: uuid('rig_id').notNull(),
    number: integer('number').notNull(),
    note: text('note').notNull(),
    schemaVersion: integer('schema_version').notNull(),
    document: jsonb('document').notNull(),
    documentHash: text('document_hash').notNull(),
    issuedBy: uuid('issued_by')
      .notNull()
      .references(() => person.id),
    issuedAt: instant('issued_at').notNull().defaultNow(),
  },
  (t) => [
    unique('revision_party_key').on(t.partyId, t.id),
    unique('revision_number_key').on(t.rigId, t.number),
    foreignKey({ name: 'revision_rig_fk', columns: [t.partyId, t.rigId], foreignColumns: [rig.partyId, rig.id] }).onDelete('cascade'),
  ],
)

/** What a line said in a revision, with the hash of it: an answer carries over while the hash holds. */
export const revisionLine = pgTable(
  'revision_line',
  {
    partyId: partyIdColumn(),
    revisionId: uuid('revision_id').notNull(),
    lineId: uuid('line_id').notNull(),
    hash: text('hash').notNull(),
    position: integer('position').notNull(),
    content: jsonb('content').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.revisionId, t.lineId] }),
    foreignKey({ name: 'revision_line_revision_fk', columns: [t.partyId, t.revisionId], foreignColumns: [revision.partyId, revision.id] }).onDelete('cascade'),
    foreignKey({ name: 'revision_line_line_fk', columns: [t.partyId, t.lineId], foreignColumns: [line.partyId, line.id] }),
    index('revision_line_line_idx').on(t.partyId, t.lineId),
  ],
)
