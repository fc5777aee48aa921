import { besselBulge, besselJZero } from './bessel-j'
import { requireQuantity } from './require-quantity'
import { risingRoot } from './rising-root'

/**
 * Lowest symmetric root x = ωa·√(σ/T) of one head on a closed rigid cavity, its air massless: J0(x) = −B·J2(x)/x² with
 * B = γ·P0·πa⁴/(T·V), the air's stiffness over the film's. From 2.4048 (B = 0, no cavity) it rises with B and stays below 5.1356.
 * Multiplied by −1/J0 this is 1 + B·J2/(x²J0) = 0, which rises from −∞ at j01 to +∞ at j02.
 * Leaves out the mass of the air inside and outside.
 * @throws AcousticsError B outside 0 to 1e9
 * Source: L. E. Kinsler et al., Fundamentals of Acoustics; R. L. Raichel, The Science and Applications of Acoustics, table 6.2.
 */
export function cavityHeadRoot(stiffnessRatio: number): number {
  const b = requireQuantity('stiffnessRatio', stiffnessRatio, { min: 0, max: 1e9, unit: '' })
  return risingRoot((x) => 1 + (b * besselBulge(x)) / x ** 2, besselJZero(0, 1), besselJZero(0, 2))
}
