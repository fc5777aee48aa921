import { db } from '@/db/client'
import { findGrantByTokenHash } from '@/db/queries/grant'
import { AppError } from '@/lib/errors'
import type { LinkActor } from './actor'
import { hashToken } from './link-token'

/** Who stands behind a link. A link that was never made is not found; one withdrawn or run out says so. Changes nothing. */
export async function linkActor(token: string, purpose: LinkActor['purpose'], address: string): Promise<LinkActor> {
  const found = /^[\w-]{43}$/.test(token) ? await findGrantByTokenHash(db(), hashToken(token)) : undefined
  if (!found || found.purpose !== purpose) {
    throw new AppError('not-found', 'This link opens nothing. Please check that the whole address was copied.')
  }
  if (found.withdrawnAt) {
    throw new AppError('gone', 'This link was withdrawn. Please ask whoever sent it for a new one.', { details: { reason: 'withdrawn' } })
  }
  if (found.expiresAt.getTime() <= Date.now()) {
    throw new AppError('gone', 'This link has run out.', { details: { reason: 'expired' } })
  }
  return {
    kind: 'link',
    purpose: found.purpose,
    grantId: found.grantId,
    tokenId: found.tokenId,
    partyId: found.partyId,
    showId: found.showId,
    hireId: found.hireId,
    recipientName: found.recipientName,
    address,
  }
}
