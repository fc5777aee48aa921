import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { HEAD_RELATIONS, headRelationCents, resonantTargetHz } from './head-relation'

describe('head relation', () => {
  it('0 cents is the same pitch, 1200 an octave, 498.045 a just fourth (derived)', () => {
    expect(resonantTargetHz(150, 0)).toBe(150)
    expect(resonantTargetHz(150, 1200)).toBeCloseTo(300, 10)
    expect(resonantTargetHz(150, 498.045)).toBeCloseTo(200, 4)
  })

  it('round trip', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 40, max: 400, noNaN: true }),
        fc.double({ min: -1200, max: 1200, noNaN: true }),
        (hz, cents) => {
          expect(headRelationCents(hz, resonantTargetHz(hz, cents))).toBeCloseTo(cents, 8)
        },
      ),
    )
  })

  it('the starting points say what they are: matched, tighter, slacker', () => {
    expect(HEAD_RELATIONS.map(({ resonantCents }) => Math.sign(resonantCents))).toEqual([0, 1, -1])
  })

  it('refuses a relation past an octave', () => {
    expect(() => resonantTargetHz(150, 1201)).toThrow(expect.objectContaining({ field: 'resonantCents' }))
  })
})
