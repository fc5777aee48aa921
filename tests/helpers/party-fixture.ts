import { randomUUID } from 'node:crypto'
import { db } from '@/db/client'
import { insertPerson } from '@/db/queries/person'
import { insertSession } from '@/db/queries/session'
import { membership, party, player } from '@/db/schema/party'
import type { Role } from '@/lib/contracts/common'
import type { HttpClient } from './http-client'
import { deviceOf } from './http-client'

export type Member = { personId: string; sessionId: string; email: string; call: HttpClient }
export type PartyFixture = {
  partyId: string
  playerId: string
  owner: Member
  drumTech: Member
  tourManager: Member
  viewer: Member
}

async function member(partyId: string, role: Role): Promise<Member> {
  const email = `${role}-${randomUUID()}@test.example`
  const person = await insertPerson(db(), { name: `The ${role}`, email, emailVerifiedAt: new Date() })
  await db().insert(membership).values({ partyId, personId: person.id, roles: [role] })
  const sessionId = await insertSession(db(), {
    personId: person.id,
    activePartyId: partyId,
    device: 'test',
    expiresAt: new Date(Date.now() + 3_600_000),
  })
  return { personId: person.id, sessionId, email, call: await deviceOf({ personId: person.id, sessionId }) }
}

/** A party of its own with one signed-in member per role: tests never share rows. */
export async function makeParty(): Promise<PartyFixture> {
  const partyId = randomUUID()
  await db().insert(party).values({ id: partyId, name: `Party ${partyId.slice(0, 8)}` })
  const playerId = randomUUID()
  await db().insert(player).values({ id: playerId, partyId, name: 'The player' })
  return {
    partyId,
    playerId,
    owner: await member(partyId, 'owner'),
    drumTech: await member(partyId, 'drum-tech'),
    tourManager: await member(partyId, 'tour-manager'),
    viewer: await member(partyId, 'viewer'),
  }
}
