import { describe, expect, it } from 'vitest'
import { answerFault, asAskedAnswer } from '@/lib/advance/answer'
import { beginDraft, draftContent } from './answer-draft'

const tom = { kind: 'drum', count: 1, size: { diameterIn: 12, depthIn: 8, lugs: 6 }, words: 'Tom 12' }
const stands = { kind: 'hardware', count: 8, size: null, words: '8 × Boom stands' }

describe('an answer’s draft', () => {
  it('puts everything into the kind that was pressed', () => {
    expect(draftContent(stands, beginDraft(stands, 'as asked', null))).toEqual(asAskedAnswer(8))
    expect(draftContent(stands, beginDraft(stands, 'cant', null))).toEqual({ asAsked: 0, instead: [], notYet: [], cant: 8 })
    expect(draftContent(stands, beginDraft(stands, 'not yet', null))).toMatchObject({ notYet: [{ n: 8, by: '' }] })
  })

  it('begins a drum that comes instead from the sizes that were asked for', () => {
    const draft = beginDraft(tom, 'instead', null)
    expect(draft.instead).toMatchObject({ diameterIn: '12', depthIn: '8', lugs: '6' })
    const content = draftContent(tom, { ...draft, instead: { ...draft.instead, diameterIn: '13', depthIn: '8,5', words: ' birch ' } })
    expect(content.instead).toEqual([{ n: 1, what: { kind: 'drum', diameterIn: 13, depthIn: 8.5, lugs: 6, words: 'birch' } }])
    expect(answerFault(content, tom)).toBeNull()
  })

  it('begins again from what was said', () => {
    const said = { asAsked: 5, instead: [{ n: 1, what: { kind: 'other' as const, words: 'straight' } }], notYet: [{ n: 1, by: '2031-10-06' }], cant: 1 }
    expect(draftContent(stands, beginDraft(stands, 'instead', said))).toEqual(said)
  })

  it('is refused while a size or a count is no number', () => {
    const draft = beginDraft(tom, 'instead', null)
    for (const diameterIn of ['', 'twelve', '1e3']) {
      expect(answerFault(draftContent(tom, { ...draft, instead: { ...draft.instead, diameterIn } }), tom)).not.toBeNull()
    }
    expect(answerFault(draftContent(stands, { ...beginDraft(stands, 'as asked', null), cant: 'two' }), stands)).not.toBeNull()
  })
})
