import { foreignKey, index, integer, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import { createdAtColumn, idColumn, partyIdColumn } from './columns'
import { party } from './party'

/** Bytes by content: the same bytes of one party are stored once. The bytes lie in the store under the hash. */
export const blob = pgTable(
  'blob',
  {
    id: idColumn(),
    partyId: partyIdColumn().references(() => party.id, { onDelete: 'cascade' }),
    sha256: text('sha256').notNull(),
    size: integer('size').notNull(),
    contentType: text('content_type').notNull(),
    createdAt: createdAtColumn(),
  },
  (t) => [unique('blob_party_key').on(t.partyId, t.id), unique('blob_content_key').on(t.partyId, t.sha256)],
)

/** Why a blob is kept and who may see it. */
export const fileReference = pgTable(
  'file_reference',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    blobId: uuid('blob_id').notNull(),
    name: text('name').notNull(),
    audience: text('audience').$type<'party' | 'recipient'>().notNull(),
    subjectType: text('subject_type').notNull(),
    subjectId: uuid('subject_id').notNull(),
    createdAt: createdAtColumn(),
  },
  (t) => [
    unique('file_reference_party_key').on(t.partyId, t.id),
    foreignKey({ name: 'file_reference_blob_fk', columns: [t.partyId, t.blobId], foreignColumns: [blob.partyId, blob.id] }),
    index('file_reference_subject_idx').on(t.partyId, t.subjectType, t.subjectId),
  ],
)
