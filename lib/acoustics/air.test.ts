import { describe, expect, it } from 'vitest'
import { airDensityKgPerM3, soundSpeedMPerS } from './air'

describe('air', () => {
  it('20 °C: 343.2 m/s (ISO 9613-1, published) and 1.2041 kg/m³ (published)', () => {
    expect(soundSpeedMPerS(20)).toBeCloseTo(343.2, 10)
    expect(airDensityKgPerM3(20)).toBeCloseTo(1.2041, 10)
  })

  it('0 °C: 331.3 m/s and 1.293 kg/m³ (dry air at 0 °C and 101 325 Pa, published tables)', () => {
    expect(soundSpeedMPerS(0)).toBeCloseTo(331.3, 1)
    expect(airDensityKgPerM3(0)).toBeCloseTo(1.292, 2)
  })

  it('warm air is thinner and faster; ρ·c² stays what it is (ideal gas: γ·P)', () => {
    expect(airDensityKgPerM3(35)).toBeLessThan(airDensityKgPerM3(5))
    expect(soundSpeedMPerS(35)).toBeGreaterThan(soundSpeedMPerS(5))
    // γP at sea level: 1.4 · 101 325 Pa, within 0.1 %.
    for (const t of [-10, 20, 40]) {
      expect((airDensityKgPerM3(t) * soundSpeedMPerS(t) ** 2) / (1.4 * 101_325)).toBeCloseTo(1, 3)
    }
  })

  it.each([Number.NaN, 300, -100])('refuses a stage at %f °C', (temperatureC) => {
    expect(() => airDensityKgPerM3(temperatureC)).toThrow(expect.objectContaining({ field: 'temperatureC' }))
  })
})
