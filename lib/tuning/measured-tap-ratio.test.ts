import { describe, expect, it } from 'vitest'
import type { MeasuredPitch } from './measured-tap-ratio'
import { measuredTapRatio, tapRatioErrorWords, tapRatioWords } from './measured-tap-ratio'

const heard = (medianHz: number, halfHz: number, count = 3): MeasuredPitch => ({ count, medianHz, halfHz })

describe('tap over note, measured', () => {
  it('is 1.744 on a 12 × 8 in drum with 10 mil heads at 2000 N/m, tap 255.32 over note 146.37 Hz (derived)', () => {
    const measured = measuredTapRatio(heard(255.32, 0.3), heard(146.37, 0.2))
    if (measured.outcome !== 'measured') throw new Error(measured.why)
    expect(measured.ratio).toBeCloseTo(1.744, 3)
    // Shares 0.3/255.32 = 0.001175 and 0.2/146.37 = 0.001366; root of the squares' sum 0.001802; times 1.74435.
    expect(measured.half).toBeCloseTo(0.003144, 5)
    expect([tapRatioWords(measured), tapRatioErrorWords(measured)]).toEqual(['1.744', '± 0.003'])
  })

  it('wants three of each', () => {
    const few = { outcome: 'unsure', why: 'too-few' }
    expect(measuredTapRatio(null, heard(146, 0.2))).toEqual(few)
    expect(measuredTapRatio(heard(255, 0.2), null)).toEqual(few)
    expect(measuredTapRatio(heard(255, 0.2, 2), heard(146, 0.2))).toEqual(few)
    expect(measuredTapRatio(heard(255, 0.2), heard(146, 0.2, 2))).toEqual(few)
  })

  it('is not named when the taps differ by more than the model’s own 2 % (published)', () => {
    expect(measuredTapRatio(heard(250, 4.9), heard(146, 0))).toMatchObject({ outcome: 'measured' })
    expect(measuredTapRatio(heard(250, 5.1), heard(146, 0))).toEqual({ outcome: 'unsure', why: 'differ' })
    expect(measuredTapRatio(heard(250, 0), heard(146, 3))).toEqual({ outcome: 'unsure', why: 'differ' })
  })

  it('is not named where no drum has it', () => {
    for (const [tap, note] of [
      [146, 146],
      [400, 146],
      [Number.NaN, 146],
    ] as const)
      expect(measuredTapRatio(heard(tap, 0.1), heard(note, 0.1))).toEqual({ outcome: 'unsure', why: 'impossible' })
  })

  it('is written to the place that is known', () => {
    expect(tapRatioWords({ ratio: 1.7239, half: 0.02 })).toBe('1.72')
    expect(tapRatioErrorWords({ half: 0.02 })).toBe('± 0.02')
    expect(tapRatioErrorWords({ half: 0.0001 })).toBe('± 0.001')
  })
})
