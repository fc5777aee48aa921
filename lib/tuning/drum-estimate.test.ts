import { describe, expect, it } from 'vitest'
import { matchedRodPullN, matchedTapRatio, matchedTensionNPerM } from '@/tests/helpers/matched-drum'
import { drumEstimate, filmOf } from './drum-estimate'
import type { TradeDrum } from './drum-estimate'
import { drumPitch, playableRange } from './playable-range'

const D3 = { semitone: 50, cents: 0 }
const tom: TradeDrum = {
  ...{ role: 'tom', diameterIn: 12, depthIn: 8, lugs: 6, ported: false, note: D3, headRelationCents: 0 },
  batter: { plyMils: [10], coatingGPerM2: 0 },
  resonant: { plyMils: [10], coatingGPerM2: 0 },
}
/** Over A4 = 440 Hz (ISO 16:1975, published). */
const D3_HZ = 146.8324

describe('the estimate of a drum', () => {
  it('works both heads out together from trade units, against the closed form of matched heads (derived)', () => {
    const made = drumEstimate(tom)
    expect(made?.noteHz).toBeCloseTo(D3_HZ, 4)
    for (const head of [made?.tuning?.batter, made?.tuning?.resonant]) {
      expect((head?.tensionNPerM.value ?? 0) / matchedTensionNPerM(D3_HZ)).toBeCloseTo(1, 3)
      expect((head?.rodPullN.value ?? 0) / matchedRodPullN(D3_HZ)).toBeCloseTo(1, 3)
      expect((head?.tapHz.value ?? 0) / (D3_HZ * matchedTapRatio())).toBeCloseTo(1, 3)
    }
  })

  it('takes the coating as grams a square metre: on both heads it moves with the film', () => {
    expect(filmOf({ plyMils: [7, 7], coatingGPerM2: 60 })).toEqual({ plyMils: [7, 7], coatingKgPerM2: 0.06 })
    const coated = { plyMils: [10], coatingGPerM2: 100 }
    const made = drumEstimate({ ...tom, batter: coated, resonant: coated })?.tuning?.batter.tensionNPerM.value ?? 0
    // 100 g/m² are as 100/353.06 of 10 mil film (derived).
    expect(made / matchedTensionNPerM(D3_HZ, 1 + 0.1 / 0.35306)).toBeCloseTo(1, 3)
  })

  it('sets the taps apart by the relation; the note stays where it is', () => {
    const made = drumEstimate({ ...tom, headRelationCents: 700 })
    const [batter = 0, resonant = 0] = [made?.tuning?.batter.tapHz.value, made?.tuning?.resonant?.tapHz.value]
    expect(1200 * Math.log2(resonant / batter)).toBeCloseTo(700, 6)
    expect(made?.noteHz).toBeCloseTo(D3_HZ, 4)
  })

  it('follows the reference of the party and the temperature of the stage', () => {
    expect(drumEstimate({ ...tom, note: { semitone: 69, cents: 0 } }, { referenceHz: 442 })?.noteHz).toBe(442)
    const [room, cold] = [drumEstimate(tom), drumEstimate(tom, { temperatureC: 0 })]
    // Denser air weighs more, so the note asks for more tension.
    expect(cold?.tuning?.batter.tensionNPerM.value).toBeGreaterThan(room?.tuning?.batter.tensionNPerM.value ?? 0)
  })

  it('takes a measured tap ratio and a head’s own range when they are there, and null as not there', () => {
    const range = { slackNPerM: 100, chokedNPerM: 1500 }
    const made = drumEstimate({ ...tom, measuredTapRatio: 1.9, batter: { ...tom.batter, range } })
    expect(made?.tuning?.batter.tapHz.value).toBeCloseTo(1.9 * D3_HZ, 2)
    expect(made?.tuning?.batter).toMatchObject({ range, cautions: ['choked'] })
    const none = { ...tom, measuredTapRatio: null, batter: { ...tom.batter, range: null } }
    expect(drumEstimate(none)?.tuning).toEqual(drumEstimate(tom)?.tuning)
  })

  it('has no figures without a note, none for a head that is not there, none for a head with a port', () => {
    expect(drumEstimate({ ...tom, note: null })).toBeNull()
    expect(drumEstimate({ ...tom, resonant: null })?.tuning).toMatchObject({ model: 'one-head', resonant: null })
    expect(drumEstimate({ ...tom, ported: true })?.tuning).toMatchObject({ model: 'one-head', resonant: null })
  })

  it('says why a drum cannot sound a note', () => {
    const made = drumEstimate({ ...tom, diameterIn: 28, note: { semitone: 96, cents: 0 } })
    expect(made?.tuning).toBeNull()
    expect(made?.refusal).toMatch(/N\/m/)
  })
})

describe('the playable range in notes', () => {
  it('runs from the slack to the choked edge of the role, evenly in cents while the heads are matched (derived)', () => {
    const range = playableRange(tom)
    // Matched heads: pitch goes as √T, so 700 to 4500 N/m is 6·log2(4500/700) semitones, a third of them in the middle.
    const span = 6 * Math.log2(4500 / 700)
    expect(range.high - range.low).toBeCloseTo(span, 6)
    expect(range.middleHigh - range.middleLow).toBeCloseTo(span / 3, 6)
    const slackHz = D3_HZ * Math.sqrt(700 / matchedTensionNPerM(D3_HZ))
    expect(range.low).toBeCloseTo(69 + 12 * Math.log2(slackHz / 440), 2)
  })

  it('follows the head’s own range and the other head', () => {
    const own = { slackNPerM: 1400, chokedNPerM: 4500 }
    expect(playableRange({ ...tom, batter: { ...tom.batter, range: own } }).low - playableRange(tom).low).toBeCloseTo(
      6,
      6,
    )
    expect(playableRange({ ...tom, headRelationCents: 500 }).low).toBeGreaterThan(playableRange(tom).low)
  })

  it('lies higher on the count when the party tunes to a lower reference', () => {
    const up = playableRange(tom, { referenceHz: 415 }).low - playableRange(tom).low
    expect(up).toBeCloseTo(12 * Math.log2(440 / 415), 6)
  })
})

describe('pitch and tension of a drum', () => {
  it.each<[string, Partial<TradeDrum>]>([
    ['matched heads', {}],
    ['heads apart', { headRelationCents: -400 }],
    ['one head', { resonant: null }],
    ['a measured drum', { measuredTapRatio: 1.7 }],
  ])('%s: round trip, and up with the tension', (_, change) => {
    const { pitchAt, batterNPerM } = drumPitch({ ...tom, ...change })
    for (const semitone of [40, 45, 50, 55]) {
      const tension = batterNPerM({ semitone, cents: 20 })
      expect(pitchAt(tension)).toBeCloseTo(semitone + 0.2, 8)
      expect(pitchAt(tension * 1.01)).toBeGreaterThan(semitone + 0.2)
    }
  })
})
