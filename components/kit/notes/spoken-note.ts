import { noteFrequencyHz } from '@/lib/acoustics/note'
import type { Note } from '@/lib/acoustics/note'
import type { NoteReader } from '@/lib/contracts/kit-form'
import { noteText } from '@/lib/contracts/kit-form'
import { hertz } from '@/lib/acoustics/figure-words'

/** A note with its frequency: "D3, 146.8 Hz". */
export function spokenNote(note: Note, { locale, referenceHz }: NoteReader): string {
  return `${noteText(note, locale)}, ${hertz(noteFrequencyHz(note, referenceHz))} Hz`
}
