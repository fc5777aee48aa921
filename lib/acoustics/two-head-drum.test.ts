import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { coupledHeads } from './coupled-heads'
import { twoHeadModes } from './two-head-drum'
import type { TwoHeadDrum } from './two-head-drum'

const INCH = 0.0254
const tenMil = { plyMils: [10], coatingKgPerM2: 0 }
const drumOf = (diameterIn: number, depthIn: number): TwoHeadDrum => ({
  ...{ diameterM: diameterIn * INCH, depthM: depthIn * INCH, temperatureC: 20, batter: tenMil, resonant: tenMil },
})
const both = (tensionNPerM: number) => ({ batterNPerM: tensionNPerM, resonantNPerM: tensionNPerM })

const film = fc.record({
  plyMils: fc.constantFrom([3], [7.5], [10], [7, 7], [20]),
  coatingKgPerM2: fc.double({ min: 0, max: 0.1, noNaN: true }),
})
const tension = fc.double({ min: 100, max: 20_000, noNaN: true })
const anyDrum = fc.record({
  diameterM: fc.double({ min: 6 * INCH, max: 26 * INCH, noNaN: true }),
  depthM: fc.double({ min: 3 * INCH, max: 24 * INCH, noNaN: true }),
  temperatureC: fc.double({ min: -10, max: 45, noNaN: true }),
  batter: film,
  resonant: film,
})

