import type { Db, Scope } from '@/db/client'
import { notifyLive } from '@/lib/server/live/notify-live'

/** Tells the advance and the bench of a show, or the advance of a hire, that one of its links changed. */
export async function notifyGrant(tx: Db, scope: Scope, grant: { showId: string | null; hireId: string | null }): Promise<void> {
  await notifyLive(tx, scope.partyId, [
    ...(grant.showId ? ([`advance:${grant.showId}`, `bench:${grant.showId}`] as const) : []),
    ...(grant.hireId ? ([`advance:${grant.hireId}`] as const) : []),
  ])
}
