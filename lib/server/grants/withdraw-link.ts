import { db } from '@/db/client'
import { findGrant, withdrawGrant } from '@/db/queries/grant'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyGrant } from './notify-grant'

/** Ends a link at once, with every key that was mailed or printed. What was said through it stays. Ended before is ended. */
export async function withdrawLink(actor: Actor, input: { grantId: string }): Promise<{ withdrawn: true }> {
  assertCan(actor, 'link:withdraw')
  return db().transaction(async (tx) => {
    const found = await findGrant(tx, actor, input.grantId)
    if (!found) throw new AppError('not-found', 'There is no such link in this party.')
    if (await withdrawGrant(tx, actor, found.id)) {
      await audit(tx, actor, 'link.withdraw', { type: 'grant', id: found.id }, { purpose: found.purpose })
      await notifyGrant(tx, actor, found)
    }
    return { withdrawn: true as const }
  })
}
