import { requireDepthM, requireDiameterM, requireQuantity, requireTensionNPerM } from './require-quantity'

/**
 * Two heads on one shell, both counted along one axis. `massKgPerM2` is what moves with each head by its own movement, film and
 * air; `crossMassKgPerM2` what the air hands from one to the other, positive where it helps heads that move the same way.
 */
export type HeadPair = {
  radiusM: number
  depthM: number
  tensionNPerM: readonly [number, number]
  massKgPerM2: readonly [number, number]
  crossMassKgPerM2: number
}

/**
 * One principal direction of T^{−1/2}·M·T^{−1/2}, in which the pair is two separate films: its slowness squared λ in s²/m², the
 * part g of the air's pressure that drives it, (m/N)^{1/2}, and the share of either head in it.
 */
export type PrincipalDirection = { slowness2: number; drive: number; of: readonly [number, number] }

/** Refuses a pair that cannot be: sizes, tensions, masses, or air that hands over more than it holds. @throws AcousticsError */
export function requireHeadPair(pair: HeadPair): void {
  requireDiameterM(2 * pair.radiusM)
  requireDepthM(pair.depthM)
  for (const tension of pair.tensionNPerM) requireTensionNPerM(tension)
  for (const mass of pair.massKgPerM2) requireQuantity('massKgPerM2', mass, { min: 0.005, max: 5, unit: 'kg/m²' })
  const most = Math.sqrt(pair.massKgPerM2[0] * pair.massKgPerM2[1]) * 0.999
  requireQuantity('crossMassKgPerM2', pair.crossMassKgPerM2, { min: -most, max: most, unit: 'kg/m²' })
}

/**
 * Both principal directions, the slower (greater λ) first, by one Jacobi rotation: exact for a 2 × 2, and square for equal heads,
 * whose common movement then takes no pressure at all.
 */
export function principalDirections(
  pair: Pick<HeadPair, 'tensionNPerM' | 'massKgPerM2' | 'crossMassKgPerM2'>,
): [PrincipalDirection, PrincipalDirection] {
  const [[t1, t2], [s1, s2]] = [pair.tensionNPerM, pair.massKgPerM2]
  const [a, b, c] = [s1 / t1, s2 / t2, pair.crossMassKgPerM2 / Math.sqrt(t1 * t2)]
  const angle = a === b ? Math.PI / 4 : Math.atan2(2 * c, a - b) / 2
  const [cos, sin] = [Math.cos(angle), Math.sin(angle)]
  const one: PrincipalDirection = {
    slowness2: a * cos ** 2 + 2 * c * sin * cos + b * sin ** 2,
    drive: cos / Math.sqrt(t1) - sin / Math.sqrt(t2),
    of: [cos, sin],
  }
  const other: PrincipalDirection = {
    slowness2: a * sin ** 2 - 2 * c * sin * cos + b * cos ** 2,
    drive: -sin / Math.sqrt(t1) - cos / Math.sqrt(t2),
    of: [-sin, cos],
  }
  return one.slowness2 >= other.slowness2 ? [one, other] : [other, one]
}
