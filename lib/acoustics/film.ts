import { AcousticsError } from './acoustics-error'
import { requireQuantity } from './require-quantity'

/** A mil is a thousandth of an inch: 25.4 µm exactly. */
export const METRE_PER_MIL = 25.4e-6

/** Density of biaxially oriented PET film, kg/m³: DuPont Teijin Films data sheet H-37232-3 (1.390 g/cm³). */
export const PET_DENSITY_KG_PER_M3 = 1390

/** Stress of the same film at 5 % strain, Pa: DuPont Teijin Films H-37232-3 (98 MPa). */
export const PET_STRESS_AT_5_PERCENT_PA = 98e6

/** The film of a head: thickness of each ply in mils, and what the coating adds in kg/m². */
export type Film = { plyMils: readonly number[]; coatingKgPerM2: number }

/**
 * Thickness in metres of all plies together (coating left out: it carries no tension).
 * @throws AcousticsError no ply, more than four, or a ply outside 0.5 to 30 mil
 */
export function filmThicknessM(plyMils: readonly number[]): number {
  if (plyMils.length < 1 || plyMils.length > 4) {
    throw new AcousticsError('plyMils', `plyMils has ${plyMils.length} plies: allowed 1 to 4.`)
  }
  return plyMils.reduce(
    (sum, mil) => sum + requireQuantity('plyMils', mil, { min: 0.5, max: 30, unit: 'mil' }) * METRE_PER_MIL,
    0,
  )
}

/**
 * Areal density σ of a head in kg/m²: ρ·Σ ply thickness + coating.
 * Leaves out damping rings, dots and moon gel: add their mass to the coating if it is known.
 * @throws AcousticsError a ply outside 0.5 to 30 mil, coating outside 0 to 1 kg/m²
 */
export function filmArealDensityKgPerM2({ plyMils, coatingKgPerM2 }: Film): number {
  return (
    PET_DENSITY_KG_PER_M3 * filmThicknessM(plyMils) +
    requireQuantity('coatingKgPerM2', coatingKgPerM2, { min: 0, max: 1, unit: 'kg/m²' })
  )
}

/**
 * Mean stress in the film in Pa for a film tension in N/m: T/thickness.
 * @throws AcousticsError
 */
export function filmStressPa(tensionNPerM: number, plyMils: readonly number[]): number {
  requireQuantity('tensionNPerM', tensionNPerM, { min: 0, max: 50_000, unit: 'N/m' })
  return tensionNPerM / filmThicknessM(plyMils)
}
