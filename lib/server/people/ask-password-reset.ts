import { randomUUID } from 'node:crypto'
import { db } from '@/db/client'
import { insertPasswordReset } from '@/db/queries/password-reset'
import { findPersonByEmail } from '@/db/queries/person'
import { env } from '@/lib/env'
import { evenTime } from '@/lib/server/auth/even-time'
import { hashToken, linkToken } from '@/lib/server/auth/link-token'
import { takeFromMailLimits } from '@/lib/server/auth/sign-in-limits'
import type { Letter } from '@/lib/server/mail/letter'
import { letterHtml, letterText } from '@/lib/server/mail/letter'
import { linkPlace } from '@/lib/server/mail/link-place'
import { queueMail } from '@/lib/server/mail/queue-mail'

const resetMs = 60 * 60 * 1000

/** Mails a link to choose a new password, or nothing to an address nobody has; the answer is the same. */
export async function askPasswordReset(input: { email: string }, address: string): Promise<void> {
  await takeFromMailLimits(input.email, address)
  await evenTime(250, async () => {
    const person = await findPersonByEmail(db(), input.email)
    if (!person) return
    const id = randomUUID()
    const letter: Letter = {
      greeting: `Hello ${person.name},`,
      paragraphs: [
        'Here is your link to choose a new password. It works once, for an hour. Choosing one signs you out on every device.',
        'If you did not ask for it, you need do nothing: your password stays as it is.',
      ],
      action: { label: 'Choose a new password', href: `${env().APP_URL}/reset/${linkPlace('reset', id)}` },
    }
    await db().transaction(async (tx) => {
      await insertPasswordReset(tx, {
        id,
        personId: person.id,
        tokenHash: hashToken(linkToken('reset', id)),
        expiresAt: new Date(Date.now() + resetMs),
      })
      await queueMail(tx, {
        partyId: null,
        kind: 'reset',
        to: { address: person.email, name: person.name },
        subject: 'Choose a new password for Hoopwright',
        text: letterText(letter),
        html: letterHtml(letter),
      })
    })
  })
}
