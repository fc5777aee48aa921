import type { Db } from '@/db/client'
import { findMailSubject } from '@/db/queries/dispatch'
import { notifyLive } from '@/lib/server/live/notify-live'

/** Tells the desk that the standing of a recipient may have changed. Sign-in mail has no desk to tell. */
export async function notifyMailChanged(tx: Db, mail: { id: string; partyId: string | null }): Promise<void> {
  if (!mail.partyId) return
  const subject = await findMailSubject(tx, { partyId: mail.partyId }, mail.id)
  if (!subject) return
  await notifyLive(tx, mail.partyId, [
    ...[subject.showId, subject.hireId].flatMap((id) => (id ? [`advance:${id}` as const] : [])),
    `run:${subject.tourId}`,
  ])
}
