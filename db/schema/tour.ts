import { date, foreignKey, index, integer, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import type { DayKind, SharedKit, Slot } from '@/lib/contracts/tour'
import { createdAtColumn, idColumn, instant, partyIdColumn, versionColumn } from './columns'
import { stage } from './directory'
import { party, player } from './party'

export const tour = pgTable(
  'tour',
  {
    id: idColumn(),
    partyId: partyIdColumn().references(() => party.id, { onDelete: 'cascade' }),
    name: text('name').notNull(),
    version: versionColumn(),
    createdAt: createdAtColumn(),
  },
  (t) => [unique('tour_party_key').on(t.partyId, t.id)],
)

/** One way of playing the tour (full, fly, acoustic): a kit, its plot, its patch and its lines hang on it. */
export const rig = pgTable(
  'rig',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    tourId: uuid('tour_id').notNull(),
    name: text('name').notNull(),
    position: integer('position').notNull().default(0),
    version: versionColumn(),
    createdAt: createdAtColumn(),
  },
  (t) => [
    unique('rig_party_key').on(t.partyId, t.id),
    unique('rig_name_key').on(t.tourId, t.name),
    foreignKey({ name: 'rig_tour_fk', columns: [t.partyId, t.tourId], foreignColumns: [tour.partyId, tour.id] }).onDelete('cascade'),
  ],
)

/** A day of the run; it holds none, one or two shows. */
export const day = pgTable(
  'day',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    tourId: uuid('tour_id').notNull(),
    date: date('date', { mode: 'string' }).notNull(),
    kind: text('kind').$type<DayKind>().notNull(),
    remark: text('remark').notNull().default(''),
    version: versionColumn(),
    createdAt: createdAtColumn(),
  },
  (t) => [
    unique('day_party_key').on(t.partyId, t.id),
    unique('day_date_key').on(t.tourId, t.date),
    foreignKey({ name: 'day_tour_fk', columns: [t.partyId, t.tourId], foreignColumns: [tour.partyId, tour.id] }).onDelete('cascade'),
  ],
)

export const show = pgTable(
  'show',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    tourId: uuid('tour_id').notNull(),
    dayId: uuid('day_id').notNull(),
    rigId: uuid('rig_id').notNull(),
    stageId: uuid('stage_id').notNull(),
    playerId: uuid('player_id').notNull(),
    name: text('name').notNull().default(''),
    /** IANA zone of the venue, null while unknown; wall times below are in it. */
    zone: text('zone'),
    loadInTime: text('load_in_time'),
    showTime: text('show_time'),
    /** Days after the show's date that the show time falls on (a set after midnight is "+1 day"). */
    showDayOffset: integer('show_day_offset').notNull().default(0),
    /** When answers are due; derived once from date, wall time and zone by the form, kept as an instant. */
    answersDueAt: instant('answers_due_at'),
    /** Festival slot; null at an ordinary show. */
    slot: jsonb('slot').$type<Slot | null>(),
    sharedKit: jsonb('shared_kit').$type<SharedKit | null>(),
    version: versionColumn(),
    createdAt: createdAtColumn(),
  },
  (t) => [
    unique('show_party_key').on(t.partyId, t.id),
    foreignKey({ name: 'show_tour_fk', columns: [t.partyId, t.tourId], foreignColumns: [tour.partyId, tour.id] }).onDelete('cascade'),
    foreignKey({ name: 'show_day_fk', columns: [t.partyId, t.dayId], foreignColumns: [day.partyId, day.id] }),
    foreignKey({ name: 'show_rig_fk', columns: [t.partyId, t.rigId], foreignColumns: [rig.partyId, rig.id] }),
    foreignKey({ name: 'show_stage_fk', columns: [t.partyId, t.stageId], foreignColumns: [stage.partyId, stage.id] }),
    foreignKey({ name: 'show_player_fk', columns: [t.partyId, t.playerId], foreignColumns: [player.partyId, player.id] }),
    // The run strip reads all shows of a tour.
    index('show_tour_idx').on(t.partyId, t.tourId),
    index('show_rig_idx').on(t.partyId, t.rigId),
  ],
)
