import type { NoteTemplate } from '@/lib/tuning/note-template'
import { intervalName, withArticle } from '@/lib/tuning/interval-name'

/** A number without needless noughts: "2.5", "2". */
const plain = (value: number) => String(Number(value.toFixed(2)))

/** What a template asks of the toms, in words. */
export function stepsWords(steps: NoteTemplate['steps']): string {
  switch (steps.kind) {
    case 'per-inch':
      return `${withArticle(intervalName(steps.semitonesPerInch * 200))} for every 2 in of width`
    case 'per-pair':
      return `from the smallest tom down: ${steps.semitones.map((each) => intervalName(each * 100)).join(', ')}, and on so`
    case 'equal-feel':
      return 'every tom at about the same film tension'
    case 'free':
      return 'no intervals: each drum in the middle of its range, apart from the others'
  }
}

/** Where a template has the kick, in words. */
export function kickWords(kickBelowLowestTom: readonly number[]): string {
  if (kickBelowLowestTom.length === 0) return 'the kick in the middle of its own range'
  return `the kick ${orList(kickBelowLowestTom.map((each) => withArticle(intervalName(each * 100))))} under the lowest tom`
}

function orList(words: readonly string[]): string {
  const last = words.at(-1) ?? ''
  return words.length < 2 ? last : `${words.slice(0, -1).join(', ')} or ${last}`
}

/** Semitones as they are typed, smallest tom first: "5, 5, 4". */
export function semitonesText(semitones: readonly number[]): string {
  return semitones.map(plain).join(', ')
}

/** What was typed, as numbers; what cannot be read is no number, and the contract says what is allowed. */
export function readSemitones(text: string): number[] {
  return text
    .split(/[,;\s]+/)
    .filter(Boolean)
    .map(Number)
}
