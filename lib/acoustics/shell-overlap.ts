import { besselJZero, besselSlopeZero } from './bessel-j'
import { requireWhole } from './require-quantity'

/** One radial mode of the air in a cylinder: wavenumber times radius, and its share w of a head's shape. */
export type ShellMode = { wavenumber: number; overlap: number }

/** Modes kept of each series. */
const MODES = 40

const kept = new Map<number, readonly ShellMode[]>()

/**
 * Shares w_n of head shape (m,1) among the radial modes J_m(k_n r) of a rigid cylinder, k_n > 0 the zeros of J_m′; the first 40.
 * With j = j_m1, both norms and the product in closed form (DLMF 10.22.4, 10.22.37, 10.22.38):
 * w_n = 4j²/((k_n² − j²)²·(1 − m²/k_n²)). For m = 0 the uniform part `uniformOverlap` belongs to them; then they sum to 1.
 * Worked out once and kept.
 * @throws AcousticsError m not a whole number 0 to 8
 */
export function shellModes(m: number): readonly ShellMode[] {
  requireWhole('m', m, { min: 0, max: 8, unit: '' })
  const known = kept.get(m)
  if (known) return known
  const j = besselJZero(m, 1)
  const modes = Array.from({ length: MODES }, (_, index) => {
    const wavenumber = besselSlopeZero(m, index + 1)
    return { wavenumber, overlap: (4 * j ** 2) / ((wavenumber ** 2 - j ** 2) ** 2 * (1 - (m / wavenumber) ** 2)) }
  })
  kept.set(m, modes)
  return modes
}

/** Share w_0 = 4/j01² = 0.69166 of the (0,1) shape in a uniform piston: what squeezes the air and what moves the plug. */
export function uniformOverlap(): number {
  return 4 / besselJZero(0, 1) ** 2
}
