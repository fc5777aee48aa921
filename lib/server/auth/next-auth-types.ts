import type { DefaultSession } from 'next-auth'

declare module 'next-auth' {
  interface Session {
    /** The session row this cookie names. */
    sessionId?: string
    user?: DefaultSession['user']
  }
}

declare module 'next-auth/jwt' {
  interface JWT {
    sessionId?: string
  }
}
