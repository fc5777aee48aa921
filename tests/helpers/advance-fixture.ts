import { randomUUID } from 'node:crypto'
import { and, desc, eq } from 'drizzle-orm'
import { expect } from 'vitest'
import { db } from '@/db/client'
import { dispatch } from '@/db/schema/advance'
import { grantToken } from '@/db/schema/grant'
import { kitEntry } from '@/db/schema/kit'
import type { AnswerContent } from '@/lib/advance/answer'
import type { Reply, ReplyLine } from '@/lib/contracts/answer'
import type { SendOutcomes } from '@/lib/contracts/dispatch'
import { linkToken } from '@/lib/server/auth/link-token'
import { stranger } from './http-client'
import type { PartyFixture } from './party-fixture'
import type { TourFixture } from './tour-fixture'

/** Issues the rig as its next revision. */
export async function issue(party: PartyFixture, tour: TourFixture, note = 'for the run'): Promise<string> {
  const issued = await party.drumTech.call('POST', `/api/rigs/${tour.rigId}/revisions`, { note })
  expect(issued.status).toBe(201)
  return (issued.body as { id: string }).id
}

export function recipientOf(tour: TourFixture, of: 'show' | 'hire', dispatchId: string = randomUUID()) {
  return of === 'show'
    ? { dispatchId, contactId: tour.contactId, showId: tour.showId, hireId: null }
    : { dispatchId, contactId: tour.supplierContactId, showId: null, hireId: tour.hireId }
}

export type Sent = { dispatchId: string; grantId: string; mailId: string; packId: string; token: string; path: string }

/** What a sending left behind, with the key that stands in its mail. */
export async function sentAs(dispatchId: string): Promise<Sent> {
  const [row] = await db()
    .select({ grantId: dispatch.grantId, mailId: dispatch.mailId, packId: dispatch.packId })
    .from(dispatch)
    .where(eq(dispatch.id, dispatchId))
  if (!row) throw new Error('nothing was sent')
  const [key] = await db()
    .select({ id: grantToken.id })
    .from(grantToken)
    .where(and(eq(grantToken.grantId, row.grantId), eq(grantToken.madeFor, 'dispatch')))
    .orderBy(desc(grantToken.createdAt), desc(grantToken.id))
    .limit(1)
  if (!key) throw new Error('no key was made')
  const token = linkToken('grant', key.id)
  return { dispatchId, ...row, token, path: `/api/r/${token}` }
}

/** Sends a revision to the house of the show or the supplier of the hire. */
export async function send(party: PartyFixture, tour: TourFixture, revisionId: string, of: 'show' | 'hire' = 'show'): Promise<Sent> {
  const recipient = recipientOf(tour, of)
  const answer = await party.tourManager.call('POST', '/api/dispatches', { revisionId, holdBack: false, recipients: [recipient] })
  expect(answer.status).toBe(200)
  expect((answer.body as SendOutcomes).outcomes).toEqual([
    { dispatchId: recipient.dispatchId, contactId: recipient.contactId, outcome: 'queued', message: '' },
  ])
  return sentAs(recipient.dispatchId)
}

export async function readReplyOf(sent: Pick<Sent, 'path'>): Promise<Reply> {
  const answer = await stranger('GET', sent.path)
  expect(answer.status).toBe(200)
  return answer.body as Reply
}

export function firstLine(reply: Reply): ReplyLine {
  const [line] = reply.lines
  if (!line) throw new Error('the pack asks nothing')
  return line
}

/** One more thing that the venue is asked for: boom stands by count. */
export async function addStands(party: PartyFixture, tour: TourFixture, count: number): Promise<string> {
  const id = randomUUID()
  await db()
    .insert(kitEntry)
    .values({
      ...{ id, partyId: party.partyId, rigId: tour.rigId, kind: 'hardware', name: 'Boom stands', supply: 'venue', count },
      ...{ spec: { type: 'boom-stand' }, position: 2 },
    })
  return id
}

export const asAsked = (count: number): AnswerContent => ({ asAsked: count, instead: [], notYet: [], cant: 0 })

export function answerBody(line: ReplyLine, content: AnswerContent = asAsked(line.count), more: object = {}) {
  return { kind: 'answer', id: randomUUID(), lineId: line.lineId, lineHash: line.hash, content, remark: '', byName: 'Ib of the house', ...more }
}

export async function give(sent: Pick<Sent, 'path'>, line: ReplyLine, content?: AnswerContent, more?: object) {
  return stranger('POST', `${sent.path}/answers`, answerBody(line, content, more))
}
