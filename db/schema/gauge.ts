import { sql } from 'drizzle-orm'
import { bigserial, boolean, check, doublePrecision, foreignKey, index, pgTable, text, unique, uniqueIndex, uuid } from 'drizzle-orm/pg-core'
import type { Head } from '@/lib/contracts/kit'
import { createdAtColumn, idColumn, instant, partyIdColumn, versionColumn } from './columns'
import { party } from './party'
import { person } from './person'

/** A tension gauge in one hand. Its units are its own dial's. Removing keeps the row, so that it can be put back. */
export const gauge = pgTable(
  'gauge',
  {
    id: idColumn(),
    partyId: partyIdColumn().references(() => party.id, { onDelete: 'cascade' }),
    name: text('name').notNull(),
    scaleMin: doublePrecision('scale_min').notNull(),
    scaleMax: doublePrecision('scale_max').notNull(),
    /** One division of the dial. */
    scaleStep: doublePrecision('scale_step').notNull(),
    remark: text('remark').notNull().default(''),
    /** The one that revisions freeze and sheets speak of. */
    toursGauge: boolean('tours_gauge').notNull().default(false),
    removedAt: instant('removed_at'),
    version: versionColumn(),
    createdAt: createdAtColumn(),
  },
  (t) => [
    unique('gauge_party_key').on(t.partyId, t.id),
    uniqueIndex('gauge_tours_key').on(t.partyId).where(sql`${t.toursGauge}`),
    check('gauge_tours_stands', sql`not (${t.toursGauge} and ${t.removedAt} is not null)`),
  ],
)

/** What a gauge read on a head, and what that head sounded then. Append-only; a wrong pair is struck, never edited. */
export const gaugePair = pgTable(
  'gauge_pair',
  {
    id: idColumn(),
    sequence: bigserial('sequence', { mode: 'number' }).notNull().unique(),
    partyId: partyIdColumn(),
    gaugeId: uuid('gauge_id').notNull(),
    reading: doublePrecision('reading').notNull(),
    diameterIn: doublePrecision('diameter_in').notNull(),
    depthIn: doublePrecision('depth_in').notNull(),
    plyMils: doublePrecision('ply_mils').array().notNull(),
    film: text('film').$type<Head['film']>().notNull(),
    coatingGPerM2: doublePrecision('coating_g_per_m2').notNull(),
    /** Pitch of a tap near a lug, the other head damped. */
    tapHz: doublePrecision('tap_hz').notNull(),
    temperatureC: doublePrecision('temperature_c'),
    /** Which head it was, in its reader's words. */
    remark: text('remark').notNull().default(''),
    at: instant('at').notNull().defaultNow(),
    byPersonId: uuid('by_person_id').notNull().references(() => person.id),
    struckAt: instant('struck_at'),
  },
  (t) => [
    unique('gauge_pair_party_key').on(t.partyId, t.id),
    foreignKey({ name: 'gauge_pair_gauge_fk', columns: [t.partyId, t.gaugeId], foreignColumns: [gauge.partyId, gauge.id] }).onDelete('cascade'),
    index('gauge_pair_gauge_idx').on(t.partyId, t.gaugeId, t.sequence),
  ],
)
