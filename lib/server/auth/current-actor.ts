import { getServerSession } from 'next-auth'
import { headers } from 'next/headers'
import { cache } from 'react'
import { db } from '@/db/client'
import { findLiveSession, touchSession } from '@/db/queries/session'
import type { Role } from '@/lib/contracts/common'
import { AppError } from '@/lib/errors'
import { clientAddress } from '@/lib/server/http/client-address'
import type { MemberActor } from './actor'
import { authOptions } from './options'

/**
 * The live session of this request, or undefined. The cookie only names a session row; the row decides, so signing out
 * everywhere, a changed role or a lent one that has run out work at the next request.
 */
export const currentSession = cache(async () => {
  const token = await getServerSession(authOptions)
  if (!token?.sessionId) return undefined
  const row = await findLiveSession(db(), token.sessionId)
  if (!row) return undefined
  if (Date.now() - row.lastSeenAt.getTime() > 60_000) await touchSession(db(), row.id)
  return row
})

export type LiveSession = NonNullable<Awaited<ReturnType<typeof currentSession>>>

/** The signed-in person in the party in hand; throws signed-out, or not-found when in no party. */
export async function currentActor(): Promise<MemberActor> {
  const session = await currentSession()
  if (!session) throw new AppError('signed-out', 'Please sign in. What you typed is kept on this page until you leave it.')
  if (!session.partyId || !session.roles) throw new AppError('not-found', 'You are in no party yet. Make one, or ask to be invited.')
  return {
    kind: 'person',
    personId: session.personId,
    name: session.name,
    partyId: session.partyId,
    roles: [...new Set([...session.roles, ...(session.lent as Role[])])],
    sessionId: session.id,
    address: clientAddress(await headers()),
  }
}
