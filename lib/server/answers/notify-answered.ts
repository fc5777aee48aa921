import type { Db, Scope } from '@/db/client'
import { listAdvanceHires, listAdvanceShows } from '@/db/queries/dispatch'
import { notifyLive } from '@/lib/server/live/notify-live'

type Of = { readonly showId: string | null; readonly hireId: string | null }

/** Tells the desk and the reply page of a show or hire that something was said or decided about it. */
export async function notifyAnswered(tx: Db, scope: Scope, of: Of): Promise<void> {
  const [show] = of.showId ? await listAdvanceShows(tx, scope, { showId: of.showId }) : []
  const [hire] = of.hireId ? await listAdvanceHires(tx, scope, { hireId: of.hireId }) : []
  const found = show ?? hire
  if (!found) return
  // What is settled changes the night's kit of every show that it is for.
  const nights = hire ? hire.showIds : [found.id]
  await notifyLive(tx, scope.partyId, [`advance:${found.id}`, `run:${found.tourId}`, ...nights.map((id) => `bench:${id}` as const)])
}
