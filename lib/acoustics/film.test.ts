import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { filmArealDensityKgPerM2, filmStressPa, filmThicknessM } from './film'

describe('film', () => {
  // Derived from ρ = 1390 kg/m³ (published: DuPont Teijin Films H-37232-3) and 1 mil = 25.4 µm exactly.
  it.each([
    [[3], 0.10592],
    [[7.5], 0.2648],
    [[10], 0.35306],
    [[7, 7], 0.49428],
  ])('%j mil weighs %f kg/m² (derived)', (plyMils, density) => {
    expect(filmArealDensityKgPerM2({ plyMils, coatingKgPerM2: 0 })).toBeCloseTo(density, 5)
  })

  it('coating adds its own mass and no thickness', () => {
    const bare = filmArealDensityKgPerM2({ plyMils: [10], coatingKgPerM2: 0 })
    expect(filmArealDensityKgPerM2({ plyMils: [10], coatingKgPerM2: 0.05 }) - bare).toBeCloseTo(0.05, 12)
    expect(filmThicknessM([7, 7])).toBeCloseTo(355.6e-6, 12)
  })

  it('stress: 2489.2 N/m on 3 mil is 32.667 MPa, a third of 98 MPa (derived)', () => {
    expect(filmStressPa(2489.2, [3])).toBeCloseTo(98e6 / 3, -2)
  })

  it('does not care in which order the plies lie', () => {
    const mil = fc.double({ min: 1, max: 15, noNaN: true })
    fc.assert(
      fc.property(mil, mil, (a, b) => {
        expect(filmThicknessM([a, b])).toBeCloseTo(filmThicknessM([b, a]), 15)
      }),
    )
  })

  it.each([
    ['plyMils', [], 0],
    ['plyMils', [0], 0],
    ['plyMils', [-10], 0],
    ['plyMils', [Number.NaN], 0],
    ['plyMils', [254], 0],
    ['plyMils', [3, 3, 3, 3, 3], 0],
    ['coatingKgPerM2', [10], -0.01],
    ['coatingKgPerM2', [10], 50],
    ['coatingKgPerM2', [10], Number.POSITIVE_INFINITY],
  ])('refuses %s: %j mil, coating %f', (field, plyMils, coatingKgPerM2) => {
    expect(() => filmArealDensityKgPerM2({ plyMils, coatingKgPerM2 })).toThrow(expect.objectContaining({ field }))
  })
})
