import { db } from '@/db/client'
import { findLiveSession } from '@/db/queries/session'
import type { MemberActor } from './actor'

/** Whether a device is still signed in and still in the party it began with. */
export async function sessionIsLive(actor: MemberActor): Promise<boolean> {
  const row = await findLiveSession(db(), actor.sessionId)
  return row?.partyId === actor.partyId
}
