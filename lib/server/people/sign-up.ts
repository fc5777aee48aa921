import { db } from '@/db/client'
import { findPersonByEmail, insertPersonUnlessKnown } from '@/db/queries/person'
import type { SignUp } from '@/lib/contracts/sign-in'
import { evenTime } from '@/lib/server/auth/even-time'
import { mailSignInLink } from '@/lib/server/auth/sign-in-link'
import { takeFromMailLimits } from '@/lib/server/auth/sign-in-limits'

/**
 * Makes a person whose address is not shown to be theirs yet, and mails the link that shows it. Whoever is known gets a
 * plain sign-in link, unchanged: the answer and the time it takes are the same.
 */
export async function signUp(input: SignUp, address: string): Promise<void> {
  await takeFromMailLimits(input.email, address)
  await evenTime(250, () =>
    db().transaction(async (tx) => {
      const made = await insertPersonUnlessKnown(tx, { name: input.name, email: input.email })
      const reader = made ?? (await findPersonByEmail(tx, input.email))
      if (reader) await mailSignInLink(tx, { reader, next: input.next, newcomer: Boolean(made) })
    }),
  )
}
