import { db } from '@/db/client'
import { listParties, switchParty } from '@/db/queries/session'
import type { OwnParty } from '@/lib/contracts/party'
import { AppError } from '@/lib/errors'
import type { SignedInPerson } from '@/lib/server/auth/current-actor'

/** The parties a person belongs to, by name. */
export async function listOwnParties(person: SignedInPerson): Promise<OwnParty[]> {
  return listParties(db(), person.personId)
}

/** Takes another of the person's parties in hand, on this device only. */
export async function takePartyInHand(person: SignedInPerson, partyId: string): Promise<void> {
  const switched = await switchParty(db(), { sessionId: person.sessionId, personId: person.personId, partyId })
  if (!switched) throw new AppError('not-found', 'You are not in that party. Nothing was changed.')
}
