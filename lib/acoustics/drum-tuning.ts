import { AcousticsError } from './acoustics-error'
import { coupledHeads } from './coupled-heads'
import { drumModel } from './drum-model'
import type { Drum, DrumModel } from './drum-model'
import { estimated } from './estimated'
import type { Estimated } from './estimated'
import { filmStressPa } from './film'
import type { Film } from './film'
import { headCautions } from './head-cautions'
import type { HeadCaution } from './head-cautions'
import { lugTapHz, undampedTapPairHz } from './lug-tap'
import { requirePitchHz } from './require-quantity'
import { keyTorqueNm, rodPullN } from './rod'
import { defaultTensionRange, rangePosition } from './tension-range'
import type { DrumRole, HeadSide, RangePosition, TensionRange } from './tension-range'

/** A head's film and, when the party keeps one, its own playable range; the role's default otherwise. */
export type DrumHead = Film & { range?: TensionRange }

export type DrumTuningInput = Omit<Drum, 'batter' | 'resonant'> & {
  role: DrumRole
  /** Rods a head, 4 to 12. */
  lugs: number
  /** The drum's note, Hz. */
  noteHz: number
  batter: DrumHead
  resonant: DrumHead | null
}

/** What one head is brought to. Every figure is an estimate with its bounds. */
export type HeadTuning = {
  side: HeadSide
  /** Tap beside a lug, fingertip on the centre, the other head damped, Hz. */
  tapHz: Estimated
  tensionNPerM: Estimated
  /** Pull on each rod, N. */
  rodPullN: Estimated
  /** Key torque, N·m: the bounds hold the thread's own scatter, too. */
  torqueNm: Estimated
  filmStressPa: Estimated
  range: TensionRange
  rangePosition: RangePosition
  cautions: HeadCaution[]
}

export type DrumTuning = {
  noteHz: number
  /** `two-heads` on a closed shell, or the batter by itself in the open air (ported, or no resonant head). */
  model: DrumModel['kind']
  /** Batter tap over the drum's note, and whether that was measured on this drum. */
  tapRatio: Estimated
  tapRatioMeasured: boolean
  /** The pitch of the heads against each other, Hz; null for one head. */
  upperPartnerHz: Estimated | null
  /** Share of the note that the heads pass to each other, 1 when matched (see `sustainShare`); null for one head. */
  sustain: number | null
  /** Distance of the two tap pitches while the other head rings, Hz: up to `MOST_WARBLE_HZ` a feigned warble; null for one head. */
  falseWarbleHz: number | null
  batter: HeadTuning
  /** Null without a resonant head, and for a ported one: a head with a hole has no figures. */
  resonant: HeadTuning | null
}

/** Two pitches further apart than this are heard as two and not as a warble, Hz (from memory). */
export const MOST_WARBLE_HZ = 20

/** Scatter of modelled pitches against real heads: 2 %, T. D. Rossing, Acoustics of Timpani, 1982 (published for bare heads). */
export const MODEL_SCATTER = 0.02

/** The same for one head on a shell that the model takes as in the open: 5 % (from memory). */
export const ONE_HEAD_SCATTER = 0.05

/** A measured ratio is two readings of a few cents each: 1 % (from memory). */
export const MEASURED_RATIO_SCATTER = 0.01

/** Film is sold to within some 5 % of its nominal thickness (from memory). */
export const FILM_SCATTER = 0.05

const MIN_TENSION_N_PER_M = 1
const MAX_TENSION_N_PER_M = 50_000

/**
 * What both heads of a drum need for its note: tensions, tap pitches, pull on each rod, key torque, film stress and where that lies
 * in the playable range, with the upper partner, sustain share and false warble. The inverse of `twoHeadModes`: `drumModel` finds
 * the batter's tension to the last bit, the rest follows in closed form.
 *
 * Bounds: the model's scatter on pitch (twice that on tension, which goes as pitch squared) together with what 5 % of film thickness
 * does, found by solving again 5 % thicker and thinner. Leaves out what `coupledHeads`, `shellAir` and `rodPullN` leave out.
 * @throws AcousticsError naming the field that was refused; `noteHz` when a head would need less than 1 or more than 50 000 N/m
 */
