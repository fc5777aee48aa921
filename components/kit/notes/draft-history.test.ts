import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { emptyHistory, grounded, recorded, redone, undone } from './draft-history'
import type { DraftHistory } from './draft-history'
import type { NoteDraft } from './note-draft'

const at = (semitone: number) => ({ note: { semitone, cents: 0 }, noteLocked: false, headRelationCents: 0 })

/** A history of steps from draft to draft. */
const through = (drafts: readonly NoteDraft[]): DraftHistory =>
  drafts
    .slice(1)
    .reduce(
      (history, after, index) => recorded(history, { says: `step ${index + 1}`, before: drafts[index] ?? {}, after }),
      emptyHistory,
    )

describe('the history of a plan', () => {
  it('leads back through every step and forth again, however many there are', () => {
    const drafts = fc.array(fc.integer({ min: 12, max: 96 }), { minLength: 1, maxLength: 200 })
    fc.assert(
      fc.property(drafts, (semitones) => {
        const states: NoteDraft[] = [{}, ...semitones.map((semitone) => ({ tom: at(semitone) }))]
        let history = through(states)
        for (const wanted of states.slice(0, -1).reverse()) {
          const step = undone(history)
          expect(step?.draft).toEqual(wanted)
          history = step?.history ?? history
        }
        expect(undone(history)).toBeNull()
        for (const wanted of states.slice(1)) {
          const step = redone(history)
          expect(step?.draft).toEqual(wanted)
          history = step?.history ?? history
        }
        expect(redone(history)).toBeNull()
        expect(history).toEqual(through(states))
      }),
      { numRuns: 50 },
    )
  })

  it('forgets what could be redone when a new step is made', () => {
    const back = undone(through([{}, { tom: at(50) }]))
    const history = recorded(back?.history ?? emptyHistory, { says: 'other', before: {}, after: { tom: at(48) } })
    expect(redone(history)).toBeNull()
    expect(history.undo.map(({ says }) => says)).toEqual(['other'])
  })

  it('leads back to the notes of before, although the plan was set in between', () => {
    const history = grounded(through([{}, { tom: at(50) }, { tom: at(50), floor: at(40) }]), {
      tom: at(48),
      floor: at(41),
    })
    const once = undone(history)
    expect(once?.draft).toEqual({ tom: at(50), floor: at(41) })
    expect(undone(once?.history ?? emptyHistory)?.draft).toEqual({ tom: at(48), floor: at(41) })
  })
})
