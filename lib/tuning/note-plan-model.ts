import type { Note } from '@/lib/acoustics/note'
import type { DrumRole, TensionRange } from '@/lib/acoustics/tension-range'
import type { NoteTemplate } from './note-template'
import type { PlayableRange } from './playable-range'

/** A drum as the note plan takes it. Its range is input, so that the plan itself knows nothing of films and air. */
export type PlanDrum = {
  id: string
  /** How the drum is called in sentences and refusals. */
  name: string
  role: DrumRole
  /** Nominal inches, 4 to 31: toms are stepped in the order of their sizes. */
  diameterIn: number
  /** Pitches on the A4 = 69 count, with fractions. */
  range: PlayableRange
  /** Batter film tension at `range.low` and `range.high`, N/m; between the four pitches of the range pitch runs straight with the logarithm of tension. */
  tension: TensionRange
  /** A note the user holds fast, kept with its cents. */
  lockedNote?: Note
}

export type NotePlanInput = {
  template: NoteTemplate
  /** In the order of the kit. */
  drums: readonly PlanDrum[]
  /** A tom or floor tom held at a note; every planned note then takes the anchor's cents, so that the intervals are whole. */
  anchor?: { drumId: string; note: Note }
  /** No two drums should lie nearer than this, semitones, 0 to 12; `DEFAULT_APART_SEMITONES` unless given. */
  apartSemitones?: number
  /** At most so many alternatives, 0 to 40; `DEFAULT_ALTERNATIVES` unless given. */
  alternatives?: number
}

/** Where a note of a plan came from. `set`: by hand, in `judgePlan`. */
export type NoteOrigin = 'locked' | 'anchor' | 'planned' | 'set'

export type PlanZone = 'below-range' | 'low' | 'middle' | 'high' | 'above-range'

/** One drum of a plan and what its note costs. */
export type JudgedDrum = {
  drumId: string
  note: Note
  origin: NoteOrigin
  zone: PlanZone
  /** Cents outside the middle third: negative under it, 0 inside. */
  centsOffMiddle: number
  /** Cents outside the playable range: negative under it, 0 inside. */
  centsOutOfRange: number
  cost: { offMiddle: number; outOfRange: number }
}

/**
 * A step from one drum down to the next: `toms` from a tom to the next larger, `kick` from the lowest tom to a kick.
 * Semitones count down: a negative `got` means that the lower drum sounds the higher note.
 */
export type JudgedInterval = {
  kind: 'toms' | 'kick'
  upperId: string
  lowerId: string
  /** What the template asks, whole semitones; several for a kick, any of which will do; none under a free template. */
  asked: readonly number[]
  /** The template's own figure before it is brought to whole semitones; null when nothing, or one of several, is asked. */
  askedExact: number | null
  /** In words, "fourth"; null when nothing is asked. */
  askedName: string | null
  got: number
  gotName: string
  /** How far `got` lies from the nearest of `asked`, semitones, never negative; 0 when nothing is asked. */
  offSemitones: number
  /** Where the lower drum would stand if the nearest of `asked` were given from the upper drum as it is; null when nothing is asked. */
  ifAsked: Pick<JudgedDrum, 'zone' | 'centsOffMiddle' | 'centsOutOfRange'> | null
  cost: { interval: number; order: number }
}

export type PlanClash =
  /**
   * Two drums nearer than the set distance, in semitones. Charged between toms next to each other in size, between a kick and the
   * lowest tom, and between a snare and any other; elsewhere the drums in between are charged already and the cost here is 0.
   */
  | { kind: 'too-close'; drumIds: readonly [string, string]; semitones: number; cost: number }
  /** A snare on a tom's note name, in whatever octave: the tom stirs its wires. */
  | { kind: 'shared-name'; snareId: string; tomId: string; cost: number }

/** A plan's cost by reason; the parts add up to the whole. In the cost's own unit: 1 is an interval of the toms one semitone off. */
export type CostSplit = {
  offMiddle: number
  outOfRange: number
  intervals: number
  order: number
  tooClose: number
  sharedNames: number
}

/** Notes for a kit with all that they cost. */
export type JudgedPlan = {
  cost: number
  split: CostSplit
  /** In the order of the kit. */
  drums: JudgedDrum[]
  /** Toms from the smallest down, then each kick. */
  intervals: JudgedInterval[]
  clashes: PlanClash[]
}

/** How an alternative differs from the best plan in its toms. */
export type PlanChange =
  /** The same intervals, the toms so many semitones higher (negative: lower). */
  | { kind: 'shifted'; semitones: number }
  /** Other intervals from tom to tom: those that differ. */
  | { kind: 'intervals'; intervals: { upperId: string; lowerId: string; best: number; here: number }[] }

export type PlanAlternative = {
  plan: JudgedPlan
  change: PlanChange
  /** Cost over the best plan's. */ extraCost: number
}

export type NotePlans = {
  best: JudgedPlan
  /** Cheapest first. */
  alternatives: PlanAlternative[]
}

/** What a drum would cost at another note: the whole plan's cost, so that choices along a range can be compared. */
export type MoveCost = {
  note: Note
  /** With every other drum left where it is. */
  cost: number
  /** With the others planned anew round it (locks and anchor kept); null unless asked for. */
  replannedCost: number | null
}
