import { sql } from 'drizzle-orm'
import { check, doublePrecision, foreignKey, index, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import type { ContactDuty, StageAccess } from '@/lib/contracts/directory'
import { createdAtColumn, idColumn, partyIdColumn, versionColumn } from './columns'
import { party } from './party'

export const venue = pgTable(
  'venue',
  {
    id: idColumn(),
    partyId: partyIdColumn().references(() => party.id, { onDelete: 'cascade' }),
    name: text('name').notNull(),
    town: text('town').notNull().default(''),
    country: text('country').notNull().default(''),
    /** IANA zone; null while it is not known yet. */
    zone: text('zone'),
    remark: text('remark').notNull().default(''),
    version: versionColumn(),
    createdAt: createdAtColumn(),
  },
  (t) => [unique('venue_party_key').on(t.partyId, t.id)],
)

/** A stage of a venue, with what a crew must know to get a kit on it and power it. */
export const stage = pgTable(
  'stage',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    venueId: uuid('venue_id').notNull(),
    name: text('name').notNull(),
    widthM: doublePrecision('width_m').notNull(),
    depthM: doublePrecision('depth_m').notNull(),
    /** Height of the deck over the floor. */
    heightM: doublePrecision('height_m').notNull().default(0),
    access: text('access').array().$type<StageAccess[]>().notNull().default([]),
    volts: doublePrecision('volts'),
    mainsHz: doublePrecision('mains_hz'),
    inlets: text('inlets').notNull().default(''),
    version: versionColumn(),
    createdAt: createdAtColumn(),
  },
  (t) => [
    unique('stage_party_key').on(t.partyId, t.id),
    foreignKey({ name: 'stage_venue_fk', columns: [t.partyId, t.venueId], foreignColumns: [venue.partyId, venue.id] }).onDelete('cascade'),
    index('stage_venue_idx').on(t.partyId, t.venueId),
  ],
)

export const supplier = pgTable(
  'supplier',
  {
    id: idColumn(),
    partyId: partyIdColumn().references(() => party.id, { onDelete: 'cascade' }),
    name: text('name').notNull(),
    town: text('town').notNull().default(''),
    country: text('country').notNull().default(''),
    zone: text('zone'),
    currency: text('currency'),
    remark: text('remark').notNull().default(''),
    version: versionColumn(),
    createdAt: createdAtColumn(),
  },
  (t) => [unique('supplier_party_key').on(t.partyId, t.id)],
)

/** A person at a venue or a supplier, by duty. Never signs in; a link in a mail is enough. */
export const contact = pgTable(
  'contact',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    venueId: uuid('venue_id'),
    supplierId: uuid('supplier_id'),
    name: text('name').notNull(),
    email: text('email').notNull(),
    phone: text('phone').notNull().default(''),
    duties: text('duties').array().$type<ContactDuty[]>().notNull().default([]),
    locale: text('locale').notNull().default('en'),
    version: versionColumn(),
    createdAt: createdAtColumn(),
  },
  (t) => [
    unique('contact_party_key').on(t.partyId, t.id),
    foreignKey({ name: 'contact_venue_fk', columns: [t.partyId, t.venueId], foreignColumns: [venue.partyId, venue.id] }).onDelete('cascade'),
    foreignKey({ name: 'contact_supplier_fk', columns: [t.partyId, t.supplierId], foreignColumns: [supplier.partyId, supplier.id] }).onDelete('cascade'),
    check('contact_of_one', sql`num_nonnulls(${t.venueId}, ${t.supplierId}) = 1`),
    index('contact_venue_idx').on(t.partyId, t.venueId),
    index('contact_supplier_idx').on(t.partyId, t.supplierId),
  ],
)
