import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { lnTensionAt, readingAt, risingCurve } from './gauge-curve'

const numbers = fc.array(fc.double({ min: -50, max: 50, noNaN: true }), { minLength: 3, maxLength: 9 })
const steps = (values: readonly number[]) => values.map((_, i) => i * 0.5)

/** The min-max formula of isotonic regression (Barlow et al. 1972): another way to the same least squares. */
function byMinMax(values: readonly number[]): number[] {
  const mean = (from: number, to: number) => {
    const part = values.slice(from, to + 1)
    return part.reduce((sum, value) => sum + value, 0) / part.length
  }
  return values.map((_, i) =>
    Math.max(
      ...values
        .slice(0, i + 1)
        .map((__, from) => Math.min(...values.slice(i).map((___, after) => mean(from, i + after)))),
    ),
  )
}

describe('the rising curve', () => {
  it('pools what falls into its mean (by hand)', () => {
    expect(risingCurve([0, 1, 2, 3, 4], [1, 3, 2, 4, 3], 0).readings).toEqual([1, 2.5, 2.5, 3.5, 3.5])
  })

  it('is the least-squares one: the min-max formula gives the same (derived)', () => {
    fc.assert(
      fc.property(numbers, (values) => {
        const expected = byMinMax(values)
        risingCurve(steps(values), values, 0).readings.forEach((reading, i) =>
          expect(reading).toBeCloseTo(expected[i] ?? Number.NaN, 9),
        )
      }),
      { numRuns: 200 },
    )
  })

  it('leaves alone what rises fast enough', () => {
    const { readings } = risingCurve([0, 1, 2], [1, 2, 4], 0.5)
    readings.forEach((reading, i) => expect(reading).toBeCloseTo([1, 2, 4][i] ?? Number.NaN, 12))
  })

  it('is nowhere flatter than asked, and keeps two curves in their order', () => {
    fc.assert(
      fc.property(numbers, fc.double({ min: 0, max: 9, noNaN: true }), (values, over) => {
        const lower = risingCurve(steps(values), values, 2).readings
        const upper = risingCurve(
          steps(values),
          values.map((value) => value + over),
          2,
        ).readings
        lower.forEach((reading, i) => {
          expect(reading).toBeLessThanOrEqual((upper[i] ?? Number.NaN) + 1e-9)
          if (i > 0) expect(reading - (lower[i - 1] ?? Number.NaN)).toBeGreaterThanOrEqual(1 - 1e-9)
        })
      }),
      { numRuns: 200 },
    )
  })

  it('reads the same both ways within its ends, and stops at them', () => {
    fc.assert(
      fc.property(numbers, fc.double({ min: 0, max: 1, noNaN: true }), (values, share) => {
        const curve = risingCurve(steps(values), values, 1)
        const x = share * ((values.length - 1) * 0.5)
        expect(lnTensionAt(curve, readingAt(curve, x))).toBeCloseTo(x, 9)
        expect(readingAt(curve, -7)).toBe(curve.readings[0])
        expect(lnTensionAt(curve, 1e9)).toBe(curve.lnTensions.at(-1))
      }),
      { numRuns: 200 },
    )
  })
})
