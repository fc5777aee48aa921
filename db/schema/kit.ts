import { foreignKey, index, integer, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import type { EntryInput, EntryKind, Supply } from '@/lib/contracts/kit'
import { createdAtColumn, idColumn, instant, partyIdColumn, versionColumn } from './columns'
import { rig } from './tour'

/**
 * One thing of a rig's kit. The spec is a document by kind, checked by lib/contracts/kit on the way in.
 * Removing keeps the row: a plot piece, a line or a reading may still speak of it.
 */
export const kitEntry = pgTable(
  'kit_entry',
  {
    id: idColumn(),
    partyId: partyIdColumn(),
    rigId: uuid('rig_id').notNull(),
    kind: text('kind').$type<EntryKind>().notNull(),
    name: text('name').notNull(),
    supply: text('supply').$type<Supply>().notNull(),
    count: integer('count').notNull().default(1),
    remark: text('remark').notNull().default(''),
    spec: jsonb('spec').$type<EntryInput['spec']>().notNull(),
    position: integer('position').notNull().default(0),
    removedAt: instant('removed_at'),
    version: versionColumn(),
    createdAt: createdAtColumn(),
  },
  (t) => [
    unique('kit_entry_party_key').on(t.partyId, t.id),
    foreignKey({ name: 'kit_entry_rig_fk', columns: [t.partyId, t.rigId], foreignColumns: [rig.partyId, rig.id] }).onDelete('cascade'),
    index('kit_entry_rig_idx').on(t.partyId, t.rigId),
  ],
)
