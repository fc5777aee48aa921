import { db } from '@/db/client'
import type { Db } from '@/db/client'
import { countAnswerEvents, findAnswerEvent, insertAnswerEvent, lockAnswers } from '@/db/queries/answer'
import { countTokenUse } from '@/db/queries/grant'
import { answerFault } from '@/lib/advance/answer'
import type { ReplyAnswered, ReplyEvent } from '@/lib/contracts/answer'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor, LinkActor } from '@/lib/server/auth/actor'
import { assertLink } from '@/lib/server/auth/actor'
import { notifyAnswered } from './notify-answered'
import type { LoadedReply } from './reply-lines'
import { loadReply, replyLines } from './reply-lines'

/** Far more than any advance needs, and below what is read back of it at once: a link cannot bury what was said. */
export const mostAnswers = 5000

type LineEvent = Extract<ReplyEvent, { kind: 'answer' }>

/** Keeps one answer or "that's all from us" that came through a link. The same id again is the same answer. */
export async function recordReply(actor: Actor, event: ReplyEvent): Promise<ReplyAnswered> {
  assertLink(actor, 'reply')
  return db().transaction(async (tx) => {
    await lockAnswers(tx, actor, actor.showId ?? actor.hireId ?? '')
    const repeated = await findAnswerEvent(tx, actor, event.id)
    if (repeated) assertSame(repeated, actor, event)
    else await keep(tx, actor, event)
    const after = await loadReply(tx, actor)
    const line = event.kind === 'answer' ? await replyLine(tx, actor, after, event.lineId) : null
    return { line, closed: after.closed }
  })
}

async function keep(tx: Db, actor: LinkActor, event: ReplyEvent): Promise<void> {
  const before = await loadReply(tx, actor)
  const revisionId = event.kind === 'answer' ? await assertAnswerable(tx, actor, before, event) : before.packs[0]?.revisionId
  if (!revisionId) throw new AppError('not-found', 'No pack was sent with this link, so there is nothing to answer.')
  if ((await countAnswerEvents(tx, actor, actor)) >= mostAnswers) {
    throw new AppError('conflict', 'More was said through these links than they take. Nothing was changed; please write to whoever sent you the pack.')
  }
  const made = await insertAnswerEvent(tx, actor, {
    ...{ id: event.id, showId: actor.showId, hireId: actor.hireId, revisionId, kind: event.kind, byName: event.byName },
    ...{ grantId: actor.grantId, tokenId: actor.tokenId },
    ...(event.kind === 'answer' ? { lineId: event.lineId, lineHash: event.lineHash, content: event.content, remark: event.remark } : {}),
  })
  // Only an id of another party is taken and yet not found before.
  if (!made) throw new AppError('conflict', 'This id is taken. Please send it again with another one.')
  await countTokenUse(tx, actor, actor.tokenId)
  await audit(tx, actor, event.kind === 'answer' ? 'answer.give' : 'answer.close', { type: 'answer', id: event.id }, {
    ...{ showId: actor.showId, hireId: actor.hireId, lineId: event.kind === 'answer' ? event.lineId : null },
  })
  await notifyAnswered(tx, actor, actor)
}

/** Refuses an answer that cannot stand, with the line as it is now; returns the revision that it answers. */
async function assertAnswerable(tx: Db, actor: LinkActor, before: LoadedReply, event: LineEvent): Promise<string> {
  const asked = before.asked.find((line) => line.lineId === event.lineId)
  const state = before.states.find((line) => line.lineId === event.lineId)
  if (!asked || !state) throw new AppError('not-found', 'This line is not among those you were asked. Nothing was changed.')
  const line = await replyLine(tx, actor, before, event.lineId)
  if (asked.hash !== event.lineHash) {
    throw new AppError('stale', 'This line has changed since you opened it. Please look at it and answer again.', { details: { line } })
  }
  if (state.state === 'settled') {
    throw new AppError('conflict', 'This line is settled. If something changed, please tell whoever sent you the pack.', { details: { line } })
  }
  const fault = answerFault(event.content, asked)
  if (fault) throw new AppError('invalid', `Please check the answer: ${fault}. Nothing was changed.`, { details: { fields: { content: fault } } })
  return asked.revisionId
}

async function replyLine(tx: Db, actor: LinkActor, loaded: LoadedReply, lineId: string) {
  const lines = await replyLines(
    tx,
    actor,
    loaded.asked.filter((line) => line.lineId === lineId),
    loaded.states,
  )
  return lines[0] ?? null
}

function assertSame(found: NonNullable<Awaited<ReturnType<typeof findAnswerEvent>>>, actor: LinkActor, event: ReplyEvent): void {
  const same =
    found.kind === event.kind &&
    found.showId === actor.showId &&
    found.hireId === actor.hireId &&
    found.lineId === (event.kind === 'answer' ? event.lineId : null)
  if (!same) throw new AppError('conflict', 'This id belongs to another answer. Nothing was changed.')
}
