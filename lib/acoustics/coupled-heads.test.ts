import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { galerkinDrumHz, galerkinLimitHz } from '@/tests/helpers/galerkin-drum'
import { coupledHeads, coupledTensionNPerM } from './coupled-heads'
import type { HeadPair } from './head-pair'

const INCH = 0.0254
/** 10 mil PET: 1390·254 µm (derived). */
const TEN_MIL = 0.35306
const J01 = 2.404825557696

/** Two heads in vacuum on a shell of massless air. */
const massless = (change: Partial<HeadPair> = {}): HeadPair => ({
  ...{ radiusM: 6 * INCH, depthM: 8 * INCH, tensionNPerM: [2000, 2000], massKgPerM2: [TEN_MIL, TEN_MIL] },
  ...{ crossMassKgPerM2: 0, ...change },
})
/** The same with masses of air, cross mass of either sign. */
const loaded = massless({ massKgPerM2: [0.62, 0.7], crossMassKgPerM2: -0.09, tensionNPerM: [1800, 2900] })

const film = fc.double({ min: 0.1059, max: 0.75, noNaN: true })
const tension = fc.double({ min: 100, max: 20_000, noNaN: true })
const drums = fc
  .record({
    radiusM: fc.double({ min: 3 * INCH, max: 13 * INCH, noNaN: true }),
    depthM: fc.double({ min: 3 * INCH, max: 24 * INCH, noNaN: true }),
    ...{ t1: tension, t2: tension, s1: film, s2: film, cross: fc.double({ min: -0.9, max: 0.9, noNaN: true }) },
  })
  .map(({ radiusM, depthM, t1, t2, s1, s2, cross }): HeadPair => ({
    ...{ radiusM, depthM, tensionNPerM: [t1, t2], massKgPerM2: [s1, s2], crossMassKgPerM2: cross * Math.min(s1, s2) },
  }))
const aloneHz = (pair: HeadPair, head: 0 | 1) =>
  (J01 / (2 * Math.PI * pair.radiusM)) * Math.sqrt(pair.tensionNPerM[head] / pair.massKgPerM2[head])

describe('two heads on one shell, massless air', () => {
  it.each([
    [2000, 189.021, 308.729],
    [3555.56, 216.178, 337.193],
  ])('12×8 in, 10 mil, 2000 and %f N/m: note %f, upper partner %f Hz (derived)', (second, noteHz, upperPartnerHz) => {
    const made = coupledHeads(massless({ tensionNPerM: [2000, second] }))
    expect(Math.abs(made.noteHz - noteHz)).toBeLessThan(1e-3)
    expect(Math.abs(made.upperPartnerHz - upperPartnerHz)).toBeLessThan(1e-3)
  })

  it('equal heads sound the note of one head alone, (j01/2πa)·√(T/σ) (A&S 9.5, published), whatever the depth', () => {
    fc.assert(
      fc.property(drums, (pair) => {
        const equal: HeadPair = {
          ...{ ...pair, crossMassKgPerM2: 0, massKgPerM2: [pair.massKgPerM2[0], pair.massKgPerM2[0]] },
          tensionNPerM: [pair.tensionNPerM[0], pair.tensionNPerM[0]],
        }
        expect(coupledHeads(equal).noteHz / aloneHz(equal, 0)).toBeCloseTo(1, 10)
        expect(coupledHeads(equal).sustain).toBeCloseTo(1, 10)
      }),
    )
  })

  it('the note lies between the two heads’ own pitches, the upper partner above both', () => {
    fc.assert(
      fc.property(drums, (pair) => {
        const alone = [aloneHz(pair, 0), aloneHz(pair, 1)]
        const made = coupledHeads({ ...pair, crossMassKgPerM2: 0 })
        expect(made.noteHz).toBeGreaterThanOrEqual(Math.min(...alone) * (1 - 1e-12))
        expect(made.noteHz).toBeLessThanOrEqual(Math.max(...alone) * (1 + 1e-12))
        // Films more than a factor 2.295 in pitch apart: the slower one's second shape comes between.
        const upper = Math.min(Math.max(...alone), (5.520078110286 / J01) * Math.min(...alone))
        expect(made.upperPartnerHz).toBeGreaterThanOrEqual(upper * (1 - 1e-12))
      }),
    )
  })

  it('the deeper the shell, the nearer to two uncoupled heads', () => {
    const between = [0.06, 0.12, 0.3, 0.6].map((depthM) => {
      const pair = massless({ depthM, tensionNPerM: [2000, 3000], radiusM: 0.06 })
      const made = coupledHeads(pair)
      return [made.noteHz / aloneHz(pair, 0) - 1, made.upperPartnerHz / aloneHz(pair, 1) - 1]
    })
    for (const [i, [note = 0, upper = 0]] of between.entries()) {
      const [noteBefore = 1, upperBefore = 1] = between[i - 1] ?? []
      expect(note).toBeLessThan(noteBefore)
      expect(upper).toBeLessThan(upperBefore)
    }
    const stiff = massless({ radiusM: 0.05, depthM: 0.65, tensionNPerM: [20_000, 30_000] })
    expect(coupledHeads(stiff).noteHz / aloneHz(stiff, 0)).toBeCloseTo(1, 2)
    expect(coupledHeads(stiff).upperPartnerHz / aloneHz(stiff, 1)).toBeCloseTo(1, 2)
  })
})

