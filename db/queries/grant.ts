import { and, eq, sql } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { grant, grantToken } from '@/db/schema/grant'

/** The one look-up that has no party yet: the token's hash is what finds it. */
export async function findGrantByTokenHash(db: Db, tokenHash: string) {
  const rows = await db
    .select({
      tokenId: grantToken.id,
      grantId: grant.id,
      partyId: grant.partyId,
      purpose: grant.purpose,
      showId: grant.showId,
      hireId: grant.hireId,
      recipientName: grant.recipientName,
      recipientEmail: grant.recipientEmail,
      expiresAt: grant.expiresAt,
      withdrawnAt: grant.withdrawnAt,
    })
    .from(grantToken)
    .innerJoin(grant, and(eq(grant.partyId, grantToken.partyId), eq(grant.id, grantToken.grantId)))
    .where(eq(grantToken.tokenHash, tokenHash))
    .limit(1)
  return rows[0]
}

/** Notes that a link did something. Opening alone is not use: mail scanners open links too. */
export async function countTokenUse(db: Db, scope: { partyId: string }, tokenId: string): Promise<void> {
  await db
    .update(grantToken)
    .set({ lastUsedAt: sql`now()`, useCount: sql`${grantToken.useCount} + 1` })
    .where(and(eq(grantToken.partyId, scope.partyId), eq(grantToken.id, tokenId)))
}
