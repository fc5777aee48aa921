import { db } from '@/db/client'
import { findAnswerEvent, findAskedLine, insertAnswerEvent, lockAnswers } from '@/db/queries/answer'
import { answerFault } from '@/lib/advance/answer'
import type { LineContent } from '@/lib/advance/line-content'
import type { TakeDown } from '@/lib/contracts/answer'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyAnswered } from './notify-answered'
import type { AnswersOf } from './present-lines'
import { loadPresentLines, subjectIds } from './present-lines'

const clockSlipMs = 5 * 60 * 1000

/** Takes down an answer that came by phone, by mail or in person, in the name of who gave it. The same id again is the same answer. */
export async function takeDown(actor: Actor, input: TakeDown & { of: AnswersOf }): Promise<{ saved: number }> {
  assertCan(actor, 'answer:take-down')
  if (Date.parse(input.at) > Date.now() + clockSlipMs) {
    throw new AppError('invalid', 'Please check at: it lies in the future. Nothing was changed.', { details: { fields: { at: 'a time that is past' } } })
  }
  const ids = subjectIds(input.of)
  return db().transaction(async (tx) => {
    await lockAnswers(tx, actor, ids.showId ?? ids.hireId ?? '')
    const present = await loadPresentLines(tx, actor, input.of)
    const repeated = await findAnswerEvent(tx, actor, input.id)
    if (repeated) {
      if (repeated.lineId === input.lineId && repeated.showId === ids.showId && repeated.hireId === ids.hireId) return { saved: 1 }
      throw new AppError('conflict', 'This id belongs to another answer. Nothing was changed.')
    }
    if (!present.lineIds.has(input.lineId)) throw new AppError('not-found', 'This line is not asked there. Nothing was changed.')
    const state = present.stateOf(input.lineId, input.lineHash)
    if (!state) throw new AppError('stale', 'This line has changed meanwhile. What you typed is kept here; look at the line and take it down again.')
    if (state.state === 'settled') throw new AppError('conflict', 'This line is settled. Ask again first; then another answer can be taken down.')
    const line = await findAskedLine(tx, actor, { lineId: input.lineId, hash: input.lineHash })
    if (!line) throw new AppError('not-found', 'This line is not asked there. Nothing was changed.')
    const fault = answerFault(input.content, line.content as LineContent)
    if (fault) throw new AppError('invalid', `Please check the answer: ${fault}. Nothing was changed.`, { details: { fields: { content: fault } } })
    const made = await insertAnswerEvent(tx, actor, {
      ...{ id: input.id, ...ids, revisionId: line.revisionId, kind: 'answer', lineId: input.lineId, lineHash: input.lineHash },
      ...{ content: input.content, remark: input.remark, byName: input.from, at: new Date(input.at) },
      ...{ personId: actor.personId, takenFrom: input.from, takenHow: input.how },
    })
    if (!made) throw new AppError('conflict', 'This id is taken. Please send it again with another one.')
    await audit(tx, actor, 'answer.take-down', { type: 'answer', id: input.id }, { ...ids, lineId: input.lineId, how: input.how })
    await notifyAnswered(tx, actor, ids)
    return { saved: 1 }
  })
}
