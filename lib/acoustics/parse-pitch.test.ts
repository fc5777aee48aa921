import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { noteName } from './note-name'
import { parsePitch } from './parse-pitch'

describe('reading a typed pitch', () => {
  it.each([
    ['D3', 'en', 50, 0],
    ['Eb3', 'en', 51, 0],
    ['f#2', 'en', 42, 0],
    [' A2 + 20 cents ', 'en', 45, 20],
    ['A2 −15', 'en', 45, -15],
    ['B3', 'en', 59, 0],
    ['Bb3', 'en', 58, 0],
    ['Cb4', 'en', 59, 0],
    ['B3', 'de', 58, 0],
    ['Bb3', 'de', 58, 0],
    ['H3', 'de', 59, 0],
    ['Fis2', 'de', 42, 0],
    ['Es3', 'de', 51, 0],
    ['ré3', 'fr', 50, 0],
    ['RE3', 'fr', 50, 0],
    ['fa dièse 2', 'fr', 42, 0],
    ['si bémol 2', 'fr', 46, 0],
    ['D3', 'fr', 50, 0],
  ] as const)('%s (%s) is semitone %i with %i cents', (text, locale, semitone, cents) => {
    expect(parsePitch(text, { locale })).toMatchObject({ asTyped: 'note', note: { semitone, cents } })
  })

  it.each(['146.8', '146,8', '146.8 Hz', '146.8hz'])('%s is a frequency', (text) => {
    const pitch = parsePitch(text)
    expect(pitch).toMatchObject({ asTyped: 'Hz', frequencyHz: 146.8, note: { semitone: 50 } })
    // 146.8 Hz lies 0.4 cents under D3 at 146.8324 Hz.
    expect(pitch?.note.cents).toBeCloseTo(-0.38, 1)
  })

  it('keeps the party reference', () => {
    expect(parsePitch('A4', { referenceHz: 442 })?.frequencyHz).toBe(442)
  })

  it.each([
    '',
    'D',
    'H3',
    'X3',
    'D33',
    '0',
    '-146.8',
    '9',
    '99999',
    'NaN',
    'Infinity',
    '1e3',
    'D3 +2000',
    '12in',
    'do3',
  ])('does not guess at "%s"', (text) => {
    expect(parsePitch(text)).toBeNull()
  })

  it('round trip: every name it writes is the name it reads, in each locale and spelling', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 16, max: 110 }),
        fc.constantFrom('en' as const, 'de' as const, 'fr' as const),
        fc.constantFrom('sharp' as const, 'flat' as const),
        (semitone, locale, spelling) => {
          expect(parsePitch(noteName(semitone, locale, spelling), { locale })?.note).toEqual({ semitone, cents: 0 })
        },
      ),
    )
  })
})
