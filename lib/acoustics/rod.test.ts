import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { keyTorqueNm, rodPullN } from './rod'

describe('rods', () => {
  it('1000 N, K 0.2, d 5.4864 mm is 1.0973 N·m (derived from Shigley’s M = K·d·F)', () => {
    expect(keyTorqueNm(1000).nominalNm).toBeCloseTo(1.0973, 4)
  })

  it('shows its scatter: lubricated K 0.18 less 30 % to dry K 0.20 plus 30 % (Shigley, published)', () => {
    const { lowNm, highNm } = keyTorqueNm(1000)
    expect(lowNm).toBeCloseTo(0.18 * 5.4864 * 0.7, 6)
    expect(highNm).toBeCloseTo(0.2 * 5.4864 * 1.3, 6)
  })

  it('pull is the whole edge pull shared: 12 in, 2000 N/m, 6 rods is 319.19 N (derived: π·0.3048·2000/6)', () => {
    expect(rodPullN(2000, 0.3048, 6)).toBeCloseTo(319.186, 2)
  })

  it('rods times pull is the same edge pull for any number of rods', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 4, max: 12 }),
        fc.double({ min: 100, max: 9000, noNaN: true }),
        (lugs, tensionNPerM) => {
          expect((lugs * rodPullN(tensionNPerM, 0.35, lugs)) / (4 * rodPullN(tensionNPerM, 0.35, 4))).toBeCloseTo(1, 12)
        },
      ),
    )
  })

  it.each([
    ['lugs', () => rodPullN(2000, 0.3048, 3)],
    ['lugs', () => rodPullN(2000, 0.3048, 6.5)],
    ['lugs', () => rodPullN(2000, 0.3048, Number.NaN)],
    ['diameterM', () => rodPullN(2000, 12, 6)],
    ['pullN', () => keyTorqueNm(Number.NEGATIVE_INFINITY)],
  ])('refuses nonsense, naming %s', (field, act) => {
    expect(act).toThrow(expect.objectContaining({ field }))
  })
})
