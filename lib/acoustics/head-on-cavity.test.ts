import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { cavityHeadRoot } from './head-on-cavity'

describe('one head on a closed rigid cavity, massless air', () => {
  // Published: R. L. Raichel, The Science and Applications of Acoustics, 2nd ed., table 6.2; to 0.01.
  it.each([
    [1, 2.545],
    [5, 3.02],
  ])('B = %f: x1 = %f (Raichel table 6.2, published)', (ratio, root) => {
    expect(Math.abs(cavityHeadRoot(ratio) - root)).toBeLessThan(0.01)
  })

  it('without a cavity it is the bare head, 2.4048; the stiffest air leaves j21 = 5.1356 (A&S 9.5, published)', () => {
    expect(cavityHeadRoot(0)).toBeCloseTo(2.404825557696, 10)
    expect(cavityHeadRoot(1e9)).toBeCloseTo(5.135622301841, 6)
  })

  it('agrees with the head’s own shapes and a rank-one spring: Σ 4B/(j_n²·(x² − j_n²)) = 1 (derived)', () => {
    // The secular equation of Galerkin's method with all shapes J0(j_n r); McMahon's zeros from the third on.
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 50, noNaN: true }), (ratio) => {
        const x = cavityHeadRoot(ratio)
        let sum = 0
        for (let n = 1; n <= 2000; n++) {
          const b = 8 * (n - 1 / 4) * Math.PI
          const j = [2.404825557696, 5.520078110286][n - 1] ?? b / 8 + 1 / b - 124 / (3 * b ** 3)
          sum += (4 * ratio) / (j ** 2 * (x ** 2 - j ** 2))
        }
        expect(sum).toBeCloseTo(1, 4)
      }),
      { numRuns: 60 },
    )
  })

  it('rises with the air’s stiffness', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 100, noNaN: true }),
        fc.double({ min: 0.01, max: 10, noNaN: true }),
        (b, more) => {
          expect(cavityHeadRoot(b + more)).toBeGreaterThan(cavityHeadRoot(b))
        },
      ),
    )
  })

  it.each([-1, Number.NaN, Number.POSITIVE_INFINITY])('refuses B = %f', (ratio) => {
    expect(() => cavityHeadRoot(ratio)).toThrow(expect.objectContaining({ field: 'stiffnessRatio' }))
  })
})
