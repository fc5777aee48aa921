import type { Db, Scope } from '@/db/client'
import type { Subjects } from '@/db/queries/answer'
import { listAnswerEvents, listSettlements } from '@/db/queries/answer'
import type { AdvancePlace, DispatchRow, NumberedLine } from '@/db/queries/dispatch'
import { listAdvanceHires, listAdvanceShows, listDispatches, listNewestLines, listRecipients } from '@/db/queries/dispatch'
import type { AnswerContent } from '@/lib/advance/answer'
import type { Decision, SaidAnswer } from '@/lib/advance/answer-state'
import type { MailFacts } from '@/lib/advance/standing'
import { isAskedOf } from '@/lib/advance/standing'

export type AdvanceShow = Awaited<ReturnType<typeof listAdvanceShows>>[number]
export type AdvanceHire = Awaited<ReturnType<typeof listAdvanceHires>>[number]
export type AdvanceRecipient = Awaited<ReturnType<typeof listRecipients>>[number]
type AnswerRow = Awaited<ReturnType<typeof listAnswerEvents>>[number]
type SettlementRow = Awaited<ReturnType<typeof listSettlements>>[number]

/** All that is known of one show's or one hire's advance, as the pure rules take it. */
export type SubjectFacts = {
  readonly recipients: readonly AdvanceRecipient[]
  /** Newest first. */
  readonly dispatches: readonly DispatchRow[]
  readonly said: readonly SaidAnswer[]
  readonly decided: readonly Decision[]
  readonly closed: readonly { readonly byName: string; readonly at: string }[]
  /** What the newest revisions ask of it. */
  readonly askedNow: readonly NumberedLine[]
  readonly newestRevisionIds: readonly string[]
  readonly rigIds: readonly string[]
  readonly dueAt: string | null
}
export type ShowFacts = SubjectFacts & { readonly kind: 'show'; readonly show: AdvanceShow }
export type HireFacts = SubjectFacts & { readonly kind: 'hire'; readonly hire: AdvanceHire }
export type Facts = { readonly shows: readonly ShowFacts[]; readonly hires: readonly HireFacts[] }

/** Reads the advance of a tour, a show or a hire in seven statements, however many shows there are. */
export async function loadAdvance(db: Db, scope: Scope, place: AdvancePlace): Promise<Facts> {
  // One after the other: inside a transaction there is one connection, and it takes one statement at a time.
  const shows = await listAdvanceShows(db, scope, place)
  const hires = await listAdvanceHires(db, scope, place)
  const subjects: Subjects = { showIds: shows.map((row) => row.id), hireIds: hires.map((row) => row.id) }
  const rigIds = [...new Set([...shows.map((row) => row.rigId), ...hires.flatMap((row) => row.rigIds)])]
  const houses = { venueIds: shows.map((row) => row.venueId), supplierIds: hires.map((row) => row.supplierId) }
  const recipients = await listRecipients(db, scope, houses)
  const dispatches = await listDispatches(db, scope, subjects)
  const answers = await listAnswerEvents(db, scope, subjects)
  const settlements = await listSettlements(db, scope, subjects)
  const newest = await listNewestLines(db, scope, rigIds)
  const factsOf = (
    subject: { id: string; rigIds: readonly string[]; answersDueAt: Date | null },
    own: (row: { showId: string | null; hireId: string | null }) => boolean,
    isAsked: (supply: 'rented' | 'venue') => boolean,
    people: readonly AdvanceRecipient[],
  ): SubjectFacts => {
    const lines = newest.filter((line) => subject.rigIds.includes(line.rigId))
    const events = answers.filter(own)
    return {
      recipients: people,
      dispatches: dispatches.filter(own),
      said: events.flatMap(saidAnswer),
      decided: settlements.filter(own).map(decisionOf),
      closed: events.filter((row) => row.kind === 'close').map((row) => ({ byName: row.byName, at: row.at.toISOString() })),
      askedNow: lines.filter((line) => isAsked(line.supply)).map(({ lineId, hash, number }) => ({ lineId, hash, number })),
      newestRevisionIds: [...new Set(lines.map((line) => line.revisionId))],
      rigIds: subject.rigIds,
      dueAt: subject.answersDueAt?.toISOString() ?? null,
    }
  }
  return {
    shows: shows.map((show) => ({
      kind: 'show',
      show,
      ...factsOf(
        { ...show, rigIds: [show.rigId] },
        (row) => row.showId === show.id,
        (supply) => isAskedOf('venue', supply, show.hired),
        recipients.filter((person) => person.venueId === show.venueId),
      ),
    })),
    hires: hires.map((hire) => ({
      kind: 'hire',
      hire,
      ...factsOf(
        hire,
        (row) => row.hireId === hire.id,
        (supply) => isAskedOf('supplier', supply, true),
        recipients.filter((person) => person.supplierId === hire.supplierId),
      ),
    })),
  }
}

/** One stored answer as the rules read it; none for "that's all from us". */
export function saidAnswer(row: AnswerRow): SaidAnswer[] {
  if (row.kind !== 'answer' || !row.lineId || !row.lineHash) return []
  return [
    {
      id: row.id,
      sequence: row.sequence,
      lineId: row.lineId,
      lineHash: row.lineHash,
      // Only ever written through the contract that states this shape.
      content: row.content as AnswerContent,
      remark: row.remark,
      byName: row.byName,
      via: row.takenBy ? 'taken down' : 'link',
      taken: row.takenBy ? { from: row.takenFrom ?? '', how: row.takenHow ?? '', by: row.takenBy } : null,
      at: row.at.toISOString(),
    },
  ]
}

export function decisionOf(row: SettlementRow): Decision {
  const { id, sequence, lineId, answerEventId, decision, remark, byName } = row
  return { id, sequence, lineId, answerEventId, decision, remark, byName, at: row.at.toISOString() }
}

/** What is known of a sending's mail. */
export function mailFacts(row: DispatchRow): MailFacts {
  return {
    sentAt: row.sentAt?.toISOString() ?? null,
    cancelledAt: row.cancelledAt?.toISOString() ?? null,
    failedAt: row.failedAt?.toISOString() ?? null,
    told: row.told as MailFacts['told'],
  }
}
