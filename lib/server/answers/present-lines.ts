import type { Db, Scope } from '@/db/client'
import type { LineState } from '@/lib/advance/answer-state'
import { deriveLineStates } from '@/lib/advance/answer-state'
import { AppError } from '@/lib/errors'
import { sentLines } from '@/lib/server/advance/derive-standings'
import { loadAdvance } from '@/lib/server/advance/load-advance'

/** Whose answers: a show's or a hire's. */
export type AnswersOf = { readonly showId: string } | { readonly hireId: string }

export function subjectIds(of: AnswersOf): { showId: string | null; hireId: string | null } {
  return 'showId' in of ? { showId: of.showId, hireId: null } : { showId: null, hireId: of.hireId }
}

/**
 * The lines that a show or hire is asked: as they were sent, and as the newest revision asks them. Throws not-found when there is
 * no such show or hire.
 */
export async function loadPresentLines(db: Db, scope: Scope, of: AnswersOf) {
  const { shows, hires } = await loadAdvance(db, scope, of)
  const facts = shows[0] ?? hires[0]
  if (!facts) throw new AppError('not-found', `There is no such ${'showId' in of ? 'show' : 'hire'} in this party.`)
  const lines = [...sentLines(facts.dispatches, facts.rigIds), ...facts.askedNow]
  const states = deriveLineStates(lines, facts.said, facts.decided)
  const byKey = new Map(lines.map((line, index) => [`${line.lineId} ${line.hash}`, states[index]]))
  return {
    facts,
    lineIds: new Set(lines.map((line) => line.lineId)),
    /** How a line stands in these very words; undefined when it is not asked so (any more). */
    stateOf: (lineId: string, hash: string): LineState | undefined => byKey.get(`${lineId} ${hash}`),
  }
}
