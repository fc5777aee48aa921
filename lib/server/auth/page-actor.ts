import type { Route } from 'next'
import { headers } from 'next/headers'
import { redirect } from 'next/navigation'
import { sitePath } from '@/lib/contracts/sign-in'
import type { MemberActor } from './actor'
import { currentActor, currentPerson, currentSession } from './current-actor'
import type { SignedInPerson } from './current-actor'
import { pathHeader } from './path-header'

/** The actor of a desk page: sends whoever is not signed in to sign in, and whoever is in no party to make one. */
export async function pageActor(): Promise<MemberActor> {
  const session = await currentSession()
  if (!session) return toSignIn()
  if (!session.partyId) redirect('/party/new')
  return currentActor()
}

/** The person of a page that needs no party. */
export async function pagePerson(): Promise<SignedInPerson> {
  return (await currentSession()) ? currentPerson() : toSignIn()
}

/** To the sign-in page, and from there back to the page that was asked for. */
async function toSignIn(): Promise<never> {
  const path = sitePath((await headers()).get(pathHeader))
  redirect((path ? `/sign-in?next=${encodeURIComponent(path)}` : '/sign-in') as Route)
}
