import { and, eq, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { dispatch, pack } from '@/db/schema/advance'
import { hire } from '@/db/schema/hire'
import { show } from '@/db/schema/tour'

/** What a mail was sent for: the show or hire of its pack, and the tour. */
export async function findMailSubject(db: Db, scope: Scope, mailId: string) {
  const rows = await db
    .select({
      showId: pack.showId,
      hireId: pack.hireId,
      tourId: sql<string>`coalesce(${show.tourId}, ${hire.tourId})`,
    })
    .from(dispatch)
    .innerJoin(pack, and(eq(pack.partyId, dispatch.partyId), eq(pack.id, dispatch.packId)))
    .leftJoin(show, and(eq(show.partyId, pack.partyId), eq(show.id, pack.showId)))
    .leftJoin(hire, and(eq(hire.partyId, pack.partyId), eq(hire.id, pack.hireId)))
    .where(and(eq(dispatch.partyId, scope.partyId), eq(dispatch.mailId, mailId)))
    .limit(1)
  return rows[0]
}
