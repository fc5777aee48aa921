import { db } from '@/db/client'
import type { Db, Scope } from '@/db/client'
import { listLineContents } from '@/db/queries/answer'
import type { DispatchRow, NumberedLine } from '@/db/queries/dispatch'
import { listSendableRevisions } from '@/db/queries/dispatch'
import { listGrants } from '@/db/queries/grant'
import { findParty } from '@/db/queries/party'
import { answerWords } from '@/lib/advance/answer'
import type { LineState, SaidAnswer } from '@/lib/advance/answer-state'
import { deriveLineStates } from '@/lib/advance/answer-state'
import { lineDifferences } from '@/lib/advance/compare-specs'
import type { LineContent } from '@/lib/advance/line-content'
import { insteadOfWords, lineDetails, lineWords } from '@/lib/advance/line-content'
import { mailFate, sameLines } from '@/lib/advance/standing'
import { instantWords } from '@/lib/advance/when-words'
import type { AdvanceLine, AdvanceOther, AdvanceRecipient, AdvanceSaid, AdvanceSending, AdvanceView } from '@/lib/contracts/advance'
import { takenHowWords } from '@/lib/contracts/answer'
import { AppError } from '@/lib/errors'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { lineSize } from '@/lib/server/answers/line-size'
import { dateWords } from '@/lib/staging/calendar'
import { recipientStandings, sentLines, standingOf, subjectStanding } from './derive-standings'
import type { HireFacts, ShowFacts } from './load-advance'
import { loadAdvance, mailFacts } from './load-advance'

type Subject = ShowFacts | HireFacts
type Grants = Awaited<ReturnType<typeof listGrants>>

/** Everything of one show's or hire's advance: recipients and standing, lines and answers side by side, links, what can be sent. */
export async function readAdvance(actor: Actor, input: { tourId: string; of: AdvanceView['of'] }): Promise<AdvanceView> {
  assertCan(actor, 'party:read')
  const { of } = input
  const facts = await loadAdvance(db(), actor, { tourId: input.tourId })
  const subjects: Subject[] = [...facts.shows, ...facts.hires]
  const subject = subjects.find((entry) => isOf(entry, of))
  if (!subject) throw new AppError('not-found', `There is no such ${of.kind} on this tour.`)
  const ids = { showId: of.kind === 'show' ? of.showId : null, hireId: of.kind === 'hire' ? of.hireId : null }
  const [revisions, grants, party] = await Promise.all([
    listSendableRevisions(db(), actor, subject.rigIds),
    listGrants(db(), actor, ids),
    findParty(db(), actor),
  ])
  const now = new Date().toISOString()
  const { standing, counts, sent } = subjectStanding(subject, now)
  const asked = sent ? sentLines(subject.dispatches, subject.rigIds) : subject.askedNow
  const changed = sent && !sameLines(asked, subject.askedNow)
  return {
    ...{ of, tourId: input.tourId, title: titleOf(subject), standing, counts, sent },
    due: subject.dueAt ? instantWords(subject.dueAt, zoneOf(subject)) : null,
    recipients: recipientsOf(subject, grants, now),
    revisions: revisions.map(({ id, number, rigId, rigName, note }) => ({ id, number, rigId, rigName, note })),
    unsentChange: (changed && revisions.find((revision) => subject.newestRevisionIds.includes(revision.id))) || null,
    lines: await advanceLines(db(), actor, { asked, subject, sent, units: party?.units ?? 'metric' }),
    closed: subject.closed.map(({ byName, at }) => ({ byName, at })).reverse(),
    others: subjects.filter((entry) => entry !== subject).flatMap((entry) => otherOf(entry, now)),
  }
}

function isOf(subject: Subject, of: AdvanceView['of']): boolean {
  return subject.kind === 'show' ? of.kind === 'show' && subject.show.id === of.showId : of.kind === 'hire' && subject.hire.id === of.hireId
}

function titleOf(subject: Subject): string {
  if (subject.kind === 'show') {
    const { name, venueName, town, date } = subject.show
    return [name, [venueName, town].filter(Boolean).join(', '), dateWords(date)].filter(Boolean).join(', ')
  }
  const { name, supplierName, firstDate, lastDate, showIds } = subject.hire
  const span = firstDate && lastDate ? (firstDate === lastDate ? dateWords(firstDate) : `${dateWords(firstDate)} to ${dateWords(lastDate)}`) : ''
  return [supplierName, name, span, showIds.length === 1 ? '1 show' : `${showIds.length} shows`].filter(Boolean).join(', ')
}

function zoneOf(subject: Subject): string | null {
  return subject.kind === 'show' ? subject.show.zone : subject.hire.zone
}

