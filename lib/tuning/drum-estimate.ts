import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { headEstimate } from '@/lib/acoustics/head-estimate'
import type { HeadEstimate, HeadEstimateInput } from '@/lib/acoustics/head-estimate'
import { noteFrequencyHz, STANDARD_REFERENCE_HZ } from '@/lib/acoustics/note'
import type { Note } from '@/lib/acoustics/note'
import { METRE_PER_INCH } from '@/lib/acoustics/require-quantity'
import type { DrumRole, HeadSide } from '@/lib/acoustics/tension-range'
import { resonantTargetHz } from './head-relation'
import type { PlanDrum } from './note-plan'

const KG_PER_G = 1e-3

/** A head as the trade writes it: plies in mil, what the coating adds in g/m². */
export type TradeHead = { readonly plyMils: readonly number[]; readonly coatingGPerM2: number }

/** A drum as the trade writes it: nominal inches, lugs per head. A kit entry's spec is one. */
export type TradeDrum = {
  readonly role: DrumRole
  readonly diameterIn: number
  readonly lugs: number
  readonly batter: TradeHead
  readonly resonant: TradeHead | null
  readonly note: Readonly<Note> | null
  /** Resonant over batter head, cents. */
  readonly headRelationCents: number
}

/** Where the drum is tuned: the party's A4 in Hz and the stage's temperature in °C; 440 and 20 unless given. */
export type TuningStage = { readonly referenceHz?: number | undefined; readonly temperatureC?: number | undefined }

/** One head's figures, or the sentence that says why there are none. `input` is what they were worked out from. */
export type SideEstimate = {
  readonly side: HeadSide
  /** Pitch wanted of this head alone, Hz. */
  readonly noteHz: number
  readonly input: HeadEstimateInput
} & (
  { readonly estimate: HeadEstimate; readonly refusal: null } | { readonly estimate: null; readonly refusal: string }
)

export type DrumEstimate = {
  readonly noteHz: number
  readonly batter: SideEstimate
  readonly resonant: SideEstimate | null
}

/** A head's film in SI units: plies in mil stay, the coating goes from g/m² to kg/m². */
export function filmOf({ plyMils, coatingGPerM2 }: TradeHead) {
  return { plyMils: [...plyMils], coatingKgPerM2: coatingGPerM2 * KG_PER_G }
}

/** A drum as the note plan takes it; its note goes along when it is locked. */
export function planDrumOf(id: string, drum: TradeDrum & { readonly noteLocked: boolean }): PlanDrum {
  const { role, diameterIn, batter, note, noteLocked } = drum
  return { id, role, diameterIn, batter: filmOf(batter), ...(noteLocked && note ? { lockedNote: note } : {}) }
}

/**
 * What both heads of a drum need for its note, each as a head in the open air, the resonant one by the drum's head relation.
 * Null while the drum has no note. Figures are estimates (see `headEstimate`); a head that cannot sound its note says so in `refusal`.
 * @throws AcousticsError the party's reference outside 415 to 466 Hz, or a relation outside ±1200 cents
 */
export function drumEstimate(drum: TradeDrum, stage: TuningStage = {}): DrumEstimate | null {
  if (drum.note === null) return null
  const noteHz = noteFrequencyHz(drum.note, stage.referenceHz ?? STANDARD_REFERENCE_HZ)
  return {
    noteHz,
    batter: sideEstimate(drum, 'batter', drum.batter, noteHz, stage),
    resonant:
      drum.resonant &&
      sideEstimate(drum, 'resonant', drum.resonant, resonantTargetHz(noteHz, drum.headRelationCents), stage),
  }
}

function sideEstimate(
  drum: TradeDrum,
  side: HeadSide,
  head: TradeHead,
  noteHz: number,
  stage: TuningStage,
): SideEstimate {
  const { role, lugs, diameterIn } = drum
  const input: HeadEstimateInput = {
    ...{ ...filmOf(head), diameterM: diameterIn * METRE_PER_INCH, noteHz, lugs, role, side },
    ...(stage.temperatureC === undefined ? {} : { temperatureC: stage.temperatureC }),
  }
  try {
    return { side, noteHz, input, estimate: headEstimate(input), refusal: null }
  } catch (error) {
    if (!(error instanceof AcousticsError)) throw error
    return { side, noteHz, input, estimate: null, refusal: error.message }
  }
}
