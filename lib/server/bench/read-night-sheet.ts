import type { Db, Scope } from '@/db/client'
import { listAnswerEvents, listSettlements } from '@/db/queries/answer'
import { listHiresOfShow } from '@/db/queries/bench'
import { findLastSentRevision } from '@/db/queries/pack'
import { findNewestRevision } from '@/db/queries/revision'
import type { LineState } from '@/lib/advance/answer-state'
import { deriveLineStates } from '@/lib/advance/answer-state'
import { entriesInOrder } from '@/lib/advance/frozen-kit'
import type { NightEntry } from '@/lib/advance/night'
import { nightKit } from '@/lib/advance/night'
import type { RevisionDocument } from '@/lib/advance/revision-document'
import { upgradeRevisionDocument } from '@/lib/advance/revision-document'
import { isAskedOf } from '@/lib/advance/standing'
import { decisionOf, saidAnswer } from '@/lib/server/advance/load-advance'

export type NightDrum = Extract<NightEntry, { kind: 'drum' }>
export type NightSheet = {
  readonly number: number
  /** The newest sent to the show, or the newest issued where none was sent. */
  readonly from: 'sent' | 'issued'
  readonly newestNumber: number
  readonly party: RevisionDocument['party']
  readonly gauge: RevisionDocument['gauge']
  readonly drums: readonly NightDrum[]
  /** Who brings the rented drums, when that is one supplier. */
  readonly supplierId: string | null
}

/** The drums that are true for one show tonight: its revision with what was settled. Null while none was issued. */
export async function readNightSheet(
  db: Db,
  scope: Scope,
  show: { id: string; rigId: string },
): Promise<NightSheet | null> {
  // One after another: a transaction has one connection.
  const sent = await findLastSentRevision(db, scope, { of: { showId: show.id }, rigId: show.rigId })
  const newest = await findNewestRevision(db, scope, { rigId: show.rigId })
  const hires = await listHiresOfShow(db, scope, show.id)
  const used = sent ?? newest
  if (!used || !newest) return null
  const document = upgradeRevisionDocument(used.document)
  const hireIds = hires.map(({ hireId }) => hireId)
  const states = await lineStates(db, scope, document, { showId: show.id, hireIds })
  const supplierIds = [...new Set(hires.map(({ supplierId }) => supplierId))]
  return {
    number: used.number,
    from: sent ? 'sent' : 'issued',
    newestNumber: newest.number,
    party: document.party,
    gauge: document.gauge,
    drums: entriesInOrder(nightKit(document, states)).filter((entry): entry is NightDrum => entry.kind === 'drum'),
    supplierId: supplierIds.length === 1 ? (supplierIds[0] ?? null) : null,
  }
}

/** Each line as its own recipients left it: the house its lines, every hire the rented ones. */
async function lineStates(
  db: Db,
  scope: Scope,
  document: RevisionDocument,
  { showId, hireIds }: { showId: string; hireIds: readonly string[] },
): Promise<LineState[]> {
  const subjects = { showIds: [showId], hireIds }
  const events = await listAnswerEvents(db, scope, subjects)
  const decisions = await listSettlements(db, scope, subjects)
  const statesOf = (
    audience: 'venue' | 'supplier',
    own: (row: { showId: string | null; hireId: string | null }) => boolean,
  ) =>
    deriveLineStates(
      document.lines
        .filter(({ content }) => isAskedOf(audience, content.supply, hireIds.length > 0))
        .map(({ lineId, hash }) => ({ lineId, hash })),
      events.filter(own).flatMap(saidAnswer),
      decisions.filter(own).map(decisionOf),
    )
  return [
    ...statesOf('venue', (row) => row.showId === showId),
    ...hireIds.flatMap((hireId) => statesOf('supplier', (row) => row.hireId === hireId)),
  ].filter(({ state }) => state === 'settled')
}
