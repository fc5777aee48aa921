import { describe, expect, it } from 'vitest'
import type { EntryInput } from './kit'
import { entryInputSchema } from './kit'
import { fivePieceKit, newDrum, newPiece, usualDrumName } from './kit-defaults'
import type { DrumForm, NoteReader } from './kit-form'
import { drumFormOf, drumFormSchema, formPath, noteText, noteValue, pieceFormOf, pieceFormSchema } from './kit-form'

const english: NoteReader = { locale: 'en', referenceHz: 440 }
const drumForm = (change: (form: DrumForm) => void = () => undefined) => {
  const form = drumFormOf(newDrum('tom'), 'en')
  change(form)
  return form
}
const problems = (form: DrumForm, reader = english) => {
  const result = drumFormSchema(reader).safeParse(form)
  return Object.fromEntries(result.error?.issues.map((issue) => [issue.path.join('.'), issue.message]) ?? [])
}
const specOf = (form: DrumForm, reader = english) =>
  (drumFormSchema(reader).parse(form) as Extract<EntryInput, { kind: 'drum' }>).spec

describe('the form of a drum', () => {
  it('reads what is typed: sizes, plies, numbers, notes', () => {
    const spec = specOf(
      drumForm(({ spec }) => {
        spec.diameterIn = '330 mm'
        spec.depthIn = '6 1/2"'
        spec.batter = { ...spec.batter, plyMils: '7 + 7', coatingGPerM2: '45,5', gauge: '' }
        spec.resonant.gauge = '74.5'
        spec.note = 'Eb3 +12'
        spec.headRelationCents = '−200'
        spec.measuredTapRatio = '1,72'
        spec.warbleLimitHz = '0,5'
        spec.batter.range = { slackNPerM: '650', chokedNPerM: '4200' }
      }),
    )
    expect(spec).toMatchObject({
      diameterIn: 13,
      depthIn: 6.5,
      batter: { plyMils: [7, 7], coatingGPerM2: 45.5, gauge: null, range: { slackNPerM: 650, chokedNPerM: 4200 } },
      resonant: { gauge: 74.5, range: null },
      note: { semitone: 51, cents: 12 },
      headRelationCents: -200,
      measuredTapRatio: 1.72,
      warbleLimitHz: 0.5,
      insteadOf: null,
    })
  })

  it('names every field at fault at once, in its own words', () => {
    const found = problems(
      drumForm((form) => {
        form.name = ' '
        form.takesOther = true
        form.spec.diameterIn = '300 mm'
        form.spec.depthIn = '2'
        form.spec.batter.plyMils = '1 + 7'
        form.spec.resonant.gauge = 'tight'
        form.spec.note = 'H9'
        form.spec.toleranceCents = ''
        form.spec.measuredTapRatio = '174'
        form.spec.warbleLimitHz = '13'
        form.spec.batter.range = { slackNPerM: '900', chokedNPerM: '' }
        form.spec.resonant.range = { slackNPerM: '3000', chokedNPerM: '900' }
        form.spec.insteadOf = { diameterMinIn: '13', diameterMaxIn: '12', depthMinIn: '7', depthMaxIn: 'deep' }
      }),
    )
    expect(found).toEqual({
      name: 'give a name',
      'spec.diameterIn': '300 mm is no whole or quarter inch: 11¾ in is 298 mm, 12 in is 305 mm',
      'spec.depthIn': 'at least 3 in',
      'spec.batter.plyMils': 'at least 2 mil',
      'spec.batter.range.chokedNPerM': 'write a number',
      'spec.resonant.gauge': 'write a number',
      'spec.resonant.range.chokedNPerM': 'the choked edge lies over the slack edge',
      'spec.measuredTapRatio': 'at most 2.5',
      'spec.warbleLimitHz': 'at most 12 a second',
      'spec.note': 'write a note such as D3, or a frequency such as 146.8 Hz',
      'spec.toleranceCents': 'write a number',
      'spec.insteadOf.depthMaxIn': 'write a size such as 12, 5½, 12" or 305 mm',
    })
  })

  it('forgets the port of a kick that became a tom: a tom with a port would be tuned as one head', () => {
    const form = drumFormOf(newDrum('kick'), 'en')
    expect(specOf(form).ported).toBe(true)
    expect(specOf({ ...form, spec: { ...form.spec, role: 'tom' } }).ported).toBe(false)
  })

  it('asks nothing of a head or a range that is not there', () => {
    const form = drumForm((draft) => {
      draft.hasResonant = false
      draft.takesOther = false
      draft.spec.resonant.plyMils = 'nonsense'
      draft.spec.insteadOf.depthMaxIn = 'nonsense'
    })
    expect(specOf(form)).toMatchObject({ resonant: null, insteadOf: null })
  })

  it('comes back as it went in, for every drum of a five-piece kit and every other kind', () => {
    for (const entry of fivePieceKit()) {
      if (entry.kind !== 'drum') throw new Error('a five-piece kit is drums')
      expect(drumFormSchema(english).parse(drumFormOf(entry, 'en'))).toEqual(entry)
    }
    for (const kind of ['cymbal', 'hardware', 'microphone'] as const) {
      const piece = newPiece(kind)
      if (piece.kind === 'drum') throw new Error('asked for another kind')
      expect(pieceFormSchema().parse(pieceFormOf(piece))).toEqual(piece)
    }
  })
})

