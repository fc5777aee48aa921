import type { findPack } from '@/db/queries/pack'
import type { PackState } from '@/lib/contracts/pack'

/** After this long a PDF that is not there has failed all its tries. */
const lateAfterMs = 10 * 60 * 1000

/** How far a pack is. */
export function packState(pack: NonNullable<Awaited<ReturnType<typeof findPack>>>, now = Date.now()): PackState {
  const { id, revisionId, revisionNumber, showId, hireId, createdAt } = pack
  return {
    ...{ id, revisionId, revisionNumber, showId, hireId },
    createdAt: createdAt.toISOString(),
    pdf: pack.pdfBlobId ? 'ready' : now - createdAt.getTime() > lateAfterMs ? 'late' : 'making',
    pages: pack.pdfPages,
  }
}
