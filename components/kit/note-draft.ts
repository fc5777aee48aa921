import type { Note } from '@/lib/acoustics/note'
import type { DrumEntry, SetNotes } from '@/lib/contracts/kit'
import { planDrumOf } from '@/lib/tuning/drum-estimate'
import type { TuningStage } from '@/lib/tuning/drum-estimate'
import { planNotes } from '@/lib/tuning/note-plan'
import type { PlannedDrum } from '@/lib/tuning/note-plan'
import { NOTE_TEMPLATES } from '@/lib/tuning/note-template'
import type { NoteTemplate } from '@/lib/tuning/note-template'

/** What the planner holds for a drum before it is set. */
export type DraftNote = { note: Note | null; noteLocked: boolean }
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

/** The drum as the draft has it. */
export function drafted(drum: DrumEntry, draft: NoteDraft): DrumEntry {
  return { ...drum, spec: { ...drum.spec, ...draft[drum.id] } }
}

/** What differs from the kit: what "Set notes" sends, each against the version that is shown. */
export function notesToSet(drums: readonly DrumEntry[], draft: NoteDraft): SetNotes['notes'] {
  return drums.flatMap((drum) => {
    const wanted = draft[drum.id]
    if (!wanted || (sameNote(wanted.note, drum.spec.note) && wanted.noteLocked === drum.spec.noteLocked)) return []
    return [{ entryId: drum.id, version: drum.version, ...wanted }]
  })
}

function sameNote(a: Note | null, b: Note | null): boolean {
  return a === b || (a !== null && b !== null && a.semitone === b.semitone && a.cents === b.cents)
}

export type Anchor = { drumId: string; note: Note }

/** A note for every drum by a template from an anchor; locked drums of the draft keep theirs. @throws AcousticsError */
export function planned(
  drums: readonly DrumEntry[],
  template: NoteTemplate,
  anchor: Anchor | null,
  stage: TuningStage,
): NoteDraft {
  const plan = planNotes({
    ...{ template, drums: drums.map(({ id, spec }) => planDrumOf(id, spec)), ...given(stage) },
    ...(anchor ? { anchor } : {}),
  })
  const locked = new Map(drums.map(({ id, spec }) => [id, spec.noteLocked]))
  return Object.fromEntries(
    plan.map(({ drumId, note }) => [drumId, { note: settled(note), noteLocked: locked.get(drumId) ?? false }]),
  )
}

/** How each drum that has a note stands with it: place in its range, warnings. */
export function judged(drums: readonly DrumEntry[], stage: TuningStage): Map<string, PlannedDrum> {
  const noted = drums.filter(({ spec }) => spec.note !== null)
  const [template] = NOTE_TEMPLATES
  if (!template || noted.length === 0) return new Map()
  // Every note held fast: the plan then moves nothing and only judges.
  const held = noted.map(({ id, spec }) => planDrumOf(id, { ...spec, noteLocked: true }))
  return new Map(planNotes({ template, drums: held, ...given(stage) }).map((drum) => [drum.drumId, drum]))
}

/** A note moved by semitones, its cents kept. */
export function movedBy({ semitone, cents }: Note, semitones: number): Note {
  return { semitone: Math.min(96, Math.max(12, semitone + semitones)), cents }
}

/** Never −0 cents: a note has one writing. */
function settled({ semitone, cents }: Note): Note {
  return { semitone, cents: cents || 0 }
}

function given({ referenceHz, temperatureC }: TuningStage) {
  return {
    ...(referenceHz === undefined ? {} : { referenceHz }),
    ...(temperatureC === undefined ? {} : { temperatureC }),
  }
}
