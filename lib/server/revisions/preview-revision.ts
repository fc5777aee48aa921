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

/** A rig of a tour (its first unless named): its revisions, and what the next one would change. Null while there is no rig. */
export async function previewRevision(
  actor: Actor,
  input: { tourId: string; rigId?: string | undefined },
): Promise<{ next: RevisionPreview; revisions: RevisionSummary[] } | null> {
  assertCan(actor, 'party:read')
  const rigs = await listRigsWithShows(db(), actor, input.tourId)
  const rig = input.rigId ? rigs.find(({ id }) => id === input.rigId) : rigs[0]
  if (!rig && !input.rigId) return null
  const spec = rig && (await readRigSpec(db(), actor, rig.id))
  if (!rig || !spec) throw new AppError('not-found', 'There is no such rig in this tour.')
  const last = await findNewestRevision(db(), actor, { rigId: rig.id })
  const before = last ? upgradeRevisionDocument(last.document) : null
  return {
    next: {
      ...{ rigId: rig.id, rigName: rig.name, shows: rig.shows },
      number: (last?.number ?? 0) + 1,
      state: spec.kit.length === 0 ? 'empty' : before && specsAreSame(before, spec) ? 'same' : 'ready',
      lines: linesOfKit(spec.kit).length,
      changes: before ? compareSpecs(before, spec) : null,
    },
    revisions: (await listRevisions(db(), actor, { rigId: rig.id })).map(revisionSummary),
  }
}
