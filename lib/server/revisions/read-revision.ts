import { db } from '@/db/client'
import { findNewestRevision, findRevision } from '@/db/queries/revision'
import { compareSpecs } from '@/lib/advance/compare-specs'
import { insteadOfWords, lineDetails, lineWords } from '@/lib/advance/line-content'
import { upgradeRevisionDocument } from '@/lib/advance/revision-document'
import type { RevisionDetail } from '@/lib/contracts/revision'
import { AppError } from '@/lib/errors'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { revisionSummary } from './revision-summary'

/** One revision: its lines in words, and what changed against the one before it. */
export async function readRevision(actor: Actor, input: { revisionId: string }): Promise<RevisionDetail> {
  assertCan(actor, 'party:read')
  const found = await findRevision(db(), actor, input.revisionId)
  if (!found) throw new AppError('not-found', 'There is no such revision in this party.')
  const before = await findNewestRevision(db(), actor, { rigId: found.rigId, before: found.number })
  const document = upgradeRevisionDocument(found.document)
  return {
    ...revisionSummary({ ...found, lines: document.lines.length }),
    documentHash: found.documentHash,
    asked: document.lines.map(({ lineId, hash, position, content }) => ({
      ...{ lineId, hash, position },
      words: lineWords(content, document.party.units),
      details: lineDetails(content),
      insteadOf: insteadOfWords(content),
      supply: content.supply,
    })),
    carried: document.kit.filter((entry) => entry.supply === 'carried').map((entry) => entry.name),
    pieces: Object.keys(document.plot.document.pieces).length,
    channels: document.channels.length,
    previousNumber: before?.number ?? null,
    changes: before ? compareSpecs(upgradeRevisionDocument(before.document), document) : null,
  }
}
