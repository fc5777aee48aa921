import { gaussLegendre } from './gauss-legendre'
import { generalisedEigenvalues } from './symmetric-matrix'

/** In-plane pull of a film per metre, over its mean: a symmetric tensor at a place of the unit disc. */
export type Pull = { xx: number; yy: number; xy: number }

/** Shapes odd or even in x and in y; 'any' where the pull does not mirror. */
export type Parity = 'odd' | 'even' | 'any'

/**
 * Wave numbers ka of a film on the unit disc, held at the rim, under any in-plane pull, rising: Rayleigh–Ritz with shapes
 * (1 − r²)·xⁱ·yʲ, i + j ≤ degree, energies by quadrature. No Bessel function. Upper bounds.
 */
export function ritzWaveNumbers(
  pullAt: (x: number, y: number) => Pull,
  { x: inX, y: inY, degree = 9 }: { x: Parity; y: Parity; degree?: number },
): number[] {
  const allowed = (power: number, parity: Parity) => parity === 'any' || (power % 2 === 1) === (parity === 'odd')
  const powers = Array.from({ length: degree + 1 }, (_, i) => i)
  const shapes = powers
    .filter((i) => allowed(i, inX))
    .flatMap((i) => powers.filter((j) => i + j <= degree && allowed(j, inY)).map((j) => ({ i, j })))
  const zeros = () => shapes.map(() => shapes.map(() => 0))
  const [stiffness, mass] = [zeros(), zeros()]
  const rounds = 4 * degree + 8
  for (const { at: r, weight } of gaussLegendre(degree + 8, 0, 1)) {
    for (let n = 0; n < rounds; n++) {
      const angle = (2 * Math.PI * (n + 0.5)) / rounds
      const [x, y] = [r * Math.cos(angle), r * Math.sin(angle)]
      const area = (weight * r * 2 * Math.PI) / rounds
      const pull = pullAt(x, y)
      const rim = 1 - x * x - y * y
      const values = shapes.map(({ i, j }) => {
        const flat = x ** i * y ** j
        const dx = (i === 0 ? 0 : i * x ** (i - 1) * y ** j * rim) - 2 * x * flat
        const dy = (j === 0 ? 0 : j * x ** i * y ** (j - 1) * rim) - 2 * y * flat
        return { u: rim * flat, dx, dy }
      })
      values.forEach((p, a) => {
        const [fx, fy] = [pull.xx * p.dx + pull.xy * p.dy, pull.xy * p.dx + pull.yy * p.dy]
        const [rowK = [], rowM = []] = [stiffness[a], mass[a]]
        for (let b = 0; b < values.length; b++) {
          const q = values[b]
          if (q === undefined) continue
          rowK[b] = (rowK[b] ?? 0) + area * (fx * q.dx + fy * q.dy)
          rowM[b] = (rowM[b] ?? 0) + area * p.u * q.u
        }
      })
    }
  }
  return generalisedEigenvalues(stiffness, mass).map(Math.sqrt)
}

/**
 * Pull of a film in balance whose edge tension is 1 + ε·cos kθ and whose edge is greased (no shear), k ≥ 2: the Airy stress
 * function φ = r²/2 + ε·(B·r^{k+2} − B·(k+1)/(k−1)·r^k)·cos kθ with B = 1/(2k+2), by which σ_rr and σ_rθ at the edge are as said
 * (checked in the test that uses it). Its second derivatives are the pull.
 */
export function balancedPull(k: number, unevenness: number): (x: number, y: number) => Pull {
  const outer = unevenness / (2 * k + 2)
  const inner = (-outer * (k + 1)) / (k - 1)
  return (x, y) => {
    const r = Math.hypot(x, y)
    const angle = Math.atan2(y, x)
    const [cos, sin] = [Math.cos(k * angle), Math.sin(k * angle)]
    const term = (a: number, n: number) => {
      const scale = a * r ** (n - 2)
      return { rr: scale * (n - k * k) * cos, tt: scale * n * (n - 1) * cos, rt: scale * (n - 1) * k * sin }
    }
    const [p, q] = [term(inner, k), term(outer, k + 2)]
    const [rr, tt, rt] = [1 + p.rr + q.rr, 1 + p.tt + q.tt, p.rt + q.rt]
    const [c, s] = [Math.cos(angle), Math.sin(angle)]
    return {
      xx: rr * c * c + tt * s * s - 2 * rt * c * s,
      yy: rr * s * s + tt * c * c + 2 * rt * c * s,
      xy: (rr - tt) * c * s + rt * (c * c - s * s),
    }
  }
}
