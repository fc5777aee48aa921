import type { SendVerificationRequestParams } from 'next-auth/providers/email'
import { db } from '@/db/client'
import { findPersonByEmail } from '@/db/queries/person'
import { sitePath } from '@/lib/contracts/sign-in'
import { env } from '@/lib/env'
import { evenTime } from './even-time'
import { queueSignInMail } from './sign-in-link'

/** Mails the sign-in link, or nothing to an address nobody has: the page says the same in both cases. */
export async function sendSignInMail({ identifier, token, url }: SendVerificationRequestParams): Promise<void> {
  await evenTime(250, async () => {
    const person = await findPersonByEmail(db(), identifier)
    if (!person) return
    const next = sitePath(new URL(url).searchParams.get('callbackUrl'), new URL(env().APP_URL).origin)
    await db().transaction((tx) => queueSignInMail(tx, { reader: person, token, next, newcomer: false }))
  })
}
