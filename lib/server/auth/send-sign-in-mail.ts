import type { SendVerificationRequestParams } from 'next-auth/providers/email'
import { db } from '@/db/client'
import { findPersonByEmail } from '@/db/queries/person'
import { env } from '@/lib/env'
import type { Limit } from '@/lib/server/http/rate-limit'
import { takeFromLimit } from '@/lib/server/http/rate-limit'
import { linkPlace } from '@/lib/server/mail/link-place'
import { queueMail } from '@/lib/server/mail/queue-mail'
import { letterHtml, letterText } from '@/lib/server/mail/letter'

const perPerson: Limit = { name: 'sign-in-mail', points: 5, seconds: 900 }

/**
 * Mails the sign-in link, or nothing to an address nobody has: the page says the same in both cases. The link leads to a
 * page with a button, because mail scanners follow links and would use it up.
 */
export async function sendSignInMail({ identifier, token, url }: SendVerificationRequestParams): Promise<void> {
  await takeFromLimit(perPerson, identifier)
  const person = await findPersonByEmail(db(), identifier)
  if (!person) return
  const id = token.split('.')[0] ?? ''
  const next = new URL(url).searchParams.get('callbackUrl') ?? ''
  const page = new URL('/sign-in/link', env().APP_URL)
  page.searchParams.set('email', identifier)
  if (next) page.searchParams.set('next', next)
  const letter = {
    greeting: `Hello ${person.name},`,
    paragraphs: ['Here is your link to sign in. It works once, for 20 minutes.', 'If you did not ask for it, you need do nothing.'],
    action: { label: 'Sign in', href: `${page.href}&token=${id}.${linkPlace('sign-in', id)}` },
  }
  await db().transaction(async (tx) => {
    await queueMail(tx, {
      partyId: null,
      kind: 'sign-in',
      to: { address: person.email, name: person.name },
      subject: 'Your link to sign in to Hoopwright',
      text: letterText(letter),
      html: letterHtml(letter),
    })
  })
}
