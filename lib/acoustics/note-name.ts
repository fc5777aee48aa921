import { requireWhole } from './require-quantity'

export type NoteLocale = 'en' | 'de' | 'fr'
export type NoteSpelling = 'sharp' | 'flat'

const NAMES: Record<NoteLocale, Record<NoteSpelling, readonly string[]>> = {
  en: {
    sharp: ['C', 'C♯', 'D', 'D♯', 'E', 'F', 'F♯', 'G', 'G♯', 'A', 'A♯', 'B'],
    flat: ['C', 'D♭', 'D', 'E♭', 'E', 'F', 'G♭', 'G', 'A♭', 'A', 'B♭', 'B'],
  },
  // German H is the English B; German B is the English B♭, and it has no common sharp spelling.
  de: {
    sharp: ['C', 'Cis', 'D', 'Dis', 'E', 'F', 'Fis', 'G', 'Gis', 'A', 'B', 'H'],
    flat: ['C', 'Des', 'D', 'Es', 'E', 'F', 'Ges', 'G', 'As', 'A', 'B', 'H'],
  },
  fr: {
    sharp: ['do', 'do♯', 'ré', 'ré♯', 'mi', 'fa', 'fa♯', 'sol', 'sol♯', 'la', 'la♯', 'si'],
    flat: ['do', 'ré♭', 'ré', 'mi♭', 'mi', 'fa', 'sol♭', 'sol', 'la♭', 'la', 'si♭', 'si'],
  },
}

/**
 * Name of a semitone with its octave, "C♯4", "Cis4", "do♯4". The octave is counted as in English (A4 = 69) in every
 * locale, so that a sheet read aloud between two countries keeps one number.
 * @throws AcousticsError semitone not a whole number 0 to 127
 */
export function noteName(semitone: number, locale: NoteLocale = 'en', spelling: NoteSpelling = 'sharp'): string {
  requireWhole('semitone', semitone, { min: 0, max: 127, unit: '' })
  const name = NAMES[locale][spelling][semitone % 12] ?? ''
  return `${name}${Math.floor(semitone / 12) - 1}`
}
