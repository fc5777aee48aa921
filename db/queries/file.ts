import { and, eq } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { blob, fileReference } from '@/db/schema/file'

/** The party's row for these bytes, made if it is the first time. */
export async function ensureBlob(db: Db, scope: Scope, row: { sha256: string; size: number; contentType: string }): Promise<string> {
  const made = await db
    .insert(blob)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoUpdate({ target: [blob.partyId, blob.sha256], set: { contentType: row.contentType } })
    .returning({ id: blob.id })
  const first = made[0]
  if (!first) throw new Error('no blob row came back')
  return first.id
}

export async function insertFileReference(db: Db, scope: Scope, row: Omit<typeof fileReference.$inferInsert, 'partyId'>): Promise<void> {
  await db.insert(fileReference).values({ ...row, partyId: scope.partyId })
}

export async function findBlob(db: Db, scope: Scope, blobId: string) {
  const rows = await db
    .select({ sha256: blob.sha256, size: blob.size, contentType: blob.contentType })
    .from(blob)
    .where(and(eq(blob.partyId, scope.partyId), eq(blob.id, blobId)))
    .limit(1)
  return rows[0]
}