/** Everybody who was sent something or could be, those who look after backline first. */
function recipientsOf(subject: Subject, grants: Grants, now: string): AdvanceRecipient[] {
  const known = new Map(subject.recipients.map((person) => [person.id, { contactId: person.id, name: person.name, email: person.email, duties: [...person.duties] as string[] }]))
  for (const row of subject.dispatches) {
    if (!known.has(row.contactId)) known.set(row.contactId, { contactId: row.contactId, name: row.contactName, email: row.toAddress, duties: [] })
  }
  const rank = (duties: string[]) => (duties.includes('backline') ? 0 : 1)
  return [...known.values()]
    .sort((a, b) => rank(a.duties) - rank(b.duties) || a.name.localeCompare(b.name))
    .map((person) => ({
      ...person,
      standing: standingOf(subject, person.contactId, now),
      sendings: subject.dispatches.filter((row) => row.contactId === person.contactId).map((row) => sendingOf(row, now)),
      links: grants
        .filter((grant) => grant.purpose === 'reply' && grant.contactId === person.contactId)
        .map((grant) => ({
          grantId: grant.id,
          state: grant.withdrawnAt ? 'withdrawn' : grant.expiresAt.toISOString() <= now ? 'expired' : 'works',
          expiresAt: grant.expiresAt.toISOString(),
          lastUsedAt: grant.lastUsedAt,
          uses: grant.uses,
        })),
    }))
}

function sendingOf(row: DispatchRow, now: string): AdvanceSending {
  const fate = mailFate(mailFacts(row))
  const held = fate === 'waiting' && row.firstTriedAt === null && row.sendAfter.toISOString() > now
  return {
    ...{ dispatchId: row.id, packId: row.packId, spec: `${row.rigName}, revision ${row.revisionNumber}`, at: row.at.toISOString() },
    ...{ by: row.sentByName, toAddress: row.toAddress, fate },
    failure: fate === 'not delivered' ? (row.failure ?? 'The mail came back: this address does not take it.') : '',
    heldUntil: held ? row.sendAfter.toISOString() : null,
  }
}

function otherOf(subject: Subject, now: string): AdvanceOther[] {
  const recipients = recipientStandings(subject, now)
  if (recipients.length === 0) return []
  return [
    {
      of: subject.kind === 'show' ? { kind: 'show', showId: subject.show.id } : { kind: 'hire', hireId: subject.hire.id },
      title: titleOf(subject),
      rigIds: [...subject.rigIds],
      standing: subjectStanding(subject, now).standing,
      recipients: recipients.map(({ contactId, name }) => ({ contactId, name })),
    },
  ]
}

async function advanceLines(
  connection: Db,
  scope: Scope,
  input: { asked: readonly NumberedLine[]; subject: Subject; sent: boolean; units: 'metric' | 'imperial' },
): Promise<AdvanceLine[]> {
  const { asked, subject, sent, units } = input
  const states = deriveLineStates(asked, subject.said, subject.decided)
  const rows = await listLineContents(connection, scope, {
    lineIds: asked.map((line) => line.lineId),
    hashes: [...new Set([...asked.map((line) => line.hash), ...subject.said.map((entry) => entry.lineHash)])],
  })
  // Only ever written by issuing a revision, which states this shape.
  const contentOf = new Map(rows.map((row) => [`${row.lineId} ${row.hash}`, row.content as LineContent]))
  return asked.flatMap((line, index) => {
    const state = states[index]
    const content = contentOf.get(`${line.lineId} ${line.hash}`)
    if (!state || !content) return []
    const before = state.state === 'changed since' ? contentOf.get(`${line.lineId} ${state.answer.lineHash}`) : undefined
    return [
      {
        ...{ lineId: line.lineId, hash: line.hash, number: line.number, kind: content.kind, count: content.count },
        ...{ words: lineWords(content, units), details: lineDetails(content), insteadOf: insteadOfWords(content), size: lineSize(content) },
        changes: before ? lineDifferences(before, content, units) : [],
        state: state.state === 'unanswered' && !sent ? 'not sent' : state.state,
        ...standsOf(state),
        history: state.history.map(saidOf).reverse(),
      },
    ]
  })
}

function standsOf(state: LineState): Pick<AdvanceLine, 'said' | 'decided'> {
  const decision = state.state === 'settled' ? state.decision : state.state === 'unanswered' ? state.askedAgain : null
  const answer = state.state === 'unanswered' ? null : state.answer
  return {
    said: answer ? saidOf(answer) : null,
    decided: decision ? { byName: decision.byName, at: decision.at, remark: decision.remark } : null,
  }
}

function saidOf(answer: SaidAnswer): AdvanceSaid {
  const { id, content, remark, byName, at, taken } = answer
  const how = taken ? `${takenHowWords[taken.how as keyof typeof takenHowWords] ?? taken.how}, taken down by ${taken.by}` : 'by the link'
  return { id, content, remark, byName, at, words: answerWords(content, dateWords), how }
}
