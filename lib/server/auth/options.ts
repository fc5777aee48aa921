import type { NextAuthOptions } from 'next-auth'
import type { EmailConfig } from 'next-auth/providers/email'
import Credentials from 'next-auth/providers/credentials'
import { randomUUID } from 'node:crypto'
import { env } from '@/lib/env'
import { authAdapter } from './adapter'
import { linkToken } from './link-token'
import './next-auth-types'
import { passwordSignIn } from './password-sign-in'
import { sendSignInMail } from './send-sign-in-mail'
import { startSession, stopSession } from './start-session'

const sessionSeconds = 30 * 24 * 60 * 60
const linkSeconds = 20 * 60

/** The token carries the id that its secret is made from, so the outbox can hold the id alone. */
function newSignInToken(): string {
  const id = randomUUID()
  return `${id}.${linkToken('sign-in', id)}`
}

const emailLink: EmailConfig = {
  id: 'email',
  type: 'email',
  name: 'Email',
  server: '',
  from: '',
  maxAge: linkSeconds,
  options: {},
  generateVerificationToken: newSignInToken,
  sendVerificationRequest: sendSignInMail,
}

export const authOptions: NextAuthOptions = {
  secret: env().NEXTAUTH_SECRET,
  adapter: authAdapter,
  session: { strategy: 'jwt', maxAge: sessionSeconds },
  pages: { signIn: '/sign-in', verifyRequest: '/sign-in/sent', error: '/sign-in' },
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
    signIn: ({ user, email }) => Boolean(email?.verificationRequest) || user.id !== user.email,
    async jwt({ token, user }) {
      if (user) token.sessionId = await startSession(user.id, sessionSeconds)
      return token
    },
    session({ session, token }) {
      if (token.sessionId) session.sessionId = token.sessionId
      return session
    },
  },
  events: {
    async signOut({ token }) {
      if (token?.sessionId && token.sub) await stopSession(token.sessionId, token.sub)
    },
  },
}
