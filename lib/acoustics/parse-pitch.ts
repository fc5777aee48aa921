import { nearestNote, noteFrequencyHz, STANDARD_REFERENCE_HZ } from './note'
import type { Note } from './note'
import type { NoteLocale } from './note-name'

/** What was typed: a note name (`asTyped` 'note') or a frequency ('Hz'); both views are always there. */
export type ParsedPitch = { asTyped: 'note' | 'Hz'; note: Note; frequencyHz: number }

const MIN_TYPED_HZ = 10
const MAX_TYPED_HZ = 5000

const LETTERS: Record<string, number> = { c: 0, d: 2, e: 4, f: 5, g: 7, a: 9, b: 11 }
const SYLLABLES: Record<string, number> = { do: 0, ut: 0, re: 2, mi: 4, fa: 5, sol: 7, la: 9, si: 11 }
const GERMAN: Record<string, number> = {
  ...{ c: 0, cis: 1, d: 2, dis: 3, e: 4, f: 5, fis: 6, g: 7, gis: 8, a: 9, ais: 10, his: 12 },
  ...{ ces: -1, des: 1, es: 3, ees: 3, fes: 4, ges: 6, as: 8, aes: 8, b: 10, h: 11, eis: 5 },
}
const ACCIDENTALS: Record<string, number> = { '': 0, '#': 1, '♯': 1, b: -1, '♭': -1 }

/** Semitones above C of a note name, or null. German B and "Bb" are both B♭ (10): nobody tunes a drum to B double flat. */
function stepOf(name: string, locale: NoteLocale): number | null {
  if (locale === 'de' && GERMAN[name] !== undefined) return GERMAN[name]
  const [, syllable, mark = ''] = /^(do|ut|re|mi|fa|sol|la|si|[a-h])(#|♯|b|♭)?$/.exec(name) ?? []
  if (syllable === undefined) return null
  const accidental = ACCIDENTALS[mark] ?? 0
  if (locale === 'de' && syllable === 'h') return 11 + accidental
  if (locale === 'de' && syllable === 'b') return mark === '' || accidental < 0 ? 10 : null
  if (locale === 'fr' && SYLLABLES[syllable] !== undefined) return SYLLABLES[syllable] + accidental
  const letter = LETTERS[syllable]
  return letter === undefined ? null : letter + accidental
}

/**
 * Reads a pitch as people type it: "D3", "Eb3", "f#2", "D3 +20", "A2 −15 cents", "146.8", "146,8 Hz";
 * with locale 'de' also "Cis3", "Es3", "H2" (B is then B♭); with 'fr' also "ré3", "fa dièse 2", "si bémol 2".
 * English letters are read in every locale, save that B is B♭ in German.
 * Returns null when it cannot be read, or lies outside 10 to 5000 Hz.
 * @throws AcousticsError only for a reference outside 415 to 466 Hz
 */
export function parsePitch(
  text: string,
  { locale = 'en', referenceHz = STANDARD_REFERENCE_HZ }: { locale?: NoteLocale; referenceHz?: number } = {},
): ParsedPitch | null {
  const plain = text
    .trim()
    .toLowerCase()
    .normalize('NFD')
    .replace(/[\u0300-\u036f]/g, '')
    .replace(/\s*(?:diese|sharp)/, '#')
    .replace(/\s*(?:bemol|flat)/, 'b')
    .replace(/[−–]/g, '-')
    .replace(/\s+/g, '')

  const typedHz = /^(\d{1,5}(?:[.,]\d+)?)(?:hz)?$/.exec(plain)?.[1]
  if (typedHz !== undefined) {
    const frequencyHz = Number(typedHz.replace(',', '.'))
    if (frequencyHz < MIN_TYPED_HZ || frequencyHz > MAX_TYPED_HZ) return null
    return { asTyped: 'Hz', note: nearestNote(frequencyHz, referenceHz), frequencyHz }
  }

  const [, name, octave, cents] =
    /^([a-z]+[#♯♭]?)(-?\d)(?:([+-]\d{1,3}(?:[.,]\d+)?)(?:c|ct|cents?)?)?$/.exec(plain) ?? []
  if (name === undefined || octave === undefined) return null
  const step = stepOf(name, locale)
  if (step === null) return null
  const note: Note = {
    semitone: step + 12 * (Number(octave) + 1),
    cents: cents === undefined ? 0 : Number(cents.replace(',', '.')),
  }
  if (note.semitone < 0 || note.semitone > 127) return null
  const frequencyHz = noteFrequencyHz(note, referenceHz)
  if (frequencyHz < MIN_TYPED_HZ || frequencyHz > MAX_TYPED_HZ) return null
  return { asTyped: 'note', note, frequencyHz }
}
