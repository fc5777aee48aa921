import { redirect } from 'next/navigation'
import type { MemberActor } from './actor'
import { currentActor, currentSession } from './current-actor'

/** The actor of a desk page: sends whoever is not signed in to sign in, and whoever is in no party to make one. */
export async function pageActor(): Promise<MemberActor> {
  const session = await currentSession()
  if (!session) redirect('/sign-in')
  if (!session.partyId) redirect('/party/new')
  return currentActor()
}
