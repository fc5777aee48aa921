import { describe, expect, test } from 'vitest'
import { T60_PER_TAU } from './pitch-of-fit'

describe('decay of a partial', () => {
  test('T60 = 6.9078 τ (published: J. O. Smith, Mathematics of the DFT)', () => {
    expect(T60_PER_TAU).toBeCloseTo(6.9078, 4)
  })
})
