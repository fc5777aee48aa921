import { describe, expect, it } from 'vitest'
import { asAskedAnswer } from './answer'
import type { Decision, LineState, SaidAnswer } from './answer-state'
import type { MailFacts, StandingFacts } from './standing'
import { countLines, isAskedOf, mailFate, recipientStanding, sameLines, urgentStanding } from './standing'

const sentAt = '2031-09-01T10:00:00Z'
const before = '2031-08-31T10:00:00Z'
const later = '2031-09-03T10:00:00Z'
const lines = [
  { lineId: 'tom', hash: 'h1' },
  { lineId: 'ride', hash: 'h1' },
]

const answer = (lineId: string, more: Partial<SaidAnswer> = {}): SaidAnswer => ({
  id: `a-${lineId}`,
  sequence: 1,
  lineId,
  lineHash: 'h1',
  content: asAskedAnswer(1),
  remark: '',
  byName: 'Ib',
  via: 'link',
  taken: null,
  at: later,
  ...more,
})
const decision: Decision = {
  id: 'd',
  sequence: 1,
  lineId: 'tom',
  answerEventId: 'a-tom',
  decision: 'accept',
  remark: '',
  byName: 'Tove',
  at: later,
}

const open = (lineId: string): LineState => ({ lineId, history: [], state: 'unanswered', askedAgain: null })
const again = (lineId: string): LineState => ({
  lineId,
  history: [answer(lineId, { at: before })],
  state: 'unanswered',
  askedAgain: { ...decision, decision: 'reopen', at: later },
})
const answered = (lineId: string, more: Partial<SaidAnswer> = {}): LineState => ({
  lineId,
  history: [answer(lineId, more)],
  state: 'answered',
  answer: answer(lineId, more),
})
const settled = (lineId: string): LineState => ({
  lineId,
  history: [answer(lineId)],
  state: 'settled',
  answer: answer(lineId),
  decision,
})
const changed = (lineId: string): LineState => ({
  lineId,
  history: [answer(lineId, { at: before })],
  state: 'changed since',
  answer: answer(lineId, { at: before }),
})

function standing(more: Partial<StandingFacts>) {
  return recipientStanding({
    sent: { fate: 'delivered', at: sentAt, lines },
    askedNow: lines,
    states: [open('tom'), open('ride')],
    closedAt: [],
    dueAt: '2031-09-10T10:00:00Z',
    now: later,
    ...more,
  })
}
const pastDue = { now: '2031-09-10T10:00:01Z' }

describe('recipientStanding', () => {
  it('is not sent before anything left, while it is held back, and when it was stopped', () => {
    expect(standing({ sent: null })).toBe('not sent')
    expect(standing({ sent: { fate: 'waiting', at: sentAt, lines } })).toBe('not sent')
    expect(standing({ sent: { fate: 'stopped', at: sentAt, lines } })).toBe('not sent')
  })

  it('goes out, and stays out when it is delivered, until something is said', () => {
    expect(standing({ sent: { fate: 'out', at: sentAt, lines } })).toBe('out')
    expect(standing({})).toBe('out')
  })

  it('is not delivered when the mail came back', () => {
    const sent = { fate: 'not delivered' as const, at: sentAt, lines }
    expect(standing({ sent })).toBe('not delivered')
    expect(standing({ sent, ...pastDue })).toBe('not delivered')
    expect(standing({ sent, states: [answered('tom', { at: before }), open('ride')] })).toBe('not delivered')
  })

  it('is not undelivered when its reader answers by an earlier link, nor when nothing is left to ask', () => {
    const sent = { fate: 'not delivered' as const, at: sentAt, lines }
    expect(standing({ sent, states: [answered('tom'), open('ride')] })).toBe('part answered')
    expect(standing({ sent, states: [settled('tom'), settled('ride')] })).toBe('settled')
    expect(standing({ sent, states: [answered('tom', { via: 'taken down' }), open('ride')] })).toBe('not delivered')
  })

  it('is part answered, then answered, then settled', () => {
    expect(standing({ states: [answered('tom'), open('ride')] })).toBe('part answered')
    expect(standing({ states: [answered('tom'), answered('ride')] })).toBe('answered')
    expect(standing({ states: [settled('tom'), answered('ride')] })).toBe('answered')
    expect(standing({ states: [settled('tom'), settled('ride')] })).toBe('settled')
  })

  it('is answered when the rest will not come, and asked again opens it', () => {
    expect(standing({ states: [answered('tom'), open('ride')], closedAt: [later] })).toBe('answered')
    expect(standing({ states: [answered('tom'), again('ride')], closedAt: [sentAt] })).toBe('part answered')
    expect(standing({ states: [answered('tom'), open('ride')], closedAt: [before] })).toBe('part answered')
  })

  it('is overdue from the moment after the time it was asked by, unless all is said', () => {
    expect(standing(pastDue)).toBe('overdue')
    expect(standing({ now: '2031-09-10T10:00:00Z' })).toBe('out')
    expect(standing({ ...pastDue, states: [answered('tom'), open('ride')] })).toBe('overdue')
    expect(standing({ ...pastDue, states: [answered('tom'), answered('ride')] })).toBe('answered')
    expect(standing({ ...pastDue, dueAt: null })).toBe('out')
  })

  it('is changed since when the newest revision asks for something else than what was sent', () => {
    const askedNow = [{ lineId: 'tom', hash: 'h2' }, lines[1] ?? { lineId: 'ride', hash: 'h1' }]
    expect(standing({ askedNow, states: [settled('tom'), settled('ride')] })).toBe('changed since')
    expect(standing({ askedNow, ...pastDue })).toBe('changed since')
    expect(standing({ askedNow: lines.slice(0, 1) })).toBe('changed since')
    expect(standing({ askedNow: [...lines, { lineId: 'kick', hash: 'h1' }] })).toBe('changed since')
  })

  it('waits again once the change was sent', () => {
    expect(standing({ states: [changed('tom'), settled('ride')] })).toBe('part answered')
    expect(standing({ states: [changed('tom'), changed('ride')] })).toBe('out')
    expect(standing({ states: [changed('tom'), settled('ride')], ...pastDue })).toBe('overdue')
  })

  it('is out, never settled, when the pack asks for nothing', () => {
    expect(standing({ sent: { fate: 'delivered', at: sentAt, lines: [] }, askedNow: [], states: [] })).toBe('out')
  })
})

