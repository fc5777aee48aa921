import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { AcousticsError } from './acoustics-error'
import { beatsPerSecond, centsBetween, nearestNote, noteFrequencyHz, shiftByCents } from './note'

const anyNote = fc.record({
  semitone: fc.integer({ min: 20, max: 100 }),
  cents: fc.double({ min: -49, max: 49, noNaN: true }),
})
const anyReference = fc.double({ min: 415, max: 466, noNaN: true })

describe('notes and frequencies', () => {
  it.each([
    ['A4 is 440 Hz (ISO 16:1975, published)', 69, 440],
    ['E2 82.4069 Hz (derived)', 40, 82.4069],
    ['D3 146.8324 Hz (derived)', 50, 146.8324],
    ['A2 110 Hz (derived)', 45, 110],
  ])('%s', (_, semitone, hz) => {
    expect(noteFrequencyHz({ semitone, cents: 0 })).toBeCloseTo(hz, 4)
  })

  it('453 Hz over 440 Hz is 50.4 cents (McGill MUMT 307 notes, published)', () => {
    expect(centsBetween(440, 453)).toBeCloseTo(50.4, 1)
  })

  it('a just fourth 4/3 is 498.045 cents (derived)', () => {
    expect(centsBetween(3, 4)).toBeCloseTo(498.045, 3)
  })

  it('438 with 442 Hz beat 4 times a second (McGill MUMT 307 notes, published)', () => {
    expect(beatsPerSecond(438, 442)).toBe(4)
    expect(beatsPerSecond(442, 438)).toBe(4)
  })

  it('follows the party reference: A4 is the reference itself', () => {
    expect(noteFrequencyHz({ semitone: 69, cents: 0 }, 442)).toBe(442)
    expect(nearestNote(442, 442)).toEqual({ semitone: 69, cents: 0 })
  })

  it('round trip: a note to Hz and back', () => {
    fc.assert(
      fc.property(anyNote, anyReference, (note, referenceHz) => {
        const back = nearestNote(noteFrequencyHz(note, referenceHz), referenceHz)
        expect(back.semitone).toBe(note.semitone)
        expect(back.cents).toBeCloseTo(note.cents, 8)
      }),
    )
  })

  it('cents are antisymmetric, and shifting by them arrives', () => {
    const hz = fc.double({ min: 20, max: 1000, noNaN: true })
    fc.assert(
      fc.property(hz, hz, (from, to) => {
        expect(centsBetween(from, to)).toBeCloseTo(-centsBetween(to, from), 9)
        expect(shiftByCents(from, centsBetween(from, to))).toBeCloseTo(to, 8)
      }),
    )
  })

  it.each([
    ['semitone', () => noteFrequencyHz({ semitone: 50.5, cents: 0 })],
    ['semitone', () => noteFrequencyHz({ semitone: -1, cents: 0 })],
    ['cents', () => noteFrequencyHz({ semitone: 50, cents: Number.NaN })],
    ['referenceHz', () => noteFrequencyHz({ semitone: 50, cents: 0 }, 414.9)],
    ['referenceHz', () => noteFrequencyHz({ semitone: 50, cents: 0 }, 466.1)],
    ['frequencyHz', () => nearestNote(0)],
    ['frequencyHz', () => nearestNote(-110)],
    ['toHz', () => centsBetween(110, Number.POSITIVE_INFINITY)],
    ['fromHz', () => centsBetween(0, 110)],
  ])('refuses nonsense, naming %s', (field, act) => {
    expect(act).toThrow(AcousticsError)
    expect(act).toThrow(expect.objectContaining({ field }))
  })
})
