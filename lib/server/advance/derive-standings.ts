import type { DispatchRow, NumberedLine } from '@/db/queries/dispatch'
import { deriveLineStates } from '@/lib/advance/answer-state'
import type { LineCounts, Standing } from '@/lib/advance/standing'
import { countLines, mailFate, recipientStanding, urgentStanding } from '@/lib/advance/standing'
import type { SubjectFacts } from './load-advance'
import { mailFacts } from './load-advance'

export type RecipientStanding = { contactId: string; name: string; standing: Standing }

/** Of each rig the newest sending that was not stopped; of rigs no longer played here only while no other was sent. */
export function currentDispatches(dispatches: readonly DispatchRow[], rigIds: readonly string[]): DispatchRow[] {
  const newest = new Map<string, DispatchRow>()
  for (const row of dispatches) if (!row.cancelledAt && !newest.has(row.rigId)) newest.set(row.rigId, row)
  const played = [...newest.values()].filter((row) => rigIds.includes(row.rigId))
  return played.length > 0 ? played : [...newest.values()].slice(0, 1)
}

/** The lines that were sent, of all rigs. */
export function sentLines(dispatches: readonly DispatchRow[], rigIds: readonly string[]): NumberedLine[] {
  return currentDispatches(dispatches, rigIds).flatMap((row) => row.lines)
}

/** Where one contact stands. */
export function standingOf(facts: SubjectFacts, contactId: string, now: string): Standing {
  const own = facts.dispatches.filter((row) => row.contactId === contactId)
  const current = currentDispatches(own, facts.rigIds)
  const lines = current.flatMap((row) => row.lines)
  const newest = current.reduce<DispatchRow | undefined>((latest, row) => (latest && latest.at > row.at ? latest : row), undefined)
  // While the newest waits in the outbox, an earlier one that left still stands.
  const fates = current.map((row) => mailFate(mailFacts(row)))
  const waits = newest && mailFate(mailFacts(newest)) === 'waiting'
  const earlier = waits ? own.filter((row) => row.id !== newest.id) : []
  if (waits && earlier.some((row) => !row.cancelledAt)) return standingOf({ ...facts, dispatches: earlier }, contactId, now)
  return recipientStanding({
    sent: newest
      ? { fate: fates.includes('not delivered') ? 'not delivered' : mailFate(mailFacts(newest)), at: newest.at.toISOString(), lines }
      : null,
    askedNow: facts.askedNow,
    states: deriveLineStates(lines, facts.said, facts.decided),
    closedAt: facts.closed.map((entry) => entry.at),
    dueAt: facts.dueAt,
    now,
  })
}

/**
 * The recipients of one show or hire, each with its standing: whoever was sent something; before the first sending those who
 * look after backline, or everybody when nobody does.
 */
export function recipientStandings(facts: SubjectFacts, now: string): RecipientStanding[] {
  const sentTo = new Map(facts.dispatches.map((row) => [row.contactId, row.contactName]))
  const backline = facts.recipients.filter((person) => person.duties.includes('backline'))
  const first = (backline.length > 0 ? backline : facts.recipients).map((person) => [person.id, person.name] as const)
  return [...(sentTo.size > 0 ? sentTo : first)]
    .map(([contactId, name]) => ({ contactId, name, standing: standingOf(facts, contactId, now) }))
    .sort((a, b) => a.name.localeCompare(b.name) || (a.contactId < b.contactId ? -1 : 1))
}

/** Lines by how they stand, or null while nothing was sent. */
export function lineCounts(facts: SubjectFacts): LineCounts | null {
  if (!facts.dispatches.some((row) => !row.cancelledAt)) return null
  return countLines(
    facts.askedNow,
    sentLines(facts.dispatches, facts.rigIds),
    deriveLineStates(facts.askedNow, facts.said, facts.decided),
  )
}

export type SubjectStanding = {
  /** Whether anything was sent and not stopped. */
  sent: boolean
  /** The most urgent of its recipients'. */
  standing: Standing
  /** Null while nothing was sent. */
  counts: LineCounts | null
  recipients: RecipientStanding[]
  dueAt: string | null
}

export function subjectStanding(facts: SubjectFacts, now: string): SubjectStanding {
  const recipients = recipientStandings(facts, now)
  return {
    sent: facts.dispatches.some((row) => !row.cancelledAt),
    standing: urgentStanding(recipients.map((recipient) => recipient.standing)),
    counts: lineCounts(facts),
    recipients,
    dueAt: facts.dueAt,
  }
}
