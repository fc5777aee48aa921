import { airDensityKgPerM3, ROOM_TEMPERATURE_C } from './air'
import { airLoadFactor } from './air-load'
import { coupledHeads } from './coupled-heads'
import type { CoupledPair } from './coupled-heads'
import { filmArealDensityKgPerM2 } from './film'
import type { Film } from './film'
import type { HeadPair } from './head-pair'
import { lugTapHz, undampedTapPairHz } from './lug-tap'
import { requireDiameterM, requireTensionNPerM } from './require-quantity'
import { shellAir } from './shell-air'

/** A closed shell with two heads, no tension said. `temperatureC` is the stage's, 20 °C unless given. */
export type TwoHeadDrum = {
  diameterM: number
  depthM: number
  temperatureC?: number
  batter: Film
  resonant: Film
}

/** What moves with either head in shape (m,1), batter first, without the tensions. */
export type LoadedPair = Omit<HeadPair, 'tensionNPerM'>

/**
 * What moves with one head of a closed shell in shape (m,1) by its own movement, kg/m²: film, half the open-air load β_m·ρa for the
 * outer face, and the shell's air (`shellAir` self) for the inner. With m = 1 it is the mass of a tap with the other head damped.
 * @throws AcousticsError naming the field that was refused
 */
export function loadedHeadKgPerM2(
  m: number,
  film: Film,
  { diameterM, depthM, temperatureC = ROOM_TEMPERATURE_C }: Omit<TwoHeadDrum, 'batter' | 'resonant'>,
): number {
  const { selfKgPerM2 } = shellAir(m, { diameterM, depthM, temperatureC })
  const outside = (airLoadFactor(m) / 2) * airDensityKgPerM3(temperatureC) * (diameterM / 2)
  return filmArealDensityKgPerM2(film) + selfKgPerM2 + outside
}

/**
 * Masses of both heads in shape (m,1) in air, see `loadedHeadKgPerM2`, and what the shell's air hands across.
 * @throws AcousticsError naming the field that was refused
 */
export function loadedPair(m: number, drum: TwoHeadDrum): LoadedPair {
  const { diameterM, depthM, temperatureC = ROOM_TEMPERATURE_C } = drum
  return {
    radiusM: requireDiameterM(diameterM) / 2,
    depthM,
    massKgPerM2: [loadedHeadKgPerM2(m, drum.batter, drum), loadedHeadKgPerM2(m, drum.resonant, drum)],
    crossMassKgPerM2: shellAir(m, { diameterM, depthM, temperatureC }).crossKgPerM2,
  }
}

export type TwoHeadModes = CoupledPair & {
  /** Tap beside a lug of either head, fingertip on its centre, the other head damped. Hz. */
  batterTapHz: number
  resonantTapHz: number
  /** The same with the other head left to ring: two pitches, lower first, Hz. */
  undampedTapHz: readonly [number, number]
  /** Their distance, Hz: the warble that an undamped other head feigns on even heads. */
  falseWarbleHz: number
}

/**
 * What a drum with two tensioned heads sounds: note, upper partner, taps with the other head damped and open. See `coupledHeads`
 * for the equation and what it leaves out. Two films at the same tension: the heavier sounds lower, as it must.
 * @throws AcousticsError naming the field that was refused
 */
export function twoHeadModes(drum: TwoHeadDrum, tension: { batterNPerM: number; resonantNPerM: number }): TwoHeadModes {
  const tensionNPerM = [
    requireTensionNPerM(tension.batterNPerM, 'batterNPerM'),
    requireTensionNPerM(tension.resonantNPerM, 'resonantNPerM'),
  ] as const
  const tap = loadedPair(1, drum)
  const undampedTapHz = undampedTapPairHz({ ...tap, tensionNPerM })
  return {
    ...coupledHeads({ ...loadedPair(0, drum), tensionNPerM }),
    batterTapHz: lugTapHz(tensionNPerM[0], tap.massKgPerM2[0], tap.radiusM),
    resonantTapHz: lugTapHz(tensionNPerM[1], tap.massKgPerM2[1], tap.radiusM),
    undampedTapHz,
    falseWarbleHz: undampedTapHz[1] - undampedTapHz[0],
  }
}
