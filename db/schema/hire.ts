import { bigint, date, foreignKey, index, integer, pgTable, primaryKey, text, unique, uuid } from 'drizzle-orm/pg-core'
import type { RateBasis } from '@/lib/contracts/hire'
import { createdAtColumn, idColumn, instant, partyIdColumn, versionColumn } from './columns'
import { supplier } from './directory'
import { show, tour } from './tour'

/** A supplier over several shows: one van, answered once. */
export const hire = pgTable(
  'hire',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    tourId: uuid('tour_id').notNull(),
    supplierId: uuid('supplier_id').notNull(),
    name: text('name').notNull().default(''),
    /** IANA zone that the windows below are told in. */
    zone: text('zone'),
    deliveryDate: date('delivery_date', { mode: 'string' }),
    deliveryFrom: text('delivery_from'),
    deliveryUntil: text('delivery_until'),
    collectionDate: date('collection_date', { mode: 'string' }),
    collectionFrom: text('collection_from'),
    collectionUntil: text('collection_until'),
    receiver: text('receiver').notNull().default(''),
    conditionOnReturn: text('condition_on_return').notNull().default(''),
    poNumber: text('po_number').notNull().default(''),
    rateBasis: text('rate_basis').$type<RateBasis>().notNull().default('show'),
    currency: text('currency'),
    /** Money in integer minor units of the currency. */
    transportMinor: bigint('transport_minor', { mode: 'number' }),
    taxBasisPoints: integer('tax_basis_points'),
    validUntil: date('valid_until', { mode: 'string' }),
    answersDueAt: instant('answers_due_at'),
    confirmedAt: instant('confirmed_at'),
    version: versionColumn(),
    createdAt: createdAtColumn(),
  },
  (t) => [
    unique('hire_party_key').on(t.partyId, t.id),
    foreignKey({ name: 'hire_tour_fk', columns: [t.partyId, t.tourId], foreignColumns: [tour.partyId, tour.id] }).onDelete('cascade'),
    foreignKey({ name: 'hire_supplier_fk', columns: [t.partyId, t.supplierId], foreignColumns: [supplier.partyId, supplier.id] }),
    index('hire_tour_idx').on(t.partyId, t.tourId),
  ],
)

export const hireShow = pgTable(
  'hire_show',
  { partyId: partyIdColumn(), hireId: uuid('hire_id').notNull(), showId: uuid('show_id').notNull() },
  (t) => [
    primaryKey({ columns: [t.hireId, t.showId] }),
    foreignKey({ name: 'hire_show_hire_fk', columns: [t.partyId, t.hireId], foreignColumns: [hire.partyId, hire.id] }).onDelete('cascade'),
    foreignKey({ name: 'hire_show_show_fk', columns: [t.partyId, t.showId], foreignColumns: [show.partyId, show.id] }).onDelete('cascade'),
    // From a show to what is hired for it.
    index('hire_show_show_idx').on(t.partyId, t.showId),
  ],
)
