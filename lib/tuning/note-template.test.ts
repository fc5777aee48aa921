import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { NOTE_TEMPLATES, templateInterval } from './note-template'

describe('note templates', () => {
  it.each([
    [12, 14, -5],
    [12, 10, 5],
    [12, 16, -10],
    [12, 12, 0],
    [12, 13, -2],
    [13, 12, 2],
    [10, 13, -7],
  ])('fourths: %i to %i in is %i semitones (common practice: 2 in a perfect fourth)', (from, to, semitones) => {
    expect(templateInterval(from, to, 2.5)).toBe(semitones)
  })

  it('there and back is the same interval', () => {
    const inches = fc.integer({ min: 6, max: 26 })
    fc.assert(
      fc.property(inches, inches, fc.constantFrom(1, 1.5, 2, 2.5), (a, b, perInch) => {
        expect(templateInterval(a, b, perInch) + templateInterval(b, a, perInch)).toBe(0)
      }),
    )
  })

  it('starts a party with fourths', () => {
    expect(NOTE_TEMPLATES[0]).toMatchObject({ id: 'fourths', steps: { semitonesPerInch: 2.5 }, resonantCents: 0 })
    expect(new Set(NOTE_TEMPLATES.map(({ id }) => id)).size).toBe(NOTE_TEMPLATES.length)
  })

  it('refuses metres passed as inches', () => {
    expect(() => templateInterval(0.3048, 14, 2.5)).toThrow(expect.objectContaining({ field: 'diameterIn' }))
  })
})
