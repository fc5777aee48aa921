import { db } from '@/db/client'
import { insertAuditEvent } from '@/db/queries/audit'
import { findPasswordReset, usePasswordResets } from '@/db/queries/password-reset'
import { markEmailVerified, setPersonPassword } from '@/db/queries/person'
import { endAllSessions } from '@/db/queries/session'
import type { LinkStanding } from '@/lib/contracts/sign-in'
import { AppError } from '@/lib/errors'
import { hashToken } from '@/lib/server/auth/link-token'
import { hashPassword } from '@/lib/server/auth/password'

function standing(row: { expiresAt: Date; usedAt: Date | null } | undefined): LinkStanding {
  if (!row) return 'unknown'
  if (row.usedAt) return 'used'
  return row.expiresAt.getTime() <= Date.now() ? 'expired' : 'open'
}

/** How the link stands, for the page that it opens. Changes nothing. */
export async function readPasswordReset(token: string): Promise<LinkStanding> {
  return standing(await findPasswordReset(db(), hashToken(token), { lock: false }))
}

/** Sets the new password, uses the link up and signs the person out everywhere. */
export async function redeemPasswordReset(input: { token: string; password: string }, address: string): Promise<void> {
  const passwordHash = await hashPassword(input.password)
  await db().transaction(async (tx) => {
    const row = await findPasswordReset(tx, hashToken(input.token), { lock: true })
    const now = standing(row)
    if (!row || now === 'unknown') {
      throw new AppError('not-found', 'This link opens nothing. Please check that the whole address was copied.')
    }
    if (now !== 'open') {
      const what = now === 'used' ? 'This link was used already.' : 'This link has run out.'
      throw new AppError('gone', `${what} Your password was not changed; ask for a new link.`, { details: { reason: now } })
    }
    await setPersonPassword(tx, row.personId, passwordHash)
    await usePasswordResets(tx, row.personId)
    // The link was read in the person's own mailbox.
    await markEmailVerified(tx, row.personId)
    await endAllSessions(tx, row.personId)
    await insertAuditEvent(tx, {
      partyId: null,
      actorKind: 'person',
      actorId: row.personId,
      action: 'password.reset',
      subjectType: 'person',
      subjectId: row.personId,
      address,
    })
  })
}
