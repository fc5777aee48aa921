import { describe, expect, it } from 'vitest'
import { drumEstimate, filmOf, planDrumOf } from './drum-estimate'
import type { TradeDrum } from './drum-estimate'
import { playableRange } from './playable-range'

const D3 = { semitone: 50, cents: 0 }
const tom: TradeDrum = {
  role: 'tom',
  diameterIn: 12,
  lugs: 6,
  batter: { plyMils: [10], coatingGPerM2: 0 },
  resonant: { plyMils: [10], coatingGPerM2: 0 },
  note: D3,
  headRelationCents: 0,
}

/** Closed form for one 12 in, 10 mil head in the open air: σ0 = 1390·254 µm + 1.4928·1.2041·0.1524, T = σ0·(2π·a·f/j01)² (derived). */
const radiusM = 0.1524
const moving = 1390 * 254e-6 + 1.4928 * 1.2041 * radiusM
const tensionAt = (hz: number) => moving * ((2 * Math.PI * radiusM * hz) / 2.404825557696) ** 2
const D3_HZ = 146.8324

describe('the estimate of a drum', () => {
  it('works both heads out from trade units, against the closed form', () => {
    const made = drumEstimate(tom)
    expect(made?.noteHz).toBeCloseTo(D3_HZ, 4)
    for (const side of [made?.batter, made?.resonant]) {
      expect(side?.estimate?.tensionNPerM).toBeCloseTo(tensionAt(D3_HZ), 0)
      expect(side?.estimate?.rodPullN).toBeCloseTo((2 * Math.PI * radiusM * tensionAt(D3_HZ)) / 6, 0)
    }
  })

  it('takes the coating as grams a square metre', () => {
    expect(filmOf({ plyMils: [7, 7], coatingGPerM2: 60 })).toEqual({ plyMils: [7, 7], coatingKgPerM2: 0.06 })
    const coated = drumEstimate({ ...tom, batter: { plyMils: [10], coatingGPerM2: 100 } })
    const ratio = (moving + 0.1) / moving
    expect(coated?.batter.estimate?.tensionNPerM).toBeCloseTo(tensionAt(D3_HZ) * ratio, 0)
  })

  it('sets the resonant head by the relation, each head alone', () => {
    const made = drumEstimate({ ...tom, headRelationCents: 1200 })
    expect(made?.resonant?.noteHz).toBeCloseTo(2 * D3_HZ, 3)
    expect(made?.resonant?.estimate?.tensionNPerM).toBeCloseTo(tensionAt(2 * D3_HZ), 0)
  })

  it('follows the reference of the party and the temperature of the stage', () => {
    expect(drumEstimate({ ...tom, note: { semitone: 69, cents: 0 } }, { referenceHz: 442 })?.noteHz).toBe(442)
    const cold = drumEstimate(tom, { temperatureC: 0 })
    const airLoad = 1.4928 * 1.2041 * radiusM
    const expected = (1390 * 254e-6 + airLoad * (293.15 / 273.15)) * (tensionAt(D3_HZ) / moving)
    expect(cold?.batter.estimate?.tensionNPerM).toBeCloseTo(expected, 0)
  })

  it('has no figures without a note, and none for a head that is not there', () => {
    expect(drumEstimate({ ...tom, note: null })).toBeNull()
    expect(drumEstimate({ ...tom, resonant: null })?.resonant).toBeNull()
  })

  it('says why a head cannot sound a note, and still answers for the other', () => {
    const made = drumEstimate({ ...tom, diameterIn: 28, note: { semitone: 96, cents: 0 }, headRelationCents: -1200 })
    expect(made?.batter.estimate).toBeNull()
    expect(made?.batter.refusal).toMatch(/N\/m/)
  })
})

describe('a drum of the plan', () => {
  it('takes its note along only when it is locked', () => {
    expect(planDrumOf('a', { ...tom, noteLocked: true })).toMatchObject({ id: 'a', diameterIn: 12, lockedNote: D3 })
    expect(planDrumOf('a', { ...tom, noteLocked: false })).not.toHaveProperty('lockedNote')
    expect(planDrumOf('a', { ...tom, note: null, noteLocked: true })).not.toHaveProperty('lockedNote')
  })
})

describe('the playable range in notes', () => {
  it('runs evenly in cents from the slack to the choked edge of the role', () => {
    const range = playableRange(tom)
    // Pitch goes as √T: from 700 to 4500 N/m is 6·log2(4500/700) semitones, a third of them in the middle.
    const span = 6 * Math.log2(4500 / 700)
    expect(range.high - range.low).toBeCloseTo(span, 6)
    expect(range.middleHigh - range.middleLow).toBeCloseTo(span / 3, 6)
    const slackHz = (2.404825557696 / (2 * Math.PI * radiusM)) * Math.sqrt(700 / moving)
    expect(range.low).toBeCloseTo(69 + 12 * Math.log2(slackHz / 440), 3)
  })

  it('lies higher on the count when the party tunes to a lower reference', () => {
    expect(playableRange(tom, { referenceHz: 415 }).low - playableRange(tom).low).toBeCloseTo(
      12 * Math.log2(440 / 415),
      6,
    )
  })
})
