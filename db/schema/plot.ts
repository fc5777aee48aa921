import { boolean, foreignKey, index, integer, jsonb, pgTable, primaryKey, text, unique, uuid } from 'drizzle-orm/pg-core'
import { createdAtColumn, idColumn, instant, partyIdColumn, versionColumn } from './columns'
import { person } from './person'
import { rig, show } from './tour'

/**
 * A plot is a command log: the rig's own, or a show's, which starts from the rig's at a base sequence and adds its own.
 * `sequence` is the last command applied; a writer sends the sequence it drew on.
 */
export const plot = pgTable(
  'plot',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    rigId: uuid('rig_id').notNull(),
    showId: uuid('show_id'),
    baseSequence: integer('base_sequence').notNull().default(0),
    sequence: integer('sequence').notNull().default(0),
    createdAt: createdAtColumn(),
  },
  (t) => [
    unique('plot_party_key').on(t.partyId, t.id),
    // One plot a rig (no show) and one a show of it.
    unique('plot_of_key').on(t.rigId, t.showId).nullsNotDistinct(),
    foreignKey({ name: 'plot_rig_fk', columns: [t.partyId, t.rigId], foreignColumns: [rig.partyId, rig.id] }).onDelete('cascade'),
    foreignKey({ name: 'plot_show_fk', columns: [t.partyId, t.showId], foreignColumns: [show.partyId, show.id] }).onDelete('cascade'),
  ],
)

export const plotCommand = pgTable(
  'plot_command',
  {
    partyId: partyIdColumn(),
    plotId: uuid('plot_id').notNull(),
    sequence: integer('sequence').notNull(),
    /** Made by the client: a command that arrives twice is the same command. */
    clientId: uuid('client_id').notNull(),
    commandVersion: integer('command_version').notNull(),
    command: jsonb('command').notNull(),
    personId: uuid('person_id')
      .notNull()
      .references(() => person.id),
    at: instant('at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.plotId, t.sequence] }),
    unique('plot_command_client_key').on(t.plotId, t.clientId),
    foreignKey({ name: 'plot_command_plot_fk', columns: [t.partyId, t.plotId], foreignColumns: [plot.partyId, plot.id] }).onDelete('cascade'),
  ],
)

/** The document at a sequence, so that opening folds few commands. */
export const plotSnapshot = pgTable(
  'plot_snapshot',
  {
    partyId: partyIdColumn(),
    plotId: uuid('plot_id').notNull(),
    sequence: integer('sequence').notNull(),
    document: jsonb('document').notNull(),
    at: instant('at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.plotId, t.sequence] }),
    foreignKey({ name: 'plot_snapshot_plot_fk', columns: [t.partyId, t.plotId], foreignColumns: [plot.partyId, plot.id] }).onDelete('cascade'),
  ],
)

/** A channel takes one output of one piece on the rig's plot (a microphone, a DI, a pad's trigger, playback L …). */
export const channel = pgTable(
  'channel',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    rigId: uuid('rig_id').notNull(),
    number: integer('number').notNull(),
    name: text('name').notNull(),
    /** The piece's id in the plot document; null while the channel waits for one. */
    pieceId: uuid('piece_id'),
    output: text('output').notNull().default(''),
    stand: text('stand').notNull().default(''),
    phantom: boolean('phantom').notNull().default(false),
    version: versionColumn(),
    createdAt: createdAtColumn(),
  },
  (t) => [
    unique('channel_party_key').on(t.partyId, t.id),
    unique('channel_number_key').on(t.rigId, t.number),
    foreignKey({ name: 'channel_rig_fk', columns: [t.partyId, t.rigId], foreignColumns: [rig.partyId, rig.id] }).onDelete('cascade'),
    index('channel_rig_idx').on(t.partyId, t.rigId),
  ],
)
