import { AcousticsError } from './acoustics-error'
import { ROOM_TEMPERATURE_C } from './air'
import { besselJZero } from './bessel-j'
import { filmStressPa, PET_STRESS_AT_5_PERCENT_PA } from './film'
import type { Film } from './film'
import { openAirTapRatio, openAirTensionNPerM } from './open-air-head'
import { requirePitchHz, requireQuantity } from './require-quantity'
import { keyTorqueNm, rodPullN } from './rod'
import type { TorqueRange } from './rod'
import { defaultTensionRange, rangePosition } from './tension-range'
import type { DrumRole, HeadSide, RangePosition, TensionRange } from './tension-range'

export type HeadEstimateInput = Film & {
  /** Nominal diameter in m, 0.1 to 0.8. */
  diameterM: number
  /** Note wanted of this head, Hz. */
  noteHz: number
  /** Rods on this head, 4 to 12. */
  lugs: number
  role: DrumRole
  /** Batter unless given. */
  side?: HeadSide
  /** Stage temperature, 20 °C unless given. */
  temperatureC?: number
  /** The head's own playable range; the role's default unless given. */
  range?: TensionRange
  /** Tap over note as measured on this drum, 1.2 to 2.5: replaces the model's. */
  measuredTapRatio?: number
}

/** Why a wanted note wants a second look. `film-stress`: the film itself is pulled harder than this kind of head should be. */
export type HeadCaution = 'slack' | 'choked' | 'film-stress'

export type HeadEstimate = {
  noteHz: number
  tensionNPerM: number
  tapHz: number
  tapRatio: number
  /** Where the true figures lie for a drum of ordinary size: a bound on the model, not on the arithmetic. */
  interval: { tapLowHz: number; tapHighHz: number; tensionLowNPerM: number; tensionHighNPerM: number }
  rodPullN: number
  torqueNm: TorqueRange
  filmStressPa: number
  range: TensionRange
  rangePosition: RangePosition
  cautions: HeadCaution[]
}

/** Scatter of the one-term air load against a real open head: 2 %, Rossing 1982 (tested beside `openAirModeHz`). */
export const OPEN_AIR_SCATTER = 0.02

/**
 * On a shell the note of a 10 mil head at one tension lies from 1 % under to 11 % over the open-air figure (worked out for
 * 8 to 26 in across, 3 to 18 in deep, both heads alike, with the shell's air as a rigid cylinder; derived). Tension goes
 * as the square, so a wanted note needs 0.80 to 1.05 of the open-air tension.
 */
export const SHELL_TENSION_LOW = 0.8
export const SHELL_TENSION_HIGH = 1.05

/** A measured ratio is two readings of a few cents each: ±1 % (from memory). */
export const MEASURED_RATIO_SCATTER = 0.01

/** Share of the 5 % strain stress that is still ordinary: a third, but two thirds for the 3 mil snare side (from memory). */
const STRESS_SHARE = 1 / 3
const SNARE_SIDE_STRESS_SHARE = 2 / 3

/** No drum film holds more than this, N/m. */
const MAX_TENSION_N_PER_M = 50_000
const MIN_TENSION_N_PER_M = 1

/**
 * What one head needs to sound a note, as a head in the open air: film tension, tap pitch beside a lug, pull on each rod,
 * key torque, film stress, and where that lies in the head's playable range.
 *
 * Every figure is an estimate. The tap lies between the ideal membrane's ratio 1.593 (no air) and the open-air ratio plus
 * 2 %: the shell's air moves it down from the open-air figure, and on every ordinary shell it stays above 1.593 (derived).
 * Leaves out the shell, its air, and the other head.
 *
 * @throws AcousticsError naming the field that was refused
 */
export function headEstimate(input: HeadEstimateInput): HeadEstimate {
  const noteHz = requirePitchHz('noteHz', input.noteHz)
  const head = {
    diameterM: input.diameterM,
    plyMils: input.plyMils,
    coatingKgPerM2: input.coatingKgPerM2,
    temperatureC: input.temperatureC ?? ROOM_TEMPERATURE_C,
  }
  const side = input.side ?? 'batter'
  const tensionNPerM = openAirTensionNPerM(noteHz, head)
  if (tensionNPerM < MIN_TENSION_N_PER_M || tensionNPerM > MAX_TENSION_N_PER_M) {
    throw new AcousticsError(
      'noteHz',
      `noteHz is ${noteHz}: this head would need ${Math.round(tensionNPerM)} N/m, allowed ${MIN_TENSION_N_PER_M} to ${MAX_TENSION_N_PER_M} N/m.`,
    )
  }
  const { tapRatio, tapLowRatio, tapHighRatio } = tapRatios(openAirTapRatio(head), input.measuredTapRatio)
  const range = input.range ?? defaultTensionRange(input.role, side)
  const position = rangePosition(tensionNPerM, range)
  const stressPa = filmStressPa(tensionNPerM, input.plyMils)
  const pullN = rodPullN(tensionNPerM, input.diameterM, input.lugs)
  const stressShare = input.role === 'snare' && side === 'resonant' ? SNARE_SIDE_STRESS_SHARE : STRESS_SHARE

  const cautions: HeadCaution[] = []
  if (position.zone === 'slack' || position.zone === 'choked') cautions.push(position.zone)
  if (stressPa > stressShare * PET_STRESS_AT_5_PERCENT_PA) cautions.push('film-stress')

  return {
    noteHz,
    tensionNPerM,
    tapHz: tapRatio * noteHz,
    tapRatio,
    interval: {
      tapLowHz: tapLowRatio * noteHz,
      tapHighHz: tapHighRatio * noteHz,
      tensionLowNPerM: SHELL_TENSION_LOW * tensionNPerM,
      tensionHighNPerM: SHELL_TENSION_HIGH * tensionNPerM,
    },
    rodPullN: pullN,
    torqueNm: keyTorqueNm(pullN),
    filmStressPa: stressPa,
    range,
    rangePosition: position,
    cautions,
  }
}

function tapRatios(openAirRatio: number, measuredTapRatio: number | undefined) {
  if (measuredTapRatio !== undefined) {
    const ratio = requireQuantity('measuredTapRatio', measuredTapRatio, { min: 1.2, max: 2.5, unit: '' })
    return {
      tapRatio: ratio,
      tapLowRatio: ratio * (1 - MEASURED_RATIO_SCATTER),
      tapHighRatio: ratio * (1 + MEASURED_RATIO_SCATTER),
    }
  }
  return {
    tapRatio: openAirRatio,
    tapLowRatio: besselJZero(1, 1) / besselJZero(0, 1),
    tapHighRatio: openAirRatio * (1 + OPEN_AIR_SCATTER),
  }
}
