import { besselJZero } from './bessel-j'
import { requireDiameterM, requirePitchHz, requireQuantity, requireTensionNPerM } from './require-quantity'

/** Shape of a head: m diameters and n circles (the rim counted) stand still. (0,1) is the note, (1,1) the tap. */
export type MembraneMode = { m: number; n: number }

export type BareHead = { diameterM: number; arealDensityKgPerM2: number }

const REFUSED_DENSITY = { min: 0.005, max: 5, unit: 'kg/m²' }

/**
 * Frequency in Hz of mode (m, n) of an ideal membrane in vacuum: f = (j_mn/2πa)·√(T/σ).
 * Leaves out air, bending stiffness and damping.
 * @throws AcousticsError
 * Source: Abramowitz & Stegun 9.5; DLMF 10.21.
 */
export function idealModeHz(mode: MembraneMode, head: BareHead & { tensionNPerM: number }): number {
  const wavesPerM = besselJZero(mode.m, mode.n) / (Math.PI * requireDiameterM(head.diameterM))
  const density = requireQuantity('arealDensityKgPerM2', head.arealDensityKgPerM2, REFUSED_DENSITY)
  return wavesPerM * Math.sqrt(requireTensionNPerM(head.tensionNPerM) / density)
}

/**
 * Film tension in N/m that puts mode (m, n) of an ideal membrane at a frequency: T = σ·(2πa·f/j_mn)².
 * @throws AcousticsError
 */
export function idealTensionNPerM(mode: MembraneMode, frequencyHz: number, head: BareHead): number {
  const density = requireQuantity('arealDensityKgPerM2', head.arealDensityKgPerM2, REFUSED_DENSITY)
  const speed =
    (requirePitchHz('frequencyHz', frequencyHz) * Math.PI * requireDiameterM(head.diameterM)) /
    besselJZero(mode.m, mode.n)
  return density * speed ** 2
}
