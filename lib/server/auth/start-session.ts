import { headers } from 'next/headers'
import { db } from '@/db/client'
import { insertAuditEvent } from '@/db/queries/audit'
import { endSession, insertSession, listParties } from '@/db/queries/session'
import { clientAddress } from '@/lib/server/http/client-address'

/** Begins a session on this device, in the person's first party by name. */
export async function startSession(personId: string, seconds: number): Promise<string> {
  const sent = await headers()
  return db().transaction(async (tx) => {
    const parties = await listParties(tx, personId)
    const activePartyId = parties[0]?.id ?? null
    const id = await insertSession(tx, {
      personId,
      activePartyId,
      device: (sent.get('user-agent') ?? '').slice(0, 200),
      expiresAt: new Date(Date.now() + seconds * 1000),
    })
    await insertAuditEvent(tx, {
      partyId: activePartyId,
      actorKind: 'person',
      actorId: personId,
      action: 'session.start',
      subjectType: 'session',
      subjectId: id,
      address: clientAddress(sent),
    })
    return id
  })
}

export async function stopSession(sessionId: string, personId: string): Promise<void> {
  await endSession(db(), { sessionId, personId })
}
