import { bigserial, index, jsonb, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { instant } from './columns'

/**
 * Who did what, on which thing, when and from which address, written with the change itself.
 * It holds plain ids, not keys: the trail outlives what it speaks of.
 */
export const auditEvent = pgTable(
  'audit_event',
  {
    id: bigserial('id', { mode: 'number' }).primaryKey(),
    partyId: uuid('party_id'),
    actorKind: text('actor_kind').$type<'person' | 'link' | 'job' | 'public'>().notNull(),
    actorId: text('actor_id').notNull(),
    action: text('action').notNull(),
    subjectType: text('subject_type').notNull(),
    subjectId: text('subject_id').notNull(),
    detail: jsonb('detail').notNull().default({}),
    address: text('address').notNull().default(''),
    at: instant('at').notNull().defaultNow(),
  },
  (t) => [
    // The trail is read newest first.
    index('audit_event_party_idx').on(t.partyId, t.id),
    index('audit_event_subject_idx').on(t.partyId, t.subjectType, t.subjectId),
  ],
)
