import { filmThicknessM, PET_DENSITY_KG_PER_M3 } from './film'
import type { Film } from './film'
import { coupledHeads, coupledTensionNPerM } from './coupled-heads'
import { lugTapHz, lugTapTensionNPerM } from './lug-tap'
import { idealModeHz, idealTensionNPerM } from './membrane-mode'
import { openAirDensityKgPerM2 } from './open-air-head'
import {
  requireDepthM,
  requireDiameterM,
  requirePitchHz,
  requireQuantity,
  requireTensionNPerM,
} from './require-quantity'
import { ROOM_TEMPERATURE_C } from './air'
import { TAP_RATIO_LIMITS } from './tap-ratio-limits'
import { loadedPair } from './two-head-drum'
import type { LoadedPair } from './two-head-drum'

/** A drum and how its heads are set to each other, no note said. */
export type Drum = {
  /** Nominal diameter and depth of the shell, m. */
  diameterM: number
  depthM: number
  /** Stage temperature, 20 °C unless given. */
  temperatureC?: number
  batter: Film
  /** Null on a drum with one head. */
  resonant: Film | null
  /** A hole in the resonant head: the shell is no closed cavity. */
  ported?: boolean
  /** Tap pitch of the resonant over that of the batter head, cents, each with the other damped; −1200 to 1200. */
  relationCents: number
  /** Batter tap over the drum's note as measured on this drum with its heads in this relation, 1.2 to 2.5: replaces the model of the note. */
  measuredTapRatio?: number
}

/** Two heads on a closed shell, or the batter as a head in the open air (ported, or no resonant head). */
export type DrumModel = {
  kind: 'two-heads' | 'one-head'
  /** Tension of the resonant over that of the batter head, by the relation of their taps; null for one head. */
  tensionRatio: number | null
  /** What moves in the note and in the tap with the batter and (two heads) the resonant head; cross mass 0 for one head. */
  note: LoadedPair
  tap: LoadedPair
  /** The drum's note in Hz at a batter tension, the resonant head following by the relation. Rises with it. */
  noteHz: (batterNPerM: number) => number
  /** Batter tension in N/m that sounds a note: the inverse of `noteHz`, to the last bit. */
  batterNPerM: (noteHz: number) => number
  /** Tap of the batter head in Hz at a batter tension, other head damped. */
  batterTapHz: (batterNPerM: number) => number
}

/**
 * The model of one drum, its air loads worked out once: note ↔ tension ↔ tap with the relation of the heads held. Both ways are
 * closed form or one bracketed root; a call takes tens of microseconds.
 *
 * The relation is that of the two tap pitches, so T2/T1 = (s2/s1)·2^(cents/600), s the (1,1) masses. With a measured ratio the tap is
 * note × ratio and the tensions follow from the (1,1) shape alone. A ported drum and one without a resonant head are a single
 * head in the open air. `filmFactor` thickens the film of both heads (1.05: 5 % over nominal) to see what that does.
 * @throws AcousticsError naming the field that was refused
 */
export function drumModel(drum: Drum, filmFactor = 1): DrumModel {
  const { measuredTapRatio, resonant } = drum
  requireDepthM(drum.depthM)
  const relation = requireQuantity('relationCents', drum.relationCents, { min: -1200, max: 1200, unit: 'cents' })
  if (measuredTapRatio !== undefined)
    requireQuantity('measuredTapRatio', measuredTapRatio, { ...TAP_RATIO_LIMITS, unit: '' })
  const closed = resonant !== null && !drum.ported
  const loads = (m: number) =>
    thickened(drum, closed ? loadedPair(m, { ...drum, resonant }) : openPair(m, drum), filmFactor)
  const [note, tap] = [loads(0), loads(1)]
  const { radiusM } = tap
  const ratio = closed ? (tap.massKgPerM2[1] / tap.massKgPerM2[0]) * 2 ** (relation / 600) : null
  const batterTapHz = (batterNPerM: number) => lugTapHz(batterNPerM, tap.massKgPerM2[0], radiusM)
  const common = {
    kind: closed ? ('two-heads' as const) : ('one-head' as const),
    tensionRatio: ratio,
    note,
    tap,
    batterTapHz,
  }

  if (measuredTapRatio !== undefined) {
    return {
      ...common,
      noteHz: (batterNPerM) => batterTapHz(batterNPerM) / measuredTapRatio,
      batterNPerM: (noteHz) =>
        lugTapTensionNPerM(requirePitchHz('noteHz', noteHz) * measuredTapRatio, tap.massKgPerM2[0], radiusM),
    }
  }
  if (ratio === null) {
    const head = { diameterM: drum.diameterM, arealDensityKgPerM2: note.massKgPerM2[0] }
    return {
      ...common,
      noteHz: (tensionNPerM) => idealModeHz({ m: 0, n: 1 }, { ...head, tensionNPerM }),
      batterNPerM: (noteHz) => idealTensionNPerM({ m: 0, n: 1 }, noteHz, head),
    }
  }
  return {
    ...common,
    noteHz: (batterNPerM) =>
      coupledHeads({ ...note, tensionNPerM: [requireTensionNPerM(batterNPerM), ratio * batterNPerM] }).noteHz,
    batterNPerM: (noteHz) => coupledTensionNPerM(noteHz, ratio, note),
  }
}

/** The batter alone with open air on both faces, written as a pair: the second head is a copy that nothing hands anything to. */
function openPair(m: number, drum: Drum): LoadedPair {
  const density = openAirDensityKgPerM2(m, {
    ...drum.batter,
    diameterM: drum.diameterM,
    temperatureC: drum.temperatureC ?? ROOM_TEMPERATURE_C,
  })
  return {
    ...{ radiusM: requireDiameterM(drum.diameterM) / 2, depthM: drum.depthM },
    ...{ massKgPerM2: [density, density], crossMassKgPerM2: 0 },
  }
}

function thickened({ batter, resonant }: Drum, pair: LoadedPair, factor: number): LoadedPair {
  const more = ({ plyMils }: Film) => (factor - 1) * PET_DENSITY_KG_PER_M3 * filmThicknessM(plyMils)
  const [first, second] = pair.massKgPerM2
  return { ...pair, massKgPerM2: [first + more(batter), second + more(resonant ?? batter)] }
}
