import { besselBulge, besselJZero } from './bessel-j'
import { principalDirections, requireHeadPair } from './head-pair'
import type { HeadPair, PrincipalDirection } from './head-pair'
import { requirePitchHz, requireQuantity } from './require-quantity'
import { risingRoot } from './rising-root'
import { sustainShare } from './sustain-share'

/** Ratio of specific heats of air times sea-level pressure, Pa: 1.4·101 325. */
export const AIR_STIFFNESS_PA = 1.4 * 101_325

/** `noteHz`: heads together. `upperPartnerHz`: heads against each other, the air's spring between. `sustain`: see `sustainShare`. */
export type CoupledPair = { noteHz: number; upperPartnerHz: number; sustain: number }

/**
 * The two lowest symmetric frequencies of two heads coupled by the air between them, Hz.
 *
 * With M = [[s1, χ], [χ, s2]], T = diag(T1, T2), d = (1, −1): ∇²u + ω²·T⁻¹M·u = p·T⁻¹·d and p = (γP0/V)·∫d·u dA. In the
 * principal directions of T^{−1/2}·M·T^{−1/2} (eigenvalues λ_j, g = Qᵀ·T^{−1/2}·d, x_j = ωa·√λ_j) this leaves
 * 1 + (γP0·a²/L)·Σ g_j²·J2(x_j)/(x_j²·J0(x_j)) = 0. Without air masses (χ = 0, s = σ) it is the exact equation of two films on
 * massless adiabatic air. The sum rises between its poles j0n/(a√λ), so one root lies between the lowest two and the next between
 * the second and third: matched heads, whose note takes no pressure, come out as the pole itself.
 *
 * Takes the air's masses with the (0,1) shape at every frequency. Leaves out the shell's wall, vent holes, stiffness and damping.
 * @throws AcousticsError naming what was refused
 */
export function coupledHeads(pair: HeadPair): CoupledPair {
  requireHeadPair(pair)
  const { radiusM, depthM } = pair
  const [slow, fast] = principalDirections(pair)
  const stiffness = (AIR_STIFFNESS_PA * radiusM ** 2) / depthM
  const part = ({ slowness2, drive }: PrincipalDirection, omega: number) => {
    const x = omega * radiusM * Math.sqrt(slowness2)
    return (stiffness * drive ** 2 * besselBulge(x)) / x ** 2
  }
  const sum = (omega: number) => 1 + part(slow, omega) + part(fast, omega)
  const pole = ({ slowness2 }: PrincipalDirection, n: number) => besselJZero(0, n) / (radiusM * Math.sqrt(slowness2))
  // Films far apart: further poles of the slower one may come before the faster one's first.
  const poles = [pole(slow, 1), pole(slow, 2), pole(slow, 3), pole(fast, 1)].sort((a, b) => a - b)
  const [low, second, third] = poles as [number, number, number, number]
  const note = risingRoot(sum, low, second)
  return {
    noteHz: note / (2 * Math.PI),
    upperPartnerHz: risingRoot(sum, second, third) / (2 * Math.PI),
    sustain: sustainShare(pair, [slow, fast], note, stiffness),
  }
}

/**
 * Tension in N/m of the first head that puts the note at `noteHz` while the second has `tensionRatio` times its tension.
 * The equation of `coupledHeads` read in u = 1/√T1 at a fixed ω rises between its poles just the same: one root to the last bit,
 * with no search over notes. The tension of `pair` itself is not read.
 * @throws AcousticsError naming what was refused
 */
export function coupledTensionNPerM(
  noteHz: number,
  tensionRatio: number,
  pair: Omit<HeadPair, 'tensionNPerM'>,
): number {
  const omega = 2 * Math.PI * requirePitchHz('noteHz', noteHz)
  requireQuantity('tensionRatio', tensionRatio, { min: 1e-3, max: 1e3, unit: '' })
  requireHeadPair({ ...pair, tensionNPerM: [1, 1] })
  const [slow, fast] = principalDirections({ ...pair, tensionNPerM: [1, tensionRatio] })
  const stiffness = AIR_STIFFNESS_PA / (pair.depthM * omega ** 2)
  const perTension = ({ slowness2, drive }: PrincipalDirection) => ({
    weight: (stiffness * drive ** 2) / slowness2,
    x: omega * pair.radiusM * Math.sqrt(slowness2),
  })
  const [one, other] = [perTension(slow), perTension(fast)]
  const part = ({ weight, x }: typeof one, u: number) => weight * besselBulge(x * u)
  const [first, second] = [besselJZero(0, 1), besselJZero(0, 2)]
  const upTo = Math.min(first / other.x, second / one.x)
  return risingRoot((u) => 1 + part(one, u) + part(other, u), first / one.x, upTo) ** -2
}
