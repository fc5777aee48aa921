import { describe, expect, it } from 'vitest'
import { parseReading } from './reading-limits'

describe('parseReading', () => {
  it.each([
    ['251.5', 'Hz', 251.5],
    [' 251,5 ', 'Hz', 251.5],
    ['75', 'gauge', 75],
    ['.5', 'gauge', 0.5],
    ['-12', 'cents', -12],
    ['−12', 'cents', -12],
    ['+8', 'cents', 8],
  ] as const)('reads %s %s', (typed, unit, value) => {
    expect(parseReading(typed, unit)).toEqual({ value, fault: null })
  })

  it.each(['', 'about 250', '2 5 1', '1,2,3', '251.5 Hz', 'NaN', 'Infinity', '1e3'])('does not read "%s"', (typed) => {
    expect(parseReading(typed, 'Hz')).toEqual({ value: null, fault: 'Write a number, such as 251.5.' })
  })

  it('says what is allowed when a number cannot be', () => {
    expect(parseReading('2515', 'Hz').fault).toBe('2515 cannot be: from 20 to 2000 Hz.')
    expect(parseReading('-1', 'gauge').fault).toBe('-1 cannot be: from 0 to 200 on the gauge.')
    expect([parseReading('20', 'Hz').value, parseReading('2000', 'Hz').value]).toEqual([20, 2000])
  })
})
