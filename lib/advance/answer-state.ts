import type { AnswerContent } from './answer'

/** One line as it is asked now. */
export interface AnsweredLine {
  readonly lineId: string
  /** Of what the line says now: an answer holds while this does. */
  readonly hash: string
}

/** One thing that was said about one line, by the link or taken down by a signed-in person. */
export interface SaidAnswer {
  readonly id: string
  /** Orders everything ever said. */
  readonly sequence: number
  readonly lineId: string
  readonly lineHash: string
  readonly content: AnswerContent
  readonly remark: string
  readonly byName: string
  readonly via: 'link' | 'taken down'
  /** From whom and how, when it was taken down. */
  readonly taken: { readonly from: string; readonly how: string; readonly by: string } | null
  /** Instant, ISO 8601. */
  readonly at: string
}

/** What the tour manager decided about one answer: accepted, or asked again. */
export interface Decision {
  readonly id: string
  readonly sequence: number
  readonly lineId: string
  readonly answerEventId: string
  readonly decision: 'accept' | 'reopen'
  readonly remark: string
  readonly byName: string
  readonly at: string
}

/**
 * Where one line stands.
 * - unanswered: nothing was said, or the tour manager asked again about what was said (`askedAgain`).
 * - answered: the answer stands and waits for a decision.
 * - settled: the tour manager accepted the answer; it is locked.
 * - changed since: what is asked is no longer what was answered, so it is asked again; the old answer is shown beside it.
 */
export type LineState = {
  readonly lineId: string
  /** Everything said about the line, oldest first. */
  readonly history: readonly SaidAnswer[]
} & (
  | { readonly state: 'unanswered'; readonly askedAgain: Decision | null }
  | { readonly state: 'answered'; readonly answer: SaidAnswer }
  | { readonly state: 'settled'; readonly answer: SaidAnswer; readonly decision: Decision }
  | { readonly state: 'changed since'; readonly answer: SaidAnswer }
)

/**
 * The present state of each line, in the order of `lines`, from everything said and decided. The latest answer to the line as it
 * is asked now stands, whoever gave it; an answer to other words never does. A decision holds for its own answer only, and the
 * latest one about that answer counts. Events of other lines are ignored.
 */
export function deriveLineStates(
  lines: readonly AnsweredLine[],
  said: readonly SaidAnswer[],
  decided: readonly Decision[],
): LineState[] {
  const answers = groupByLine(said)
  const decisions = groupByLine(decided)
  return lines.map((line) => {
    const history = answers.get(line.lineId) ?? []
    const common = { lineId: line.lineId, history }
    const answer = history.findLast((entry) => entry.lineHash === line.hash)
    if (!answer) {
      const older = history.at(-1)
      return older
        ? { ...common, state: 'changed since', answer: older }
        : { ...common, state: 'unanswered', askedAgain: null }
    }
    const decision = decisions.get(line.lineId)?.findLast((entry) => entry.answerEventId === answer.id)
    if (!decision) return { ...common, state: 'answered', answer }
    return decision.decision === 'accept'
      ? { ...common, state: 'settled', answer, decision }
      : { ...common, state: 'unanswered', askedAgain: decision }
  })
}

function groupByLine<Event extends { readonly lineId: string; readonly sequence: number }>(
  events: readonly Event[],
): Map<string, Event[]> {
  const groups = new Map<string, Event[]>()
  for (const event of [...events].sort((a, b) => a.sequence - b.sequence)) {
    const group = groups.get(event.lineId)
    if (group) group.push(event)
    else groups.set(event.lineId, [event])
  }
  return groups
}
