import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { inchFractions, millimetresOf, parseSize } from './size'

describe('a typed size', () => {
  it.each([
    ['12', 12],
    [' 12 ', 12],
    ['12"', 12],
    ['12”', 12],
    ["12''", 12],
    ['12 in', 12],
    ['12 Inches', 12],
    ['5.5', 5.5],
    ['5,5 in', 5.5],
    ['5½', 5.5],
    ['5 ½"', 5.5],
    ['6 1/4', 6.25],
    ['6-3/4 in', 6.75],
    ['5 2/4', 5.5],
    // 12 in is 304.8 mm, 5½ in 139.7, 14 in 355.6, 22 in 558.8.
    ['305 mm', 12],
    ['304.8mm', 12],
    ['304 mm', 12],
    ['30.5 cm', 12],
    ['140 mm', 5.5],
    ['356 MM', 14],
    ['559 mm', 22],
  ])('%s is %s in', (text, inches) => {
    expect(parseSize(text)).toEqual({ inches, problem: null })
  })

  it.each(['', 'big', '12 ft', '-12', '1e1', '12 1/0', '12 x 8', '12 m', '12345', '½'])('"%s" is not read', (text) => {
    expect(parseSize(text)).toEqual({ inches: null, problem: expect.stringContaining('such as 12') as string })
  })

  it('that is no quarter inch is refused with the sizes beside it', () => {
    expect(parseSize('12.3').problem).toBe('sizes are whole or quarter inches: 12¼ or 12½ in, not 12.3')
    expect(parseSize('5 1/3').problem).toContain('5¼ or 5½ in')
    // 11¾ in is 298.45 mm, 12 in 304.8 mm.
    expect(parseSize('300 mm').problem).toBe('300 mm is no whole or quarter inch: 11¾ in is 298 mm, 12 in is 305 mm')
  })

  it('in whole millimetres finds every quarter inch again, and inches written out do too', () => {
    fc.assert(
      fc.property(fc.integer({ min: 12, max: 112 }), (quarters) => {
        const inches = quarters / 4
        expect(parseSize(`${Math.round(inches * 25.4)} mm`).inches).toBe(inches)
        expect(parseSize(inchFractions(inches)).inches).toBe(inches)
      }),
    )
  })
})

describe('a size in words', () => {
  it('writes quarters as the trade does', () => {
    expect([12, 5.5, 6.25, 0.75, 12.3].map(inchFractions)).toEqual(['12', '5½', '6¼', '¾', '12.3'])
  })

  it('is 25.4 mm an inch', () => {
    expect(millimetresOf(12)).toBeCloseTo(304.8, 9)
  })
})
