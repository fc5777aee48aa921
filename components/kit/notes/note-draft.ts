import type { z } from 'zod'
import type { Note } from '@/lib/acoustics/note'
import { drumSpecSchema } from '@/lib/contracts/kit'
import type { DrumEntry, SetNotes } from '@/lib/contracts/kit'

/** What the planner holds for a drum before it is set. */
export const draftNoteSchema = drumSpecSchema.pick({ note: true, noteLocked: true, headRelationCents: true })
export type DraftNote = z.infer<typeof draftNoteSchema>
/** By entry id; a drum that is not in it stands as it is in the kit. */
export type NoteDraft = Readonly<Record<string, DraftNote>>

const roleOrder = { tom: 0, 'floor-tom': 0, kick: 1, snare: 2 }

/** Toms from the smallest down, then kick and snare: as the notes fall. */
export function inNoteOrder(drums: readonly DrumEntry[]): DrumEntry[] {
  return [...drums].sort(
    (a, b) =>
      roleOrder[a.spec.role] - roleOrder[b.spec.role] ||
      a.spec.diameterIn - b.spec.diameterIn ||
      a.position - b.position,
  )
}

export function isTom({ spec }: DrumEntry): boolean {
  return spec.role === 'tom' || spec.role === 'floor-tom'
}

const draftedOnce = new WeakMap<DraftNote, DrumEntry & { readonly of: DrumEntry }>()

/** The drum as the draft has it: the same object as long as neither changes, so that what hangs on it is worked out once. */
export function drafted(drum: DrumEntry, draft: NoteDraft): DrumEntry {
  const wanted = draft[drum.id]
  if (!wanted) return drum
  const known = draftedOnce.get(wanted)
  if (known?.of === drum) return known
  const made = { ...drum, spec: { ...drum.spec, ...wanted }, of: drum }
  draftedOnce.set(wanted, made)
  return made
}

/** What a drum holds, as a draft would. */
export function draftNoteOf({ spec }: DrumEntry): DraftNote {
  const { note, noteLocked, headRelationCents } = spec
  return { note, noteLocked, headRelationCents }
}

/** The draft with one drum changed. */
export function withChange(draft: NoteDraft, drum: DrumEntry, change: Partial<DraftNote>): NoteDraft {
  return { ...draft, [drum.id]: { ...draftNoteOf(drafted(drum, draft)), ...change } }
}

/** What differs from the kit: what "Set notes" sends, each against the version that is shown. */
export function notesToSet(drums: readonly DrumEntry[], draft: NoteDraft): SetNotes['notes'] {
  return drums.flatMap((drum) => {
    const wanted = draft[drum.id]
    if (!wanted) return []
    const { headRelationCents, ...rest } = wanted
    const otherHeads = headRelationCents !== drum.spec.headRelationCents
    if (sameNote(wanted.note, drum.spec.note) && wanted.noteLocked === drum.spec.noteLocked && !otherHeads) return []
    return [{ entryId: drum.id, version: drum.version, ...rest, ...(otherHeads ? { headRelationCents } : {}) }]
  })
}

export function sameNote(a: Note | null, b: Note | null): boolean {
  return a === b || (a !== null && b !== null && a.semitone === b.semitone && a.cents === b.cents)
}

/** A note on the A4 = 69 count, with fractions. */
export function pitchOf({ semitone, cents }: Note): number {
  return semitone + cents / 100
}

const lowest = 12
const highest = 96

/** A note moved by semitones, its cents kept, within what a drum may have. */
export function movedBy({ semitone, cents }: Note, semitones: number): Note {
  return { semitone: Math.min(highest, Math.max(lowest, semitone + semitones)), cents }
}

/** A note moved by cents, written from the nearest semitone. */
export function bentBy(note: Note, by: number): Note {
  const cents = Math.round((pitchOf(note) * 100 + by) * 100) / 100
  const semitone = Math.min(highest, Math.max(lowest, Math.round(cents / 100)))
  // Never −0 cents: a note has one writing.
  return { semitone, cents: Math.min(50, Math.max(-50, Math.round((cents - semitone * 100) * 100) / 100)) || 0 }
}
