import { and, eq, isNull, sql } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { passwordReset } from '@/db/schema/person'

/** Resets stand above parties: they belong to a person. */
export async function insertPasswordReset(db: Db, row: typeof passwordReset.$inferInsert): Promise<void> {
  await db.insert(passwordReset).values(row)
}

/** `lock` holds the row for the one who uses it. */
export async function findPasswordReset(db: Db, tokenHash: string, options: { lock: boolean }) {
  const query = db
    .select({
      id: passwordReset.id,
      personId: passwordReset.personId,
      expiresAt: passwordReset.expiresAt,
      usedAt: passwordReset.usedAt,
    })
    .from(passwordReset)
    .where(eq(passwordReset.tokenHash, tokenHash))
    .limit(1)
  const rows = await (options.lock ? query.for('update') : query)
  return rows[0]
}

/** Uses up every open reset of a person: a new password ends older links too. */
export async function usePasswordResets(db: Db, personId: string): Promise<void> {
  await db
    .update(passwordReset)
    .set({ usedAt: sql`now()` })
    .where(and(eq(passwordReset.personId, personId), isNull(passwordReset.usedAt)))
}
