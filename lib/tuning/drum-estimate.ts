import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import type { Drum } from '@/lib/acoustics/drum-model'
import { drumTuning } from '@/lib/acoustics/drum-tuning'
import type { DrumTuning, DrumTuningInput } from '@/lib/acoustics/drum-tuning'
import { noteFrequencyHz, STANDARD_REFERENCE_HZ } from '@/lib/acoustics/note'
import type { Note } from '@/lib/acoustics/note'
import { METRE_PER_INCH } from '@/lib/acoustics/require-quantity'
import type { DrumRole, TensionRange } from '@/lib/acoustics/tension-range'

const KG_PER_G = 1e-3

/** A head as the trade writes it: plies in mil, what the coating adds in g/m², its own playable range when the party keeps one. */
export type TradeHead = {
  readonly plyMils: readonly number[]
  readonly coatingGPerM2: number
  readonly range?: Readonly<TensionRange> | null | undefined
}

/** A drum as the trade writes it: nominal inches, lugs per head. A kit entry's spec is one. */
export type TradeDrum = {
  readonly role: DrumRole
  readonly diameterIn: number
  readonly depthIn: number
  readonly lugs: number
  readonly ported: boolean
  readonly batter: TradeHead
  readonly resonant: TradeHead | null
  readonly note: Readonly<Note> | null
  /** Tap of the resonant over that of the batter head, cents, each with the other damped. */
  readonly headRelationCents: number
  /** Batter tap over the drum's note, when it was measured on this drum. */
  readonly measuredTapRatio?: number | null | undefined
}

/** Where the drum is tuned: the party's A4 in Hz and the stage's temperature in °C; 440 and 20 unless given. */
export type TuningStage = { readonly referenceHz?: number | undefined; readonly temperatureC?: number | undefined }

/** A drum's figures, or the sentence that says why there are none. `input` is what they were worked out from. */
export type DrumEstimate = { readonly noteHz: number; readonly input: DrumTuningInput } & (
  { readonly tuning: DrumTuning; readonly refusal: null } | { readonly tuning: null; readonly refusal: string }
)

/** A head's film in SI units: plies in mil stay, the coating goes from g/m² to kg/m². */
export function filmOf({ plyMils, coatingGPerM2 }: TradeHead) {
  return { plyMils: [...plyMils], coatingKgPerM2: coatingGPerM2 * KG_PER_G }
}

/** What of a drum its pitch hangs on. */
export type PitchedDrum = Pick<
  TradeDrum,
  'diameterIn' | 'depthIn' | 'ported' | 'batter' | 'resonant' | 'headRelationCents' | 'measuredTapRatio'
>

/** The drum as the model takes it, in SI units. */
export function modelDrumOf(drum: PitchedDrum, { temperatureC }: TuningStage): Drum {
  const { diameterIn, depthIn, ported, batter, resonant, headRelationCents, measuredTapRatio } = drum
  return {
    ...{ diameterM: diameterIn * METRE_PER_INCH, depthM: depthIn * METRE_PER_INCH, ported },
    ...{ batter: filmOf(batter), resonant: resonant && filmOf(resonant), relationCents: headRelationCents },
    ...(temperatureC === undefined ? {} : { temperatureC }),
    ...(measuredTapRatio == null ? {} : { measuredTapRatio }),
  }
}

/**
 * What a drum needs for its note, both heads worked out together by the relation of their taps (see `drumTuning`).
 * Null while the drum has no note. A drum that cannot sound its note says so in `refusal`.
 * @throws AcousticsError the party's reference outside 415 to 466 Hz
 */
export function drumEstimate(drum: TradeDrum, stage: TuningStage = {}): DrumEstimate | null {
  if (drum.note === null) return null
  const noteHz = noteFrequencyHz(drum.note, stage.referenceHz ?? STANDARD_REFERENCE_HZ)
  const { role, lugs, batter, resonant } = drum
  const model = modelDrumOf(drum, stage)
  const input: DrumTuningInput = {
    ...{ ...model, role, lugs, noteHz },
    batter: { ...model.batter, ...rangeOf(batter) },
    resonant: model.resonant && { ...model.resonant, ...rangeOf(resonant) },
  }
  try {
    return { noteHz, input, tuning: drumTuning(input), refusal: null }
  } catch (error) {
    if (!(error instanceof AcousticsError)) throw error
    return { noteHz, input, tuning: null, refusal: error.message }
  }
}

function rangeOf(head: TradeHead | null): { range?: TensionRange } {
  return head?.range ? { range: head.range } : {}
}
