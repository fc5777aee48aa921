import type { NextAuthOptions } from 'next-auth'
import type { EmailConfig } from 'next-auth/providers/email'
import Credentials from 'next-auth/providers/credentials'
import { headers } from 'next/headers'
import { sitePath } from '@/lib/contracts/sign-in'
import { env } from '@/lib/env'
import { AppError } from '@/lib/errors'
import { clientAddress } from '@/lib/server/http/client-address'
import { log } from '@/lib/server/log'
import { authAdapter } from './adapter'
import './next-auth-types'
import { passwordSignIn } from './password-sign-in'
import { sendSignInMail } from './send-sign-in-mail'
import { newSignInToken, signInLinkSeconds } from './sign-in-link'
import { takeFromMailLimits } from './sign-in-limits'
import { startSession, stopSession } from './start-session'

const sessionSeconds = 30 * 24 * 60 * 60

/** Before a link is mailed: true, or the page to go to when too many were asked for. */
async function mayMailLink(email: string): Promise<true | string> {
  try {
    await takeFromMailLimits(email, clientAddress(await headers()))
    return true
  } catch (refusal) {
    if (refusal instanceof AppError) return new URL('/sign-in?error=RateLimited', env().APP_URL).href
    throw refusal
  }
}

const emailLink: EmailConfig = {
  id: 'email',
  type: 'email',
  name: 'Email',
  server: '',
  from: '',
  maxAge: signInLinkSeconds,
  options: {},
  generateVerificationToken: newSignInToken,
  sendVerificationRequest: sendSignInMail,
}

/** Its secret is not said here: next-auth takes NEXTAUTH_SECRET itself when it is called, and a build must need no settings. */
export const authOptions: NextAuthOptions = {
  adapter: authAdapter,
  session: { strategy: 'jwt', maxAge: sessionSeconds },
  pages: { signIn: '/sign-in', signOut: '/sign-in', verifyRequest: '/sign-in/sent', error: '/sign-in' },
  providers: [
    Credentials({
      name: 'Password',
      credentials: { email: { label: 'E-mail' }, password: { label: 'Password', type: 'password' } },
      authorize: (credentials, request) => passwordSignIn(credentials, request.headers ?? {}),
    }),
    emailLink,
  ],
  callbacks: {
    // next-auth invents a person for an unknown address (its id is the address); those are let go without a word.
    signIn: ({ user, email }) =>
      email?.verificationRequest ? mayMailLink(user.email ?? '') : Promise.resolve(user.id !== user.email),
    redirect: ({ url, baseUrl }) => `${baseUrl}${sitePath(url, baseUrl) ?? '/tours'}`,
    async jwt({ token, user }) {
      if (user) token.sessionId = await startSession(user.id, sessionSeconds)
      return token
    },
    session({ session, token }) {
      if (token.sessionId) session.sessionId = token.sessionId
      return session
    },
  },
  // What its errors carry beside their kind can name a person.
  logger: {
    error: (code, metadata) => log.error({ error: metadata instanceof Error ? metadata : metadata.error }, `next-auth: ${code}`),
    warn: (code) => log.warn(`next-auth: ${code}`),
    debug: () => undefined,
  },
  events: {
    async signOut({ token }) {
      if (token?.sessionId && token.sub) await stopSession(token.sessionId, token.sub)
    },
  },
}
