import { describe, expect, test } from 'vitest'
import { LOW_RATE_STEP, lowRate, lowRateGain } from './low-rate'

describe('the sound at an eighth of its rate', () => {
  test('derived: a damped sinusoid stays one, times the gain that the filter has at its frequency and decay', () => {
    const [decay, angle] = [0.0004, 0.021]
    const samples = Float32Array.from({ length: 4000 }, (_, n) => Math.exp(-decay * n) * Math.cos(angle * n + 0.4))
    const low = lowRate(samples, 100, samples.length)
    const gain = lowRateGain(decay, angle)
    low.forEach((value, i) => {
      const n = 100 + i * LOW_RATE_STEP
      const [size, turn] = [Math.exp(-decay * n), angle * n + 0.4]
      // Float32 samples carry 6·10⁻⁸ each.
      expect(Math.abs(value - size * (gain.re * Math.cos(turn) - gain.im * Math.sin(turn)))).toBeLessThan(1e-6)
    })
  })

  test('what would fold back under 1 kHz is 55 dB down', () => {
    for (const rateHz of [44_100, 48_000]) {
      const low = rateHz / LOW_RATE_STEP
      for (let hz = low - 1000; hz <= rateHz / 2; hz += 10) {
        const gain = lowRateGain(0, (2 * Math.PI * hz) / rateHz)
        if (Math.abs(hz - low * Math.round(hz / low)) <= 1000) {
          expect(20 * Math.log10(Math.hypot(gain.re, gain.im))).toBeLessThan(-55)
        }
      }
    }
  })

  test('nothing from outside the stretch comes in', () => {
    const samples = new Float32Array(1000)
    samples[99] = 1
    samples[600] = 1
    expect(lowRate(samples, 100, 600).every((value) => value === 0)).toBe(true)
    expect(lowRate(samples, 100, 120)).toHaveLength(0)
  })
})
