import { and, eq } from 'drizzle-orm'
import { db } from '@/db/client'
import { grant, grantToken } from '@/db/schema/grant'
import { asAskedAnswer } from '@/lib/advance/answer'
import type { AnswerContent } from '@/lib/advance/answer'
import type { ReplyLine } from '@/lib/contracts/answer'
import { readReply } from '@/lib/server/answers/read-reply'
import { recordReply } from '@/lib/server/answers/record-reply'
import { settle } from '@/lib/server/answers/settle'
import type { AnswersOf } from '@/lib/server/answers/present-lines'
import { subjectIds } from '@/lib/server/answers/present-lines'
import { linkActor } from '@/lib/server/auth/link-actor'
import { linkToken } from '@/lib/server/auth/link-token'
import { sendPacks } from '@/lib/server/dispatch/send-packs'
import { dateAfter } from '@/lib/staging/calendar'
import { demoId } from './demo-id'
import { demoHires, demoShows } from './demo-run'
import { demoRevisionId } from './demo-spec'
import type { Team } from './demo-team'
import { demoContactId, demoHireId, demoShowId } from './demo-tour'

type Say = (line: ReplyLine, index: number) => AnswerContent | null

async function send(team: Team, house: string, of: AnswersOf, revisionId: string): Promise<void> {
  const { outcomes } = await sendPacks(team['tour-manager'], {
    revisionId,
    holdBack: false,
    recipients: [
      { dispatchId: demoId('dispatch', house, revisionId), contactId: demoContactId(house), ...subjectIds(of) },
    ],
  })
  const refused = outcomes.find(({ outcome }) => outcome === 'refused')
  if (refused) throw new Error(`${house}: ${refused.message}`)
}

/** Answers through the link that was mailed, as its reader would. */
async function answer(
  team: Team,
  house: string,
  of: AnswersOf,
  byName: string,
  say: Say,
  close: boolean,
): Promise<string[]> {
  const subject = 'showId' in of ? eq(grant.showId, of.showId) : eq(grant.hireId, of.hireId)
  const [token] = await db()
    .select({ id: grantToken.id })
    .from(grantToken)
    .innerJoin(grant, and(eq(grant.partyId, grantToken.partyId), eq(grant.id, grantToken.grantId)))
    .where(and(eq(grant.partyId, team.owner.partyId), eq(grant.purpose, 'reply'), subject))
    .orderBy(grantToken.createdAt, grantToken.id)
    .limit(1)
  if (!token) throw new Error(`${house} has no link`)
  const reader = await linkActor(linkToken('grant', token.id), 'reply', '')
  const { lines } = await readReply(reader)
  const answered: string[] = []
  for (const [index, line] of lines.entries()) {
    const content = say(line, index)
    if (!content) continue
    const id = demoId('answer', house, line.lineId)
    answered.push(line.lineId)
    if (line.state === 'unanswered')
      await recordReply(reader, {
        kind: 'answer',
        id,
        lineId: line.lineId,
        lineHash: line.hash,
        content,
        remark: '',
        byName,
      })
  }
  if (close) await recordReply(reader, { kind: 'close', id: demoId('close', house), byName })
  return answered
}

async function settleAnswers(team: Team, house: string, of: AnswersOf, lineIds: string[]): Promise<void> {
  await settle(team['tour-manager'], {
    of,
    decisions: lineIds.map((lineId) => ({
      ...{ id: demoId('settlement', house, lineId), lineId, answerEventId: demoId('answer', house, lineId) },
      ...{ decision: 'accept' as const, remark: '' },
    })),
  })
}

const asAsked: Say = (line) => asAskedAnswer(line.count)

/** A house that has nearly everything: one drum an inch wider, one thing not known yet, one it has not got. */
function mostly(today: string): Say {
  let drums = 0
  return (line) => {
    if (line.kind === 'drum' && line.size?.lugs && line.size.depthIn && drums++ === 1) {
      const what = {
        kind: 'drum',
        diameterIn: line.size.diameterIn + 1,
        depthIn: line.size.depthIn + 1,
        lugs: 6,
        words: 'birch, in good order',
      } as const
      return { asAsked: 0, instead: [{ n: 1, what }], notYet: [], cant: 0 }
    }
    if (line.kind === 'microphone' && line.number % 4 === 0)
      return { asAsked: 0, instead: [], notYet: [{ n: line.count, by: dateAfter(today, 1) }], cant: 0 }
    if (line.words.toLowerCase().includes('rug')) return { asAsked: 0, instead: [], notYet: [], cant: line.count }
    return asAskedAnswer(line.count)
  }
}

/** What was sent, answered and settled, so that every standing can be seen once. */
export async function makeAdvance(team: Team, today: string): Promise<void> {
  const full = demoRevisionId('full rig', 2)
  const show = (venue: string) => ({ showId: demoShowId(venue) })
  for (const { venue, rig } of demoShows) {
    if (venue === 'Lakeside') continue
    // One venue answered the revision before: it stands as changed since.
    const revision =
      venue === 'Palais Est' ? demoRevisionId('full rig', 1) : rig === 'full rig' ? full : demoRevisionId('fly rig', 1)
    await send(team, venue, show(venue), revision)
  }
  for (const { key } of demoHires) {
    await send(team, key, { hireId: demoHireId(key) }, full)
    // The second van serves both rigs.
    if (key === 'Fjord Backline') await send(team, key, { hireId: demoHireId(key) }, demoRevisionId('fly rig', 1))
  }
  for (const venue of ['Harbour Hall', 'Kornhaus']) {
    const answered = await answer(team, venue, show(venue), 'Sif', asAsked, true)
    await settleAnswers(team, venue, show(venue), answered)
  }
  await answer(team, 'Salle Nord', show('Salle Nord'), 'Odile', mostly(today), true)
  await answer(
    team,
    'The Tannery',
    show('The Tannery'),
    'Wren',
    (line, index) => (index < 2 ? asAskedAnswer(line.count) : null),
    false,
  )
  await answer(team, 'Palais Est', show('Palais Est'), 'Basile', asAsked, true)
  await answer(
    team,
    'Northline',
    { hireId: demoHireId('Northline') },
    'Runa',
    (line, index) => (index < 3 ? asAskedAnswer(line.count) : null),
    false,
  )
}
