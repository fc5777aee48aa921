import { signIn, signOut } from 'next-auth/react'
import { acceptedInvitationSchema, doneSchema } from '@/lib/contracts/sign-in'
import type { SignUp } from '@/lib/contracts/sign-in'
import { AppError } from '@/lib/errors'
import { callApi } from './http'
import { loadPage } from './load-page'

/** What went wrong at next-auth, as the code that the sign-in page has words for; undefined when nothing did. */
async function throughNextAuth(provider: 'credentials' | 'email', fields: Record<string, string>): Promise<string | undefined> {
  try {
    const answer = await signIn(provider, { ...fields, redirect: false })
    return answer?.ok && !answer.error ? undefined : (answer?.error ?? 'Default')
  } catch (cause) {
    throw new AppError('unavailable', 'No connection. What you typed is kept here; you are not signed in yet.', { cause })
  }
}

export function signInWithPassword(input: { email: string; password: string }): Promise<string | undefined> {
  return throughNextAuth('credentials', input)
}

/** Asks for a sign-in link by mail that leads to `next`. */
export function askForSignInLink(input: { email: string; next: string }): Promise<string | undefined> {
  return throughNextAuth('email', { email: input.email, callbackUrl: input.next })
}

/** Signs this device out and goes to the sign-in page, or to another page of ours. */
export async function signOutHere(then = '/sign-in?said=out'): Promise<void> {
  await signOut({ callbackUrl: then, redirect: false })
  loadPage(then)
}

export function signUp(input: SignUp) {
  return callApi('/api/sign-ups', { method: 'POST', body: input, response: doneSchema })
}

export function askForReset(input: { email: string }) {
  return callApi('/api/password-resets', { method: 'POST', body: input, response: doneSchema })
}

export function redeemReset(input: { token: string; password: string }) {
  return callApi('/api/password-resets/redeem', { method: 'POST', body: input, response: doneSchema })
}

export function acceptInvitation(input: { token: string; newcomer?: { name: string; password: string } }) {
  return callApi('/api/invitations/accept', { method: 'POST', body: input, response: acceptedInvitationSchema })
}
