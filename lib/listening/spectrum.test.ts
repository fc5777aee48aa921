import { describe, expect, test } from 'vitest'
import { peakOffset, spectrumOf } from './spectrum'

describe('peak between bins', () => {
  test('published (J. O. Smith, Spectral Audio Signal Processing 5.7): −10, −6, −8 dB peak a sixth of a bin to the right', () => {
    expect(peakOffset(-10, -6, -8)).toBeCloseTo(1 / 6, 12)
  })

  test('derived: three levels of any parabola give back its top', () => {
    for (const top of [-0.5, -0.3, 0, 0.2, 0.49]) {
      const level = (bin: number) => -3 - 7 * (bin - top) ** 2
      expect(peakOffset(level(-1), level(0), level(1))).toBeCloseTo(top, 12)
    }
  })

  test('levels in a line have no top to move to', () => {
    expect(peakOffset(-4, -4, -4)).toBe(0)
  })
})

describe('spectrum', () => {
  test('derived: the sum Σ x·e^{−2πi·kn/size} written out, of fewer samples than bins', () => {
    const sound = [0.3, -1, 0.25, 0.5, 0.125]
    const { re, im, size, count } = spectrumOf(sound, 8)
    expect([size, count]).toEqual([8, 5])
    for (let k = 0; k <= 4; k++) {
      const angle = (n: number) => (-2 * Math.PI * k * n) / 8
      expect(re[k]).toBeCloseTo(
        sound.reduce((sum, x, n) => sum + x * Math.cos(angle(n)), 0),
        12,
      )
      expect(im[k]).toBeCloseTo(
        sound.reduce((sum, x, n) => sum + x * Math.sin(angle(n)), 0),
        12,
      )
    }
  })

  test('one sound leaves nothing behind for the next', () => {
    spectrumOf([1, 1, 1, 1, 1, 1, 1, 1], 8)
    expect([...spectrumOf([1], 8).re]).toEqual([1, 1, 1, 1, 1])
  })
})
