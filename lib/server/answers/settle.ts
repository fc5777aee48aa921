import { db } from '@/db/client'
import type { Db } from '@/db/client'
import { findSettlement, insertSettlement, lockAnswers } from '@/db/queries/answer'
import type { Settle } from '@/lib/contracts/answer'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor, MemberActor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyAnswered } from './notify-answered'
import type { AnswersOf } from './present-lines'
import { loadPresentLines, subjectIds } from './present-lines'

type Decision = Settle['decisions'][number]
type Present = Awaited<ReturnType<typeof loadPresentLines>>

/** Settles answers or asks again about them, all of them or none. What is decided already is not decided twice. */
export async function settle(actor: Actor, input: Settle & { of: AnswersOf }): Promise<{ saved: number }> {
  assertCan(actor, 'answer:settle')
  const ids = subjectIds(input.of)
  return db().transaction(async (tx) => {
    await lockAnswers(tx, actor, ids.showId ?? ids.hireId ?? '')
    const present = await loadPresentLines(tx, actor, input.of)
    let saved = 0
    for (const decision of input.decisions) saved += (await decide(tx, actor, present, decision, ids)) ? 1 : 0
    if (saved > 0) await notifyAnswered(tx, actor, ids)
    return { saved }
  })
}

async function decide(
  tx: Db,
  actor: MemberActor,
  present: Present,
  decision: Decision,
  ids: { showId: string | null; hireId: string | null },
): Promise<boolean> {
  const repeated = await findSettlement(tx, actor, decision.id)
  if (repeated) {
    if (repeated.lineId === decision.lineId && repeated.showId === ids.showId && repeated.hireId === ids.hireId) return false
    throw new AppError('conflict', 'This id belongs to another decision. Nothing was settled.')
  }
  const answer = present.facts.said.find((entry) => entry.id === decision.answerEventId && entry.lineId === decision.lineId)
  if (!answer) throw new AppError('not-found', 'There is no such answer to this line. Nothing was settled.')
  const state = present.stateOf(answer.lineId, answer.lineHash)
  const latest = state?.history.findLast((entry) => entry.lineHash === answer.lineHash)
  if (!state || latest?.id !== answer.id) {
    throw new AppError('stale', 'Another answer came in, or the line changed. Please look at it again; nothing was settled.')
  }
  const standsSo = decision.decision === 'accept' ? state.state === 'settled' : state.state === 'unanswered'
  if (standsSo) return false
  const made = await insertSettlement(tx, actor, {
    ...{ id: decision.id, ...ids, lineId: answer.lineId, lineHash: answer.lineHash, answerEventId: answer.id },
    ...{ decision: decision.decision, remark: decision.remark, personId: actor.personId },
  })
  if (!made) throw new AppError('conflict', 'This id is taken. Please send it again with another one.')
  await audit(tx, actor, `answer.${decision.decision}`, { type: 'answer', id: answer.id }, { ...ids, lineId: answer.lineId })
  return true
}
