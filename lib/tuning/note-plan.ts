import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { ROOM_TEMPERATURE_C } from '@/lib/acoustics/air'
import { nearestNote, noteFrequencyHz, STANDARD_REFERENCE_HZ } from '@/lib/acoustics/note'
import type { Note } from '@/lib/acoustics/note'
import { openAirModeHz, openAirTensionNPerM } from '@/lib/acoustics/open-air-head'
import type { Film } from '@/lib/acoustics/film'
import { METRE_PER_INCH } from '@/lib/acoustics/require-quantity'
import { defaultTensionRange, middleTensionNPerM, rangePosition } from '@/lib/acoustics/tension-range'
import type { DrumRole, RangePosition, TensionRange } from '@/lib/acoustics/tension-range'
import { resonantTargetHz } from './head-relation'
import { templateInterval } from './note-template'
import type { NoteTemplate } from './note-template'

export type PlanDrum = {
  id: string
  role: DrumRole
  /** Nominal inches. */
  diameterIn: number
  /** Film of the batter head. */
  batter: Film
  /** The batter's own playable range; the role's default unless given. */
  range?: TensionRange
  /** A note the user holds fast: the plan works round it. */
  lockedNote?: Note
}

export type NotePlanInput = {
  template: NoteTemplate
  drums: readonly PlanDrum[]
  /**
   * A tom or floor tom and its note, from which the others are stepped. Without it a locked tom is
   * the anchor, else the middle one by size, at the middle of its range.
   */
  anchor?: { drumId: string; note: Note }
  referenceHz?: number
  temperatureC?: number
}

/** Where a planned note came from. `middle`: the middle of the drum's own range. */
export type NoteOrigin = 'locked' | 'anchor' | 'template' | 'middle'

/**
 * `below-range`, `above-range`: the head is slack or chokes at this note. `off-middle`: playable, yet outside the safe middle
 * third of its range. `shared-note`: `withDrumIds` sound the same note to the ear (within half a semitone).
 */
export type NoteWarning =
  { kind: 'below-range' | 'above-range' | 'off-middle' } | { kind: 'shared-note'; withDrumIds: string[] }

export type PlannedDrum = {
  drumId: string
  note: Note
  noteHz: number
  /** Pitch of the resonant head alone, Hz, by the template's relation. */
  resonantHz: number
  /** Batter film tension, as a head in the open air. */
  tensionNPerM: number
  rangePosition: RangePosition
  origin: NoteOrigin
  warnings: NoteWarning[]
}

const SHARED_WITHIN_CENTS = 50

/**
 * A note for every drum of a kit. Toms and floor toms are stepped from the anchor by the template; the kick goes a fourth,
 * fifth or octave under the lowest tom, whichever lies nearest the middle of its range; the snare goes to the middle of its
 * range, moved to the nearest semitone that no tom sounds in any octave, so that toms stir its wires less (both common
 * practice). A locked drum keeps its note. Every note is judged on the batter head in the open air.
 * @throws AcousticsError naming `drums` (same id twice), `anchor` (not a tom of this kit, or locked to another note), or
 * whatever a drum's head refuses; a drum that cannot reach its note at all names `noteHz`
 */
export function planNotes(input: NotePlanInput): PlannedDrum[] {
  const { drums, template } = input
  if (new Set(drums.map(({ id }) => id)).size !== drums.length) {
    throw new AcousticsError('drums', 'Two drums of the plan have the same id.')
  }
  const stage: Stage = {
    referenceHz: input.referenceHz ?? STANDARD_REFERENCE_HZ,
    temperatureC: input.temperatureC ?? ROOM_TEMPERATURE_C,
  }
  const toms = drums.filter(isTom)
  const anchor = anchorOf(input, toms, stage)
  const tomNotes = new Map(toms.map((drum) => [drum.id, tomNote(drum, anchor, template, stage)]))
  const soundedByToms = [...tomNotes.values()].map(({ note }) => note)
  const noteOf = (drum: PlanDrum): GivenNote => {
    const tom = tomNotes.get(drum.id)
    if (tom !== undefined) return tom
    if (drum.lockedNote !== undefined) return { note: drum.lockedNote, origin: 'locked' }
    return drum.role === 'snare'
      ? { note: clearOf(soundedByToms, middleNote(drum, stage)), origin: 'middle' }
      : kickNote(drum, soundedByToms, template, stage)
  }
  const given = drums.map((drum) => ({ drum, ...noteOf(drum) }))
  return given.map((each) => judge(each, given, template.resonantCents, stage))
}

type Stage = { referenceHz: number; temperatureC: number }
type GivenNote = { note: Note; origin: NoteOrigin }
type Anchor = { drum: PlanDrum; note: Note; origin: 'anchor' | 'middle' }

function isTom({ role }: PlanDrum): boolean {
  return role === 'tom' || role === 'floor-tom'
}

