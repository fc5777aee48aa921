import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import type { Note } from '@/lib/acoustics/note'
import { requireQuantity, requireWhole } from '@/lib/acoustics/require-quantity'
import { middleTensionNPerM } from '@/lib/acoustics/tension-range'
import { askedOffsets, pitchAtTension } from './note-asks'
import type { AskedOffset } from './note-asks'
import { DEFAULT_APART_SEMITONES } from './note-cost'
import type { NotePlanInput, PlanDrum } from './note-plan-model'
import { requireTemplate } from './note-template'

/** How far outside its range a note may be asked of a drum, semitones: past an octave no head goes there. */
const REACH_SEMITONES = 12

/** Far more than any kit; it bounds the sums of the search. */
const MOST_DRUMS = 64

/** A kit made ready for planning and judging: checked, ordered, and with what is fixed and asked worked out. */
export type PlanKit = {
  drums: readonly PlanDrum[]
  /** From the smallest to the largest; of one size the one with the higher range first, then in the order of the kit. */
  toms: readonly PlanDrum[]
  kicks: readonly PlanDrum[]
  snares: readonly PlanDrum[]
  /** Notes that are not planned: locks and the anchor, by drum id. */
  fixed: ReadonlyMap<string, Note>
  anchorId: string | null
  /** Cents of every planned note: the anchor's. */
  cents: number
  apartSemitones: number
  /** By drum id of the toms; empty under a free template. */
  asked: ReadonlyMap<string, AskedOffset>
  kickBelow: readonly number[]
}

/** Pitch of a note on the A4 = 69 count, with fractions. */
export function pitchOf({ semitone, cents }: Note): number {
  return semitone + cents / 100
}

export function isTom({ role }: Pick<PlanDrum, 'role'>): boolean {
  return role === 'tom' || role === 'floor-tom'
}

/**
 * @throws AcousticsError naming what is refused: `drums` (none, or one id twice), `diameterIn`, `range` (upside down), `tension`,
 * `lockedNote`, `anchor` (not a tom, locked to another note, or out of the drum's reach), `apartSemitones`, or a part of the template
 */
export function planKitOf(input: NotePlanInput): PlanKit {
  const { drums, template, anchor } = input
  const apartSemitones = input.apartSemitones ?? DEFAULT_APART_SEMITONES
  requireQuantity('apartSemitones', apartSemitones, { min: 0, max: 12, unit: 'semitones' })
  requireTemplate(template)
  if (drums.length === 0) throw new AcousticsError('drums', 'A plan needs at least one drum.')
  if (drums.length > MOST_DRUMS) throw new AcousticsError('drums', `A plan takes at most ${MOST_DRUMS} drums.`)
  if (new Set(drums.map(({ id }) => id)).size !== drums.length) {
    throw new AcousticsError('drums', 'Two drums of the plan have the same id.')
  }
  drums.forEach(requireDrum)
  const fixed = new Map(drums.flatMap((drum) => (drum.lockedNote ? [[drum.id, drum.lockedNote] as const] : [])))
  if (anchor) {
    requireAnchor(anchor, drums)
    fixed.set(anchor.drumId, anchor.note)
  }
  const toms = drums.filter(isTom).sort((a, b) => a.diameterIn - b.diameterIn || centreOf(b) - centreOf(a))
  const reference =
    toms.find(({ id }) => id === anchor?.drumId) ??
    toms.find(({ id }) => fixed.has(id)) ??
    toms[Math.floor((toms.length - 1) / 2)]
  return {
    ...{ drums, toms, fixed, apartSemitones, kickBelow: template.kickBelowLowestTom },
    kicks: drums.filter(({ role }) => role === 'kick'),
    snares: drums.filter(({ role }) => role === 'snare'),
    ...{ anchorId: anchor?.drumId ?? null, cents: anchor?.note.cents ?? 0 },
    asked: reference
      ? askedOffsets(toms, template.steps, reference, referencePitch(reference, fixed.get(reference.id)))
      : new Map<string, AskedOffset>(),
  }
}

function referencePitch(reference: PlanDrum, note: Note | undefined): number {
  return note ? pitchOf(note) : pitchAtTension(reference, middleTensionNPerM(reference.tension))
}

/** Whether two drums must keep apart. Kicks are a pair that sounds as one, and of several snares one is played at a time. */
export function keepApart(a: Pick<PlanDrum, 'role'>, b: Pick<PlanDrum, 'role'>): boolean {
  return isTom(a) || isTom(b) || a.role !== b.role
}

/** The middle of a drum's middle third. */
export function centreOf({ range }: Pick<PlanDrum, 'range'>): number {
  return (range.middleLow + range.middleHigh) / 2
}

/** The notes a plan may give a drum: its fixed one, else every whole semitone with the plan's cents that the drum can reach. */
export function notesWithinReach({ fixed, cents }: PlanKit, { id, range }: PlanDrum): Note[] {
  const only = fixed.get(id)
  if (only) return [only]
  const from = Math.max(0, Math.ceil(range.low - REACH_SEMITONES - cents / 100))
  const to = Math.min(127, Math.floor(range.high + REACH_SEMITONES - cents / 100))
  return Array.from({ length: to - from + 1 }, (_, i) => ({ semitone: from + i, cents }))
}

/** @throws AcousticsError naming `semitone` or `cents` */
export function requireNote({ semitone, cents }: Note): void {
  requireWhole('semitone', semitone, { min: 0, max: 127, unit: '' })
  requireQuantity('cents', cents, { min: -100, max: 100, unit: 'cents' })
}

function requireDrum({ name, diameterIn, range, tension, lockedNote }: PlanDrum): void {
  requireQuantity('diameterIn', diameterIn, { min: 4, max: 31, unit: 'in' })
  const { low, middleLow, middleHigh, high } = range
  for (const pitch of [low, middleLow, middleHigh, high]) {
    requireQuantity('range', pitch, { min: 0, max: 127, unit: 'semitones' })
  }
  if (!(low < middleLow && middleLow < middleHigh && middleHigh < high)) {
    throw new AcousticsError(
      'range',
      `The range of ${name} must rise from its low edge over its middle to its high edge.`,
    )
  }
  const { slackNPerM, chokedNPerM } = tension
  if (!(slackNPerM > 0 && slackNPerM < chokedNPerM && Number.isFinite(chokedNPerM))) {
    throw new AcousticsError(
      'tension',
      `The tensions of ${name} must be above nothing, the slack one below the choked one.`,
    )
  }
  if (lockedNote) {
    requireNote(lockedNote)
    requireReach('lockedNote', name, range, lockedNote)
  }
}

function requireAnchor({ drumId, note }: NonNullable<NotePlanInput['anchor']>, drums: readonly PlanDrum[]): void {
  const drum = drums.find(({ id }) => id === drumId)
  if (!drum || !isTom(drum)) {
    throw new AcousticsError('anchor', 'The anchor must be a tom or floor tom of this kit.')
  }
  requireNote(note)
  if (drum.lockedNote && pitchOf(drum.lockedNote) !== pitchOf(note)) {
    throw new AcousticsError('anchor', `${drum.name} is locked to another note: unlock it or anchor on that note.`)
  }
  requireReach('anchor', drum.name, drum.range, note)
}

function requireReach(field: string, name: string, { low, high }: PlanDrum['range'], note: Note): void {
  if (pitchOf(note) < low - REACH_SEMITONES || pitchOf(note) > high + REACH_SEMITONES) {
    throw new AcousticsError(field, `${name} cannot reach that note: it lies more than an octave outside its range.`)
  }
}
