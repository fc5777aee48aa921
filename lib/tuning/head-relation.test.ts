import { describe, expect, it } from 'vitest'
import { drumTuning } from '@/lib/acoustics/drum-tuning'
import { HEAD_RELATIONS } from './head-relation'

describe('head relation', () => {
  it('the starting points say what they are: matched, tighter, slacker', () => {
    expect(HEAD_RELATIONS.map(({ resonantCents }) => Math.sign(resonantCents))).toEqual([0, 1, -1])
  })

  it('the matched one passes the most of the note from head to head, as it says', () => {
    const film = { plyMils: [10], coatingKgPerM2: 0 }
    const sustain = HEAD_RELATIONS.map(
      ({ resonantCents }) =>
        drumTuning({
          ...{
            role: 'tom',
            lugs: 6,
            diameterM: 0.3048,
            depthM: 0.2032,
            noteHz: 146.8324,
            batter: film,
            resonant: film,
          },
          relationCents: resonantCents,
        }).sustain ?? 0,
    )
    expect(Math.max(...sustain)).toBe(sustain[0])
  })
})
