import { describe, expect, it } from 'vitest'
import { headRelationWords, intervalName, withArticle } from './interval-name'

describe('an interval in words', () => {
  it.each<[number, string]>([
    [0, 'same note'],
    [3, 'same note'],
    [500, 'fourth'],
    [-500, 'fourth'],
    // A just fourth, 4/3, is 498.045 cents.
    [498.045, 'fourth'],
    [-700, 'fifth'],
    [314, 'minor third +14 cents'],
    [-286, 'minor third −14 cents'],
    [1200, 'octave'],
    [1900, 'octave and fifth'],
    [2400, 'two octaves'],
  ])('%s cents is a %s', (cents, name) => {
    expect(intervalName(cents)).toBe(name)
  })
})

describe('an interval with its article', () => {
  it.each([
    ['fourth', 'a fourth'],
    ['octave and fifth', 'an octave and fifth'],
    ['two octaves', 'two octaves'],
    ['same note +14 cents', 'the same note +14 cents'],
  ])('%s', (name, words) => {
    expect(withArticle(name)).toBe(words)
  })
})

describe('the relation of two heads in words', () => {
  it.each<[number, string]>([
    [0, 'both heads at the same pitch'],
    [300, 'resonant a minor third higher'],
    [-200, 'resonant a tone lower'],
    [30, 'resonant 30 cents higher'],
    [-1200, 'resonant an octave lower'],
    [350, 'resonant a major third −50 cents higher'],
  ])('%s cents', (cents, words) => {
    expect(headRelationWords(cents)).toBe(words)
  })
})
