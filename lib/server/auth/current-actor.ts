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

const signedOut = 'Please sign in. What you typed is kept on this page until you leave it.'

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

/** Somebody signed in, in whatever party or none: for what a person does with their own account. */
export type SignedInPerson = {
  readonly personId: string
  readonly name: string
  readonly email: string
  readonly sessionId: string
  readonly partyId: string | null
  readonly address: string
}

/** The signed-in person; throws signed-out. */
export async function currentPerson(): Promise<SignedInPerson> {
  const session = await currentSession()
  if (!session) throw new AppError('signed-out', signedOut)
  return {
    personId: session.personId,
    name: session.name,
    email: session.email,
    sessionId: session.id,
    partyId: session.partyId,
    address: clientAddress(await headers()),
  }
}

/** The signed-in person in the party in hand; throws signed-out, or not-found when in no party. */
export async function currentActor(): Promise<MemberActor> {
  const session = await currentSession()
  if (!session) throw new AppError('signed-out', signedOut)
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
