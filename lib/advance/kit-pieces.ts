import { noteFrequencyHz } from '@/lib/acoustics/note'
import { noteName } from '@/lib/acoustics/note-name'
import type { KitPiece } from '@/plots/model/kit-piece'
import type { FrozenEntry } from './frozen-kit'
import { entriesInOrder } from './frozen-kit'
import { noteLocale } from './note-locale'

/** Kit entries as the plot draws them, in the kit's order, with notes named for the reader and in Hz of the party's A4. */
export function kitPieces(
  document: { readonly kit: readonly FrozenEntry[]; readonly party: { readonly referenceHz: number } },
  locale: string,
): KitPiece[] {
  return entriesInOrder(document.kit).map((entry): KitPiece => {
    const { id, name, count } = entry
    switch (entry.kind) {
      case 'drum': {
        const { role, diameterIn, depthIn, lugs, note } = entry.spec
        return {
          ...{ kind: 'drum', id, name, role, diameterIn, depthIn, lugs },
          noteLabel: note ? noteName(note.semitone, noteLocale(locale)) : null,
          noteHz: note ? noteFrequencyHz(note, document.party.referenceHz) : null,
        }
      }
      case 'cymbal':
        return { kind: 'cymbal', id, name, count, type: entry.spec.type, diameterIn: entry.spec.diameterIn }
      case 'hardware':
        return { kind: 'hardware', id, name, count, type: entry.spec.type }
      case 'microphone': {
        const { type, phantom, stand } = entry.spec
        return { kind: 'microphone', id, name, count, type, phantom, stand }
      }
    }
  })
}
