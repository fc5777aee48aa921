import { sql } from 'drizzle-orm'
import { index, pgTable, primaryKey, text, uniqueIndex, uuid } from 'drizzle-orm/pg-core'
import { createdAtColumn, idColumn, instant } from './columns'

/** Someone who can sign in. A person belongs to no party by itself; see membership. */
export const person = pgTable(
  'person',
  {
    id: idColumn(),
    name: text('name').notNull(),
    email: text('email').notNull(),
    emailVerifiedAt: instant('email_verified_at'),
    /** argon2id; null until a password is chosen (an e-mail link signs in without one). */
    passwordHash: text('password_hash'),
    locale: text('locale').notNull().default('en'),
    createdAt: createdAtColumn(),
  },
  // Addresses are compared without case: two rows for one mailbox would be two people.
  (t) => [uniqueIndex('person_email_key').on(sql`lower(${t.email})`)],
)

/** One signed-in device. Checked on every request, so ending it works at once although the cookie is a JWT. */
export const session = pgTable(
  'session',
  {
    id: idColumn(),
    personId: uuid('person_id')
      .notNull()
      .references(() => person.id, { onDelete: 'cascade' }),
    /** The party this device works in now; null while the person belongs to none. */
    activePartyId: uuid('active_party_id'),
    device: text('device').notNull().default(''),
    createdAt: createdAtColumn(),
    lastSeenAt: instant('last_seen_at').notNull().defaultNow(),
    expiresAt: instant('expires_at').notNull(),
    endedAt: instant('ended_at'),
  },
  // Listing and ending every device of one person.
  (t) => [index('session_person_idx').on(t.personId)],
)

/** Next-auth's one-time tokens of the e-mail link; the token column holds its hash. */
export const verificationToken = pgTable(
  'verification_token',
  { identifier: text('identifier').notNull(), token: text('token').notNull(), expires: instant('expires').notNull() },
  (t) => [primaryKey({ columns: [t.identifier, t.token] })],
)

/** A one-time link to choose a new password; only its hash is stored. */
export const passwordReset = pgTable(
  'password_reset',
  {
    id: idColumn(),
    personId: uuid('person_id')
      .notNull()
      .references(() => person.id, { onDelete: 'cascade' }),
    tokenHash: text('token_hash').notNull().unique(),
    createdAt: createdAtColumn(),
    expiresAt: instant('expires_at').notNull(),
    usedAt: instant('used_at'),
  },
  (t) => [index('password_reset_person_idx').on(t.personId)],
)
