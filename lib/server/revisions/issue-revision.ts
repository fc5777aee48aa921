import { randomUUID } from 'node:crypto'
import { db } from '@/db/client'
import type { Db } from '@/db/client'
import { insertLines, insertRevisionLines, listLines } from '@/db/queries/line'
import { findNewestRevision, findRevision, insertRevision, lockRig } from '@/db/queries/revision'
import { specsAreSame } from '@/lib/advance/compare-specs'
import { linesOfKit } from '@/lib/advance/line-content'
import type { RevisionDocument, RevisionLine, RigSpec } from '@/lib/advance/revision-document'
import { REVISION_SCHEMA_VERSION, upgradeRevisionDocument } from '@/lib/advance/revision-document'
import type { IssueRevision, RevisionSummary } from '@/lib/contracts/revision'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor, MemberActor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'
import { hashDocument } from './hash-document'
import { readRigSpec } from './read-rig-spec'
import { revisionSummary } from './revision-summary'

/** Freezes a rig as its next revision. The same id again is the same issue; nothing changed is no new revision. */
export async function issueRevision(actor: Actor, input: IssueRevision & { rigId: string }): Promise<RevisionSummary> {
  assertCan(actor, 'revision:issue')
  return db().transaction(async (tx) => {
    if (!(await lockRig(tx, actor, input.rigId))) throw new AppError('not-found', 'There is no such rig in this party.')
    const id = input.id ?? randomUUID()
    const repeated = await findRevision(tx, actor, id)
    if (repeated) return sameRequest(repeated, input.rigId)
    const spec = await readRigSpec(tx, actor, input.rigId)
    if (!spec) throw new AppError('not-found', 'There is no such rig in this party.')
    if (spec.kit.length === 0) {
      throw new AppError('conflict', 'This kit is empty. Add a drum first; then there is something to issue.')
    }
    const last = await findNewestRevision(tx, actor, { rigId: input.rigId })
    if (last && specsAreSame(upgradeRevisionDocument(last.document), spec)) {
      throw new AppError('conflict', `Nothing changed since revision ${last.number}. Nothing was issued.`, {
        details: { number: last.number },
      })
    }
    const lines = await findLines(tx, actor, input.rigId, spec)
    const document: RevisionDocument = { schemaVersion: REVISION_SCHEMA_VERSION, ...spec, lines }
    const number = (last?.number ?? 0) + 1
    const made = await insertRevision(tx, actor, {
      ...{ id, rigId: input.rigId, number, note: input.note, document },
      schemaVersion: document.schemaVersion,
      documentHash: hashDocument(document),
      issuedBy: actor.personId,
    })
    // Only an id of another party is taken and yet not found above.
    if (!made) throw new AppError('conflict', 'This id is taken. Please send it again with another one.')
    await insertRevisionLines(
      tx,
      actor,
      lines.map(({ lineId, hash, position, content }) => ({ revisionId: id, lineId, hash, position, content })),
    )
    await audit(
      tx,
      actor,
      'revision.issue',
      { type: 'revision', id },
      { rigId: input.rigId, number, lines: lines.length },
    )
    await notifyLive(tx, actor.partyId, [`revision:${input.rigId}`, `run:${spec.tour.id}`])
    const issued = await findRevision(tx, actor, id)
    if (!issued) throw new Error('the revision was just written')
    return revisionSummary({ ...issued, lines: lines.length })
  })
}

function sameRequest(found: NonNullable<Awaited<ReturnType<typeof findRevision>>>, rigId: string): RevisionSummary {
  if (found.rigId !== rigId)
    throw new AppError('conflict', 'This id belongs to a revision of another rig. Nothing was issued.')
  return revisionSummary({ ...found, lines: upgradeRevisionDocument(found.document).lines.length })
}

/** Finds each asked thing's permanent line again; what was never asked as this kind gets a new one, replacing the one before. */
async function findLines(tx: Db, actor: MemberActor, rigId: string, spec: RigSpec): Promise<RevisionLine[]> {
  const known = await listLines(tx, actor, rigId)
  const byEntryAndKind = new Map(known.map((row) => [`${row.kitEntryId} ${row.kind}`, row.id]))
  const newestOfEntry = new Map(known.map((row) => [row.kitEntryId, row.id]))
  const fresh: Parameters<typeof insertLines>[2] = []
  const lines = linesOfKit(spec.kit).map((asked): RevisionLine => {
    const { kind } = asked.content
    const found = byEntryAndKind.get(`${asked.entryId} ${kind}`)
    const lineId = found ?? randomUUID()
    if (!found) {
      const replacesLineId = newestOfEntry.get(asked.entryId) ?? null
      fresh.push({ id: lineId, rigId, kitEntryId: asked.entryId, kind, replacesLineId })
    }
    return { ...asked, lineId, hash: hashDocument(asked.content) }
  })
  await insertLines(tx, actor, fresh)
  return lines
}
