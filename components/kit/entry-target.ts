import type { Entry, EntryInput } from '@/lib/contracts/kit'
import type { DrumForm, PieceForm } from '@/lib/contracts/kit-form'

/** What a form is open for: a new entry with the id that it will have, or one of the kit as it was when it was opened. */
export type EntryTarget = { do: 'add'; id: string; start: EntryInput } | { do: 'change'; id: string; start: Entry }

/** What was typed and not saved. */
export type EntryDraft = { target: EntryTarget; typed: DrumForm | PieceForm }

const kept = new Map<string, EntryDraft>()

/** Drafts outlive the page they were typed on, by rig, until the browser's own page ends. */
export const keptDrafts = {
  read: (rigId: string): EntryDraft | null => kept.get(rigId) ?? null,
  keep: (rigId: string, draft: EntryDraft) => void kept.set(rigId, draft),
  drop: (rigId: string) => void kept.delete(rigId),
}
