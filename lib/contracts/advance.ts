import type { AnswerContent } from '@/lib/advance/answer'
import type { LineCounts, MailFate, Standing } from '@/lib/advance/standing'
import type { ReplyLine } from './answer'

/** What the desk's advance page shows of one show or hire. Instants in ISO 8601. */
export type AdvanceView = {
  of: { kind: 'show'; showId: string } | { kind: 'hire'; hireId: string }
  tourId: string
  title: string
  due: string | null
  standing: Standing
  counts: LineCounts | null
  sent: boolean
  recipients: AdvanceRecipient[]
  /** What can be sent, newest first. */
  revisions: AdvanceRevision[]
  /** The newest revision that asks for something else than what was sent; null when all is sent. */
  unsentChange: AdvanceRevision | null
  lines: AdvanceLine[]
  closed: { byName: string; at: string }[]
  /** Other shows and hires of this tour that the same revision could go to. */
  others: AdvanceOther[]
}

export type AdvanceRevision = { id: string; number: number; rigId: string; rigName: string; note: string }

export type AdvanceRecipient = {
  contactId: string
  name: string
  email: string
  duties: string[]
  standing: Standing
  sendings: AdvanceSending[]
  links: AdvanceLink[]
}

export type AdvanceSending = {
  dispatchId: string
  packId: string
  spec: string
  at: string
  by: string
  toAddress: string
  fate: MailFate
  /** Why it was not delivered; empty otherwise. */
  failure: string
  /** Until when it can still be stopped, null when it cannot. */
  heldUntil: string | null
}

export type AdvanceLink = {
  grantId: string
  state: 'works' | 'expired' | 'withdrawn'
  expiresAt: string
  lastUsedAt: string | null
  uses: number
}

export type AdvanceSaid = {
  id: string
  words: string
  remark: string
  byName: string
  /** "by the link", "by phone, taken down by Tove". */
  how: string
  at: string
  content: AnswerContent
}

export type AdvanceLine = Pick<
  ReplyLine,
  'lineId' | 'hash' | 'number' | 'kind' | 'count' | 'words' | 'details' | 'insteadOf' | 'size' | 'changes'
> & {
  state: 'not sent' | 'unanswered' | 'answered' | 'settled' | 'changed since'
  said: AdvanceSaid | null
  /** Who settled it, or asked again and why. */
  decided: { byName: string; at: string; remark: string } | null
  /** Everything said, newest first. */
  history: AdvanceSaid[]
}

export type AdvanceOther = {
  of: AdvanceView['of']
  title: string
  rigIds: string[]
  standing: Standing
  recipients: { contactId: string; name: string }[]
}
