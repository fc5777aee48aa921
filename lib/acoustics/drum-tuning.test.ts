import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { drumModel } from './drum-model'
import { drumTuning } from './drum-tuning'
import type { DrumTuningInput } from './drum-tuning'
import { twoHeadModes } from './two-head-drum'

const INCH = 0.0254
const tenMil = { plyMils: [10], coatingKgPerM2: 0 }
const tom: DrumTuningInput = {
  ...{ role: 'tom', lugs: 6, diameterM: 12 * INCH, depthM: 8 * INCH, temperatureC: 20 },
  ...{ batter: tenMil, resonant: tenMil, relationCents: 0, noteHz: 146.3626 },
}

/** 12 in, 10 mil in the open air (derived): σ_m = 1390·254 µm + β_m·1.2041·0.1524, T = σ_m·(2πa·f/j)². */
const openAir = (beta: number) => 1390 * 254e-6 + beta * 1.2041 * 0.1524
const tensionAt = (hz: number, zero: number, beta: number) => openAir(beta) * ((2 * Math.PI * 0.1524 * hz) / zero) ** 2

const film = fc.record({
  plyMils: fc.constantFrom([3], [7.5], [10], [7, 7], [20]),
  coatingKgPerM2: fc.double({ min: 0, max: 0.1, noNaN: true }),
})
const anyDrum = fc.record({
  diameterM: fc.double({ min: 6 * INCH, max: 26 * INCH, noNaN: true }),
  depthM: fc.double({ min: 3 * INCH, max: 24 * INCH, noNaN: true }),
  batter: film,
  resonant: film,
  relationCents: fc.double({ min: -700, max: 700, noNaN: true }),
})
/** The heaviest resonant head a fifth higher over the lightest batter holds some twelve times its tension: still under 50 000 N/m. */
const batterTension = fc.double({ min: 300, max: 3500, noNaN: true })

describe('what a drum with two heads needs for its note', () => {
  it('12×8 in at the note of 2000 N/m on both: 2000 N/m, tap 255.32 Hz, false warble nearly 6 (derived)', () => {
    const made = drumTuning(tom)
    expect(made.model).toBe('two-heads')
    for (const head of [made.batter, made.resonant]) {
      expect(Math.abs((head?.tensionNPerM.value ?? 0) - 2000)).toBeLessThan(0.1)
      expect(Math.abs((head?.tapHz.value ?? 0) - 255.32)).toBeLessThan(0.01)
      // 2πaT/N.
      expect(head?.rodPullN.value).toBeCloseTo((2 * Math.PI * 0.1524 * 2000) / 6, 1)
      // Shigley (published): K 0.2, d 5.4864 mm.
      expect(head?.torqueNm.value).toBeCloseTo((0.2 * 5.4864e-3 * 2 * Math.PI * 0.1524 * 2000) / 6, 3)
      expect((head?.filmStressPa.value ?? 0) / (2000 / 254e-6)).toBeCloseTo(1, 4)
    }
    expect(made.sustain).toBeCloseTo(1, 9)
    expect(made.falseWarbleHz).toBeCloseTo(5.87, 1)
    expect(made.tapRatio.value).toBeCloseTo(1.744, 3)
  })

  it('round trip: the two tensions sound the note to 0.01 Hz and the taps stand by the relation', () => {
    fc.assert(
      fc.property(anyDrum, batterTension, (drum, batterNPerM) => {
        const model = drumModel(drum)
        const noteHz = model.noteHz(batterNPerM)
        fc.pre(noteHz >= 10 && noteHz <= 5000)
        const made = drumTuning({ ...drum, role: 'tom', lugs: 8, noteHz })
        const sounded = twoHeadModes(drum, {
          batterNPerM: made.batter.tensionNPerM.value,
          resonantNPerM: made.resonant?.tensionNPerM.value ?? 0,
        })
        expect(Math.abs(sounded.noteHz - noteHz)).toBeLessThan(0.01)
        expect(1200 * Math.log2(sounded.resonantTapHz / sounded.batterTapHz)).toBeCloseTo(drum.relationCents, 6)
        expect(made.batter.tapHz.value / sounded.batterTapHz).toBeCloseTo(1, 8)
        expect(made.batter.tensionNPerM.value / batterNPerM).toBeCloseTo(1, 7)
      }),
      { numRuns: 120 },
    )
  })

  it('a higher note needs more of both heads; the note rises with the tension', () => {
    fc.assert(
      fc.property(anyDrum, batterTension, (drum, batterNPerM) => {
        const model = drumModel(drum)
        expect(model.noteHz(batterNPerM * 1.05)).toBeGreaterThan(model.noteHz(batterNPerM))
        expect(model.batterTapHz(batterNPerM * 4) / model.batterTapHz(batterNPerM)).toBeCloseTo(2, 10)
      }),
    )
  })

  it('heads at different pitches: the tighter resonant head takes more, the batter less than when matched', () => {
    const [matched, apart] = [drumTuning(tom), drumTuning({ ...tom, relationCents: 300 })]
    expect(apart.batter.tensionNPerM.value).toBeLessThan(matched.batter.tensionNPerM.value)
    expect(apart.resonant?.tensionNPerM.value).toBeGreaterThan(matched.resonant?.tensionNPerM.value ?? 0)
    expect(apart.sustain).toBeLessThan(0.95)
  })
})

