import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { headEstimate } from './head-estimate'
import type { HeadEstimateInput } from './head-estimate'

const tom: HeadEstimateInput = {
  ...{ diameterM: 0.3048, plyMils: [10], coatingKgPerM2: 0, noteHz: 146.8324, lugs: 6, role: 'tom', temperatureC: 20 },
}

describe('head estimate', () => {
  it('12 in, 10 mil at D3: tension, pull and torque follow from the open-air head (derived by hand)', () => {
    const moving = 0.35306 + 1.49287 * 1.2041 * 0.1524
    const tension = moving * ((2 * Math.PI * 0.1524 * 146.8324) / 2.404825557696) ** 2
    const { tensionNPerM, rodPullN, torqueNm, filmStressPa } = headEstimate(tom)
    expect(tensionNPerM).toBeCloseTo(tension, 1)
    expect(rodPullN).toBeCloseTo((Math.PI * 0.3048 * tension) / 6, 1)
    expect(torqueNm.nominalNm).toBeCloseTo((0.2 * 5.4864e-3 * Math.PI * 0.3048 * tension) / 6, 3)
    expect(filmStressPa / (tension / 254e-6)).toBeCloseTo(1, 4)
  })

  it('the tap interval holds what a shell does to it: ratios 1.744 (12×8 in) and 1.686 (12×5 in) (derived)', () => {
    const { interval, noteHz } = headEstimate(tom)
    for (const ratio of [1.744, 1.686]) {
      expect(ratio * noteHz).toBeGreaterThan(interval.tapLowHz)
      expect(ratio * noteHz).toBeLessThan(interval.tapHighHz)
    }
  })

  it('the tension interval holds the shell’s: a 12×8 and a 12×5 in drum sound 146.37 and 150.60 Hz at 2000 N/m (derived)', () => {
    for (const noteHz of [146.37, 150.6]) {
      const { interval } = headEstimate({ ...tom, noteHz })
      expect(interval.tensionLowNPerM).toBeLessThan(2000)
      expect(interval.tensionHighNPerM).toBeGreaterThan(2000)
    }
  })

  it('a measured tap ratio replaces the model and narrows the interval', () => {
    const [modelled, measured] = [headEstimate(tom), headEstimate({ ...tom, measuredTapRatio: 1.7 })]
    expect(measured.tapHz).toBeCloseTo(1.7 * 146.8324, 6)
    expect(measured.interval.tapHighHz - measured.interval.tapLowHz).toBeLessThan(
      modelled.interval.tapHighHz - modelled.interval.tapLowHz,
    )
    expect(measured.tensionNPerM).toBe(modelled.tensionNPerM)
  })

  it('an octave up needs four times the tension, and the tap goes with the note', () => {
    fc.assert(
      fc.property(fc.double({ min: 50, max: 150, noNaN: true }), (noteHz) => {
        const [low, high] = [headEstimate({ ...tom, noteHz }), headEstimate({ ...tom, noteHz: 2 * noteHz })]
        expect(high.tensionNPerM / low.tensionNPerM).toBeCloseTo(4, 9)
        expect(high.tapHz / low.tapHz).toBeCloseTo(2, 9)
        expect(high.interval.tapLowHz).toBeLessThan(high.tapHz)
        expect(high.interval.tapHighHz).toBeGreaterThan(high.tapHz)
      }),
    )
  })

  it('cautions: slack, choked, and film pulled past a third of 98 MPa, which is ordinary for a 3 mil snare side', () => {
    expect(headEstimate({ ...tom, noteHz: 70 }).cautions).toEqual(['slack'])
    expect(headEstimate({ ...tom, noteHz: 240 }).cautions).toEqual(['choked'])
    const thin = { ...tom, diameterM: 0.3556, plyMils: [3], lugs: 10, noteHz: 190 }
    expect(headEstimate({ ...thin, role: 'tom' }).cautions).toContain('film-stress')
    expect(headEstimate({ ...thin, role: 'snare', side: 'resonant' }).cautions).not.toContain('film-stress')
  })

  it('a range kept for the head replaces the default', () => {
    const range = { slackNPerM: 100, chokedNPerM: 2000 }
    expect(headEstimate({ ...tom, range }).cautions).toEqual(['choked'])
  })

  it.each<[string, Partial<HeadEstimateInput>]>([
    ['diameterM', { diameterM: 12 }],
    ['diameterM', { diameterM: Number.NaN }],
    ['plyMils', { plyMils: [] }],
    ['coatingKgPerM2', { coatingKgPerM2: -1 }],
    ['noteHz', { noteHz: 0 }],
    ['noteHz', { noteHz: -146 }],
    ['noteHz', { noteHz: Number.POSITIVE_INFINITY }],
    ['noteHz', { noteHz: 2000 }],
    ['lugs', { lugs: 0 }],
    ['temperatureC', { temperatureC: 293.15 }],
    ['measuredTapRatio', { measuredTapRatio: 0 }],
  ])('refuses nonsense, naming %s: %j', (field, change) => {
    expect(() => headEstimate({ ...tom, ...change })).toThrow(
      expect.objectContaining({ name: 'AcousticsError', field }),
    )
  })
})
