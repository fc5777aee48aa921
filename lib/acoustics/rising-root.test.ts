import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { risingRoot } from './rising-root'

describe('the root of a rising function', () => {
  it('is found to the last bits, without asking the ends', () => {
    fc.assert(
      fc.property(fc.double({ min: -0.999, max: 0.999, noNaN: true }), (root) => {
        // Runs from −∞ to +∞ between its poles at ±1.
        const f = (x: number) => {
          expect(Math.abs(x)).toBeLessThan(1)
          return Math.atanh(x) - Math.atanh(root)
        }
        expect(Math.abs(risingRoot(f, -1, 1) - root)).toBeLessThan(1e-12)
      }),
    )
  })

  it('is the end it never reaches when the function keeps one sign, and the end itself when there is no room', () => {
    expect(risingRoot(() => 1, 2, 3)).toBeCloseTo(2, 12)
    expect(risingRoot(() => -1, 2, 3)).toBeCloseTo(3, 12)
    expect(risingRoot(() => 1, 2, 2)).toBe(2)
  })

  it('comes to an end on bounds that are no numbers', () => {
    expect(risingRoot((x) => x, Number.NaN, 1)).toBeNaN()
  })
})
