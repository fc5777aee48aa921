import { besselJ } from './bessel-j'
import type { HeadPair, PrincipalDirection } from './head-pair'

/**
 * Share of the note's swept volume that is passed from head to head and not squeezed, 0 to 1: 1 − |q1 − q2|/(|q1| + |q2|), q the
 * volume either head sweeps along the axis in the note. At 1, heads matched, one gives what the other takes: the drum as a whole
 * pushes no air into the room (a dipole, a poor radiator) and the note lasts. It falls as the heads part; at 0 one head moves alone,
 * or both against each other. A share, not seconds: damping in film, edge and hand is left out.
 *
 * Along a principal direction the swept volume is −p·g·J2/(x²J0), infinite at its pole; so the one nearer to its pole is taken
 * from the equation itself and both are multiplied by the other's J0: nothing is divided by that can be 0.
 * `omega` is the note's, rad/s, a root of `coupledHeads`; `stiffness` γP0a²/L, N/m.
 */
export function sustainShare(
  { radiusM, tensionNPerM }: HeadPair,
  directions: readonly [PrincipalDirection, PrincipalDirection],
  omega: number,
  stiffness: number,
): number {
  const atNote = (direction: PrincipalDirection) => {
    const x = omega * radiusM * Math.sqrt(direction.slowness2)
    return { ...direction, j0: besselJ(0, x), pull: stiffness * direction.drive ** 2 * (besselJ(2, x) / x ** 2) }
  }
  const [one, other] = [atNote(directions[0]), atNote(directions[1])]
  const [near, far] = Math.abs(one.j0) <= Math.abs(other.j0) ? [one, other] : [other, one]
  const [alongNear, alongFar] = [-(far.j0 + far.pull) * far.drive, far.pull * near.drive]
  const swept = (head: 0 | 1) => (near.of[head] * alongNear + far.of[head] * alongFar) / Math.sqrt(tensionNPerM[head])
  const [first, second] = [swept(0), swept(1)]
  return 1 - Math.abs(first - second) / (Math.abs(first) + Math.abs(second))
}
