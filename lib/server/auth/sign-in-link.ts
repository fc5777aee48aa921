import { createHash, randomUUID } from 'node:crypto'
import type { Db } from '@/db/client'
import { insertVerificationToken } from '@/db/queries/verification-token'
import { env } from '@/lib/env'
import type { Letter } from '@/lib/server/mail/letter'
import { letterHtml, letterText } from '@/lib/server/mail/letter'
import { linkPlace } from '@/lib/server/mail/link-place'
import { queueMail } from '@/lib/server/mail/queue-mail'
import { linkToken } from './link-token'

export const signInLinkSeconds = 20 * 60

/** The token carries the id that its secret is made from, so the outbox can hold the id alone. */
export function newSignInToken(): string {
  const id = randomUUID()
  return `${id}.${linkToken('sign-in', id)}`
}

type Reader = { name: string; email: string }

/**
 * Writes the mail with a sign-in link. The link leads to a page with a button, because mail scanners follow links and
 * would use it up.
 */
export async function queueSignInMail(
  tx: Db,
  input: { reader: Reader; token: string; next: string | undefined; newcomer: boolean },
): Promise<void> {
  const id = input.token.split('.')[0] ?? ''
  const page = new URL('/sign-in/link', env().APP_URL)
  page.searchParams.set('email', input.reader.email)
  if (input.next) page.searchParams.set('next', input.next)
  const letter: Letter = {
    // Whoever typed a newcomer's name may not be the reader: no stranger's words go out under our own.
    greeting: input.newcomer ? 'Hello,' : `Hello ${input.reader.name},`,
    paragraphs: [
      input.newcomer
        ? 'Here is your link to begin. It shows that this mail address is yours, and signs you in. It works once, for 20 minutes.'
        : 'Here is your link to sign in. It works once, for 20 minutes.',
      'If you did not ask for it, you need do nothing.',
    ],
    action: { label: 'Sign in', href: `${page.href}&token=${id}.${linkPlace('sign-in', id)}` },
  }
  await queueMail(tx, {
    partyId: null,
    kind: 'sign-in',
    to: { address: input.reader.email, name: input.newcomer ? '' : input.reader.name },
    subject: 'Your link to sign in to Hoopwright',
    text: letterText(letter),
    html: letterHtml(letter),
  })
}

/** Makes and mails a sign-in link outside next-auth's own form, such that its callback takes it. */
export async function mailSignInLink(
  tx: Db,
  input: { reader: Reader; next: string | undefined; newcomer: boolean },
): Promise<void> {
  const token = newSignInToken()
  await insertVerificationToken(tx, {
    identifier: input.reader.email,
    // As next-auth stores it: SHA-256 of the token with its secret behind, in hexadecimal (its core/lib/utils, hashToken).
    token: createHash('sha256').update(`${token}${env().NEXTAUTH_SECRET}`).digest('hex'),
    expires: new Date(Date.now() + signInLinkSeconds * 1000),
  })
  await queueSignInMail(tx, { ...input, token })
}
