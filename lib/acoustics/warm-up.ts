import { filmThicknessM, METRE_PER_MIL } from './film'
import { requireQuantity } from './require-quantity'

/** A 10 mil head may lose up to this much in 10 K, its rim held fast (from memory). */
const MOST_N_PER_M = 240
const OF_THICKNESS_M = 10 * METRE_PER_MIL
const OVER_K = 10

/**
 * The most by which film tension may fall when a head warms, N/m; negative when it cools and tightens. In proportion to thickness
 * and warming from 240 N/m for 10 mil and 10 K, the rim held fast: an upper bound from memory, for the hoop gives and the shell grows
 * too. The film moves far more than the air does: tune again after warm-up, and after new heads have settled.
 * @throws AcousticsError warming outside −60 to 60 K, or the film refused
 */
export function mostSlackeningNPerM(plyMils: readonly number[], warmingK: number): number {
  requireQuantity('warmingK', warmingK, { min: -60, max: 60, unit: 'K' })
  return (MOST_N_PER_M * (filmThicknessM(plyMils) / OF_THICKNESS_M) * warmingK) / OVER_K
}
