import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { drumModel } from './drum-model'
import { defaultTensionRange, DRUM_ROLES, middleTensionNPerM, rangePosition } from './tension-range'

const range = { slackNPerM: 500, chokedNPerM: 4000 }

describe('playable range', () => {
  it.each([
    [499, 'slack'],
    [500, 'low'],
    [1415, 'middle'],
    [3000, 'high'],
    [4000, 'high'],
    [4001, 'choked'],
  ] as const)('%i N/m in 500 to 4000 is %s', (tensionNPerM, zone) => {
    expect(rangePosition(tensionNPerM, range).zone).toBe(zone)
  })

  it('is even in cents: the middle is the geometric mean, 500 and 4000 give 1414.2', () => {
    expect(middleTensionNPerM(range)).toBeCloseTo(1414.21, 2)
    expect(rangePosition(middleTensionNPerM(range), range).fraction).toBeCloseTo(0.5, 12)
    expect(rangePosition(1000, range).fraction).toBeCloseTo(1 / 3, 12)
  })

  it('rises with tension', () => {
    const tension = fc.double({ min: 10, max: 20_000, noNaN: true })
    fc.assert(
      fc.property(tension, tension, (a, b) => {
        fc.pre(a * (1 + 1e-9) < b)
        expect(rangePosition(a, range).fraction).toBeLessThan(rangePosition(b, range).fraction)
      }),
    )
  })

  // Common sizes and notes of the trade (common practice); the defaults themselves are from memory.
  it.each([
    ['tom', 10, 7, [10], 196],
    ['tom', 12, 8, [10], 146.83],
    ['tom', 12, 8, [7, 7], 130.81],
    ['floor-tom', 16, 14, [10], 82.41],
    ['kick', 22, 16, [10], 49],
    ['snare', 14, 6.5, [10], 196],
  ] as const)('a %s of %i×%f in with plies %j at %f Hz is playable', (role, inches, depthIn, plyMils, noteHz) => {
    const batter = { plyMils, coatingKgPerM2: 0 }
    const tensionNPerM = drumModel({
      ...{ diameterM: inches * 0.0254, depthM: depthIn * 0.0254, batter, relationCents: 0, ported: role === 'kick' },
      resonant: { plyMils: role === 'snare' ? [3] : [10], coatingKgPerM2: 0 },
    }).batterNPerM(noteHz)
    expect(['low', 'middle', 'high']).toContain(rangePosition(tensionNPerM, defaultTensionRange(role)).zone)
  })

  it('has a range for every role, and one of its own for the snare side', () => {
    for (const role of DRUM_ROLES) {
      const { slackNPerM, chokedNPerM } = defaultTensionRange(role)
      expect(slackNPerM).toBeLessThan(chokedNPerM)
    }
    expect(defaultTensionRange('snare', 'resonant').chokedNPerM).toBeLessThan(defaultTensionRange('snare').chokedNPerM)
  })

  it('refuses a range that is upside down or no number', () => {
    expect(() => rangePosition(1000, { slackNPerM: 2000, chokedNPerM: 2000 })).toThrow(
      expect.objectContaining({ field: 'range' }),
    )
    expect(() => rangePosition(1000, { slackNPerM: Number.NaN, chokedNPerM: 2000 })).toThrow(RangeError)
  })
})
