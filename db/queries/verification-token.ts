import { and, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { verificationToken } from '@/db/schema/person'

type Row = { identifier: string; token: string; expires: Date }

export async function insertVerificationToken(db: Db, row: Row): Promise<void> {
  await db.insert(verificationToken).values(row)
}

/** Takes a token away: of two who use it at once, one gets it. */
export async function takeVerificationToken(db: Db, input: { identifier: string; token: string }): Promise<Row | undefined> {
  const rows = await db
    .delete(verificationToken)
    .where(and(eq(verificationToken.identifier, input.identifier), eq(verificationToken.token, input.token)))
    .returning({
      identifier: verificationToken.identifier,
      token: verificationToken.token,
      expires: verificationToken.expires,
    })
  return rows[0]
}
