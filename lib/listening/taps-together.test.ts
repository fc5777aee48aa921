import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { tapRandom } from './tap-random'
import { tapsAgree, tapsTogether } from './taps-together'

const taps = (errorHz: number, ...pitches: number[]) =>
  pitches.map((pitchHz) => ({ pitchHz, standardErrorHz: errorHz }))

describe('several taps together', () => {
  it('are nothing without a tap', () => {
    expect(tapsTogether([])).toBeNull()
  })

  it('know of one tap its own error only: 1.96 standard errors (published)', () => {
    expect(tapsTogether(taps(0.1, 250))).toEqual({
      ...{ count: 1, medianHz: 250, lowestHz: 250, highestHz: 250 },
      halfHz: expect.closeTo(0.196, 12) as number,
    })
  })

  it('take the middle of three, and its interval by Student’s t: 4.303 · 1.2533 · s/√3 (derived)', () => {
    // 249, 250, 252: mean 250.333, squares 1.7778 + 0.1111 + 2.7778 = 4.6667, s = √2.33333 = 1.527525.
    const three = tapsTogether(taps(0.01, 252, 249, 250))
    expect(three).toMatchObject({ count: 3, medianHz: 250, lowestHz: 249, highestHz: 252 })
    expect(three?.halfHz).toBeCloseTo((4.303 * 1.2533 * 1.527525) / 1.7320508, 4)
  })

  it('take the middle of the two middle ones of four', () => {
    expect(tapsTogether(taps(0.01, 100, 104, 101, 109))?.medianHz).toBe(102.5)
  })

  it('are not surer than each tap’s own fit, however well they agree: 12.706 · 1.2533 · 0.5/√2 (derived)', () => {
    expect(tapsTogether(taps(0.5, 200, 200))?.halfHz).toBeCloseTo((12.706 * 1.2533 * 0.5) / Math.SQRT2, 9)
  })

  it('hold the true pitch in 19 of 20 rounds of normal scatter or more, for 2 to 14 taps', () => {
    const random = tapRandom(5)
    for (const count of [2, 3, 4, 5, 8, 14]) {
      const rounds = Array.from({ length: 4000 }, () =>
        tapsTogether(taps(0, ...Array.from({ length: count }, () => 250 + random.normal()))),
      )
      const held = rounds.filter((round) => round && Math.abs(round.medianHz - 250) <= round.halfHz)
      // Three standard errors of a share near 0.95 in 4000 rounds are 0.0103.
      expect(held.length / rounds.length).toBeGreaterThan(0.95 - 0.0103)
    }
  })

  it('agree up to a quarter tone, a factor of 2^(50/1200) (derived)', () => {
    const agree = (...hz: number[]) => {
      const together = tapsTogether(taps(0.1, ...hz))
      return together && tapsAgree(together)
    }
    expect(agree(250)).toBe(true)
    expect(agree(250, 256, 250 * 2 ** (49 / 1200))).toBe(true)
    expect(agree(250, 252, 250 * 2 ** (51 / 1200))).toBe(false)
    expect(agree(146.4, 255.1, 146.4)).toBe(false)
  })

  it('do not hang on the order, and scale with the pitch', () => {
    const pitches = fc.array(fc.double({ min: 50, max: 600, noNaN: true }), { minLength: 2, maxLength: 14 })
    fc.assert(
      fc.property(pitches, fc.double({ min: 0.5, max: 3, noNaN: true }), (hz, factor) => {
        const once = tapsTogether(taps(0.2, ...hz))
        const turned = tapsTogether(taps(0.2, ...[...hz].reverse()))
        const scaled = tapsTogether(taps(0.2 * factor, ...hz.map((pitch) => pitch * factor)))
        expect(turned?.medianHz).toBe(once?.medianHz)
        expect(scaled?.medianHz).toBeCloseTo((once?.medianHz ?? 0) * factor, 6)
        expect(scaled?.halfHz).toBeCloseTo((once?.halfHz ?? 0) * factor, 6)
      }),
      { numRuns: 200 },
    )
  })

  it('refuse what is no pitch and no error', () => {
    for (const pitch of [Number.NaN, 0, -1, Infinity]) expect(() => tapsTogether(taps(0.1, pitch))).toThrow(/pitchHz/)
    for (const error of [Number.NaN, -0.1, Infinity])
      expect(() => tapsTogether(taps(error, 250))).toThrow(/standardErrorHz/)
  })
})
