import { describe, expect, it } from 'vitest'
import { mostSlackeningNPerM } from './warm-up'

describe('what warming may take off a head', () => {
  it('10 mil, 10 K: up to 240 N/m (from memory)', () => {
    expect(mostSlackeningNPerM([10], 10)).toBeCloseTo(240, 10)
  })

  it('goes with the thickness of all plies and with the warming; cooling tightens', () => {
    expect(mostSlackeningNPerM([7, 7], 10)).toBeCloseTo(240 * 1.4, 10)
    expect(mostSlackeningNPerM([10], 25)).toBeCloseTo(600, 10)
    expect(mostSlackeningNPerM([10], -5)).toBeCloseTo(-120, 10)
  })

  it('refuses kelvin on the absolute scale, and film that is none', () => {
    expect(() => mostSlackeningNPerM([10], 293.15)).toThrow(expect.objectContaining({ field: 'warmingK' }))
    expect(() => mostSlackeningNPerM([10], Number.NaN)).toThrow(expect.objectContaining({ field: 'warmingK' }))
    expect(() => mostSlackeningNPerM([], 10)).toThrow(expect.objectContaining({ field: 'plyMils' }))
  })
})
