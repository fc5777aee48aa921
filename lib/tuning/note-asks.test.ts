import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { askedOffsets, pitchAtTension, tensionAtPitch } from './note-asks'
import type { PlanDrum } from './note-plan-model'
import type { TemplateSteps } from './note-template'

/** A drum whose range is its film's alone: pitch goes with half the logarithm of tension, 6 semitones for twice the tension. */
function drum(diameterIn: number, low: number): PlanDrum {
  const range = { low, middleLow: low + 4, middleHigh: low + 8, high: low + 12 }
  const tension = { slackNPerM: 1000, chokedNPerM: 4000 }
  return { id: `tom${diameterIn}`, name: `Tom ${diameterIn}`, role: 'tom', diameterIn, range, tension }
}
const toms = [drum(10, 45), drum(12, 41), drum(13, 39.5), drum(14, 38), drum(16, 35.5)]
const [, twelve, , , sixteen] = toms
if (!twelve || !sixteen) throw new Error('no toms')

function asked(steps: TemplateSteps, reference = twelve, pitch = 47): number[] {
  if (!reference) throw new Error('no reference')
  const offsets = askedOffsets(toms, steps, reference, pitch)
  return toms.map(({ id }) => offsets.get(id)?.whole ?? Number.NaN)
}

describe('what a template asks of each tom under the reference', () => {
  it('by the inch: a fourth for 2 in, a half left over goes to the smaller interval (common practice)', () => {
    expect(asked({ kind: 'per-inch', semitonesPerInch: 2.5 })).toEqual([-5, 0, 2, 5, 10])
    expect(asked({ kind: 'per-inch', semitonesPerInch: 2.5 }, sixteen)).toEqual([-15, -10, -7, -5, 0])
  })

  it('by pairs: each its own, the last one going on', () => {
    expect(asked({ kind: 'per-pair', semitones: [5, 3, 4] })).toEqual([-5, 0, 3, 7, 11])
  })

  it('by pairs in fractions: rounded from the reference, so that nothing adds up along the toms', () => {
    expect(asked({ kind: 'per-pair', semitones: [2.4] }, toms[0])).toEqual([0, 2, 5, 7, 10])
  })

  it('equal feel: the pitch of every tom at the reference’s film tension', () => {
    // With pitch straight in log tension and equal tensions at the edges the drums differ as their low edges do.
    expect(asked({ kind: 'equal-feel' })).toEqual([-4, 0, 1, 3, 5])
  })

  it('free: nothing', () => {
    expect(askedOffsets(toms, { kind: 'free' }, twelve, 47).size).toBe(0)
  })
})

describe('pitch and film tension of a range', () => {
  it('meets the edges and goes on past them', () => {
    expect(pitchAtTension(twelve, 1000)).toBeCloseTo(41, 9)
    expect(pitchAtTension(twelve, 4000)).toBeCloseTo(53, 9)
    // Closed form: 6 semitones for twice the tension.
    expect(pitchAtTension(twelve, 8000)).toBeCloseTo(59, 9)
    expect(pitchAtTension(twelve, 500)).toBeCloseTo(35, 9)
  })

  it('is the same there and back', () => {
    const bent = { ...twelve, range: { low: 40, middleLow: 45, middleHigh: 50.5, high: 55 } }
    fc.assert(
      fc.property(fc.double({ min: 30, max: 65, noNaN: true }), (pitch) => {
        expect(pitchAtTension(bent, tensionAtPitch(bent, pitch))).toBeCloseTo(pitch, 9)
      }),
    )
  })
})

describe('equal film tension on real heads', () => {
  /** One head in the open air, both faces loaded: f01 = (j01/2πa)·√(T/(σ + β₀ρa)), as a pitch. */
  function openPitch(diameterIn: number, tensionNPerM: number): number {
    const [radiusM, filmKgPerM2, airKgPerM3] = [(diameterIn * 0.0254) / 2, 0.35306, 1.2041]
    const massKgPerM2 = filmKgPerM2 + 1.4928 * airKgPerM3 * radiusM
    return (
      69 + 12 * Math.log2(((2.404825557696 / (2 * Math.PI * radiusM)) * Math.sqrt(tensionNPerM / massKgPerM2)) / 440)
    )
  }

  it('asks about 3.8, 3.3, 2.9, 2.6 semitones from 10 to 18 in (derived: 10 mil heads in the open)', () => {
    const tension = { slackNPerM: 700, chokedNPerM: 4500 }
    const real = [10, 12, 14, 16, 18].map((diameterIn): PlanDrum => {
      const at = (fraction: number) => openPitch(diameterIn, 700 * (4500 / 700) ** fraction)
      const range = { low: at(0), middleLow: at(1 / 3), middleHigh: at(2 / 3), high: at(1) }
      return { id: `tom${diameterIn}`, name: `Tom ${diameterIn}`, role: 'tom', diameterIn, range, tension }
    })
    const [reference] = real
    if (!reference) throw new Error('no drums')
    const offsets = real.map(({ id }) => askedOffsets(real, { kind: 'equal-feel' }, reference, 52).get(id))
    const steps = offsets.slice(1).map((offset, i) => (offset?.exact ?? 0) - (offsets[i]?.exact ?? 0))
    steps.forEach((step, i) => expect(step).toBeCloseTo([3.8, 3.3, 2.9, 2.6][i] ?? 0, 1))
    // 3.8, 7.1, 10.0 and 12.6 in all: whole semitones from the reference, not step by step.
    expect(offsets.map((offset) => offset?.whole)).toEqual([0, 4, 7, 10, 13])
  })
})
