import { db } from '@/db/client'
import { insertAuditEvent } from '@/db/queries/audit'
import { endAllSessions, endSession, listSessions } from '@/db/queries/session'
import type { Device } from '@/lib/contracts/sign-in'
import { AppError } from '@/lib/errors'
import type { SignedInPerson } from '@/lib/server/auth/current-actor'
import { deviceWords } from './device-words'

/** Every device the person is signed in on, the one last used first. */
export async function listDevices(person: SignedInPerson): Promise<Device[]> {
  const rows = await listSessions(db(), person.personId)
  return rows.map((row) => ({
    id: row.id,
    words: deviceWords(row.device),
    current: row.id === person.sessionId,
    since: row.createdAt.toISOString(),
    lastSeen: row.lastSeenAt.toISOString(),
  }))
}

/** Signs the person out on one device, at its next request. */
export async function endDevice(person: SignedInPerson, sessionId: string): Promise<void> {
  await db().transaction(async (tx) => {
    const ended = await endSession(tx, { sessionId, personId: person.personId })
    if (!ended) throw new AppError('not-found', 'That device is not signed in any more. Nothing was changed.')
    await insertAuditEvent(tx, {
      partyId: person.partyId,
      actorKind: 'person',
      actorId: person.personId,
      action: 'session.end',
      subjectType: 'session',
      subjectId: sessionId,
      address: person.address,
    })
  })
}

/** Signs the person out on every device, this one too. */
export async function endAllDevices(person: SignedInPerson): Promise<void> {
  await db().transaction(async (tx) => {
    const count = await endAllSessions(tx, person.personId)
    await insertAuditEvent(tx, {
      partyId: person.partyId,
      actorKind: 'person',
      actorId: person.personId,
      action: 'session.end-all',
      subjectType: 'person',
      subjectId: person.personId,
      detail: { count },
      address: person.address,
    })
  })
}
