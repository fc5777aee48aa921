import { useWatch } from 'react-hook-form'
import { noteFrequencyHz } from '@/lib/acoustics/note'
import type { NoteReader } from '@/lib/contracts/kit-form'
import { noteText, noteValue } from '@/lib/contracts/kit-form'
import { hertz } from '@/lib/acoustics/figure-words'
import { TextField } from './text-field'

/** Examples in the party's own note names: a B is another note to a German reader. */
const d3 = { semitone: 50, cents: 0 }
const raisedB2 = { semitone: 47, cents: 12 }

/** A note by name or by frequency; the other stands beside it as it is typed. */
export function NoteField({ path, reader }: { path: string; reader: NoteReader }) {
  const text = useWatch({ name: path }) as string
  const typed = noteValue(text, reader)
  const note = 'value' in typed ? typed.value : null
  return (
    <TextField
      path={path}
      label="Note, or Hz"
      optional
      unit=""
      hint={
        note
          ? `${hertz(noteFrequencyHz(note, reader.referenceHz))} Hz, ${noteText(note, reader.locale)}`
          : `${noteText(d3, reader.locale)}, ${noteText(raisedB2, reader.locale)} or ${hertz(noteFrequencyHz(d3, reader.referenceHz))} Hz`
      }
    />
  )
}
