import type { z } from 'zod'
import type { Db } from '@/db/client'
import { db } from '@/db/client'
import { insertAuditEvent } from '@/db/queries/audit'
import { findInvitationByTokenHash, markInvitationAccepted } from '@/db/queries/invitation'
import { findMember, insertMembership } from '@/db/queries/member'
import { findPersonByEmail, insertPersonUnlessKnown, markEmailVerified } from '@/db/queries/person'
import { switchParty } from '@/db/queries/session'
import type { Role } from '@/lib/contracts/common'
import type { acceptInvitationSchema, LinkStanding } from '@/lib/contracts/sign-in'
import { AppError } from '@/lib/errors'
import type { SignedInPerson } from '@/lib/server/auth/current-actor'
import { hashToken } from '@/lib/server/auth/link-token'
import { hashPassword } from '@/lib/server/auth/password'
import { notifyLive } from '@/lib/server/live/notify-live'

type Row = NonNullable<Awaited<ReturnType<typeof findInvitationByTokenHash>>>
type Input = z.output<typeof acceptInvitationSchema>

function standing(row: Row): Exclude<LinkStanding, 'unknown'> {
  if (row.acceptedAt) return 'used'
  if (row.withdrawnAt) return 'withdrawn'
  return row.expiresAt.getTime() <= Date.now() ? 'expired' : 'open'
}

export type ReadInvitation =
  | { standing: 'unknown' }
  | {
      standing: Exclude<LinkStanding, 'unknown'>
      partyName: string
      invitedBy: string
      email: string
      roles: Role[]
      /** Whether somebody with that address can sign in already. */
      known: boolean
    }

/** What the page of an invitation shows. Changes nothing. */
export async function readInvitation(token: string): Promise<ReadInvitation> {
  const row = await findInvitationByTokenHash(db(), hashToken(token), { lock: false })
  if (!row) return { standing: 'unknown' }
  return {
    standing: standing(row),
    partyName: row.partyName,
    invitedBy: row.invitedBy,
    email: row.email,
    roles: row.roles,
    known: Boolean(await findPersonByEmail(db(), row.email)),
  }
}

const goneWords: Record<'used' | 'withdrawn' | 'expired', string> = {
  used: 'This invitation was accepted already. Sign in to open the party.',
  withdrawn: 'This invitation was withdrawn. Ask whoever sent it for a new one.',
  expired: 'This invitation has run out. Ask whoever sent it to send it again.',
}

/** Who joins: the one signed in, if the invitation is theirs, or a newcomer who chooses a name and a password. */
async function whoJoins(tx: Db, row: Row, signedIn: SignedInPerson | undefined, newcomer: { name: string; passwordHash: string } | undefined) {
  if (signedIn) {
    if (signedIn.email.toLowerCase() !== row.email.toLowerCase()) {
      throw new AppError('forbidden', `This invitation is for ${row.email}, and you are signed in as ${signedIn.email}. Sign out first. Nothing was changed.`)
    }
    return signedIn.personId
  }
  if (!newcomer) throw new AppError('signed-out', `Sign in as ${row.email} first, or choose a name and a password.`)
  // The link was read in the newcomer's own mailbox.
  const made = await insertPersonUnlessKnown(tx, { ...newcomer, email: row.email, emailVerifiedAt: new Date() })
  if (!made) throw new AppError('signed-out', `There is an account for ${row.email} already. Sign in to it, then join. Nothing was changed.`)
  return made.id
}

/** Makes the invited person a member, once, and takes the party in hand on a device that is signed in. */
export async function acceptInvitation(
  input: Input,
  signedIn: SignedInPerson | undefined,
  address: string,
): Promise<{ partyId: string; email: string; roles: Role[] }> {
  const newcomer = input.newcomer && !signedIn
    ? { name: input.newcomer.name, passwordHash: await hashPassword(input.newcomer.password) }
    : undefined
  return db().transaction(async (tx) => {
    const row = await findInvitationByTokenHash(tx, hashToken(input.token), { lock: true })
    if (!row) throw new AppError('not-found', 'This link opens nothing. Please check that the whole address was copied.')
    const now = standing(row)
    if (now !== 'open') throw new AppError('gone', goneWords[now], { details: { reason: now } })
    const scope = { partyId: row.partyId }
    const personId = await whoJoins(tx, row, signedIn, newcomer)
    if (!(await insertMembership(tx, scope, { personId, roles: row.roles })) && !(await findMember(tx, scope, personId))) {
      throw new AppError('conflict', 'You could not be made a member just now. Please try again.')
    }
    await markInvitationAccepted(tx, scope, row.id)
    await markEmailVerified(tx, personId)
    if (signedIn) await switchParty(tx, { sessionId: signedIn.sessionId, personId, partyId: row.partyId })
    await insertAuditEvent(tx, {
      ...scope,
      actorKind: 'person',
      actorId: personId,
      action: 'invitation.accept',
      subjectType: 'invitation',
      subjectId: row.id,
      detail: { roles: row.roles },
      address,
    })
    await notifyLive(tx, row.partyId, [`party:${row.partyId}`])
    return { partyId: row.partyId, email: row.email, roles: row.roles }
  })
}
