import { besselJZero } from './bessel-j'
import { principalDirections, requireHeadPair } from './head-pair'
import type { HeadPair } from './head-pair'
import { requireDiameterM, requirePitchHz, requireQuantity, requireTensionNPerM } from './require-quantity'

/**
 * Pitch in Hz of a tap beside a lug, shape (1,1), with a fingertip on the centre and the other head damped:
 * f11 = (j11/2πa)·√(T/s), s the film with its air in kg/m² (`shellAir(1)` self and half the open-air load).
 * @throws AcousticsError
 */
export function lugTapHz(tensionNPerM: number, massKgPerM2: number, radiusM: number): number {
  const mass = requireMass(massKgPerM2)
  return (
    (besselJZero(1, 1) / (Math.PI * requireDiameterM(2 * radiusM))) *
    Math.sqrt(requireTensionNPerM(tensionNPerM) / mass)
  )
}

/** Tension in N/m whose tap beside a lug has this pitch: the inverse of `lugTapHz`, in closed form. @throws AcousticsError */
export function lugTapTensionNPerM(tapHz: number, massKgPerM2: number, radiusM: number): number {
  const mass = requireMass(massKgPerM2)
  return mass * ((requirePitchHz('tapHz', tapHz) * Math.PI * requireDiameterM(2 * radiusM)) / besselJZero(1, 1)) ** 2
}

function requireMass(massKgPerM2: number): number {
  return requireQuantity('massKgPerM2', massKgPerM2, { min: 0.005, max: 5, unit: 'kg/m²' })
}

/**
 * The two (1,1) pitches in Hz, lower first, of a drum whose other head rings along: the air couples the heads, each pitch belongs
 * to both, and their difference sounds as a warble although either head may be perfectly even. Damp the other head and it is gone.
 * ω² from k²·T = ω²·M, k = j11/a: f = j11/(2πa·√λ), λ of the principal directions.
 * @throws AcousticsError
 */
export function undampedTapPairHz(pair: HeadPair): [number, number] {
  requireHeadPair(pair)
  const [slow, fast] = principalDirections(pair)
  const scale = besselJZero(1, 1) / (2 * Math.PI * pair.radiusM)
  return [scale / Math.sqrt(slow.slowness2), scale / Math.sqrt(fast.slowness2)]
}
