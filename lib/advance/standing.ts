import type { AnsweredLine, LineState } from './answer-state'

/** Where a recipient stands with what was sent. Always derived, never stored. */
export type Standing =
  'not sent' | 'out' | 'not delivered' | 'overdue' | 'part answered' | 'answered' | 'settled' | 'changed since'

/** What is known of one mail. Instants in ISO 8601. */
export interface MailFacts {
  readonly sentAt: string | null
  readonly cancelledAt: string | null
  readonly failedAt: string | null
  /** What the mail service told us afterwards, in any order. */
  readonly told: readonly ('delivered' | 'delayed' | 'bounced' | 'complained' | 'failed')[]
}

/** How one mail fared. `waiting` still stands in the outbox; `out` left and nothing more is known. */
export type MailFate = 'waiting' | 'stopped' | 'out' | 'delivered' | 'not delivered'

/**
 * The fate of a mail. What was told may come in any order and more than once: a bounce or failure is final whatever else was
 * told, because a mail can be taken by a server and still come back. A complaint means that it arrived.
 */
export function mailFate(mail: MailFacts): MailFate {
  if (mail.cancelledAt) return 'stopped'
  if (mail.told.some((kind) => kind === 'bounced' || kind === 'failed')) return 'not delivered'
  if (mail.failedAt) return 'not delivered'
  if (mail.told.some((kind) => kind === 'delivered' || kind === 'complained')) return 'delivered'
  return mail.sentAt ? 'out' : 'waiting'
}

export interface StandingFacts {
  /** The newest sending to this recipient that was not stopped; null when there is none. */
  readonly sent: {
    readonly fate: MailFate
    /** Instant of the sending. */
    readonly at: string
    readonly lines: readonly AnsweredLine[]
  } | null
  /** What would be asked of this recipient by the newest revision. */
  readonly askedNow: readonly AnsweredLine[]
  /** How the sent lines stand. */
  readonly states: readonly LineState[]
  /** Instants of "that's all from us". */
  readonly closedAt: readonly string[]
  /** Instant by which an answer was asked for. */
  readonly dueAt: string | null
  readonly now: string
}

/**
 * A recipient's standing. The first that holds, most urgent first:
 * not sent (nothing left the house), not delivered (it came back and nobody answered since), changed since (the newest revision
 * asks for something else than what was sent), settled, answered (every line, or closed by "that's all from us" after the last
 * asking), overdue (the time is up), part answered, out.
 */
export function recipientStanding(facts: StandingFacts): Standing {
  const { sent } = facts
  if (!sent || sent.fate === 'waiting' || sent.fate === 'stopped') return 'not sent'
  const complete =
    facts.states.length > 0 && facts.states.every(({ state }) => state === 'answered' || state === 'settled')
  if (sent.fate === 'not delivered' && !complete && !saidSince(facts.states, sent.at)) return 'not delivered'
  if (!sameLines(sent.lines, facts.askedNow)) return 'changed since'
  if (complete && facts.states.every(({ state }) => state === 'settled')) return 'settled'
  if (complete || closedSince(facts, lastAsked(facts))) return 'answered'
  if (facts.dueAt && Date.parse(facts.now) > Date.parse(facts.dueAt)) return 'overdue'
  return facts.states.some(({ state }) => state === 'answered' || state === 'settled') ? 'part answered' : 'out'
}

function saidSince(states: readonly LineState[], instant: string): boolean {
  return states.some(({ history }) =>
    history.some(({ at, via }) => via === 'link' && Date.parse(at) >= Date.parse(instant)),
  )
}

/** Whether two askings say the same about the same lines, in any order. */
export function sameLines(one: readonly AnsweredLine[], other: readonly AnsweredLine[]): boolean {
  const hashes = new Map(one.map((line) => [line.lineId, line.hash]))
  return one.length === other.length && other.every((line) => hashes.get(line.lineId) === line.hash)
}

/** When this recipient was last asked anything: the sending, or a line that was asked again. */
function lastAsked({ sent, states }: StandingFacts): number {
  const again = states.flatMap((line) =>
    line.state === 'unanswered' && line.askedAgain ? [Date.parse(line.askedAgain.at)] : [],
  )
  return Math.max(sent ? Date.parse(sent.at) : 0, ...again)
}

function closedSince(facts: StandingFacts, asked: number): boolean {
  return facts.closedAt.some((at) => Date.parse(at) >= asked)
}

/** Lines by how they stand, for the bar of a show: what is answered still waits for a decision. */
export interface LineCounts {
  readonly settled: number
  readonly waiting: number
  readonly changed: number
}

/**
 * Counts the lines that the newest revision asks for. One is changed when it was not sent as it now reads, or was answered as it
 * read before; what is settled as it reads now stays settled even while the newest sending does not hold it.
 * @param statesNow how the lines of `askedNow` stand
 */
export function countLines(
  askedNow: readonly AnsweredLine[],
  sent: readonly AnsweredLine[],
  statesNow: readonly LineState[],
): LineCounts {
  const sentHash = new Map(sent.map((line) => [line.lineId, line.hash]))
  const state = new Map(statesNow.map((line) => [line.lineId, line.state]))
  const counts = { settled: 0, waiting: 0, changed: 0 }
  for (const line of askedNow) {
    const now = state.get(line.lineId)
    if (now === 'settled') counts.settled += 1
    else if (now === 'changed since' || sentHash.get(line.lineId) !== line.hash) counts.changed += 1
    else counts.waiting += 1
  }
  return counts
}

const urgency: readonly Standing[] = [
  'not delivered',
  'changed since',
  'overdue',
  'part answered',
  'out',
  'answered',
  'settled',
  'not sent',
]

/** The standing of several recipients as one: the most urgent. Nobody at all is not sent. */
export function urgentStanding(standings: readonly Standing[]): Standing {
  return urgency.find((standing) => standings.includes(standing)) ?? 'not sent'
}

/**
 * Whether a line of a rig is asked of this audience: a supplier brings what is rented, a house what is the venue's, and what is
 * rented too where nobody was hired.
 */
export function isAskedOf(
  audience: 'venue' | 'supplier',
  supply: 'rented' | 'venue',
  someoneIsHired: boolean,
): boolean {
  return audience === 'supplier' ? supply === 'rented' : supply === 'venue' || !someoneIsHired
}
