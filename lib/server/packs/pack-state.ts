import type { findPack } from '@/db/queries/pack'
import type { PackState } from '@/lib/contracts/pack'
import { rolesMay } from '@/lib/contracts/permissions'
import type { MemberActor } from '@/lib/server/auth/actor'

type Pack = NonNullable<Awaited<ReturnType<typeof findPack>>>

/** After this long a PDF that is not there has failed all its tries. */
const lateAfterMs = 10 * 60 * 1000

/** A reply link speaks for its reader; the PDF that was sent holds one, so it is handed out like one. */
export function mayOpenPdf(actor: MemberActor, pack: Pack): boolean {
  return !pack.dispatched || rolesMay(actor.roles, 'advance:send')
}

/** How far a pack is. */
export function packState(actor: MemberActor, pack: Pack, now = Date.now()): PackState {
  const { id, revisionId, revisionNumber, showId, hireId, createdAt } = pack
  return {
    ...{ id, revisionId, revisionNumber, showId, hireId },
    createdAt: createdAt.toISOString(),
    pdf: pack.pdfBlobId ? 'ready' : now - createdAt.getTime() > lateAfterMs ? 'late' : 'making',
    pages: pack.pdfPages,
    mayOpen: mayOpenPdf(actor, pack),
  }
}