export function drumTuning(input: DrumTuningInput): DrumTuning {
  const noteHz = requirePitchHz('noteHz', input.noteHz)
  const [nominal, thin, thick] = [1, 1 - FILM_SCATTER, 1 + FILM_SCATTER].map((film) => solved(input, noteHz, film)) as [
    Solved,
    Solved,
    Solved,
  ]
  const measured = input.measuredTapRatio !== undefined
  const scatter = nominal.model.kind === 'two-heads' ? MODEL_SCATTER : ONE_HEAD_SCATTER
  const ratioScatter = measured ? MEASURED_RATIO_SCATTER : scatter
  /** Half the way in logarithm that a figure goes from thin to thick film. */
  const byFilm = (of: (solved: Solved) => number) => Math.abs(Math.log(of(thick) / of(thin))) / 2

  const head = (side: HeadSide, film: DrumHead): HeadTuning => {
    const tension = (of: Solved) => of[side].tensionNPerM
    const tapOf = (of: Solved) => of[side].tapHz
    const stress = (of: Solved) => filmStressPa(tension(of), film.plyMils) / of.film
    const tensionShares = [2 * scatter, ...(measured ? [2 * MEASURED_RATIO_SCATTER] : [])]
    const tensionNPerM = estimated(tension(nominal), ...tensionShares, byFilm(tension))
    // In proportion, and not by asking again: the upper bound of a tension that is allowed may lie past what is.
    const perTension = rodPullN(tensionNPerM.value, input.diameterM, input.lugs) / tensionNPerM.value
    const pulls = {
      value: perTension * tensionNPerM.value,
      low: perTension * tensionNPerM.low,
      high: perTension * tensionNPerM.high,
    }
    const range = film.range ?? defaultTensionRange(input.role, side)
    const position = rangePosition(tensionNPerM.value, range)
    const stressPa = estimated(stress(nominal), ...tensionShares, byFilm(stress))
    return {
      ...{ side, tensionNPerM, rodPullN: pulls, filmStressPa: stressPa, range, rangePosition: position },
      tapHz: estimated(tapOf(nominal), ratioScatter, byFilm(tapOf)),
      torqueNm: {
        value: keyTorqueNm(pulls.value).nominalNm,
        low: keyTorqueNm(pulls.low).lowNm,
        high: keyTorqueNm(pulls.high).highNm,
      },
      cautions: headCautions({ role: input.role, side }, position, stressPa.value),
    }
  }
  const together = nominal.together
  const tapRatio = (of: Solved) => of.batter.tapHz / noteHz
  return {
    ...{ noteHz, model: nominal.model.kind, tapRatioMeasured: measured },
    tapRatio: estimated(tapRatio(nominal), ratioScatter, byFilm(tapRatio)),
    upperPartnerHz:
      together &&
      estimated(
        together.upperPartnerHz,
        scatter,
        byFilm((of) => of.together?.upperPartnerHz ?? 1),
      ),
    sustain: together && together.sustain,
    falseWarbleHz: together && together.falseWarbleHz,
    batter: head('batter', input.batter),
    resonant: together && input.resonant ? head('resonant', input.resonant) : null,
  }
}

type SolvedHead = { tensionNPerM: number; tapHz: number }
type Solved = {
  film: number
  model: DrumModel
  batter: SolvedHead
  resonant: SolvedHead
  /** What only two heads have. */
  together: { upperPartnerHz: number; sustain: number; falseWarbleHz: number } | null
}

function solved(input: DrumTuningInput, noteHz: number, film: number): Solved {
  const model = drumModel(input, film)
  const { note, tap, tensionRatio } = model
  const batterNPerM = held('batter', noteHz, model.batterNPerM(noteHz))
  const tapHz = (tensionNPerM: number, head: 0 | 1) => lugTapHz(tensionNPerM, tap.massKgPerM2[head], tap.radiusM)
  const batter = { tensionNPerM: batterNPerM, tapHz: tapHz(batterNPerM, 0) }
  if (tensionRatio === null) return { film, model, batter, resonant: batter, together: null }
  const resonantNPerM = held('resonant', noteHz, batterNPerM * tensionRatio)
  const tensionNPerM = [batterNPerM, resonantNPerM] as const
  const pair = coupledHeads({ ...note, tensionNPerM })
  const [low, high] = undampedTapPairHz({ ...tap, tensionNPerM })
  return {
    ...{ film, model, batter, resonant: { tensionNPerM: resonantNPerM, tapHz: tapHz(resonantNPerM, 1) } },
    together: {
      // With a measured ratio the modelled note is a little off the drum's: the partner keeps its distance from the drum's.
      upperPartnerHz: (pair.upperPartnerHz / pair.noteHz) * noteHz,
      ...{ sustain: pair.sustain, falseWarbleHz: high - low },
    },
  }
}

function held(side: HeadSide, noteHz: number, tensionNPerM: number): number {
  if (tensionNPerM >= MIN_TENSION_N_PER_M && tensionNPerM <= MAX_TENSION_N_PER_M) return tensionNPerM
  throw new AcousticsError(
    'noteHz',
    `noteHz is ${noteHz}: the ${side} head would need ${Math.round(tensionNPerM)} N/m, allowed ${MIN_TENSION_N_PER_M} to ${MAX_TENSION_N_PER_M} N/m.`,
  )
}