function anchorOf({ anchor }: NotePlanInput, toms: readonly PlanDrum[], stage: Stage): Anchor | null {
  if (anchor === undefined) {
    const bySize = [...toms].sort((a, b) => a.diameterIn - b.diameterIn)
    const drum =
      bySize.find(({ lockedNote }) => lockedNote !== undefined) ?? bySize[Math.floor((bySize.length - 1) / 2)]
    return drum === undefined ? null : { drum, note: drum.lockedNote ?? middleNote(drum, stage), origin: 'middle' }
  }
  const drum = toms.find(({ id }) => id === anchor.drumId)
  if (drum === undefined) throw new AcousticsError('anchor', 'The anchor must be a tom or floor tom of this kit.')
  if (drum.lockedNote !== undefined && pitchOf(drum.lockedNote) !== pitchOf(anchor.note)) {
    throw new AcousticsError('anchor', 'The anchor drum is locked to another note: unlock it or anchor on that note.')
  }
  return { drum, note: anchor.note, origin: 'anchor' }
}

function tomNote(drum: PlanDrum, anchor: Anchor | null, { steps }: NoteTemplate, stage: Stage): GivenNote {
  if (drum.lockedNote !== undefined) return { note: drum.lockedNote, origin: 'locked' }
  if (anchor === null || anchor.drum.id === drum.id) {
    return { note: anchor?.note ?? middleNote(drum, stage), origin: anchor?.origin ?? 'middle' }
  }
  if (steps.kind === 'equal-feel') {
    return { note: noteAtTension(drum, tensionAt(anchor.drum, anchor.note, stage), stage), origin: 'template' }
  }
  if (steps.kind !== 'per-inch') return { note: middleNote(drum, stage), origin: 'middle' }
  const interval = templateInterval(anchor.drum.diameterIn, drum.diameterIn, steps.semitonesPerInch)
  return { note: { semitone: anchor.note.semitone + interval, cents: anchor.note.cents }, origin: 'template' }
}

function kickNote(kick: PlanDrum, tomNotes: readonly Note[], template: NoteTemplate, stage: Stage): GivenNote {
  const middle = middleNote(kick, stage)
  const fromMiddle = (note: Note) => Math.abs(pitchOf(note) - pitchOf(middle))
  const lowest = [...tomNotes].sort((a, b) => pitchOf(a) - pitchOf(b))[0]
  const nearest = template.kickBelowLowestTom
    .flatMap((semitones) => (lowest === undefined ? [] : [{ ...lowest, semitone: lowest.semitone - semitones }]))
    .sort((a, b) => fromMiddle(a) - fromMiddle(b))[0]
  return nearest === undefined ? { note: middle, origin: 'middle' } : { note: nearest, origin: 'template' }
}

/** The semitone nearest to the wanted one whose name no tom sounds; the wanted one if the toms sound all twelve. */
function clearOf(tomNotes: readonly Note[], wanted: Note): Note {
  const taken = new Set(tomNotes.map((note) => Math.round(pitchOf(note)) % 12))
  const nearestFirst = [0, 1, -1, 2, -2, 3, -3, 4, -4, 5, -5, 6]
  const shift = nearestFirst.find((by) => !taken.has((wanted.semitone + by) % 12)) ?? 0
  return { semitone: wanted.semitone + shift, cents: 0 }
}

function judge(
  { drum, note, origin }: GivenNote & { drum: PlanDrum },
  all: readonly (GivenNote & { drum: PlanDrum })[],
  resonantCents: number,
  stage: Stage,
): PlannedDrum {
  const noteHz = noteFrequencyHz(note, stage.referenceHz)
  const tensionNPerM = tensionAt(drum, note, stage)
  const position = rangePosition(tensionNPerM, rangeOf(drum))
  const warnings: NoteWarning[] = []
  if (position.zone === 'slack') warnings.push({ kind: 'below-range' })
  else if (position.zone === 'choked') warnings.push({ kind: 'above-range' })
  else if (position.zone !== 'middle') warnings.push({ kind: 'off-middle' })
  const withDrumIds = all
    .filter((other) => other.drum.id !== drum.id)
    .filter((other) => Math.abs(pitchOf(other.note) - pitchOf(note)) * 100 < SHARED_WITHIN_CENTS)
    .map((other) => other.drum.id)
  if (withDrumIds.length > 0) warnings.push({ kind: 'shared-note', withDrumIds })
  return {
    ...{ drumId: drum.id, note, noteHz, resonantHz: resonantTargetHz(noteHz, resonantCents), tensionNPerM },
    ...{ rangePosition: position, origin, warnings },
  }
}

function pitchOf({ semitone, cents }: Note): number {
  return semitone + cents / 100
}

function rangeOf(drum: PlanDrum): TensionRange {
  return drum.range ?? defaultTensionRange(drum.role)
}

function headOf(drum: PlanDrum, { temperatureC }: Stage) {
  return { ...drum.batter, diameterM: drum.diameterIn * METRE_PER_INCH, temperatureC }
}

function tensionAt(drum: PlanDrum, note: Note, stage: Stage): number {
  return openAirTensionNPerM(noteFrequencyHz(note, stage.referenceHz), headOf(drum, stage))
}

/** To the whole cent: finer is beyond any ear and any key. */
function noteAtTension(drum: PlanDrum, tensionNPerM: number, stage: Stage): Note {
  const { semitone, cents } = nearestNote(openAirModeHz(0, tensionNPerM, headOf(drum, stage)), stage.referenceHz)
  return { semitone, cents: Math.round(cents) }
}

/** The whole semitone nearest to the middle of the drum's range. */
function middleNote(drum: PlanDrum, stage: Stage): Note {
  return { semitone: noteAtTension(drum, middleTensionNPerM(rangeOf(drum)), stage).semitone, cents: 0 }
}
