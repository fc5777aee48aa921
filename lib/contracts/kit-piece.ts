import { noteFrequencyHz, STANDARD_REFERENCE_HZ } from '@/lib/acoustics/note'
import { noteName } from '@/lib/acoustics/note-name'
import type { NoteLocale } from '@/lib/acoustics/note-name'
import type { KitPiece } from '@/plots/model/kit-piece'
import type { EntryInput } from './kit'

/** A kit entry as the plot draws it: its sizes, and its note as the reader names it. */
export function kitPieceOf(
  entry: { id: string } & EntryInput,
  reader: { referenceHz?: number; locale?: NoteLocale } = {},
): KitPiece {
  const { id, name, count } = entry
  switch (entry.kind) {
    case 'drum': {
      const { role, diameterIn, depthIn, lugs, note } = entry.spec
      return {
        kind: 'drum',
        id,
        name,
        role,
        diameterIn,
        depthIn,
        lugs,
        noteLabel: note && noteName(note.semitone, reader.locale),
        noteHz: note && noteFrequencyHz(note, reader.referenceHz ?? STANDARD_REFERENCE_HZ),
      }
    }
    case 'cymbal':
      return { kind: 'cymbal', id, name, type: entry.spec.type, diameterIn: entry.spec.diameterIn, count }
    case 'hardware':
      return { kind: 'hardware', id, name, type: entry.spec.type, count }
    case 'microphone': {
      const { type, phantom, stand } = entry.spec
      return { kind: 'microphone', id, name, type, phantom, stand, count }
    }
  }
}
