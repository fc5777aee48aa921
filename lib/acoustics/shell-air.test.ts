import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { gaussLegendre } from '@/tests/helpers/gauss-legendre'
import { SHELL_SERIES_BOUND, shellAir } from './shell-air'
import type { Shell } from './shell-air'
import { shellModes, uniformOverlap } from './shell-overlap'

const INCH = 0.0254
/** Dry air at 20 °C: 1.2041 kg/m³ (published). */
const AIR = 1.2041
const twelve: Shell = { diameterM: 12 * INCH, depthM: 8 * INCH, temperatureC: 20 }

/** Zeros j_m1: Abramowitz & Stegun table 9.5 (published). */
const FIRST_ZEROS = [2.404825557696, 3.831705970208, 5.135622301841]

/** Bessel's integral (DLMF 10.9.2) by the trapezoid rule: no code shared with the package. */
function besselByIntegral(order: number, x: number): number {
  const points = 120
  let sum = 0
  for (let i = 0; i < points; i++) {
    const t = (2 * Math.PI * (i + 0.5)) / points
    sum += Math.cos(order * t - x * Math.sin(t))
  }
  return sum / points
}

/** ∫₀¹ f·g·r dr of two shapes by quadrature. */
const product = (f: (r: number) => number, g: (r: number) => number) =>
  gaussLegendre(40, 0, 1).reduce((sum, { at, weight }) => sum + weight * f(at) * g(at) * at, 0)

describe('shares of a head’s shape among the modes of a cylinder', () => {
  it('w_0 = 0.69166 (derived)', () => {
    expect(Math.abs(uniformOverlap() - 0.69166)).toBeLessThan(1e-5)
  })

  it.each([0, 1, 2])('m = %i: the first eight agree with a quadrature of their definition (derived)', (m) => {
    const shape = (r: number) => besselByIntegral(m, (FIRST_ZEROS[m] ?? Number.NaN) * r)
    const overlap = (mode: (r: number) => number) =>
      product(shape, mode) ** 2 / (product(shape, shape) * product(mode, mode))
    for (const { wavenumber, overlap: share } of shellModes(m).slice(0, 8)) {
      expect(Math.abs(share - overlap((r) => besselByIntegral(m, wavenumber * r)))).toBeLessThan(1e-9)
    }
    if (m === 0) expect(Math.abs(uniformOverlap() - overlap(() => 1))).toBeLessThan(1e-12)
  })

  it.each([0, 1, 2, 3, 4, 5, 6, 7, 8])('m = %i: they sum to 1 (Parseval, closed form), less the cut tail', (m) => {
    const sum = shellModes(m).reduce((so, { overlap }) => so + overlap, m === 0 ? uniformOverlap() : 0)
    expect(1 - sum).toBeGreaterThan(0)
    expect(1 - sum).toBeLessThan(4e-5)
  })
})

describe('the shell’s air on the inner faces', () => {
  it('a very shallow shell moves with its heads: ρL/2 on each when they go together (closed form)', () => {
    // Far less deep than any shape is wide, all the air between goes along.
    const shallow = { ...twelve, diameterM: 0.8, depthM: 0.05 }
    for (const m of [0, 1]) {
      const { selfKgPerM2, crossKgPerM2 } = shellAir(m, shallow)
      expect((selfKgPerM2 + crossKgPerM2) / ((AIR * 0.05) / 2)).toBeGreaterThan(0.98)
      expect((selfKgPerM2 + crossKgPerM2) / ((AIR * 0.05) / 2)).toBeLessThan(1)
    }
  })

  it('a deep shell parts the heads for the tap, and only the plug goes on for the note: ±w_0·ρL/6 (closed form)', () => {
    const deep = { ...twelve, diameterM: 6 * INCH, depthM: 24 * INCH }
    const plug = 0.69166 * AIR * 24 * INCH
    expect(Math.abs(shellAir(1, deep).crossKgPerM2 / shellAir(1, deep).selfKgPerM2)).toBeLessThan(1e-5)
    expect(shellAir(0, deep).crossKgPerM2 / (plug / 6)).toBeCloseTo(1, 4)
    const deeper = { ...deep, depthM: 25 * INCH }
    expect(shellAir(0, deeper).selfKgPerM2 - shellAir(0, deep).selfKgPerM2).toBeCloseTo((0.69166 * AIR * INCH) / 3, 6)
  })

  it('the plug helps heads that move the same way; every other mode hinders them', () => {
    expect(shellAir(0, twelve).crossKgPerM2).toBeGreaterThan(0)
    for (const m of [1, 2, 3]) expect(shellAir(m, twelve).crossKgPerM2).toBeLessThan(0)
  })

  it('moving air is never worth less than nothing, whichever way the heads go', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 8 }),
        fc.double({ min: 6 * INCH, max: 26 * INCH, noNaN: true }),
        fc.double({ min: 3 * INCH, max: 24 * INCH, noNaN: true }),
        (m, diameterM, depthM) => {
          const { selfKgPerM2, crossKgPerM2 } = shellAir(m, { diameterM, depthM, temperatureC: 20 })
          expect(selfKgPerM2).toBeGreaterThan(Math.abs(crossKgPerM2))
        },
      ),
    )
  })

  it('grows with size as a length, and with cold as the air’s density (closed form)', () => {
    const [here, twice] = [
      shellAir(1, { ...twelve, depthM: 0.2 }),
      shellAir(1, { ...twelve, diameterM: 24 * INCH, depthM: 0.4 }),
    ]
    expect(twice.selfKgPerM2 / here.selfKgPerM2).toBeCloseTo(2, 10)
    const cold = shellAir(1, { ...twelve, depthM: 0.2, temperatureC: 0 })
    expect(cold.selfKgPerM2 / here.selfKgPerM2).toBeCloseTo(293.15 / 273.15, 10)
  })

  it('the cut series leaves out less than its bound, against 4000 terms with McMahon’s zeros (A&S 9.5.12, derived)', () => {
    // Zeros of J1, the wavenumbers for m = 0: b = (n + 1/4)π, k = b − 3/(8b) + 36/(3·(8b)³).
    const radiusM = twelve.diameterM / 2
    const through = twelve.depthM / radiusM
    let tail = 0
    for (let n = 41; n <= 4000; n++) {
      const b = (n + 1 / 4) * Math.PI
      const k = b - 3 / (8 * b) + 36 / (3 * (8 * b) ** 3)
      tail += (4 * 2.404825557696 ** 2) / ((k * k - 2.404825557696 ** 2) ** 2 * k * Math.tanh(k * through))
    }
    expect(tail).toBeGreaterThan(0)
    expect(tail).toBeLessThan(SHELL_SERIES_BOUND)
  })

  it.each<[string, Partial<Shell>]>([
    ['diameterM', { diameterM: 12 }],
    ['depthM', { depthM: 8 }],
    ['depthM', { depthM: 0 }],
    ['depthM', { depthM: Number.NaN }],
    ['temperatureC', { temperatureC: 293.15 }],
  ])('refuses nonsense, naming %s: %j', (field, change) => {
    expect(() => shellAir(1, { ...twelve, ...change })).toThrow(
      expect.objectContaining({ name: 'AcousticsError', field }),
    )
  })

  it('tells inches passed as metres, and refuses a shape it does not know', () => {
    expect(() => shellAir(1, { ...twelve, depthM: 8 })).toThrow('8 in is 0.2032 m')
    expect(() => shellAir(9, twelve)).toThrow(expect.objectContaining({ field: 'm' }))
  })
})