describe('two heads in air', () => {
  it.each<[string, HeadPair]>([
    ['massless, unequal', massless({ tensionNPerM: [2000, 3555.56] })],
    ['massless, equal', massless()],
    ['air handing across against the movement', loaded],
    ['air handing across with the movement', { ...loaded, crossMassKgPerM2: 0.15 }],
    ['a 14×5 in snare, 10 and 3 mil', { ...loaded, radiusM: 7 * INCH, depthM: 5 * INCH, massKgPerM2: [0.6, 0.35] }],
    ['films far apart', { ...loaded, tensionNPerM: [300, 9000] }],
    ['films farther apart than three shapes of one', massless({ tensionNPerM: [100, 2402], radiusM: 3 * INCH })],
  ])('agree with an independent Galerkin solution, many shapes a head: %s (derived)', (_, pair) => {
    const made = coupledHeads(pair)
    expect(made.noteHz / galerkinLimitHz(pair, 0, 12)).toBeCloseTo(1, 5)
    expect(made.upperPartnerHz / galerkinLimitHz(pair, 1, 12)).toBeCloseTo(1, 5)
  })

  it('the Galerkin solution comes down to it from above as its shapes grow in number', () => {
    const { upperPartnerHz } = coupledHeads(loaded)
    const over = [6, 12, 24].map((terms) => (galerkinDrumHz(loaded, terms)[1] ?? 0) - upperPartnerHz)
    expect(over[2]).toBeGreaterThan(0)
    expect((over[0] ?? 0) / (over[1] ?? 1)).toBeGreaterThan(5)
    expect((over[1] ?? 0) / (over[2] ?? 1)).toBeGreaterThan(5)
  })

  it('swapping the heads changes nothing', () => {
    fc.assert(
      fc.property(drums, (pair) => {
        const [made, swapped] = [
          coupledHeads(pair),
          coupledHeads({
            ...pair,
            tensionNPerM: [pair.tensionNPerM[1], pair.tensionNPerM[0]],
            massKgPerM2: [pair.massKgPerM2[1], pair.massKgPerM2[0]],
          }),
        ]
        expect(swapped.noteHz / made.noteHz).toBeCloseTo(1, 10)
        expect(swapped.upperPartnerHz / made.upperPartnerHz).toBeCloseTo(1, 10)
        expect(swapped.sustain).toBeCloseTo(made.sustain, 6)
      }),
    )
  })

  it('tightening either head raises note and upper partner', () => {
    fc.assert(
      fc.property(drums, fc.constantFrom(0, 1), fc.double({ min: 1.01, max: 2, noNaN: true }), (pair, head, by) => {
        const [t1, t2] = pair.tensionNPerM
        const tighter = coupledHeads({ ...pair, tensionNPerM: head === 0 ? [t1 * by, t2] : [t1, t2 * by] })
        const made = coupledHeads(pair)
        expect(tighter.noteHz).toBeGreaterThanOrEqual(made.noteHz * (1 - 1e-12))
        expect(tighter.upperPartnerHz).toBeGreaterThanOrEqual(made.upperPartnerHz * (1 - 1e-12))
        expect(tighter.noteHz + tighter.upperPartnerHz).toBeGreaterThan(made.noteHz + made.upperPartnerHz)
      }),
    )
  })

  it('scales: a quarter of the tensions on four times the depth is an octave down', () => {
    // Everything that pulls back (the air by γP0/V) falls to a quarter, so every frequency halves, exactly.
    fc.assert(
      fc.property(drums, ({ depthM, tensionNPerM: [t1, t2], ...pair }) => {
        const shallow = 0.05 + depthM / 6
        const [made, down] = [
          coupledHeads({ ...pair, depthM: shallow, tensionNPerM: [t1, t2] }),
          coupledHeads({ ...pair, depthM: 4 * shallow, tensionNPerM: [t1 / 4, t2 / 4] }),
        ]
        expect(down.noteHz / made.noteHz).toBeCloseTo(1 / 2, 9)
        expect(down.upperPartnerHz / made.upperPartnerHz).toBeCloseTo(1 / 2, 9)
      }),
      { numRuns: 60 },
    )
  })

  it('sustain is 1 for matched heads and falls the further they part, either way', () => {
    const sustainAt = (cents: number) =>
      coupledHeads(massless({ tensionNPerM: [2000, 2000 * 2 ** (cents / 600)] })).sustain
    for (const way of [1, -1]) {
      const falling = [0, 100, 200, 400, 800, 1200].map((cents) => sustainAt(way * cents))
      expect(falling[0]).toBeCloseTo(1, 10)
      for (let i = 1; i < falling.length; i++) expect(falling[i]).toBeLessThan(falling[i - 1] ?? 0)
      expect(falling.at(-1)).toBeGreaterThan(0)
    }
  })
})

