import type { DrumEntry } from '@/lib/contracts/kit'
import type { JudgedPlan } from '@/lib/tuning/note-plan-model'
import type { NoteTemplate } from '@/lib/tuning/note-template'
import { isTom } from './note-draft'
import type { NoteDraft } from './note-draft'

/** A template says how the heads of toms stand; a locked drum, a snare side and a kick are left as they are. */
export function headsFollow(drum: DrumEntry): boolean {
  return isTom(drum) && drum.spec.resonant !== null && !drum.spec.noteLocked
}

/** A plan as a draft: its notes, and the heads' relation of its template where that is wanted. */
export function planDraft(
  plan: JudgedPlan,
  mine: readonly DrumEntry[],
  template: NoteTemplate,
  headsToo: boolean,
): NoteDraft {
  return Object.fromEntries(
    plan.drums.flatMap(({ drumId, note }) => {
      const drum = mine.find(({ id }) => id === drumId)
      if (!drum) return []
      const { noteLocked, headRelationCents } = drum.spec
      const relation = headsToo && headsFollow(drum) ? template.resonantCents : headRelationCents
      // Never −0 cents: a note has one writing.
      const written = { semitone: note.semitone, cents: note.cents || 0 }
      return [[drumId, { note: written, noteLocked, headRelationCents: relation }]]
    }),
  )
}
