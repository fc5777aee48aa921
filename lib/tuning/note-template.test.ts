import { describe, expect, it } from 'vitest'
import { NOTE_TEMPLATES, requireTemplate } from './note-template'
import type { NoteTemplate } from './note-template'

const [fourths] = NOTE_TEMPLATES
if (!fourths) throw new Error('no templates')

describe('note templates', () => {
  it('start a party with fourths: 5 semitones for 2 in (common practice)', () => {
    expect(fourths).toMatchObject({
      id: 'fourths',
      steps: { kind: 'per-inch', semitonesPerInch: 2.5 },
      resonantCents: 0,
    })
  })

  it('have ids of their own, and each is one that is allowed', () => {
    expect(new Set(NOTE_TEMPLATES.map(({ id }) => id)).size).toBe(NOTE_TEMPLATES.length)
    for (const template of NOTE_TEMPLATES) expect(() => requireTemplate(template)).not.toThrow()
  })

  it('cover every kind of step', () => {
    const kinds = new Set(NOTE_TEMPLATES.map(({ steps }) => steps.kind))
    expect(kinds).toEqual(new Set(['per-inch', 'per-pair', 'equal-feel', 'free']))
  })

  it.each<[string, Partial<NoteTemplate>]>([
    ['semitonesPerInch', { steps: { kind: 'per-inch', semitonesPerInch: Number.NaN } }],
    ['semitonesPerInch', { steps: { kind: 'per-inch', semitonesPerInch: -1 } }],
    ['semitones', { steps: { kind: 'per-pair', semitones: [] } }],
    ['semitones', { steps: { kind: 'per-pair', semitones: [5, Number.POSITIVE_INFINITY] } }],
    ['semitones', { steps: { kind: 'per-pair', semitones: [25] } }],
    ['kickBelowLowestTom', { kickBelowLowestTom: [5, 7.5] }],
    ['resonantCents', { resonantCents: 1300 }],
  ])('refuse nonsense, naming %s', (field, change) => {
    expect(() => requireTemplate({ ...fourths, ...change })).toThrow(expect.objectContaining({ field }))
  })
})
