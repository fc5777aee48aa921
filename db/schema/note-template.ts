import { jsonb, pgTable, text, unique } from 'drizzle-orm/pg-core'
import type { NoteTemplateInput } from '@/lib/contracts/note-template'
import { createdAtColumn, idColumn, partyIdColumn, versionColumn } from './columns'
import { party } from './party'

/** A party's own way to step its toms. What the templates that everybody has hold is data in the tuning core. */
export const noteTemplate = pgTable(
  'note_template',
  {
    id: idColumn(),
    partyId: partyIdColumn().references(() => party.id, { onDelete: 'cascade' }),
    name: text('name').notNull(),
    /** Checked by lib/contracts/note-template on the way in. */
    document: jsonb('document').$type<Omit<NoteTemplateInput, 'name'>>().notNull(),
    version: versionColumn(),
    createdAt: createdAtColumn(),
  },
  // Also the way to a party's templates, which are few.
  (t) => [unique('note_template_party_key').on(t.partyId, t.id)],
)
