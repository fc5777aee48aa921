import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { hearingDose, hearingMinutes } from './hearing'

describe('the recommended limit of a day’s noise', () => {
  // Published: NIOSH 98-126, table 1-1.
  it.each([
    [85, 480],
    [94, 60],
    [100, 15],
  ])('%i dBA: %i min (NIOSH 98-126, published)', (level, minutes) => {
    expect(hearingMinutes(level)).toBeCloseTo(minutes, 10)
  })

  it('2 h at 94, 1 h at 97 and a quarter of an hour at 100 dBA are 500 % (derived)', () => {
    const dose = hearingDose([
      { levelDba: 94, minutes: 120 },
      { levelDba: 97, minutes: 60 },
      { levelDba: 100, minutes: 15 },
    ])
    expect(dose).toBeCloseTo(5, 10)
  })

  it('3 dB more halves the time; its own minutes are the whole dose', () => {
    fc.assert(
      fc.property(fc.double({ min: 70, max: 130, noNaN: true }), (level) => {
        expect(hearingMinutes(level + 3) / hearingMinutes(level)).toBeCloseTo(1 / 2, 10)
        const minutes = Math.min(1440, hearingMinutes(level))
        expect(hearingDose([{ levelDba: level, minutes }])).toBeLessThanOrEqual(1 + 1e-12)
      }),
    )
    expect(hearingDose([])).toBe(0)
  })

  it.each([Number.NaN, -3, 0.02, Number.POSITIVE_INFINITY])('refuses a level of %f', (level) => {
    expect(() => hearingMinutes(level)).toThrow(expect.objectContaining({ field: 'levelDba' }))
  })

  it('refuses minutes that no day has', () => {
    expect(() => hearingDose([{ levelDba: 90, minutes: 7200 }])).toThrow(expect.objectContaining({ field: 'minutes' }))
  })
})
