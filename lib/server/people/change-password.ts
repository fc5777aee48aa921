import { db } from '@/db/client'
import { insertAuditEvent } from '@/db/queries/audit'
import { usePasswordResets } from '@/db/queries/password-reset'
import { findPerson, setPersonPassword } from '@/db/queries/person'
import { endOtherSessions } from '@/db/queries/session'
import { AppError } from '@/lib/errors'
import type { SignedInPerson } from '@/lib/server/auth/current-actor'
import { hashPassword, passwordMatches } from '@/lib/server/auth/password'
import type { Limit } from '@/lib/server/http/rate-limit'
import { takeFromLimit } from '@/lib/server/http/rate-limit'

const tries: Limit = { name: 'change-password', points: 10, seconds: 600 }

/** Whether the person ever chose a password; one who came by mailed links has none. */
export async function hasPassword(person: SignedInPerson): Promise<boolean> {
  return Boolean((await findPerson(db(), person.personId))?.passwordHash)
}

/** Sets a new password against the present one, and signs the person out on every other device. */
export async function changePassword(
  person: SignedInPerson,
  input: { current: string | null; password: string },
): Promise<void> {
  await takeFromLimit(tries, person.personId)
  const row = await findPerson(db(), person.personId)
  if (row?.passwordHash && !(await passwordMatches(row.passwordHash, input.current ?? ''))) {
    throw new AppError('invalid', 'The password you have now is not that one. Nothing was changed.', {
      details: { fields: { current: 'is not the password you have now' } },
    })
  }
  const passwordHash = await hashPassword(input.password)
  await db().transaction(async (tx) => {
    await setPersonPassword(tx, person.personId, passwordHash)
    await usePasswordResets(tx, person.personId)
    await endOtherSessions(tx, person)
    await insertAuditEvent(tx, {
      partyId: null,
      actorKind: 'person',
      actorId: person.personId,
      action: 'password.change',
      subjectType: 'person',
      subjectId: person.personId,
      address: person.address,
    })
  })
}