describe('mailFate', () => {
  const mail = (more: Partial<MailFacts>): MailFacts => ({
    sentAt,
    cancelledAt: null,
    failedAt: null,
    told: [],
    ...more,
  })

  it.each<[string, Partial<MailFacts>, string]>([
    ['waits in the outbox', { sentAt: null }, 'waiting'],
    ['was stopped', { sentAt: null, cancelledAt: later }, 'stopped'],
    ['left', {}, 'out'],
    ['left and is delayed', { told: ['delayed'] }, 'out'],
    ['arrived', { told: ['delivered'] }, 'delivered'],
    ['arrived before we had noted that it left', { sentAt: null, told: ['delivered'] }, 'delivered'],
    ['arrived after a delay, told in the wrong order', { told: ['delivered', 'delayed'] }, 'delivered'],
    ['arrived and was complained about', { told: ['complained', 'delivered'] }, 'delivered'],
    ['came back', { told: ['bounced'] }, 'not delivered'],
    ['came back, told before the delivery', { told: ['bounced', 'delivered'] }, 'not delivered'],
    ['was refused', { sentAt: null, failedAt: later }, 'not delivered'],
  ])('of a mail that %s', (_, more, fate) => {
    expect(mailFate(mail(more))).toBe(fate)
  })
})

describe('sameLines', () => {
  it('does not mind the order, but every line and word', () => {
    expect(sameLines(lines, [...lines].reverse())).toBe(true)
    expect(sameLines(lines, lines.slice(1))).toBe(false)
    expect(sameLines(lines.slice(1), lines)).toBe(false)
    expect(sameLines([], [])).toBe(true)
  })
})

describe('countLines', () => {
  it('tells settled, waiting and changed apart', () => {
    const asked = ['a', 'b', 'c', 'd', 'e'].map((lineId) => ({ lineId, hash: 'h2' }))
    const sent = [
      { lineId: 'a', hash: 'h2' },
      { lineId: 'b', hash: 'h2' },
      { lineId: 'c', hash: 'h1' },
      { lineId: 'd', hash: 'h2' },
    ]
    const states = [settled('a'), answered('b'), open('c'), changed('d'), open('e')]
    expect(countLines(asked, sent, states)).toEqual({ settled: 1, waiting: 1, changed: 3 })
    expect(countLines(asked.slice(0, 1), [{ lineId: 'a', hash: 'h1' }], states)).toEqual({
      settled: 1,
      waiting: 0,
      changed: 0,
    })
  })
})

describe('urgentStanding', () => {
  it('puts what needs a hand first', () => {
    expect(urgentStanding(['settled', 'out', 'not delivered'])).toBe('not delivered')
    expect(urgentStanding(['settled', 'not sent'])).toBe('settled')
    expect(urgentStanding([])).toBe('not sent')
  })
})

describe('isAskedOf', () => {
  it('asks a supplier for what is rented only, and a house for that too when nobody is hired', () => {
    expect(isAskedOf('supplier', 'rented', true)).toBe(true)
    expect(isAskedOf('supplier', 'venue', true)).toBe(false)
    expect(isAskedOf('venue', 'venue', true)).toBe(true)
    expect(isAskedOf('venue', 'rented', true)).toBe(false)
    expect(isAskedOf('venue', 'rented', false)).toBe(true)
  })
})
