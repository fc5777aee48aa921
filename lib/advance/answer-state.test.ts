import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { asAskedAnswer } from './answer'
import type { Decision, SaidAnswer } from './answer-state'
import { deriveLineStates } from './answer-state'

function said(sequence: number, lineId: string, lineHash: string, more: Partial<SaidAnswer> = {}): SaidAnswer {
  return {
    id: `a${sequence}`,
    sequence,
    lineId,
    lineHash,
    content: asAskedAnswer(1),
    remark: '',
    byName: 'Ib',
    via: 'link',
    taken: null,
    at: '2031-09-01T10:00:00Z',
    ...more,
  }
}

function decided(sequence: number, lineId: string, answerEventId: string, decision: Decision['decision']): Decision {
  return {
    id: `d${sequence}`,
    sequence,
    lineId,
    answerEventId,
    decision,
    remark: '',
    byName: 'Tove',
    at: '2031-09-02T10:00:00Z',
  }
}

const line = { lineId: 'tom', hash: 'h1' }
const stateOf = (answers: SaidAnswer[], decisions: Decision[] = [], asked = line) =>
  deriveLineStates([asked], answers, decisions)[0]

describe('deriveLineStates', () => {
  it('leaves a line unanswered until something was said about it', () => {
    expect(stateOf([said(1, 'kick', 'h1')])).toEqual({
      lineId: 'tom',
      history: [],
      state: 'unanswered',
      askedAgain: null,
    })
  })

  it('lets the later of two people stand and keeps both', () => {
    const state = stateOf([said(2, 'tom', 'h1', { byName: 'Second' }), said(1, 'tom', 'h1', { byName: 'First' })])
    expect(state).toMatchObject({ state: 'answered', answer: { byName: 'Second' } })
    expect(state?.history.map((entry) => entry.byName)).toEqual(['First', 'Second'])
  })

  it('settles the answer that was accepted, and only that one', () => {
    const answers = [said(1, 'tom', 'h1'), said(3, 'tom', 'h1')]
    expect(stateOf(answers.slice(0, 1), [decided(1, 'tom', 'a1', 'accept')])).toMatchObject({
      state: 'settled',
      answer: { id: 'a1' },
    })
    expect(stateOf(answers, [decided(1, 'tom', 'a1', 'accept')])).toMatchObject({
      state: 'answered',
      answer: { id: 'a3' },
    })
  })

  it('asks again when a settled answer is reopened, until there is another answer', () => {
    const decisions = [decided(1, 'tom', 'a1', 'accept'), decided(2, 'tom', 'a1', 'reopen')]
    expect(stateOf([said(1, 'tom', 'h1')], decisions)).toMatchObject({ state: 'unanswered', askedAgain: { id: 'd2' } })
    expect(stateOf([said(1, 'tom', 'h1'), said(2, 'tom', 'h1')], decisions)).toMatchObject({
      state: 'answered',
      answer: { id: 'a2' },
    })
    expect(stateOf([said(1, 'tom', 'h1')], [...decisions, decided(3, 'tom', 'a1', 'accept')])).toMatchObject({
      state: 'settled',
    })
  })

  it('asks again when the line says something else, even after it was settled', () => {
    const state = stateOf([said(1, 'tom', 'h1')], [decided(1, 'tom', 'a1', 'accept')], { lineId: 'tom', hash: 'h2' })
    expect(state).toMatchObject({ state: 'changed since', answer: { id: 'a1' } })
  })

  it('carries an answer over when the line says the same again', () => {
    const answers = [said(1, 'tom', 'h1'), said(2, 'tom', 'h2')]
    expect(stateOf(answers)).toMatchObject({ state: 'answered', answer: { id: 'a1' } })
    expect(stateOf(answers, [], { lineId: 'tom', hash: 'h2' })).toMatchObject({
      state: 'answered',
      answer: { id: 'a2' },
    })
  })

  const history = fc.array(
    fc.record({ line: fc.constantFrom('tom', 'kick', 'ride'), hash: fc.constantFrom('h1', 'h2') }),
    { maxLength: 30 },
  )

  it('is the same in whatever order the events are read, and loses none of them', () => {
    fc.assert(
      fc.property(history, fc.infiniteStream(fc.integer()), (events, order) => {
        const answers = events.map((event, index) => said(index + 1, event.line, event.hash))
        const decisions = answers
          .filter((_, index) => index % 3 === 0)
          .map((entry, index) => decided(index + 1, entry.lineId, entry.id, 'accept'))
        const shuffled = answers.map((entry) => ({ entry, at: order.next().value ?? 0 })).sort((a, b) => a.at - b.at)
        const lines = ['tom', 'kick', 'ride'].map((lineId) => ({ lineId, hash: 'h1' }))
        const states = deriveLineStates(lines, answers, decisions)
        expect(
          deriveLineStates(
            lines,
            shuffled.map(({ entry }) => entry),
            [...decisions].reverse(),
          ),
        ).toEqual(states)
        expect(states.flatMap((state) => state.history)).toHaveLength(answers.length)
      }),
    )
  })

  it('is changed since exactly when a line was answered, but never as it is asked now', () => {
    fc.assert(
      fc.property(history, (events) => {
        const answers = events.map((event, index) => said(index + 1, event.line, event.hash))
        for (const state of deriveLineStates(
          ['tom', 'kick', 'ride'].map((lineId) => ({ lineId, hash: 'h1' })),
          answers,
          [],
        )) {
          const own = events.filter((event) => event.line === state.lineId)
          const never = own.length > 0 && own.every((event) => event.hash !== 'h1')
          expect(state.state === 'changed since').toBe(never)
        }
      }),
    )
  })
})
