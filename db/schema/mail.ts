import { foreignKey, index, integer, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import { createdAtColumn, idColumn, instant } from './columns'
import { blob } from './file'

/**
 * The outbox: a row written in the caller's transaction, sent by a job. Sign-in mails belong to no party.
 * The idempotency key is the row's own; the provider forgets it after a day, so a row that is still in doubt by then
 * waits for a person instead of being sent again.
 */
export const mail = pgTable(
  'mail',
  {
    id: idColumn(),
    partyId: uuid('party_id'),
    kind: text('kind').$type<'sign-in' | 'reset' | 'invitation' | 'pack' | 'fresh-link'>().notNull(),
    toAddress: text('to_address').notNull(),
    toName: text('to_name').notNull().default(''),
    subject: text('subject').notNull(),
    textBody: text('text_body').notNull(),
    htmlBody: text('html_body').notNull(),
    idempotencyKey: text('idempotency_key').notNull().unique(),
    sendAfter: instant('send_after').notNull().defaultNow(),
    firstTriedAt: instant('first_tried_at'),
    attempts: integer('attempts').notNull().default(0),
    sentAt: instant('sent_at'),
    providerId: text('provider_id').unique(),
    cancelledAt: instant('cancelled_at'),
    failedAt: instant('failed_at'),
    failure: text('failure'),
    createdAt: createdAtColumn(),
  },
  (t) => [unique('mail_party_key').on(t.partyId, t.id)],
)

export const mailAttachment = pgTable(
  'mail_attachment',
  {
    id: idColumn(),
    partyId: uuid('party_id').notNull(),
    mailId: uuid('mail_id').notNull(),
    blobId: uuid('blob_id').notNull(),
    name: text('name').notNull(),
  },
  (t) => [
    foreignKey({ name: 'mail_attachment_mail_fk', columns: [t.partyId, t.mailId], foreignColumns: [mail.partyId, mail.id] }).onDelete('cascade'),
    foreignKey({ name: 'mail_attachment_blob_fk', columns: [t.partyId, t.blobId], foreignColumns: [blob.partyId, blob.id] }),
    index('mail_attachment_mail_idx').on(t.mailId),
  ],
)

/** What the provider told us by webhook. A replayed event has the same id and is dropped. */
export const mailEvent = pgTable(
  'mail_event',
  {
    id: idColumn(),
    eventId: text('event_id').notNull().unique(),
    mailId: uuid('mail_id')
      .notNull()
      .references(() => mail.id, { onDelete: 'cascade' }),
    kind: text('kind').$type<'delivered' | 'delayed' | 'bounced' | 'complained' | 'failed'>().notNull(),
    detail: jsonb('detail').notNull(),
    at: instant('at').notNull(),
    receivedAt: instant('received_at').notNull().defaultNow(),
  },
  (t) => [index('mail_event_mail_idx').on(t.mailId)],
)
