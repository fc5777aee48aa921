import { describe, expect, it } from 'vitest'
import { noteName } from './note-name'

describe('note names by locale', () => {
  it.each([
    ['en', 'sharp', 61, 'C♯4'],
    ['en', 'flat', 51, 'E♭3'],
    ['en', 'sharp', 59, 'B3'],
    ['de', 'sharp', 61, 'Cis4'],
    ['de', 'flat', 51, 'Es3'],
    ['de', 'flat', 56, 'As3'],
    ['de', 'sharp', 59, 'H3'],
    ['de', 'sharp', 58, 'B3'],
    ['fr', 'sharp', 50, 'ré3'],
    ['fr', 'flat', 58, 'si♭3'],
  ] as const)('%s, %s: %i is %s', (locale, spelling, semitone, name) => {
    expect(noteName(semitone, locale, spelling)).toBe(name)
  })

  it('turns the octave at C, not at A', () => {
    expect([noteName(59), noteName(60), noteName(0)]).toEqual(['B3', 'C4', 'C-1'])
  })

  it('refuses a semitone that is no whole number', () => {
    expect(() => noteName(60.5)).toThrow(expect.objectContaining({ field: 'semitone' }))
  })
})
