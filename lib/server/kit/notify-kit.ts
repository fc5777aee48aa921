import type { Db, Scope } from '@/db/client'
import { notifyLive } from '@/lib/server/live/notify-live'

/** A kit changed: whoever shows it, or what the next revision of its rig would freeze, reads again. */
export async function notifyKit(tx: Db, scope: Scope, rigId: string): Promise<void> {
  await notifyLive(tx, scope.partyId, [`kit:${rigId}`, `revision:${rigId}`])
}
