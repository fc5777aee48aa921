import { describe, expect, it } from 'vitest'
import type { NextMove } from './next-move-step'
import { nextMoveWords } from './next-move-words'

const blank: NextMove = {
  kind: 'read',
  reason: 'not-read-yet',
  lugs: [],
  direction: null,
  size: null,
  turns: [],
  fromBelow: false,
  twoKeys: false,
  expected: null,
  thenRead: [],
  evenChance: null,
}

describe('the next move in words', () => {
  it('says lugs, direction, size and what to read then', () => {
    const turns = [2, 6].map((lug) => ({ lug, size: 'eighth' as const, turns: 0.125 }))
    const move: NextMove = {
      ...blank,
      kind: 'turn',
      reason: 'uneven',
      lugs: [2, 6],
      direction: 'up',
      size: 'eighth',
      turns,
      thenRead: [2, 6],
    }
    expect(nextMoveWords(move, 8)).toBe('Turn lugs 2 and 6 up an eighth of a turn, then read lugs 2 and 6.')
    expect(nextMoveWords({ ...move, thenRead: [1, 5, 2, 6, 3, 7, 4, 8] }, 8)).toBe(
      'Turn lugs 2 and 6 up an eighth of a turn, then read all round.',
    )
  })

  it('says that the way down goes under and comes up', () => {
    const turns = [
      { lug: 1, size: 'quarter' as const, turns: -0.25 },
      { lug: 5, size: 'hair' as const, turns: -0.0625 },
    ]
    const move: NextMove = { ...blank, kind: 'turn', reason: 'over', lugs: [1, 5], direction: 'down', turns }
    expect(nextMoveWords(move, 8)).toBe(
      'The head is over on the whole. Turn lug 1 down a quarter turn and 5 down a hair (a sixteenth of a turn): go under, then come up to it.',
    )
  })

  it('says what it is not sure of', () => {
    const move: NextMove = { ...blank, kind: 'not-sure', reason: 'contradictory', lugs: [3] }
    expect(nextMoveWords(move, 8)).toBe('Not sure: read lug 3 again. Its readings do not agree.')
  })

  it('says what to look for when the head does not follow, and what lies at the edge', () => {
    expect(nextMoveWords({ ...blank, kind: 'not-sure', reason: 'no-progress', lugs: [1, 3] }, 4)).toBe(
      'Not sure: the head does not follow at lugs 1 and 3. Look for a bent hoop, a stiff rod or an unseated edge, then read again.',
    )
    expect(nextMoveWords({ ...blank, kind: 'done', reason: 'at-the-edge', lugs: [3] }, 4)).toBe(
      'As even as turns make it: leave it. Lug 3 may lie at the edge of the tolerance.',
    )
  })

  it('says seat, bring up, read and done', () => {
    expect(nextMoveWords({ ...blank, kind: 'seat', reason: 'seat-first', lugs: [1, 3, 2, 4] }, 4)).toBe(
      'Turn every lug finger-tight, working across the drum: 1, 3, 2, 4.',
    )
    expect(nextMoveWords({ ...blank, kind: 'bring-up', reason: 'bring-up', lugs: [1, 5] }, 8)).toBe(
      'With two keys, turn lugs 1 and 5 up a quarter turn.',
    )
    expect(nextMoveWords({ ...blank, lugs: [1, 2, 3, 4] }, 4)).toBe('Read every lug once round before touching one.')
    expect(nextMoveWords({ ...blank, kind: 'done', reason: 'believed-even' }, 4)).toBe('Even: leave it.')
    expect(nextMoveWords({ ...blank, kind: 'done', reason: 'good-enough', lugs: [3] }, 4)).toBe(
      'Good enough for the time there is: lug 3 may still be out.',
    )
  })
})