describe('a drum with two heads in air', () => {
  // Derived, both heads 10 mil at 2000 N/m, 20 °C. Worked out there with ρ 1.204, here with 1.2041 kg/m³: 0.01 Hz apart at most.
  it('12×8 in: note 146.37, tap with the other head damped 255.32, pair with it open 252.44 and 258.30 Hz (derived)', () => {
    const made = twoHeadModes(drumOf(12, 8), both(2000))
    expect(Math.abs(made.noteHz - 146.37)).toBeLessThan(0.01)
    expect(Math.abs(made.batterTapHz - 255.32)).toBeLessThan(0.01)
    expect(made.resonantTapHz).toBe(made.batterTapHz)
    expect(Math.abs(made.undampedTapHz[0] - 252.44)).toBeLessThan(0.01)
    expect(Math.abs(made.undampedTapHz[1] - 258.3)).toBeLessThan(0.01)
    expect(Math.abs(made.batterTapHz / made.noteHz - 1.744)).toBeLessThan(5e-4)
  })

  it('a false warble of nearly 6 a second from two perfectly even heads (derived)', () => {
    const { falseWarbleHz } = twoHeadModes(drumOf(12, 8), both(2000))
    expect(falseWarbleHz).toBeGreaterThan(5.8)
    expect(falseWarbleHz).toBeLessThan(5.9)
  })

  it('12×5 in: note 150.60, tap 253.93 Hz, ratio 1.686 (derived)', () => {
    const made = twoHeadModes(drumOf(12, 5), both(2000))
    expect(Math.abs(made.noteHz - 150.6)).toBeLessThan(0.01)
    expect(Math.abs(made.batterTapHz - 253.93)).toBeLessThan(0.01)
    expect(Math.abs(made.batterTapHz / made.noteHz - 1.686)).toBeLessThan(5e-4)
  })

  it('air lowers note and tap under the films’ own in vacuum', () => {
    fc.assert(
      fc.property(anyDrum, tension, tension, (drum, batterNPerM, resonantNPerM) => {
        const made = twoHeadModes(drum, { batterNPerM, resonantNPerM })
        const density = ({ plyMils, coatingKgPerM2 }: typeof drum.batter) =>
          1390 * plyMils.reduce((sum, mil) => sum + mil * 25.4e-6, 0) + coatingKgPerM2
        const vacuum = coupledHeads({
          ...{ radiusM: drum.diameterM / 2, depthM: drum.depthM, crossMassKgPerM2: 0 },
          massKgPerM2: [density(drum.batter), density(drum.resonant)],
          tensionNPerM: [batterNPerM, resonantNPerM],
        })
        expect(made.noteHz).toBeLessThan(vacuum.noteHz)
        expect(made.upperPartnerHz).toBeLessThan(vacuum.upperPartnerHz)
      }),
    )
  })

  it('never fails and stays in order: 6 to 26 in, 3 to 24 in deep, 3 to 20 mil, 100 to 20 000 N/m, any order of heads', () => {
    fc.assert(
      fc.property(anyDrum, tension, tension, (drum, batterNPerM, resonantNPerM) => {
        const made = twoHeadModes(drum, { batterNPerM, resonantNPerM })
        for (const hz of [made.noteHz, made.upperPartnerHz, made.batterTapHz, made.resonantTapHz]) {
          expect(Number.isFinite(hz) && hz > 0).toBe(true)
        }
        expect(made.noteHz).toBeLessThan(made.upperPartnerHz)
        expect(made.sustain).toBeGreaterThanOrEqual(0)
        expect(made.sustain).toBeLessThanOrEqual(1)
        // The open pair lies on either side of both damped taps.
        expect(made.undampedTapHz[0]).toBeLessThanOrEqual(Math.min(made.batterTapHz, made.resonantTapHz) * (1 + 1e-12))
        expect(made.undampedTapHz[1]).toBeGreaterThanOrEqual(
          Math.max(made.batterTapHz, made.resonantTapHz) * (1 - 1e-12),
        )
      }),
      { numRuns: 300 },
    )
  })

  it('swapping the heads swaps the taps and changes nothing else', () => {
    fc.assert(
      fc.property(anyDrum, tension, tension, (drum, batterNPerM, resonantNPerM) => {
        const made = twoHeadModes(drum, { batterNPerM, resonantNPerM })
        const swapped = twoHeadModes(
          { ...drum, batter: drum.resonant, resonant: drum.batter },
          { batterNPerM: resonantNPerM, resonantNPerM: batterNPerM },
        )
        expect(swapped.noteHz / made.noteHz).toBeCloseTo(1, 10)
        expect(swapped.batterTapHz).toBe(made.resonantTapHz)
        expect(swapped.falseWarbleHz).toBeCloseTo(made.falseWarbleHz, 6)
      }),
    )
  })

  it('two plies at one tension sound lower than one (common practice), and colder air lowers every pitch', () => {
    const one = twoHeadModes(drumOf(12, 8), both(2000))
    const two = twoHeadModes({ ...drumOf(12, 8), batter: { plyMils: [7, 7], coatingKgPerM2: 0 } }, both(2000))
    expect(two.noteHz).toBeLessThan(one.noteHz)
    expect(two.batterTapHz).toBeLessThan(one.batterTapHz)
    const cold = twoHeadModes({ ...drumOf(12, 8), temperatureC: 0 }, both(2000))
    expect(cold.noteHz).toBeLessThan(one.noteHz)
    expect(cold.batterTapHz).toBeLessThan(one.batterTapHz)
  })

  it('the false warble of even heads dies out with the depth of the shell', () => {
    const warbles = [5, 8, 12, 16].map((depthIn) => twoHeadModes(drumOf(12, depthIn), both(2000)).falseWarbleHz)
    for (let i = 1; i < warbles.length; i++) expect(warbles[i]).toBeLessThan((warbles[i - 1] ?? 0) / 2)
  })

  it.each<[string, Partial<TwoHeadDrum>, Partial<ReturnType<typeof both>> & object]>([
    ['diameterM', { diameterM: 12 }, {}],
    ['diameterM', { diameterM: 305 }, {}],
    ['diameterM', { diameterM: Number.NaN }, {}],
    ['depthM', { depthM: 8 }, {}],
    ['depthM', { depthM: Number.POSITIVE_INFINITY }, {}],
    ['depthM', { depthM: -0.2 }, {}],
    ['plyMils', { batter: { plyMils: [], coatingKgPerM2: 0 } }, {}],
    ['plyMils', { resonant: { plyMils: [254e-6], coatingKgPerM2: 0 } }, {}],
    ['coatingKgPerM2', { batter: { plyMils: [10], coatingKgPerM2: 60 } }, {}],
    ['temperatureC', { temperatureC: 293.15 }, {}],
    ['batterNPerM', {}, { batterNPerM: 0 }],
    ['batterNPerM', {}, { batterNPerM: Number.NaN }],
    ['resonantNPerM', {}, { resonantNPerM: -2000 }],
    ['resonantNPerM', {}, { resonantNPerM: 2e6 }],
  ])('refuses nonsense, naming %s: %j %j', (field, change, tensions) => {
    expect(() => twoHeadModes({ ...drumOf(12, 8), ...change }, { ...both(2000), ...tensions })).toThrow(
      expect.objectContaining({ name: 'AcousticsError', field }),
    )
  })
})
