import { bigserial, boolean, doublePrecision, foreignKey, index, integer, pgTable, primaryKey, text, unique, uuid } from 'drizzle-orm/pg-core'
import type { HeadSide } from '@/lib/contracts/kit'
import type { ReadingMethod, ReadingUnit } from '@/lib/contracts/bench'
import { createdAtColumn, idColumn, instant, partyIdColumn } from './columns'
import { supplier } from './directory'
import { grant } from './grant'
import { kitEntry } from './kit'
import { person } from './person'
import { show } from './tour'

/** A drum you can touch: the party's or a supplier's, known by badge and serial where somebody wrote them down. */
export const physicalDrum = pgTable(
  'physical_drum',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    /** Null for the party's own drum. */
    supplierId: uuid('supplier_id'),
    badge: text('badge').notNull().default(''),
    serial: text('serial').notNull().default(''),
    diameterIn: doublePrecision('diameter_in').notNull(),
    depthIn: doublePrecision('depth_in').notNull(),
    lugs: integer('lugs').notNull(),
    createdAt: createdAtColumn(),
  },
  (t) => [
    unique('physical_drum_party_key').on(t.partyId, t.id),
    foreignKey({ name: 'physical_drum_supplier_fk', columns: [t.partyId, t.supplierId], foreignColumns: [supplier.partyId, supplier.id] }),
  ],
)

/** Which physical drum stands for a kit drum at a show. Made when the first reading of that drum arrives. */
export const benchDrum = pgTable(
  'bench_drum',
  {
    partyId: partyIdColumn(),
    showId: uuid('show_id').notNull(),
    kitEntryId: uuid('kit_entry_id').notNull(),
    physicalDrumId: uuid('physical_drum_id').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.showId, t.kitEntryId] }),
    foreignKey({ name: 'bench_drum_show_fk', columns: [t.partyId, t.showId], foreignColumns: [show.partyId, show.id] }).onDelete('cascade'),
    foreignKey({ name: 'bench_drum_entry_fk', columns: [t.partyId, t.kitEntryId], foreignColumns: [kitEntry.partyId, kitEntry.id] }),
    foreignKey({ name: 'bench_drum_physical_fk', columns: [t.partyId, t.physicalDrumId], foreignColumns: [physicalDrum.partyId, physicalDrum.id] }),
  ],
)

/** One reading at one lug, append-only. A correction is a new reading that strikes one. */
export const reading = pgTable(
  'reading',
  {
    /** Made by the device, so that a reading sent twice is one reading. */
    id: uuid('id').primaryKey(),
    sequence: bigserial('sequence', { mode: 'number' }).notNull().unique(),
    partyId: partyIdColumn(),
    showId: uuid('show_id').notNull(),
    kitEntryId: uuid('kit_entry_id').notNull(),
    physicalDrumId: uuid('physical_drum_id').notNull(),
    side: text('side').$type<HeadSide>().notNull(),
    /** 1 is the first lug clockwise from the badge, seen facing this head. */
    lug: integer('lug').notNull(),
    deviceId: uuid('device_id').notNull(),
    deviceSequence: integer('device_sequence').notNull(),
    deviceAt: instant('device_at').notNull(),
    serverAt: instant('server_at').notNull().defaultNow(),
    method: text('method').$type<ReadingMethod>().notNull(),
    value: doublePrecision('value').notNull(),
    unit: text('unit').$type<ReadingUnit>().notNull(),
    /** The target in force when it was typed, Hz: cents mean nothing without it. Null for a gauge reading. */
    targetHz: doublePrecision('target_hz'),
    otherHead: text('other_head').$type<'damped' | 'open'>().notNull(),
    onStand: boolean('on_stand').notNull(),
    gauge: text('gauge').notNull().default(''),
    temperatureC: doublePrecision('temperature_c'),
    pass: integer('pass').notNull(),
    strikesReadingId: uuid('strikes_reading_id'),
    byName: text('by_name').notNull(),
    grantId: uuid('grant_id'),
    personId: uuid('person_id').references(() => person.id),
  },
  (t) => [
    unique('reading_party_key').on(t.partyId, t.id),
    unique('reading_device_key').on(t.deviceId, t.deviceSequence),
    // A reading can be struck once.
    unique('reading_strikes_key').on(t.strikesReadingId),
    foreignKey({ name: 'reading_show_fk', columns: [t.partyId, t.showId], foreignColumns: [show.partyId, show.id] }).onDelete('cascade'),
    foreignKey({ name: 'reading_entry_fk', columns: [t.partyId, t.kitEntryId], foreignColumns: [kitEntry.partyId, kitEntry.id] }),
    foreignKey({ name: 'reading_physical_fk', columns: [t.partyId, t.physicalDrumId], foreignColumns: [physicalDrum.partyId, physicalDrum.id] }),
    foreignKey({ name: 'reading_grant_fk', columns: [t.partyId, t.grantId], foreignColumns: [grant.partyId, grant.id] }),
    foreignKey({ name: 'reading_strikes_fk', columns: [t.partyId, t.strikesReadingId], foreignColumns: [t.partyId, t.id] }),
    index('reading_head_idx').on(t.partyId, t.showId, t.kitEntryId, t.side, t.sequence),
  ],
)

/** A drum handed over as tuned, by name. Append-only: signing again adds one, and so does taking it back. */
export const signOff = pgTable(
  'sign_off',
  {
    id: uuid('id').primaryKey(),
    sequence: bigserial('sequence', { mode: 'number' }).notNull().unique(),
    partyId: partyIdColumn(),
    showId: uuid('show_id').notNull(),
    kitEntryId: uuid('kit_entry_id').notNull(),
    decision: text('decision').$type<'signed' | 'taken-back'>().notNull(),
    byName: text('by_name').notNull(),
    remark: text('remark').notNull().default(''),
    grantId: uuid('grant_id'),
    personId: uuid('person_id').references(() => person.id),
    at: instant('at').notNull().defaultNow(),
  },
  (t) => [
    unique('sign_off_party_key').on(t.partyId, t.id),
    foreignKey({ name: 'sign_off_show_fk', columns: [t.partyId, t.showId], foreignColumns: [show.partyId, show.id] }).onDelete('cascade'),
    foreignKey({ name: 'sign_off_entry_fk', columns: [t.partyId, t.kitEntryId], foreignColumns: [kitEntry.partyId, kitEntry.id] }),
    foreignKey({ name: 'sign_off_grant_fk', columns: [t.partyId, t.grantId], foreignColumns: [grant.partyId, grant.id] }),
    index('sign_off_show_idx').on(t.partyId, t.showId),
  ],
)
