import { sql } from 'drizzle-orm'
import { doublePrecision, foreignKey, index, jsonb, pgTable, primaryKey, text, unique, uniqueIndex, uuid } from 'drizzle-orm/pg-core'
import type { Role } from '@/lib/contracts/common'
import { createdAtColumn, idColumn, instant, partyIdColumn, versionColumn } from './columns'
import { person } from './person'

/** The touring party: the owner of everything below it. */
export const party = pgTable('party', {
  id: idColumn(),
  name: text('name').notNull(),
  units: text('units').$type<'metric' | 'imperial'>().notNull().default('metric'),
  /** Frequency of A4, Hz. */
  referenceHz: doublePrecision('reference_hz').notNull().default(440),
  paper: text('paper').$type<'A4' | 'Letter'>().notNull().default('A4'),
  locale: text('locale').notNull().default('en'),
  version: versionColumn(),
  createdAt: createdAtColumn(),
})

/** A person in a party, with a set of roles. */
export const membership = pgTable(
  'membership',
  {
    partyId: partyIdColumn().references(() => party.id, { onDelete: 'cascade' }),
    personId: uuid('person_id')
      .notNull()
      .references(() => person.id, { onDelete: 'cascade' }),
    roles: text('roles').array().$type<Role[]>().notNull(),
    version: versionColumn(),
    createdAt: createdAtColumn(),
  },
  // The reverse look-up: which parties a person may switch to.
  (t) => [primaryKey({ columns: [t.partyId, t.personId] }), index('membership_person_idx').on(t.personId)],
)

/** A role lent to a member until a time. */
export const standIn = pgTable(
  'stand_in',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    personId: uuid('person_id').notNull(),
    role: text('role').$type<Role>().notNull(),
    lentBy: uuid('lent_by')
      .notNull()
      .references(() => person.id),
    fromAt: instant('from_at').notNull().defaultNow(),
    untilAt: instant('until_at').notNull(),
    endedAt: instant('ended_at'),
  },
  (t) => [
    unique('stand_in_party_key').on(t.partyId, t.id),
    foreignKey({
      name: 'stand_in_membership_fk',
      columns: [t.partyId, t.personId],
      foreignColumns: [membership.partyId, membership.personId],
    }).onDelete('cascade'),
    // Read on every request of a member.
    index('stand_in_person_idx').on(t.partyId, t.personId),
  ],
)

/** An invitation by mail with roles; accepted once. Only the link's hash is stored. */
export const invitation = pgTable(
  'invitation',
  {
    id: idColumn(),
    partyId: partyIdColumn().references(() => party.id, { onDelete: 'cascade' }),
    email: text('email').notNull(),
    roles: text('roles').array().$type<Role[]>().notNull(),
    tokenHash: text('token_hash').notNull().unique(),
    invitedBy: uuid('invited_by')
      .notNull()
      .references(() => person.id),
    createdAt: createdAtColumn(),
    expiresAt: instant('expires_at').notNull(),
    acceptedAt: instant('accepted_at'),
    withdrawnAt: instant('withdrawn_at'),
  },
  (t) => [
    unique('invitation_party_key').on(t.partyId, t.id),
    // One open invitation an address; asking again replaces it.
    uniqueIndex('invitation_open_key')
      .on(t.partyId, sql`lower(${t.email})`)
      .where(sql`${t.acceptedAt} is null and ${t.withdrawnAt} is null`),
  ],
)

/** Who sits behind the kit. */
export const player = pgTable(
  'player',
  {
    id: idColumn(),
    partyId: partyIdColumn().references(() => party.id, { onDelete: 'cascade' }),
    name: text('name').notNull(),
    hand: text('hand').$type<'right' | 'left'>().notNull().default('right'),
    throneHeightM: doublePrecision('throne_height_m'),
    /** How the kit stands round this player, as piece positions relative to the throne; null until one is kept. */
    arrangement: jsonb('arrangement'),
    mixes: text('mixes').notNull().default(''),
    version: versionColumn(),
    createdAt: createdAtColumn(),
  },
  (t) => [unique('player_party_key').on(t.partyId, t.id)],
)
