import { describe, expect, it } from 'vitest'
import { airLoadFactor } from './air-load'

/** Bessel's integral (DLMF 10.9.2), trapezoid over half a period by symmetry: no code shared with the package. */
function besselByIntegral(order: number, x: number): number {
  const points = 160
  let sum = 0
  for (let i = 0; i < points; i++) {
    const t = (2 * Math.PI * (i + 0.5)) / points
    sum += Math.cos(order * t - x * Math.sin(t))
  }
  return sum / points
}

/** Zeros j_m1: Abramowitz & Stegun table 9.5. */
const FIRST_ZEROS = [2.404825557696, 3.831705970208, 5.135622301841, 6.380161895924, 7.588342434504]

const GAUSS_NODES = [0.1488743389816312, 0.4333953941292472, 0.6794095682990244, 0.8650633666889845, 0.9739065285171717]
const GAUSS_WEIGHTS = [
  0.2955242247147529, 0.2692667193099963, 0.219086362515982, 0.1494513491505806, 0.0666713443086881,
]

/** Ten-point Gauss-Legendre on equal panels (A&S table 25.4). */
function gauss(f: (x: number) => number, from: number, to: number, panels: number): number {
  const half = (to - from) / panels / 2
  let sum = 0
  for (let p = 0; p < panels; p++) {
    const mid = from + (2 * p + 1) * half
    GAUSS_NODES.forEach((node, i) => {
      sum += (GAUSS_WEIGHTS[i] ?? 0) * (f(mid - half * node) + f(mid + half * node))
    })
  }
  return sum * half
}

/** The definition as it stands: Hankel transform by quadrature over the disc, then the integral over k by quadrature. */
function factorByDefinition(m: number): number {
  const j = FIRST_ZEROS[m] ?? Number.NaN
  const shape = (r: number) => besselByIntegral(m, j * r)
  const norm = gauss((r) => shape(r) ** 2 * r, 0, 1, 2)
  const transform = (k: number) => gauss((r) => shape(r) * besselByIntegral(m, k * r) * r, 0, 1, 5)
  return (2 * gauss((k) => transform(k) ** 2, 0, 40, 16)) / norm
}

describe('air load of an open head, both faces', () => {
  // Derived; the quoted four figures are cut rather than rounded, hence the tolerance of one in the last.
  it.each([
    [0, 1.4928],
    [1, 0.6602],
    [2, 0.4516],
    [3, 0.3494],
    [4, 0.2871],
  ])('β%i = %f (derived)', (m, factor) => {
    expect(Math.abs(airLoadFactor(m) - factor)).toBeLessThan(1e-4)
  })

  it.each([0, 1, 2, 3, 4])('β%i agrees with an independent quadrature of its definition', (m) => {
    // What lies beyond k = 40 is j²/(π·40⁴), at most 7e-6.
    expect(Math.abs(airLoadFactor(m) - factorByDefinition(m))).toBeLessThan(1e-5)
  })

  it('falls as the shape gets finer, and is kept once worked out', () => {
    for (let m = 1; m <= 8; m++) expect(airLoadFactor(m)).toBeLessThan(airLoadFactor(m - 1))
    expect(airLoadFactor(3)).toBe(airLoadFactor(3))
  })

  it.each([-1, 1.5, 9, Number.NaN])('refuses m = %f', (m) => {
    expect(() => airLoadFactor(m)).toThrow(expect.objectContaining({ field: 'm' }))
  })
})
