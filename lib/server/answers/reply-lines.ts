import type { Db, Scope } from '@/db/client'
import { listAnswerEvents, listLineContents, listSettlements } from '@/db/queries/answer'
import { listPacksOfGrant } from '@/db/queries/dispatch'
import type { LineState } from '@/lib/advance/answer-state'
import { deriveLineStates } from '@/lib/advance/answer-state'
import { lineDifferences } from '@/lib/advance/compare-specs'
import type { LineContent } from '@/lib/advance/line-content'
import type { PackLine } from '@/lib/advance/pack-document'
import { upgradePackDocument } from '@/lib/advance/pack-document'
import type { ReplyLine } from '@/lib/contracts/answer'
import type { LinkActor } from '@/lib/server/auth/actor'
import { decisionOf, saidAnswer } from '@/lib/server/advance/load-advance'
import { lineSize } from './line-size'

/** What stands behind a reply link now: its packs, the lines its reader is asked to answer, and all that was said about them. */
export async function loadReply(db: Db, actor: LinkActor) {
  const rows = await listPacksOfGrant(db, actor, actor.grantId)
  const packs = rows.map((row) => ({
    ...row,
    document: upgradePackDocument(row.document),
    spec: `${row.rigName}, revision ${row.revisionNumber}`,
  })).sort((a, b) => b.at.getTime() - a.at.getTime())
  const asked = packs.flatMap((pack) =>
    pack.document.lines.filter((line) => line.asked).map((line) => ({
      ...line,
      revisionId: pack.revisionId,
      units: pack.document.units,
      spec: pack.spec,
    })),
  )
  const subjects = { showIds: actor.showId ? [actor.showId] : [], hireIds: actor.hireId ? [actor.hireId] : [] }
  const events = await listAnswerEvents(db, actor, subjects)
  const settlements = await listSettlements(db, actor, subjects)
  const states = deriveLineStates(asked, events.flatMap(saidAnswer), settlements.map(decisionOf))
  const closed = events.findLast((row) => row.kind === 'close')
  return { packs, asked, states, closed: closed ? { byName: closed.byName, at: closed.at.toISOString() } : null }
}
export type LoadedReply = Awaited<ReturnType<typeof loadReply>>
export type ReplyAsked = LoadedReply['asked'][number]

/** Lines as their reader sees them: with what stands, what changed since it was said, and why it is asked again. */
export async function replyLines(db: Db, scope: Scope, asked: readonly ReplyAsked[], states: readonly LineState[]): Promise<ReplyLine[]> {
  const contents = await listLineContents(db, scope, {
    lineIds: asked.map((line) => line.lineId),
    hashes: [...new Set([...asked.map((line) => line.hash), ...states.flatMap((state) => state.history.map((entry) => entry.lineHash))])],
  })
  // Only ever written by issuing a revision, which states this shape.
  const contentOf = new Map(contents.map((row) => [`${row.lineId} ${row.hash}`, row.content as LineContent]))
  const stateOf = new Map(states.map((state) => [state.lineId, state]))
  return asked.flatMap((line) => {
    const state = stateOf.get(line.lineId)
    if (!state) return []
    const last = state.state === 'unanswered' ? state.history.findLast((entry) => entry.lineHash === line.hash) : state.answer
    const before = state.state === 'changed since' ? contentOf.get(`${line.lineId} ${state.answer.lineHash}`) : undefined
    const now = contentOf.get(`${line.lineId} ${line.hash}`)
    return [
      {
        ...shown(line),
        size: now ? lineSize(now) : null,
        state: state.state,
        answer: last ? { content: last.content, remark: last.remark, byName: last.byName } : null,
        changes: before && now ? lineDifferences(before, now, line.units) : [],
        askedAgain: state.state === 'unanswered' && state.askedAgain ? { remark: state.askedAgain.remark } : null,
      },
    ]
  })
}

function shown({ lineId, hash, number, spec, kind, count, words, details, insteadOf }: PackLine & { spec: string }) {
  return { lineId, hash, number, spec, kind, count, words, details: [...details], insteadOf }
}
