import { randomUUID } from 'node:crypto'
import { db } from '@/db/client'
import { insertAuditEvent } from '@/db/queries/audit'
import { findMember, insertMembership } from '@/db/queries/member'
import { findParty, insertParty } from '@/db/queries/party'
import { switchParty } from '@/db/queries/session'
import type { Party } from '@/lib/contracts/party'
import { AppError } from '@/lib/errors'
import type { SignedInPerson } from '@/lib/server/auth/current-actor'
import type { Limit } from '@/lib/server/http/rate-limit'
import { takeFromLimit } from '@/lib/server/http/rate-limit'

const perPerson: Limit = { name: 'create-party', points: 20, seconds: 3600 }

/** Makes a party, its maker the owner, and takes it in hand on this device. The same id again is the same request. */
export async function createParty(person: SignedInPerson, input: { id?: string | undefined; name: string }): Promise<Party> {
  await takeFromLimit(perPerson, person.personId)
  const scope = { partyId: input.id ?? randomUUID() }
  return db().transaction(async (tx) => {
    const made = await insertParty(tx, { id: scope.partyId, name: input.name })
    if (!made) {
      const there = (await findMember(tx, scope, person.personId)) ? await findParty(tx, scope) : undefined
      if (!there) throw new AppError('conflict', 'That id is taken. Nothing was made; please try again.')
      return there
    }
    await insertMembership(tx, scope, { personId: person.personId, roles: ['owner'] })
    await switchParty(tx, { sessionId: person.sessionId, personId: person.personId, partyId: scope.partyId })
    await insertAuditEvent(tx, {
      ...scope,
      actorKind: 'person',
      actorId: person.personId,
      action: 'party.create',
      subjectType: 'party',
      subjectId: scope.partyId,
      detail: { name: input.name },
      address: person.address,
    })
    return made
  })
}
