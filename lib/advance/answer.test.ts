import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { AnswerContent, InsteadWhat } from './answer'
import { answerCount, answerFault, answerWords, asAskedAnswer, insteadKind, insteadWords } from './answer'

const tom: InsteadWhat = { kind: 'drum', diameterIn: 13, depthIn: 9, lugs: 6, words: '' }
const answer = (part: Partial<AnswerContent>): AnswerContent => ({
  asAsked: 0,
  instead: [],
  notYet: [],
  cant: 0,
  ...part,
})
const plainDate = (date: string) => date

/** Splits a count into four heaps: whatever the split, the answer is whole. */
const split = fc
  .tuple(fc.nat(20), fc.nat(20), fc.nat(20), fc.nat(20))
  .filter((parts) => parts.some((part) => part > 0))
  .map(([asAsked, instead, notYet, cant]) => ({
    count: asAsked + instead + notYet + cant,
    content: answer({
      asAsked,
      cant,
      instead: instead > 0 ? [{ n: instead, what: { kind: 'other' as const, words: 'short ones' } }] : [],
      notYet: notYet > 0 ? [{ n: notYet, by: '2031-10-05' }] : [],
    }),
  }))

describe('answerFault', () => {
  it('takes any split of the count that was asked for', () => {
    fc.assert(
      fc.property(split, ({ count, content }) => {
        expect(answerFault(content, { kind: 'hardware', count })).toBeNull()
      }),
    )
  })

  it('refuses every answer whose counts are not the count asked for, and says both numbers', () => {
    fc.assert(
      fc.property(
        split,
        fc.integer({ min: -10, max: 10 }).filter((off) => off !== 0),
        ({ count, content }, off) => {
          const fault = answerFault(content, { kind: 'hardware', count: count + off })
          expect(fault).toContain(String(count))
          expect(fault).toContain(String(count + off))
        },
      ),
    )
  })

  it('refuses a date that is over where today is known, and takes today', () => {
    const by = (date: string) => answer({ notYet: [{ n: 1, by: date }] })
    const line = { kind: 'hardware', count: 1 }
    expect(answerFault(by('2031-10-04'), line, '2031-10-05')).toContain('still to come')
    expect(answerFault(by('2031-10-05'), line, '2031-10-05')).toBeNull()
    expect(answerFault(by('2031-10-04'), line)).toBeNull()
  })

  it.each([
    ['a broken count', answer({ asAsked: 1.5 }), 'hardware', 1.5],
    ['a negative count', answer({ asAsked: 2, cant: -1 }), 'hardware', 1],
    ['an empty part', answer({ asAsked: 1, notYet: [{ n: 0, by: '2031-10-05' }] }), 'hardware', 1],
    ['a date that is none', answer({ notYet: [{ n: 1, by: '2031-02-30' }] }), 'hardware', 1],
    ['a date in words', answer({ notYet: [{ n: 1, by: 'Monday' }] }), 'hardware', 1],
    ['a sentence for a drum', answer({ instead: [{ n: 1, what: { kind: 'other', words: 'a 13' } }] }), 'drum', 1],
    ['a drum for a stand', answer({ instead: [{ n: 1, what: tom }] }), 'hardware', 1],
    ['seven lugs', answer({ instead: [{ n: 1, what: { ...tom, lugs: 7 } }] }), 'drum', 1],
    ['a drum of five inches', answer({ instead: [{ n: 1, what: { ...tom, diameterIn: 5 } }] }), 'drum', 1],
    ['a depth of a third of an inch', answer({ instead: [{ n: 1, what: { ...tom, depthIn: 8.3 } }] }), 'drum', 1],
    ['a size that is no number', answer({ instead: [{ n: 1, what: { ...tom, depthIn: Number.NaN } }] }), 'drum', 1],
    [
      'a cymbal of thirty inches',
      answer({ instead: [{ n: 1, what: { kind: 'cymbal', diameterIn: 30, words: '' } }] }),
      'cymbal',
      1,
    ],
    [
      'nothing said of what comes',
      answer({ instead: [{ n: 1, what: { kind: 'other', words: '  ' } }] }),
      'microphone',
      1,
    ],
  ])('refuses %s', (_, content, kind, count) => {
    expect(answerFault(content, { kind, count })).toEqual(expect.any(String))
  })

  it('takes the edges of every size', () => {
    for (const [diameterIn, depthIn] of [
      [6, 3],
      [28, 24],
      [12.25, 5.5],
    ] as const) {
      expect(
        answerFault(answer({ instead: [{ n: 1, what: { ...tom, diameterIn, depthIn } }] }), { kind: 'drum', count: 1 }),
      ).toBeNull()
    }
  })
})

describe('words', () => {
  it('says one thing without a count and several with their counts', () => {
    expect(answerWords(asAskedAnswer(1), plainDate)).toBe('as asked')
    expect(answerWords(answer({ asAsked: 6, notYet: [{ n: 2, by: '2031-10-05' }] }), plainDate)).toBe(
      '6 as asked; 2 not yet, by 2031-10-05',
    )
    expect(answerWords(answer({ instead: [{ n: 1, what: { ...tom, words: ' birch ' } }] }), plainDate)).toBe(
      'instead: 13 in across, 9 deep, 6 lugs, birch',
    )
    expect(answerWords(answer({ cant: 1 }), plainDate)).toBe("can't")
    expect(insteadWords({ kind: 'cymbal', diameterIn: 20, words: '' })).toBe('20 in')
  })

  it('names every part of an answer, and its count, whatever the split', () => {
    fc.assert(
      fc.property(split, ({ count, content }) => {
        expect(answerCount(content)).toBe(count)
        const words = answerWords(content, plainDate)
        expect(words.includes('as asked')).toBe(content.asAsked > 0)
        expect(words.includes('instead: short ones')).toBe(content.instead.length > 0)
        expect(words.includes('not yet, by 2031-10-05')).toBe(content.notYet.length > 0)
        expect(words.includes("can't")).toBe(content.cant > 0)
      }),
    )
  })

  it('asks for sizes of drums and cymbals, and for a sentence of all else', () => {
    expect(['drum', 'cymbal', 'hardware', 'microphone', 'of a later release'].map(insteadKind)).toEqual([
      'drum',
      'cymbal',
      'other',
      'other',
      'other',
    ])
  })
})
