import { sql } from 'drizzle-orm'
import { check, foreignKey, index, integer, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import { createdAtColumn, idColumn, instant, partyIdColumn } from './columns'
import { contact } from './directory'
import { hire } from './hire'
import { person } from './person'
import { show } from './tour'

/** Leave to do one thing (reply, bench) on one show or one hire, until a time. Its keys are grant_tokens. */
export const grant = pgTable(
  'grant',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    purpose: text('purpose').$type<'reply' | 'bench'>().notNull(),
    showId: uuid('show_id'),
    hireId: uuid('hire_id'),
    /** The contact it was made for; null for a bench code printed for whoever stands there. */
    contactId: uuid('contact_id'),
    recipientName: text('recipient_name').notNull(),
    recipientEmail: text('recipient_email'),
    expiresAt: instant('expires_at').notNull(),
    withdrawnAt: instant('withdrawn_at'),
    createdBy: uuid('created_by')
      .notNull()
      .references(() => person.id),
    createdAt: createdAtColumn(),
  },
  (t) => [
    unique('grant_party_key').on(t.partyId, t.id),
    foreignKey({ name: 'grant_show_fk', columns: [t.partyId, t.showId], foreignColumns: [show.partyId, show.id] }).onDelete('cascade'),
    foreignKey({ name: 'grant_hire_fk', columns: [t.partyId, t.hireId], foreignColumns: [hire.partyId, hire.id] }).onDelete('cascade'),
    foreignKey({ name: 'grant_contact_fk', columns: [t.partyId, t.contactId], foreignColumns: [contact.partyId, contact.id] }),
    check('grant_of_one', sql`num_nonnulls(${t.showId}, ${t.hireId}) = 1`),
    check('grant_bench_of_show', sql`${t.purpose} <> 'bench' or ${t.showId} is not null`),
    index('grant_show_idx').on(t.partyId, t.showId),
    index('grant_hire_idx').on(t.partyId, t.hireId),
  ],
)

/** A key to a grant, one per mail or print; only its hash is stored, so a new one is made rather than the old one shown. */
export const grantToken = pgTable(
  'grant_token',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    grantId: uuid('grant_id').notNull(),
    tokenHash: text('token_hash').notNull().unique(),
    madeFor: text('made_for').$type<'dispatch' | 'print' | 'fresh'>().notNull(),
    createdAt: createdAtColumn(),
    lastUsedAt: instant('last_used_at'),
    useCount: integer('use_count').notNull().default(0),
  },
  (t) => [
    unique('grant_token_party_key').on(t.partyId, t.id),
    foreignKey({ name: 'grant_token_grant_fk', columns: [t.partyId, t.grantId], foreignColumns: [grant.partyId, grant.id] }).onDelete('cascade'),
    index('grant_token_grant_idx').on(t.partyId, t.grantId),
  ],
)
