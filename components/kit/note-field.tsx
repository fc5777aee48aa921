import { useWatch } from 'react-hook-form'
import { noteFrequencyHz } from '@/lib/acoustics/note'
import type { NoteReader } from '@/lib/contracts/kit-form'
import { noteText, noteValue } from '@/lib/contracts/kit-form'
import { hertz } from './figure-words'
import { TextField } from './text-field'

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
          : 'D3, E♭3 +12 or 146.8 Hz'
      }
    />
  )
}