describe('a typed note', () => {
  it('is a name or a frequency, in the language and by the reference of the party', () => {
    expect(noteValue('d3', english)).toEqual({ value: { semitone: 50, cents: 0 } })
    expect(noteValue('H2', { locale: 'de', referenceHz: 440 })).toEqual({ value: { semitone: 47, cents: 0 } })
    expect(noteValue('la3', { locale: 'fr', referenceHz: 440 })).toEqual({ value: { semitone: 57, cents: 0 } })
    // 442 over 440 Hz is 1200·log2(442/440) = 7.85 cents.
    expect(noteValue('442 Hz', english)).toEqual({ value: { semitone: 69, cents: 7.85 } })
    expect(noteValue('442', { locale: 'en', referenceHz: 442 })).toEqual({ value: { semitone: 69, cents: 0 } })
    expect(noteValue('D3 +80', english)).toEqual({ value: { semitone: 51, cents: -20 } })
    expect(noteValue('  ', english)).toEqual({ value: null })
  })

  it('reads again what it is shown as', () => {
    for (const note of [
      { semitone: 50, cents: 0 },
      { semitone: 49, cents: -12.34 },
      { semitone: 58, cents: 50 },
    ]) {
      for (const locale of ['en', 'de', 'fr'] as const) {
        const value = noteValue(noteText(note, locale), { locale, referenceHz: 440 })
        const pitch = 'value' in value && value.value ? value.value.semitone + value.value.cents / 100 : null
        expect(pitch).toBeCloseTo(note.semitone + note.cents / 100, 6)
      }
    }
  })
})

describe('the contract of an entry', () => {
  it('takes every default as it is', () => {
    for (const entry of [...fivePieceKit(), newPiece('cymbal'), newPiece('hardware'), newPiece('microphone')])
      expect(entryInputSchema.parse(entry)).toEqual(entry)
  })

  it('takes a drum that was written before heads had a range and drums a measured ratio and a warble limit', () => {
    const { spec, ...drum } = newDrum('tom')
    const { measuredTapRatio: _ratio, warbleLimitHz: _limit, batter, ...older } = spec
    const { range: _range, ...olderHead } = batter
    expect(entryInputSchema.parse({ ...drum, spec: { ...older, batter: olderHead } })).toEqual({ ...drum, spec })
  })

  it('calls a drum by what it is and its width', () => {
    expect([usualDrumName('floor-tom', 16), usualDrumName('snare', 13.5)]).toEqual(['Floor 16', 'Snare 13½'])
  })

  it('leads an error to the text it is about', () => {
    expect(formPath(['spec', 'batter', 'plyMils', '1'])).toEqual(['spec', 'batter', 'plyMils'])
    expect(formPath(['spec', 'note', 'semitone'])).toEqual(['spec', 'note'])
    expect(formPath(['spec', 'insteadOf', 'depthMaxIn'])).toEqual(['spec', 'insteadOf', 'depthMaxIn'])
  })
})
