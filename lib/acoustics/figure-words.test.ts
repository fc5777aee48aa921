import { describe, expect, it } from 'vitest'
import { figureWords, hertz, kilonewtons } from './figure-words'

describe('figures in words', () => {
  it('are in the unit that reads best, to four figures', () => {
    expect(figureWords(254e-6, 'm')).toBe('254 µm')
    expect(figureWords(0.1524, 'm')).toBe('152.4 mm')
    expect(figureWords(98e6, 'Pa')).toBe('98 MPa')
    expect(figureWords(0.35306, 'kg/m²')).toBe('0.3531 kg/m²')
    expect(figureWords(2.404825557696, '')).toBe('2.405')
    expect(figureWords(6, '')).toBe('6')
    expect(figureWords(-5.04, '°C')).toBe('−5.04 °C')
  })

  it('of pitch are to the tenth, or whole when high', () => {
    expect([hertz(146.8324), hertz(82), hertz(1046.5)]).toEqual(['146.8', '82.0', '1047'])
  })

  it('of film tension are in kN/m', () => {
    expect(kilonewtons(2011)).toBe('2.01')
  })
})