describe('the tension that puts two heads on a note', () => {
  it('round trip to 1e-9 of the note: any order of heads, 6 to 26 in, 3 to 24 in deep', () => {
    fc.assert(
      fc.property(drums, (pair) => {
        const [t1, t2] = pair.tensionNPerM
        const { noteHz } = coupledHeads(pair)
        fc.pre(noteHz >= 10 && noteHz <= 5000)
        expect(coupledTensionNPerM(noteHz, t2 / t1, pair) / t1).toBeCloseTo(1, 8)
      }),
      { numRuns: 300 },
    )
  })

  it('12×8 in, 10 mil, 216.178 Hz and tensions as 16 to 9: 2000 N/m (derived)', () => {
    expect(Math.abs(coupledTensionNPerM(216.178, 3555.56 / 2000, massless()) - 2000)).toBeLessThan(0.05)
  })
})

describe('refuses', () => {
  it.each<[string, Partial<HeadPair>]>([
    ['diameterM', { radiusM: 6 }],
    ['diameterM', { radiusM: Number.NaN }],
    ['depthM', { depthM: 8 }],
    ['depthM', { depthM: 0 }],
    ['tensionNPerM', { tensionNPerM: [2000, -1] }],
    ['tensionNPerM', { tensionNPerM: [Number.POSITIVE_INFINITY, 2000] }],
    ['massKgPerM2', { massKgPerM2: [0, TEN_MIL] }],
    ['crossMassKgPerM2', { crossMassKgPerM2: TEN_MIL }],
  ])('%s: %j', (field, change) => {
    const refusal = expect.objectContaining({ name: 'AcousticsError', field })
    expect(() => coupledHeads(massless(change))).toThrow(refusal)
  })

  it.each([Number.NaN, 0, -146, Number.POSITIVE_INFINITY])('a note of %f Hz', (noteHz) => {
    expect(() => coupledTensionNPerM(noteHz, 1, massless())).toThrow(expect.objectContaining({ field: 'noteHz' }))
  })

  it.each([Number.NaN, 0, -1, 1e6])('a tension ratio of %f', (ratio) => {
    expect(() => coupledTensionNPerM(150, ratio, massless())).toThrow(
      expect.objectContaining({ field: 'tensionRatio' }),
    )
  })
})
