import { describe, expect, it } from 'vitest'
import { evenTicks, tapTicks, tensionPlace, tensionTicks } from './calibration-axis'

const span = { fromNPerM: 1000, toNPerM: 4000 }

describe('the axis of a calibration', () => {
  it('is logarithmic: a tension and its double lie as far apart everywhere', () => {
    expect(tensionPlace(span, 2000)).toBeCloseTo(0.5, 12)
    expect(tensionPlace(span, 8000)).toBeCloseTo(1.5, 12)
  })

  it('marks round tensions within its ends only', () => {
    expect(tensionTicks(span).map(({ words }) => words)).toEqual(['1', '1.5', '2', '3', '4'])
  })

  it.each([
    [48, 91, 6, [50, 60, 70, 80, 90]],
    [0, 3, 6, [0, 1, 2, 3]],
    [180.4, 361, 6, [200, 250, 300, 350]],
  ])('marks round numbers from %d to %d', (from, to, most, ticks) => {
    expect(evenTicks(from, to, most)).toEqual(ticks)
  })

  it('marks a head’s taps where its tensions lie, rising', () => {
    const ticks = tapTicks(span, { diameterIn: 12, depthIn: 8, plyMils: [10], coatingGPerM2: 0 })
    // 12×8 in, 10 mil: 255.32 Hz at 2000 N/m, so 180.5 Hz at 1000 (derived: pitch goes as the root of tension).
    expect(ticks.map(({ words }) => words)).toEqual(['200', '250', '300', '350'])
    expect(ticks[1]?.at).toBeCloseTo(Math.log((2000 * (250 / 255.32) ** 2) / 1000) / Math.log(4), 4)
    expect(ticks.every(({ at }, i) => at > (ticks[i - 1]?.at ?? 0))).toBe(true)
  })

  it('marks nothing for a head that cannot be', () => {
    expect(tapTicks(span, { diameterIn: 0.3, depthIn: 8, plyMils: [10], coatingGPerM2: 0 })).toEqual([])
  })
})
