import type { Db, Scope } from '@/db/client'
import { listHiresOfShow } from '@/db/queries/bench'
import { listAdvanceHires, listAdvanceShows } from '@/db/queries/dispatch'
import { extendGrants } from '@/db/queries/grant'
import { grantExpiry } from './grant-expiry'
import { lastDayOfHire } from './last-day-of-hire'

/** After a hire's dates changed: no link of it runs out before its collection. */
export async function extendLinksOfHire(tx: Db, scope: Scope, hireId: string): Promise<void> {
  const [hire] = await listAdvanceHires(tx, scope, { hireId })
  if (!hire) return
  const expiresAt = grantExpiry({ lastDate: lastDayOfHire(hire), zone: hire.zone, now: new Date() })
  await extendGrants(tx, scope, { showId: null, hireId, expiresAt })
}

/** After a show moved to another day: neither its links nor those of the hires over it run out before it. */
export async function extendLinksOfShow(tx: Db, scope: Scope, showId: string): Promise<void> {
  const [show] = await listAdvanceShows(tx, scope, { showId })
  if (!show) return
  const expiresAt = grantExpiry({ lastDate: show.date, zone: show.zone, now: new Date() })
  await extendGrants(tx, scope, { showId, hireId: null, expiresAt })
  for (const { hireId } of await listHiresOfShow(tx, scope, showId)) await extendLinksOfHire(tx, scope, hireId)
}
