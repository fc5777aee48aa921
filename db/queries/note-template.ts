import { and, asc, eq, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { noteTemplate } from '@/db/schema/note-template'
import type { NoteTemplateInput } from '@/lib/contracts/note-template'
import { noteTemplateLimit } from '@/lib/contracts/note-template'

const columns = {
  id: noteTemplate.id,
  name: noteTemplate.name,
  document: noteTemplate.document,
  version: noteTemplate.version,
}

const flat = ({
  document,
  ...row
}: {
  id: string
  name: string
  version: number
  document: Omit<NoteTemplateInput, 'name'>
}) => ({
  ...row,
  ...document,
})

/** Every template of the party by name. */
export async function listNoteTemplates(db: Db, scope: Scope) {
  const rows = await db
    .select(columns)
    .from(noteTemplate)
    .where(eq(noteTemplate.partyId, scope.partyId))
    .orderBy(asc(sql`lower(${noteTemplate.name})`), asc(noteTemplate.id))
    .limit(noteTemplateLimit)
  return rows.map(flat)
}

export async function findNoteTemplate(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select(columns)
    .from(noteTemplate)
    .where(and(eq(noteTemplate.partyId, scope.partyId), eq(noteTemplate.id, id)))
    .limit(1)
  return rows.map(flat)[0]
}

/** Undefined when the id is taken already. */
export async function insertNoteTemplate(
  db: Db,
  scope: Scope,
  row: { id?: string | undefined; template: NoteTemplateInput },
) {
  const { name, ...document } = row.template
  const rows = await db
    .insert(noteTemplate)
    .values({ id: row.id, name, document, partyId: scope.partyId })
    .onConflictDoNothing({ target: noteTemplate.id })
    .returning(columns)
  return rows.map(flat)[0]
}

/** Undefined when the version is no longer the one that was seen. */
export async function updateNoteTemplate(
  db: Db,
  scope: Scope,
  input: { id: string; version: number; template: NoteTemplateInput },
) {
  const { name, ...document } = input.template
  const rows = await db
    .update(noteTemplate)
    .set({ name, document, version: sql`${noteTemplate.version} + 1` })
    .where(
      and(
        eq(noteTemplate.partyId, scope.partyId),
        eq(noteTemplate.id, input.id),
        eq(noteTemplate.version, input.version),
      ),
    )
    .returning(columns)
  return rows.map(flat)[0]
}

/** False when the version is no longer the one that was seen. */
export async function deleteNoteTemplate(
  db: Db,
  scope: Scope,
  input: { id: string; version: number },
): Promise<boolean> {
  const rows = await db
    .delete(noteTemplate)
    .where(
      and(
        eq(noteTemplate.partyId, scope.partyId),
        eq(noteTemplate.id, input.id),
        eq(noteTemplate.version, input.version),
      ),
    )
    .returning({ id: noteTemplate.id })
  return rows.length > 0
}
