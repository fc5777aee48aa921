import { db } from '@/db/client'
import { findGrant, listGrants } from '@/db/queries/grant'
import { findShow } from '@/db/queries/show'
import type { BenchLink } from '@/lib/contracts/bench'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { withdrawLink } from '@/lib/server/grants/withdraw-link'
import { notThere } from '@/lib/server/refusals'

/** The bench links of a show, newest first, with when each was last used. Their secrets are not kept. */
export async function listBenchLinks(actor: Actor, input: { showId: string }): Promise<{ links: BenchLink[] }> {
  assertCan(actor, 'party:read')
  if (!(await findShow(db(), actor, input.showId))) throw notThere('show')
  const grants = await listGrants(db(), actor, { showId: input.showId, hireId: null })
  const now = Date.now()
  return {
    links: grants
      .filter(({ purpose }) => purpose === 'bench')
      .map((grant) => ({
        ...{
          grantId: grant.id,
          name: grant.recipientName,
          prints: grant.tokens,
          uses: grant.uses,
          lastUsedAt: grant.lastUsedAt,
        },
        ...{ madeAt: grant.createdAt.toISOString(), expiresAt: grant.expiresAt.toISOString() },
        state: grant.withdrawnAt ? 'withdrawn' : grant.expiresAt.getTime() <= now ? 'expired' : 'works',
      })),
  }
}

/** Ends a bench link of this show, with every print of it. What was read through it stays. */
export async function withdrawBenchLink(
  actor: Actor,
  input: { showId: string; grantId: string },
): Promise<{ withdrawn: true }> {
  assertCan(actor, 'link:withdraw')
  const found = await findGrant(db(), actor, input.grantId)
  if (found?.purpose !== 'bench' || found.showId !== input.showId) throw notThere('bench link')
  return withdrawLink(actor, { grantId: found.id })
}
