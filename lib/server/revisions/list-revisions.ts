import { db } from '@/db/client'
import { findRigHead, listRevisions as listRows } from '@/db/queries/revision'
import type { RevisionSummary } from '@/lib/contracts/revision'
import { AppError } from '@/lib/errors'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { revisionSummary } from './revision-summary'

/** The revisions of a rig, newest first. */
export async function listRigRevisions(actor: Actor, input: { rigId: string }): Promise<RevisionSummary[]> {
  assertCan(actor, 'party:read')
  if (!(await findRigHead(db(), actor, input.rigId)))
    throw new AppError('not-found', 'There is no such rig in this party.')
  return (await listRows(db(), actor, input)).map(revisionSummary)
}
