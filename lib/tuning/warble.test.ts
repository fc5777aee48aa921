import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { balancedPull, ritzWaveNumbers } from '../../tests/helpers/ritz-membrane'
import type { Pull } from '../../tests/helpers/ritz-membrane'
import { observableFromTaps, unevennessOfWarble, warbleHz } from './warble'

/** First zero of J1 (published: Abramowitz & Stegun, table 9.5). */
const J11 = 3.8317059702
const even = (): Pull => ({ xx: 1, yy: 1, xy: 0 })

/** Wave numbers of the (1,1) pair, along x and across it, for a pull that mirrors in both. */
function pair(pull: (x: number, y: number) => Pull) {
  const along = ritzWaveNumbers(pull, { x: 'odd', y: 'even' })[0] ?? Number.NaN
  const across = ritzWaveNumbers(pull, { x: 'even', y: 'odd' })[0] ?? Number.NaN
  return { along, across, split: (along - across) / J11 }
}

describe('an independent film (Ritz, no Bessel functions)', () => {
  it('of even tension sounds (1,1) at the first zero of J1 (published: Abramowitz & Stegun)', () => {
    expect(pair(even).along).toBeCloseTo(J11, 8)
    expect(pair(even).across).toBeCloseTo(J11, 8)
  })

  it('pulled T0(1 ± 0.1) along x and y splits to ka 3.925536 and 3.733892 (derived)', () => {
    const { along, across } = pair(() => ({ xx: 1.1, yy: 0.9, xy: 0 }))
    expect(along).toBeCloseTo(3.925536, 6)
    expect(across).toBeCloseTo(3.733892, 6)
  })

  it.each([2, 3, 4])('stands in balance under T0(1 + ε·cos %iθ) at a greased edge', (k) => {
    const pull = balancedPull(k, 0.3)
    for (const angle of [0, 0.4, 1.1, 2.9, 5]) {
      const [c, s] = [Math.cos(angle), Math.sin(angle)]
      const { xx, yy, xy } = pull(c, s)
      expect(xx * c * c + 2 * xy * c * s + yy * s * s).toBeCloseTo(1 + 0.3 * Math.cos(k * angle), 12)
      expect((yy - xx) * c * s + xy * (c * c - s * s)).toBeCloseTo(0, 12)
      // No net pull on any small piece inside, by central differences.
      const [x, y, h] = [0.6 * c, 0.6 * s, 1e-4]
      const slope = (part: keyof Pull, dx: number, dy: number) =>
        (pull(x + dx, y + dy)[part] - pull(x - dx, y - dy)[part]) / (2 * h)
      expect(slope('xx', h, 0) + slope('xy', 0, h)).toBeCloseTo(0, 6)
      expect(slope('xy', h, 0) + slope('yy', 0, h)).toBeCloseTo(0, 6)
    }
  })
})

describe('the split of the tap pair', () => {
  it('is (ε/2)·f11 for T0(1 + ε·cos 2θ) in balance (derived: independent solver)', () => {
    for (const unevenness of [0.01, 0.05]) {
      const { split } = pair(balancedPull(2, unevenness))
      // What is left is of third order in ε: turning the head by a quarter turns ε into −ε.
      expect(Math.abs(split - warbleHz(unevenness, 300) / 300)).toBeLessThan(0.2 * unevenness ** 3)
    }
  })

  it('is 0.148 ε only for a tension that is out of balance: the wrong model (derived)', () => {
    const outOfBalance = (x: number, y: number): Pull => {
      const tension = 1 + 0.01 * Math.cos(2 * Math.atan2(y, x))
      return { xx: tension, yy: tension, xy: 0 }
    }
    expect(pair(outOfBalance).split / 0.01).toBeCloseTo(0.148, 3)
  })

  it('of 300 Hz and ε = 0.02 is 3 beats a second (derived)', () => {
    expect(warbleHz(0.02, 300)).toBeCloseTo(3, 12)
  })

  it('is none under an alternate pattern, k = 3, nor k = 4: they do not split (1,1) (derived: independent solver)', () => {
    const three = balancedPull(3, 0.1)
    // k = 3 mirrors in y only, so shapes even in y hold (0,1) first and then the pair's one half.
    const along = ritzWaveNumbers(three, { x: 'any', y: 'even' })[1] ?? Number.NaN
    const across = ritzWaveNumbers(three, { x: 'any', y: 'odd' })[0] ?? Number.NaN
    expect(Math.abs(along - across) / J11).toBeLessThan(1e-5)
    expect(Math.abs(pair(balancedPull(4, 0.1)).split)).toBeLessThan(1e-6)
  })

  it('k = 4 splits (2,1) instead: only k = 2m splits (m,1) (derived: independent solver)', () => {
    const four = balancedPull(4, 0.1)
    const onAxes = ritzWaveNumbers(four, { x: 'even', y: 'even' })[1] ?? Number.NaN
    const between = ritzWaveNumbers(four, { x: 'odd', y: 'odd' })[0] ?? Number.NaN
    expect(Math.abs(onAxes - between) / between).toBeGreaterThan(0.005)
  })

  it('there and back, and no figure for what cannot be', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.double({ min: 20, max: 2000, noNaN: true }),
        (unevenness, tapHz) => {
          expect(unevennessOfWarble(warbleHz(unevenness, tapHz), tapHz)).toBeCloseTo(unevenness, 12)
        },
      ),
    )
    for (const bad of [Number.NaN, -0.1, 1.5, Number.POSITIVE_INFINITY]) {
      expect(() => warbleHz(bad, 300)).toThrow(expect.objectContaining({ field: 'unevenness' }))
    }
    expect(() => unevennessOfWarble(1, 0)).toThrow(expect.objectContaining({ field: 'tapHz' }))
  })
})

describe('what taps can show', () => {
  it.each([
    [4, 'on-the-lugs-only', []],
    [5, 'every-direction', []],
    [6, 'every-direction', [3]],
    [8, 'every-direction', [3, 4]],
    [11, 'every-direction', [3, 4, 5]],
  ])('%i lugs: the two-fold part %s, patterns %j hidden (derived)', (lugs, twoFold, hidden) => {
    expect(observableFromTaps(lugs)).toEqual({ lugs, twoFold, hidden })
  })

  it('refuses lugs that are no lugs', () => {
    expect(() => observableFromTaps(3)).toThrow(expect.objectContaining({ field: 'lugs' }))
  })
})