describe('a measured tap ratio', () => {
  it('replaces the model: tap is note × ratio, tensions from the (1,1) shape, 1 % scatter', () => {
    const made = drumTuning({ ...tom, measuredTapRatio: 1.7, relationCents: 200 })
    expect(made.tapRatioMeasured).toBe(true)
    expect(made.batter.tapHz.value).toBeCloseTo(1.7 * 146.3626, 6)
    expect(made.resonant?.tapHz.value).toBeCloseTo(1.7 * 146.3626 * 2 ** (200 / 1200), 6)
    // The tap goes as √T: from 255.315 Hz at 2000 N/m (derived above).
    expect(made.batter.tensionNPerM.value).toBeCloseTo(2000 * ((1.7 * 146.3626) / 255.3152) ** 2, 0)
    expect(made.batter.tapHz.high / made.batter.tapHz.value).toBeCloseTo(Math.exp(0.01), 6)
  })

  it('equal to the modelled one changes no tension (round trip)', () => {
    const modelled = drumTuning(tom)
    const measured = drumTuning({ ...tom, measuredTapRatio: modelled.tapRatio.value })
    expect(measured.batter.tensionNPerM.value).toBeCloseTo(modelled.batter.tensionNPerM.value, 6)
    expect(measured.upperPartnerHz?.value).toBeCloseTo(modelled.upperPartnerHz?.value ?? 0, 6)
  })
})

describe('a drum that is no closed cavity', () => {
  it.each<[string, Partial<DrumTuningInput>]>([
    ['a ported kick', { ported: true }],
    ['no resonant head', { resonant: null }],
  ])('%s: the batter as a head in the open air (closed form), and no figures for two heads', (_, change) => {
    const made = drumTuning({ ...tom, ...change })
    expect(made).toMatchObject({ model: 'one-head', upperPartnerHz: null, sustain: null, falseWarbleHz: null })
    expect(made.resonant).toBeNull()
    expect(made.batter.tensionNPerM.value).toBeCloseTo(tensionAt(146.3626, 2.404825557696, 1.4928), 0)
    const ratio = (3.831705970208 / 2.404825557696) * Math.sqrt(openAir(1.4928) / openAir(0.6602))
    expect(made.tapRatio.value).toBeCloseTo(ratio, 3)
  })

  it('takes a measured ratio: tap is note × ratio, tension from the open (1,1) shape (closed form)', () => {
    const made = drumTuning({ ...tom, role: 'kick', ported: true, measuredTapRatio: 1.9 })
    expect(made.batter.tapHz.value).toBeCloseTo(1.9 * 146.3626, 6)
    expect(made.batter.tensionNPerM.value).toBeCloseTo(tensionAt(1.9 * 146.3626, 3.831705970208, 0.6602), 0)
  })
})

