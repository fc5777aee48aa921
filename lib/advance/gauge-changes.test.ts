import { describe, expect, it } from 'vitest'
import type { FrozenGauge } from './frozen-gauge'
import { changeSentences, compareSpecs, specsAreSame } from './compare-specs'
import { gaugeChanges } from './gauge-changes'
import { upgradeRevisionDocument } from './revision-document'
import { sampleRevision, sampleSpec } from './sample-revision'

const pair = {
  ...{ reading: 75, diameterIn: 12, depthIn: 8, plyMils: [10], coatingGPerM2: 0 },
  ...{ tapHz: 288, temperatureC: null },
}
const gauge: FrozenGauge = { id: 'g-1', name: 'Brass gauge', scale: { min: 0, max: 100, step: 1 }, pairs: [pair] }

describe('what became of the tour’s gauge', () => {
  it('is nothing while gauge and pairs stay', () => {
    expect(gaugeChanges(null, null)).toEqual([])
    expect(gaugeChanges(gauge, { ...gauge, pairs: [{ ...pair }] })).toEqual([])
  })

  it.each([
    [null, gauge, 'Gauge: none → Brass gauge'],
    [gauge, null, 'Gauge: Brass gauge → none'],
    [gauge, { ...gauge, id: 'g-2', name: 'Spare' }, 'Gauge: Brass gauge → Spare'],
    [gauge, { ...gauge, name: 'Old brass' }, 'Gauge Old brass: called Brass gauge → Old brass'],
    [gauge, { ...gauge, pairs: [pair, pair] }, 'Gauge Brass gauge: calibrated again, 1 → 2 pairs'],
    [gauge, { ...gauge, pairs: [{ ...pair, tapHz: 290 }] }, 'Gauge Brass gauge: calibrated again, 1 → 1 pairs'],
    [gauge, { ...gauge, scale: { min: 0, max: 120, step: 1 } }, 'Gauge Brass gauge: dial 0 to 100 → 0 to 120'],
  ])('is said: %#', (before, after, words) => {
    expect(gaugeChanges(before, after)).toEqual([words])
  })

  it('makes another revision, and its readers are told', () => {
    const calibrated = { ...sampleSpec, gauge }
    expect(specsAreSame(sampleSpec, calibrated)).toBe(false)
    expect(specsAreSame(calibrated, { ...sampleSpec, gauge: { ...gauge } })).toBe(true)
    expect(changeSentences(compareSpecs(sampleSpec, calibrated))).toEqual(['Gauge: none → Brass gauge'])
    expect(changeSentences(compareSpecs(null, calibrated))).not.toContain('Gauge: none → Brass gauge')
  })
})

describe('a stored revision', () => {
  it('keeps its gauge with the pairs, and has none where it is older than gauges', () => {
    const kept = JSON.parse(JSON.stringify({ ...sampleRevision(), gauge })) as Record<string, unknown>
    expect(upgradeRevisionDocument(kept).gauge).toEqual(gauge)
    const { gauge: _none, ...older } = kept
    const opened = upgradeRevisionDocument(older)
    expect(opened.gauge).toBeNull()
    expect(opened).toEqual(sampleRevision())
  })
})
