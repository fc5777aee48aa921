import type { NoteLocale } from '@/lib/acoustics/note-name'
import { noteName } from '@/lib/acoustics/note-name'
import type { TapReading } from './tap-report'

/** "146.8": a pitch to the tenth, or coarser when it is known no better. */
export function tapHertz({ pitchHz, standardErrorHz }: TapReading): string {
  return standardErrorHz > 0.5 ? String(Math.round(pitchHz)) : pitchHz.toFixed(1)
}

/** "± 0.2": the 95 % interval's half, never under what is shown. */
export function tapHertzError({ standardErrorHz }: TapReading): string {
  const half = 1.96 * standardErrorHz
  return `± ${half < 0.1 ? '0.1' : half < 1 ? half.toFixed(1) : String(Math.ceil(half))}`
}

/** "D3 +12 cents" */
export function tapNote({ note }: TapReading, locale: NoteLocale = 'en'): string {
  const cents = Math.round(note.cents)
  return `${noteName(note.semitone, locale)} ${cents < 0 ? '−' : '+'}${Math.abs(cents)} cents`
}

/** What else was heard, a sentence each: warble, glide. */
export function tapRemarks({ warble, glide }: TapReading): string[] {
  const remarks: string[] = []
  if (warble !== null)
    remarks.push(
      `Warbles ${warble.differenceHz.toFixed(1)} times a second (${warble.lowHz.toFixed(1)} to ${warble.highHz.toFixed(1)}).`,
    )
  if (glide !== null && glide.cents >= 10) {
    remarks.push(`The pitch fell by ${Math.round(glide.cents)} cents to ${glide.settledHz.toFixed(1)} Hz. Tap softer.`)
  }
  return remarks
}

/** Under this a reading stands, but another tap is worth it. */
const SURE = 0.5

/** What to say when the reading is not a sure one; null when it is. */
export function tapDoubt({ confidence }: TapReading): string | null {
  return confidence < SURE ? 'Not quite sure: tap again to be.' : null
}

/** The reading as it is read out. */
export function tapReadingWords(reading: TapReading, locale: NoteLocale = 'en'): string {
  return [`${tapHertz(reading)} hertz, ${tapNote(reading, locale)}.`, ...tapRemarks(reading), tapDoubt(reading)]
    .filter(Boolean)
    .join(' ')
}