describe('the bounds of a figure', () => {
  it('hold at least the model’s scatter of 2 % on pitch (Rossing 1982, published) and 4 % on tension', () => {
    fc.assert(
      fc.property(anyDrum, batterTension, (drum, batterNPerM) => {
        const noteHz = drumModel(drum).noteHz(batterNPerM)
        const { batter, upperPartnerHz } = drumTuning({ ...drum, role: 'tom', lugs: 8, noteHz })
        const share = ({ value, low, high }: { value: number; low: number; high: number }) => {
          expect(low).toBeLessThan(value)
          return high / value - 1
        }
        expect(share(batter.tapHz)).toBeGreaterThanOrEqual(0.02)
        expect(share(batter.tapHz)).toBeLessThan(0.05)
        expect(share(batter.tensionNPerM)).toBeGreaterThanOrEqual(0.04)
        expect(share(batter.tensionNPerM)).toBeLessThan(0.09)
        expect(share(batter.rodPullN)).toBeCloseTo(share(batter.tensionNPerM), 9)
        if (upperPartnerHz) expect(share(upperPartnerHz)).toBeGreaterThanOrEqual(0.02)
      }),
      { numRuns: 60 },
    )
  })

  it('may lie past what a head is allowed: 20 mil heads at 47 500 N/m are still told their bounds', () => {
    const thick = { plyMils: [20], coatingKgPerM2: 0 }
    const drum = { ...tom, batter: thick, resonant: thick }
    const { batter } = drumTuning({ ...drum, noteHz: drumModel(drum).noteHz(47_500) })
    expect(batter.tensionNPerM.high).toBeGreaterThan(50_000)
    // 2πaT/N at the upper bound.
    expect(batter.rodPullN.high).toBeCloseTo((2 * Math.PI * 0.1524 * batter.tensionNPerM.high) / 6, 3)
  })

  it('are wider for a single head on a shell, and the torque’s hold ±30 % of the thread (Shigley, published)', () => {
    const [closed, ported] = [drumTuning(tom), drumTuning({ ...tom, ported: true })]
    const width = ({ low, high }: { low: number; high: number }) => high / low
    expect(width(ported.batter.tapHz)).toBeGreaterThan(1.1)
    expect(width(ported.batter.tapHz)).toBeGreaterThan(width(closed.batter.tapHz))
    expect(closed.batter.torqueNm.high / closed.batter.torqueNm.value).toBeGreaterThan(1.3)
    expect(closed.batter.torqueNm.low / closed.batter.torqueNm.value).toBeLessThan(0.9 * 0.7)
  })
})

describe('playable range and cautions', () => {
  it('slack, choked, and film pulled past a third of 98 MPa, which is ordinary for a 3 mil snare side', () => {
    expect(drumTuning({ ...tom, noteHz: 70 }).batter.cautions).toEqual(['slack'])
    expect(drumTuning({ ...tom, noteHz: 250 }).batter.cautions).toEqual(['choked'])
    const thin = { plyMils: [3], coatingKgPerM2: 0 }
    const snare: DrumTuningInput = { ...tom, resonant: thin, relationCents: 500, noteHz: 200 }
    expect(drumTuning(snare).resonant?.cautions).toContain('film-stress')
    expect(drumTuning({ ...snare, role: 'snare' }).resonant?.cautions).not.toContain('film-stress')
  })

  it('a range kept for one head replaces its default', () => {
    const kept = { slackNPerM: 100, chokedNPerM: 1500 }
    const made = drumTuning({ ...tom, resonant: { ...tenMil, range: kept } })
    expect(made.resonant).toMatchObject({ range: kept, cautions: ['choked'] })
    expect(made.batter.cautions).toEqual([])
  })
})

describe('refuses nonsense', () => {
  it.each<[string, Partial<DrumTuningInput>]>([
    ['diameterM', { diameterM: 12 }],
    ['depthM', { depthM: 8 }],
    ['depthM', { depthM: Number.NaN }],
    ['depthM', { depthM: 8, ported: true }],
    ['plyMils', { batter: { plyMils: [], coatingKgPerM2: 0 } }],
    ['coatingKgPerM2', { batter: { plyMils: [10], coatingKgPerM2: -1 } }],
    ['noteHz', { noteHz: 0 }],
    ['noteHz', { noteHz: -146 }],
    ['noteHz', { noteHz: Number.POSITIVE_INFINITY }],
    ['noteHz', { noteHz: 2000 }],
    ['lugs', { lugs: 0 }],
    ['temperatureC', { temperatureC: 293.15 }],
    ['relationCents', { relationCents: 1201 }],
    ['relationCents', { relationCents: Number.NaN }],
    ['measuredTapRatio', { measuredTapRatio: 0 }],
    ['measuredTapRatio', { measuredTapRatio: 174 }],
    ['range', { batter: { ...tenMil, range: { slackNPerM: 3000, chokedNPerM: 900 } } }],
  ])('naming %s: %j', (field, change) => {
    expect(() => drumTuning({ ...tom, ...change })).toThrow(expect.objectContaining({ name: 'AcousticsError', field }))
  })

  it('says which head could not hold the note', () => {
    expect(() => drumTuning({ ...tom, noteHz: 700, relationCents: 600 })).toThrow(/resonant head would need \d+ N\/m/)
  })
})
