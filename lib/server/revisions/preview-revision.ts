import { db } from '@/db/client'
import { findNewestRevision, listRevisions, listRigsWithShows } from '@/db/queries/revision'
import { compareSpecs, specsAreSame } from '@/lib/advance/compare-specs'
import { linesOfKit } from '@/lib/advance/line-content'
import { upgradeRevisionDocument } from '@/lib/advance/revision-document'
import type { RevisionPreview, RevisionSummary } from '@/lib/contracts/revision'
import { AppError } from '@/lib/errors'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { readRigSpec } from './read-rig-spec'
import { revisionSummary } from './revision-summary'

/** The revisions of a tour, and for each of its rigs what the next one would change. */
export async function previewRevisions(
  actor: Actor,
  input: { tourId: string },
): Promise<{ rigs: RevisionPreview[]; revisions: RevisionSummary[] }> {
  assertCan(actor, 'party:read')
  const rigs = await listRigsWithShows(db(), actor, input.tourId)
  const previews: RevisionPreview[] = []
  for (const rig of rigs) {
    const spec = await readRigSpec(db(), actor, rig.id)
    if (!spec) throw new AppError('not-found', 'There is no such tour in this party.')
    const last = await findNewestRevision(db(), actor, { rigId: rig.id })
    const before = last ? upgradeRevisionDocument(last.document) : null
    previews.push({
      rigId: rig.id,
      rigName: rig.name,
      shows: rig.shows,
      nextNumber: (last?.number ?? 0) + 1,
      state: spec.kit.length === 0 ? 'empty' : before && specsAreSame(before, spec) ? 'same' : 'ready',
      lines: linesOfKit(spec.kit).length,
      changes: before ? compareSpecs(before, spec) : null,
    })
  }
  return { rigs: previews, revisions: (await listRevisions(db(), actor, input)).map(revisionSummary) }
}
