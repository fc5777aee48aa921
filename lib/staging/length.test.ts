import { describe, expect, it } from 'vitest'
import { formatLength, lengthBound, parseLength } from './length'

describe('a typed length', () => {
  // Feet and inches by their definition, 0.3048 m and 0.0254 m.
  it.each([
    ['8 ft', 2.4384],
    ['2.4 m', 2.4],
    ['2,4 m', 2.4],
    ['7\'10"', 2.3876],
    ['7′ 10″', 2.3876],
    ['7 ft 10 in', 2.3876],
    ["8'", 2.4384],
    ['20 in', 0.508],
    ['240 cm', 2.4],
    ['600 mm', 0.6],
    ['6.5ft', 1.9812],
    [' 12 METRES ', 12],
  ])('%s is read', (text, metres) => {
    expect(parseLength(text, 'metric')).toBeCloseTo(metres, 10)
    expect(parseLength(text, 'imperial')).toBeCloseTo(metres, 10)
  })

  it('a bare number goes by the units of the party', () => {
    expect(parseLength('8', 'metric')).toBe(8)
    expect(parseLength('8', 'imperial')).toBeCloseTo(2.4384, 10)
  })

  it.each(['', 'wide', '8 yd', '-2 m', '7\'12"', '2.4.1 m', '1e3', 'm', '8 ft m'])('"%s" is refused', (text) => {
    expect(parseLength(text, 'metric')).toBeNull()
  })
})

describe('a length in words', () => {
  it('is a bound in both units', () => {
    // 1 m is 39.37 in: 3 ft 3 in to the nearest inch.
    expect(lengthBound(1)).toBe('1 m (3\'3")')
  })

  it('is metric to the centimetre', () => {
    expect(formatLength(2.4384, 'metric')).toBe('2.44 m')
    expect(formatLength(10, 'metric')).toBe('10 m')
    expect(formatLength(0, 'metric')).toBe('0 m')
  })

  it('is imperial to the inch, carrying twelve inches into the foot', () => {
    expect(formatLength(2.4384, 'imperial')).toBe('8 ft')
    expect(formatLength(2.3876, 'imperial')).toBe('7\'10"')
    expect(formatLength(0.508, 'imperial')).toBe('1\'8"')
    expect(formatLength(0.254, 'imperial')).toBe('10 in')
    expect(formatLength(2.43, 'imperial')).toBe('8 ft')
  })
})
