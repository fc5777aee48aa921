import { requireQuantity } from '@/lib/acoustics/require-quantity'

const NAMES = [
  'same note',
  'semitone',
  'tone',
  'minor third',
  'major third',
  'fourth',
  'tritone',
  'fifth',
  'minor sixth',
  'major sixth',
  'minor seventh',
  'major seventh',
] as const

/** Nearer than this, in cents, an interval goes by its name alone. */
const NAMED_WITHIN_CENTS = 5

/**
 * The size of an interval in words, up or down alike: "fourth", "minor third +14 cents", "octave and fifth", "two octaves".
 * @throws AcousticsError cents no finite number, or beyond any pitch
 */
export function intervalName(cents: number): string {
  const size = Math.abs(requireQuantity('cents', cents, { min: -1e9, max: 1e9, unit: 'cents' }))
  const semitones = Math.round(size / 100)
  const rest = Math.round(size - semitones * 100)
  const name = wholeName(semitones)
  return Math.abs(rest) < NAMED_WITHIN_CENTS ? name : `${name} ${rest > 0 ? '+' : '−'}${Math.abs(rest)} cents`
}

function wholeName(semitones: number): string {
  const octaves = Math.floor(semitones / 12)
  const name = NAMES[semitones % 12] ?? ''
  if (octaves === 0) return name
  const spanned = octaves === 1 ? 'octave' : octaves === 2 ? 'two octaves' : `${octaves} octaves`
  return semitones % 12 === 0 ? spanned : `${spanned} and ${name}`
}

/** An interval's name with its article: "a fourth", "an octave", "two octaves". */
export function withArticle(name: string): string {
  if (/^(two|\d)/.test(name)) return name
  if (name.startsWith('same note')) return `the ${name}`
  return `${name.startsWith('octave') ? 'an' : 'a'} ${name}`
}

/** The relation between the heads in words, by how far the resonant stands above the batter in cents. @throws AcousticsError as `intervalName` */
export function headRelationWords(cents: number): string {
  if (Math.abs(cents) < NAMED_WITHIN_CENTS) return 'both heads at the same pitch'
  const name = intervalName(cents)
  const size = name.startsWith('same note') ? `${Math.round(Math.abs(cents))} cents` : withArticle(name)
  return `resonant ${size} ${cents > 0 ? 'higher' : 'lower'}`
}
