import { describe, expect, it } from 'vitest'
import { matchedRodPullN, matchedTapRatio, matchedTapScatter, matchedTensionNPerM } from '@/tests/helpers/matched-drum'
import { calibrateGauge } from '@/lib/tuning/gauge-calibration'
import { springDial, sampleGauge } from '@/lib/tuning/sample-gauge'
import { sampleDrum } from './sample-revision'
import { tuningSheet } from './tuning-sheet'

const reader = { locale: 'en', units: 'imperial', referenceHz: 440, calibration: null } as const
const size = { role: 'tom', diameterIn: 12, depthIn: 8, lugs: 6 } as const
const drum = (spec: Partial<Parameters<typeof sampleDrum>[1]>) =>
  sampleDrum({ id: 'd', name: 'Tom 12', position: 0 }, { ...size, ...spec })
const D3 = { semitone: 50, cents: 0 }

describe('a tuning sheet', () => {
  // Equal temperament from A4 = 440 Hz (ISO 16:1975): D3 is 146.83 Hz.
  it('names the note in Hz, whatever the reference', () => {
    expect(tuningSheet(drum({ note: D3 }), reader).heads[0]?.note?.hz).toBeCloseTo(146.83, 2)
    expect(tuningSheet(drum({ note: D3 }), { ...reader, referenceHz: 442 }).heads[0]?.note?.hz).toBeCloseTo(
      (146.832 * 442) / 440,
      2,
    )
  })

  it('stands the resonant tap over the batter’s by the drum’s relation, for one note', () => {
    const sheet = tuningSheet(drum({ note: D3, headRelationCents: 1200 }), reader)
    const [batter, resonant] = sheet.heads
    expect((resonant?.tap?.hz ?? 0) / (batter?.tap?.hz ?? 1)).toBeCloseTo(2, 9)
    // The drum has one note, whichever head it is asked of.
    expect([sheet.note?.name, batter?.note?.name, resonant?.note?.name]).toEqual(['D3', 'D3', 'D3'])
    expect(sheet.relationWords).toBe('resonant tap 1200 cents over the batter’s')
  })

  it('names notes in the reader’s language', () => {
    const name = (locale: string) =>
      tuningSheet(drum({ note: { semitone: 59, cents: 0 } }), { ...reader, locale }).heads[0]?.note?.name
    expect([name('en-GB'), name('de'), name('fr-CA'), name('pt')]).toEqual(['B3', 'H3', 'si3', 'B3'])
  })

  it('gives tap, tension and pull of matched heads inside their bounds (closed form, derived)', () => {
    const plain = { plyMils: [10], film: 'clear', coatingGPerM2: 0, damping: 'none', gauge: null } as const
    const sheet = tuningSheet(drum({ note: D3, batter: plain, resonant: plain }), reader)
    const [head] = sheet.heads
    if (!head?.tap || !head.tensionNPerM || !head.rodPullBoundsN) throw new Error('no figures')
    expect(head.tap.hz / (146.832 * matchedTapRatio())).toBeCloseTo(1, 3)
    expect(head.tap.highHz / head.tap.hz).toBeCloseTo(matchedTapScatter(), 4)
    expect(head.tap.hz / head.tap.lowHz).toBeCloseTo(matchedTapScatter(), 4)
    expect(head.tensionNPerM.value / matchedTensionNPerM(146.832)).toBeCloseTo(1, 3)
    expect((head.rodPullN ?? 0) / matchedRodPullN(146.832)).toBeCloseTo(1, 3)
    expect(head.rodPullBoundsN.low).toBeLessThan(head.rodPullN ?? 0)
    expect(head.rodPullBoundsN.high).toBeGreaterThan(head.rodPullN ?? 0)
    expect(sheet.figures).toMatchObject({ model: 'two-heads', tapRatioMeasured: false })
    expect(sheet.figures?.sustain).toBeCloseTo(1, 6)
  })

  // 10 cents of 256 Hz are 256·(2^(10/1200) − 1) = 1.483 Hz (closed form, derived).
  it('gives the tolerance in Hz at the tap, and the usual warble limit unless the drum has its own', () => {
    const sheet = tuningSheet(drum({ note: D3, toleranceCents: 10 }), reader)
    const [head] = sheet.heads
    expect(head?.toleranceHz).toBeCloseTo((1.483 / 256) * (head?.tap?.hz ?? 0), 3)
    expect(sheet.warbleLimitHz).toBe(1)
    expect(tuningSheet(drum({ note: D3, warbleLimitHz: 0.5 }), reader).warbleLimitHz).toBe(0.5)
  })

  it('foretells the gauge by the tour’s calibrated one, inside its interval, and else says what was noted', () => {
    const calibration = calibrateGauge(sampleGauge)
    const [head] = tuningSheet(drum({ note: D3 }), { ...reader, calibration }).heads
    if (head?.gauge?.kind !== 'foretold') throw new Error('not foretold')
    const { reading, bounds } = head.gauge
    expect(head.gauge.gauge).toBe(sampleGauge.name)
    const [low, high] = (bounds ?? '').split('–').map(Number)
    expect(low).toBeLessThan(Number(reading))
    expect(high).toBeGreaterThan(Number(reading))
    // The dial that the pairs were made with, on this tension (derived, see springDial).
    const wanted = springDial(head.tensionNPerM?.value ?? 0)
    expect(wanted).toBeGreaterThan((low ?? 0) - 1)
    expect(wanted).toBeLessThan((high ?? 0) + 1)
    expect(tuningSheet(drum({}), { ...reader, calibration }).heads[0]?.gauge).toEqual({ kind: 'noted', reading: '75' })
  })

  it('keeps what its figures were worked out from, and nothing where there are none', () => {
    expect(tuningSheet(drum({ note: D3 }), reader).workedFrom).toMatchObject({ lugs: 6, role: 'tom', depthM: 0.2032 })
    expect(tuningSheet(drum({}), reader).workedFrom).toBeNull()
  })

  it('has no figures for a head with a port, and says so', () => {
    const sheet = tuningSheet(drum({ note: D3, ported: true }), reader)
    expect(sheet.heads[1]).toMatchObject({ tap: null, tensionNPerM: null, rodPullN: null })
    expect(sheet.heads[1]?.without).toContain('port')
    expect(sheet.relationWords).toBeNull()
    expect(sheet.figures).toMatchObject({ model: 'one-head', upperPartner: null, sustain: null, falseWarbleHz: null })
  })

  it('crosses over from lug to lug and counts from the badge on each head', () => {
    const [batter, resonant] = tuningSheet(drum({ note: D3 }), reader).heads
    expect(batter?.order).toEqual([1, 4, 2, 5, 3, 6])
    expect(batter?.lugs.map(({ lug, turn }) => [lug, turn])).toEqual([
      [1, 1],
      [2, 3],
      [3, 5],
      [4, 2],
      [5, 4],
      [6, 6],
    ])
    // Badge at the top: lug 1 is to the right of it on both heads, and above the middle.
    for (const head of [batter, resonant]) {
      expect(head?.lugs[0]?.x).toBeCloseTo(0.5, 6)
      expect(head?.lugs[0]?.y).toBeCloseTo(-Math.sqrt(3) / 2, 6)
    }
  })

  it('has no figure without a note, and says whom to ask', () => {
    const [batter] = tuningSheet(drum({}), reader).heads
    expect(batter).toMatchObject({ note: null, tap: null, rodPullN: null, gauge: { kind: 'noted', reading: '75' } })
    expect(batter?.without).toContain('ask the drum tech')
  })

  it('has no figure where the head cannot be estimated, and keeps the note', () => {
    const [batter] = tuningSheet(drum({ note: { semitone: 96, cents: 0 }, diameterIn: 26 }), reader).heads
    expect(batter).toMatchObject({ tap: null, rodPullN: null })
    expect(batter?.note?.hz).toBeCloseTo(2093, 0)
    expect(batter?.without).toContain('cannot be estimated')
  })

  it('has one head when there is no resonant one', () => {
    const sheet = tuningSheet(drum({ note: D3, resonant: null }), reader)
    expect(sheet.heads.map(({ side }) => side)).toEqual(['batter'])
    expect(sheet.relationWords).toBeNull()
  })
})
