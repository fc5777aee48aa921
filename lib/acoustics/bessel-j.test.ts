import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { besselBulge, besselJ, besselJZero, besselSlopeZero } from './bessel-j'

/** Bessel's integral, DLMF 10.9.2, by the trapezoid rule: exact to rounding for a periodic entire integrand. */
function besselByIntegral(order: number, x: number): number {
  const points = 400
  let sum = 0
  for (let i = 0; i < points; i++) {
    const t = (2 * Math.PI * i) / points
    sum += Math.cos(order * t - x * Math.sin(t))
  }
  return sum / points
}

describe('Bessel functions', () => {
  // Published: Abramowitz & Stegun, Handbook of Mathematical Functions, table 9.1 (J0, J1, J2 at x = 1, 2, 5).
  it.each([
    [0, 1, 0.7651976866],
    [1, 1, 0.4400505857],
    [2, 1, 0.1149034849],
    [0, 2, 0.2238907791],
    [1, 2, 0.5767248078],
    [2, 2, 0.3528340286],
    [0, 5, -0.1775967713],
    [1, 5, -0.3275791376],
    [2, 5, 0.0465651163],
  ])('J%i(%f) = %f (A&S table 9.1, published)', (order, x, value) => {
    expect(besselJ(order, x)).toBeCloseTo(value, 10)
  })

  it('agrees with Bessel’s integral to 1e-13 on either side of x = m', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 20 }), fc.double({ min: 0, max: 100, noNaN: true }), (order, x) => {
        expect(Math.abs(besselJ(order, x) - besselByIntegral(order, x))).toBeLessThan(1e-13)
      }),
    )
  })

  // Published: Abramowitz & Stegun table 9.5; DLMF 10.21.
  it.each([
    [0, 1, 2.404825557696],
    [1, 1, 3.831705970208],
    [2, 1, 5.135622301841],
    [0, 2, 5.520078110286],
    [3, 1, 6.380161895924],
    [1, 2, 7.015586669816],
  ])('zero j(%i,%i) = %f (A&S table 9.5, published)', (order, index, zero) => {
    expect(Math.abs(besselJZero(order, index) - zero)).toBeLessThan(1e-12)
  })

  it('(6,1) over (0,1) is 4.1317, not the textbook misprint 4.15 (derived)', () => {
    expect(besselJZero(6, 1) / besselJZero(0, 1)).toBeCloseTo(4.1317, 4)
  })

  it('zeros interlace and none is skipped: they draw near to π apart', () => {
    for (let order = 0; order <= 8; order++) {
      for (let index = 2; index <= 30; index++) {
        const step = besselJZero(order, index) - besselJZero(order, index - 1)
        expect(step).toBeGreaterThan(3)
        expect(step).toBeLessThan(4.5)
        expect(Math.abs(besselByIntegral(order, besselJZero(order, index)))).toBeLessThan(1e-13)
      }
    }
    expect(besselJZero(4, 30) - besselJZero(4, 29)).toBeCloseTo(Math.PI, 2)
  })

  it.each([
    ['order', () => besselJ(-1, 1)],
    ['order', () => besselJ(0.5, 1)],
    ['x', () => besselJ(0, Number.NaN)],
    ['x', () => besselJ(0, -1)],
    ['index', () => besselJZero(0, 0)],
  ])('refuses nonsense, naming %s', (field, act) => {
    expect(act).toThrow(expect.objectContaining({ field }))
  })
})

describe('zeros of the slope', () => {
  // Published: Abramowitz & Stegun table 9.5, zeros of J0′ (after the one at 0), J1′, J2′, J3′.
  it.each([
    [0, 1, 3.83171],
    [0, 2, 7.01559],
    [1, 1, 1.84118],
    [1, 2, 5.33144],
    [2, 1, 3.05424],
    [2, 2, 6.70613],
    [3, 1, 4.20119],
  ])('j′(%i,%i) = %f (A&S table 9.5, published)', (order, index, zero) => {
    expect(Math.abs(besselSlopeZero(order, index) - zero)).toBeLessThan(6e-6)
  })

  it('every one lies where J_m stands still, and they follow one another', () => {
    for (let order = 0; order <= 8; order++) {
      let before = 0
      for (let index = 1; index <= 40; index++) {
        const zero = besselSlopeZero(order, index)
        const slope = (besselByIntegral(order, zero + 1e-4) - besselByIntegral(order, zero - 1e-4)) / 2e-4
        expect(Math.abs(slope)).toBeLessThan(1e-8)
        // More than 3 apart: the spacing on which the bound of the shell's series rests.
        if (index > 1) expect(zero - before).toBeGreaterThan(3)
        before = zero
      }
    }
  })

  it.each([
    ['order', 9, 1],
    ['index', 1, 0],
    ['index', 1, 1.5],
  ])('refuses a %s that is not there', (field, order, index) => {
    expect(() => besselSlopeZero(order, index)).toThrow(expect.objectContaining({ field }))
  })
})

it('the bulge is J2/J0 (A&S table 9.1 at x = 1 and 2, published)', () => {
  expect(besselBulge(1)).toBeCloseTo(0.1149034849 / 0.7651976866, 9)
  expect(besselBulge(2)).toBeCloseTo(0.3528340286 / 0.2238907791, 9)
})
