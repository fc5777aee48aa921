import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { bruteForcePlans } from '@/tests/helpers/brute-force-plan'
import { judgePlan } from './note-judge'
import { costOfMoving } from './note-moves'
import { planNotes } from './note-plan'
import type { JudgedPlan, NotePlanInput, PlanDrum } from './note-plan-model'

/** Ranges of a drum: narrow ones, so that trying every note stays short; low edge and thirds in quarter semitones. */
const range = (low: number) =>
  fc
    .tuple(fc.integer({ min: low * 4, max: (low + 10) * 4 }), fc.tuple(third, third, third))
    .map(([quarters, [a, b, c]]) => {
      const edge = quarters / 4
      return { low: edge, middleLow: edge + a, middleHigh: edge + a + b, high: edge + a + b + c }
    })
const third = fc.integer({ min: 2, max: 9 }).map((quarters) => quarters / 4)
const tension = { slackNPerM: 700, chokedNPerM: 4500 }

function drumOf(id: string, role: PlanDrum['role'], diameterIn: number, low: number): fc.Arbitrary<PlanDrum> {
  return fc
    .tuple(range(low), fc.option(fc.integer({ min: -8, max: 10 }), { nil: undefined, freq: 4 }))
    .map(([of, lock]): PlanDrum => ({
      ...{ id, name: id, role, diameterIn, range: of, tension },
      ...(lock === undefined ? {} : { lockedNote: { semitone: Math.round(of.low + lock), cents: 0 } }),
    }))
}

/** Kits with at most `free` drums that are not locked. */
function inputOf(kit: fc.Arbitrary<PlanDrum>[], free: number): fc.Arbitrary<NotePlanInput> {
  const steps = fc.oneof(
    fc.constant({ kind: 'free' as const }),
    fc.array(fc.integer({ min: 0, max: 7 }), { minLength: 1, maxLength: 3 }).map((semitones) => ({
      ...{ kind: 'per-pair' as const, semitones },
    })),
  )
  return fc
    .tuple(fc.tuple(...kit), steps, fc.subarray([5, 7, 12]), fc.integer({ min: 0, max: 6 }))
    .filter(([drums]) => drums.filter(({ lockedNote }) => !lockedNote).length <= free)
    .map(([drums, each, kickBelowLowestTom, apartSemitones]) => ({
      ...{ drums, apartSemitones, alternatives: 6 },
      template: { id: 'test', name: 'Test', steps: each, resonantCents: 0, kickBelowLowestTom },
    }))
}

const threeToms = [drumOf('a', 'tom', 10, 42), drumOf('b', 'tom', 12, 40), drumOf('c', 'floor-tom', 16, 36)]
const mixed = [...threeToms, drumOf('kick', 'kick', 22, 28), drumOf('snare', 'snare', 14, 40)]
const twoSnares = [...threeToms.slice(0, 2), drumOf('snare', 'snare', 14, 42), drumOf('side', 'snare', 13, 42)]

const semitones = (plan: JudgedPlan) =>
  Object.fromEntries(plan.drums.map(({ drumId, note }) => [drumId, note.semitone]))

function agrees(input: NotePlanInput) {
  const { best, alternatives } = planNotes(input)
  const brute = bruteForcePlans(input)
  const [first] = brute
  if (!first) throw new Error('nothing tried')
  expect({ cost: best.cost, notes: semitones(best) }).toEqual({ cost: first.cost / 1000, notes: first.notes })
  // The same intervals at other heights, and the first of each other set of intervals; none out of order while order can be kept.
  const inOrder = ({ toms }: { toms: number[] }) => toms.every((pitch, i) => i === 0 || pitch <= (toms[i - 1] ?? 0))
  const intervals = ({ toms }: { toms: number[] }) =>
    toms
      .slice(1)
      .map((pitch, i) => (toms[i] ?? 0) - pitch)
      .join(' ')
  const expected = brute.filter((plan, i) => {
    const own = intervals(plan)
    return (
      i > 0 &&
      (inOrder(plan) || !inOrder(first)) &&
      (own === intervals(first) || brute.findIndex((other) => intervals(other) === own) === i)
    )
  })
  expect(alternatives.map(({ plan }) => ({ cost: plan.cost, notes: semitones(plan) }))).toEqual(
    expected.slice(0, 6).map(({ cost, notes }) => ({ cost: cost / 1000, notes })),
  )
}

describe('the note plan beside every plan tried one by one (brute force, the rules written a second time)', () => {
  it('three toms: the best and every alternative are the same, notes and cost', () => {
    fc.assert(fc.property(inputOf(threeToms, 2), agrees), { numRuns: 120 })
  })

  it('three free toms', () => {
    fc.assert(fc.property(inputOf(threeToms, 3), agrees), { numRuns: 6 })
  })

  it('toms, a kick and a snare', () => {
    fc.assert(fc.property(inputOf(mixed, 2), agrees), { numRuns: 120 })
  })

  it('two snares', () => {
    fc.assert(fc.property(inputOf(twoSnares, 2), agrees), { numRuns: 40 })
  })
})

describe('what a plan costs', () => {
  const inputs = inputOf(mixed, 5)

  it('is what judging its notes by hand gives, and the parts add up to it', () => {
    fc.assert(
      fc.property(inputs, (input) => {
        const { best } = planNotes({ ...input, alternatives: 0 })
        const judged = judgePlan(input, new Map(best.drums.map(({ drumId, note }) => [drumId, note])))
        expect({ ...judged, drums: [] }).toEqual({ ...best, drums: [] })
        const { cost, split, drums, intervals, clashes } = best
        expect(Object.values(split).reduce((sum, part) => sum + part, 0)).toBeCloseTo(cost, 6)
        const each = [
          ...drums.flatMap((drum) => Object.values(drum.cost)),
          ...intervals.flatMap((interval) => Object.values(interval.cost)),
          ...clashes.map((clash) => clash.cost),
        ]
        expect(each.reduce((sum, part) => sum + part, 0)).toBeCloseTo(cost, 6)
      }),
      { numRuns: 100 },
    )
  })

  it('is never less for any note a drum is moved to, with the others replanned or not', () => {
    fc.assert(
      fc.property(inputs, fc.constantFrom('a', 'b', 'c', 'kick', 'snare'), (input, drumId) => {
        const drums = input.drums.map((drum): PlanDrum => {
          const { id, name, role, diameterIn, range: own } = drum
          return id === drumId ? { id, name, role, diameterIn, range: own, tension } : drum
        })
        const { best } = planNotes({ ...input, drums, alternatives: 0 })
        const notes = new Map(best.drums.map((drum) => [drum.drumId, drum.note]))
        for (const move of costOfMoving({ ...input, drums }, notes, drumId, { replan: true })) {
          expect(move.replannedCost).toBeGreaterThanOrEqual(best.cost)
          expect(move.cost).toBeGreaterThanOrEqual(move.replannedCost ?? Infinity)
        }
      }),
      { numRuns: 60 },
    )
  })

  it('the same question has the same answer', () => {
    fc.assert(
      fc.property(inputs, (input) => {
        expect(planNotes(structuredClone(input))).toEqual(planNotes(input))
      }),
      { numRuns: 40 },
    )
  })
})
