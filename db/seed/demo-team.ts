import { readFileSync } from 'node:fs'
import { db } from '@/db/client'
import { findPersonByEmail, insertPerson } from '@/db/queries/person'
import type { Role } from '@/lib/contracts/common'
import type { MemberActor } from '@/lib/server/auth/actor'
import { linkToken } from '@/lib/server/auth/link-token'
import { hashPassword } from '@/lib/server/auth/password'
import { acceptInvitation } from '@/lib/server/members/accept-invitation'
import { invite } from '@/lib/server/members/invite'
import { createParty } from '@/lib/server/party/create-party'
import { demoId } from './demo-id'

type DemoPerson = { name: string; email: string; password: string; roles: Role[] }
export type Team = Record<Role, MemberActor>

export const demoPeople = JSON.parse(
  readFileSync(new URL('./demo-people.json', import.meta.url), 'utf8'),
) as DemoPerson[]
export const demoPartyId = demoId('party')

/** The party and its four people: the owner makes it, the others are invited and come. */
export async function makeTeam(): Promise<Team> {
  const made: Partial<Team> = {}
  for (const person of demoPeople) {
    const [role] = person.roles
    if (!role) throw new Error(`${person.email} has no role`)
    const known = await findPersonByEmail(db(), person.email)
    if (role === 'owner') {
      const owner =
        known ??
        (await insertPerson(db(), {
          id: demoId('person', person.email),
          name: person.name,
          email: person.email,
          passwordHash: await hashPassword(person.password),
          emailVerifiedAt: new Date(),
        }))
      const signedIn = {
        personId: owner.id,
        name: owner.name,
        email: owner.email,
        sessionId: demoId('no session'),
        partyId: null,
        address: '',
      }
      await createParty(signedIn, { id: demoPartyId, name: 'Saltmarsh Radio' })
    } else if (!known) {
      const owner = made.owner
      if (!owner) throw new Error('the owner comes first')
      const invitation = await invite(owner, {
        id: demoId('invitation', person.email),
        email: person.email,
        roles: person.roles,
      })
      await acceptInvitation(
        { token: linkToken('invitation', invitation.id), newcomer: { name: person.name, password: person.password } },
        undefined,
        '',
      )
    }
    const row = await findPersonByEmail(db(), person.email)
    if (!row) throw new Error(`${person.email} did not come`)
    made[role] = {
      kind: 'person',
      personId: row.id,
      name: row.name,
      partyId: demoPartyId,
      roles: person.roles,
      sessionId: demoId('no session'),
      address: '',
    }
  }
  return made as Team
}
