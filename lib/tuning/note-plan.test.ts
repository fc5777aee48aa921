import { describe, expect, it } from 'vitest'
import { judgePlan } from './note-judge'
import { costOfMoving } from './note-moves'
import { planNotes } from './note-plan'
import type { JudgedPlan, NotePlanInput, PlanDrum } from './note-plan-model'
import { NOTE_TEMPLATES } from './note-template'
import type { NoteTemplate } from './note-template'

function template(id: string): NoteTemplate {
  const found = NOTE_TEMPLATES.find((each) => each.id === id)
  if (found === undefined) throw new Error(`no template ${id}`)
  return found
}

/** A drum whose thirds are so many semitones wide. */
function drum(id: string, role: PlanDrum['role'], diameterIn: number, low: number, third = 5): PlanDrum {
  const range = { low, middleLow: low + third, middleHigh: low + 2 * third, high: low + 3 * third }
  return { id, name: id, role, diameterIn, range, tension: { slackNPerM: 700, chokedNPerM: 4500 } }
}
const KIT: PlanDrum[] = [
  drum('kick', 'kick', 22, 22.3, 5.8),
  drum('snare', 'snare', 14, 46.8, 4.2),
  drum('tom10', 'tom', 10, 45),
  drum('tom12', 'tom', 12, 40.9),
  drum('floor16', 'floor-tom', 16, 32.3),
]
const D3 = { semitone: 50, cents: 0 }
const ANCHORED: NotePlanInput = { template: template('fourths'), drums: KIT, anchor: { drumId: 'tom12', note: D3 } }

function lock(id: string, semitone: number, cents = 0): PlanDrum[] {
  return KIT.map((each) => (each.id === id ? { ...each, lockedNote: { semitone, cents } } : each))
}

function noted({ drums }: JudgedPlan): Record<string, number> {
  return Object.fromEntries(drums.map(({ drumId, note }) => [drumId, note.semitone + note.cents / 100]))
}

describe('the best plan', () => {
  it('in fourths from D3 on the 12: G3 on the 10, E2 on the 16 (common practice), at no cost', () => {
    const { best } = planNotes(ANCHORED)
    expect(noted(best)).toMatchObject({ tom10: 55, tom12: 50, floor16: 40 })
    expect(best.cost).toBe(0)
    expect(best.intervals.map(({ gotName }) => gotName).slice(0, 2)).toEqual(['fourth', 'minor seventh'])
  })

  it('keeps the order of the kit, and says where each note came from', () => {
    const { best } = planNotes({ ...ANCHORED, drums: lock('floor16', 40) })
    expect(best.drums.map(({ drumId, origin }) => [drumId, origin])).toEqual([
      ['kick', 'planned'],
      ['snare', 'planned'],
      ['tom10', 'planned'],
      ['tom12', 'anchor'],
      ['floor16', 'locked'],
    ])
  })

  it('keeps a lock exactly, with its cents', () => {
    const { best } = planNotes({ ...ANCHORED, drums: lock('floor16', 43, 10) })
    expect(best.drums.find(({ drumId }) => drumId === 'floor16')?.note).toEqual({ semitone: 43, cents: 10 })
  })

  it('stands on the anchor’s cents, so that its intervals are whole', () => {
    const { best } = planNotes({ ...ANCHORED, anchor: { drumId: 'tom12', note: { semitone: 50, cents: -7 } } })
    expect(new Set(best.drums.map(({ note }) => note.cents))).toEqual(new Set([-7]))
    expect(best.intervals[0]?.got).toBeCloseTo(5, 9)
  })

  it('sets the kick a fourth, fifth or octave under the lowest tom (common practice)', () => {
    const { kick = 0, floor16 = 0 } = noted(planNotes(ANCHORED).best)
    expect([5, 7, 12]).toContain(floor16 - kick)
  })

  it('sets the snare off the toms’ note names (common practice), and in its middle where it can', () => {
    const { best } = planNotes(ANCHORED)
    const { snare = 0, ...others } = noted(best)
    for (const tom of ['tom10', 'tom12', 'floor16']) expect(((others[tom] ?? 0) - snare) % 12).not.toBe(0)
    expect(best.drums.find(({ drumId }) => drumId === 'snare')?.zone).toBe('middle')
  })

  it('gives up an interval before a drum leaves its range', () => {
    // A fourth under D2 would be A1, 3.3 semitones under the floor tom's range.
    const drums = KIT.map((each) => (each.id === 'floor16' ? drum('floor16', 'floor-tom', 14, 36.3) : each))
    const { best } = planNotes({ ...ANCHORED, drums, anchor: { drumId: 'tom12', note: { semitone: 38, cents: 0 } } })
    const floor = best.drums.find(({ drumId }) => drumId === 'floor16')
    expect(floor?.centsOutOfRange).toBe(0)
    expect(best.intervals[1]).toMatchObject({ asked: [5], askedName: 'fourth' })
    expect(best.split.intervals).toBeGreaterThan(0)
  })

  it('never sets a larger tom above a smaller one, but where locks leave no other way', () => {
    const odd = KIT.map((each) => (each.id === 'floor16' ? drum('floor16', 'floor-tom', 16, 50) : each))
    const free = planNotes({ template: template('free'), drums: odd }).best
    expect(free.split.order).toBe(0)
    const forced = planNotes({
      template: template('free'),
      drums: lock('tom10', 45).map((each) =>
        each.id === 'floor16' ? { ...each, lockedNote: { semitone: 47, cents: 0 } } : each,
      ),
    }).best
    expect(forced.intervals.filter(({ cost }) => cost.order > 0)).toHaveLength(1)
  })

  it('holds two toms of one size apart, by the set distance', () => {
    const drums = [...KIT, drum('tom12b', 'tom', 12, 40.9)]
    const { best } = planNotes({ template: template('fourths'), drums, apartSemitones: 3 })
    const { tom12 = 0, tom12b = 0 } = noted(best)
    expect(tom12 - tom12b).toBeGreaterThanOrEqual(3)
    expect(best.clashes).toEqual([])
  })

  it('without toms keeps kick and snare to the middle of their ranges', () => {
    const { best, alternatives } = planNotes({ template: template('fourths'), drums: KIT.slice(0, 2) })
    expect(best.drums.map(({ zone }) => zone)).toEqual(['middle', 'middle'])
    expect(alternatives).toEqual([])
  })

  it('lets a pair of kicks share a note, and several snares', () => {
    const drums = [
      ...KIT,
      drum('kick2', 'kick', 22, 22.3, 5.8),
      drum('snare2', 'snare', 14, 46.8, 4.2),
      drum('snare3', 'snare', 14, 46.8, 4.2),
    ]
    const { kick, kick2, snare, snare2, snare3 } = noted(planNotes({ ...ANCHORED, drums }).best)
    expect(kick2).toBe(kick)
    expect([snare2, snare3]).toEqual([snare, snare])
  })
})

describe('alternatives', () => {
  it('are the same intervals at other heights and other intervals, cheapest first', () => {
    const { alternatives } = planNotes({ template: template('fourths'), drums: KIT, alternatives: 12 })
    const costs = alternatives.map(({ plan }) => plan.cost)
    expect(costs).toEqual([...costs].sort((a, b) => a - b))
    expect(alternatives.map(({ change }) => change)).toContainEqual({ kind: 'shifted', semitones: 1 })
    expect(new Set(alternatives.map(({ change }) => change.kind))).toEqual(new Set(['shifted', 'intervals']))
  })

  it('keep the anchor, and say which interval is another', () => {
    const { alternatives } = planNotes(ANCHORED)
    expect(alternatives).toHaveLength(8)
    for (const { plan, change } of alternatives) {
      expect(noted(plan)['tom12']).toBe(50)
      expect(change.kind).toBe('intervals')
    }
    expect(alternatives.map(({ change }) => change)).toContainEqual({
      kind: 'intervals',
      intervals: [{ upperId: 'tom12', lowerId: 'floor16', best: 10, here: 9 }],
    })
  })

  it('there are none when no tom can move', () => {
    const drums = KIT.map((each) =>
      each.role === 'tom' || each.role === 'floor-tom'
        ? { ...each, lockedNote: { semitone: Math.round(each.range.middleLow), cents: 0 } }
        : each,
    )
    expect(planNotes({ template: template('fourths'), drums }).alternatives).toEqual([])
  })
})

describe('notes set by hand', () => {
  const notes = (change: Record<string, number>) =>
    new Map(
      Object.entries({ tom10: 55, tom12: 50, floor16: 40, ...change }).map(([id, semitone]) => [
        id,
        { semitone, cents: 0 },
      ]),
    )

  it('are judged where they stand: in the middle third nothing, at the edge 3, outside at once 10 and 5 a semitone', () => {
    const costAt = (semitone: number) => {
      const input = { template: template('free'), drums: [drum('tom12', 'tom', 12, 40)] }
      const [judged] = judgePlan(input, new Map([['tom12', { semitone, cents: 0 }]])).drums
      return judged
    }
    expect(costAt(45)).toMatchObject({ zone: 'middle', centsOffMiddle: 0, cost: { offMiddle: 0, outOfRange: 0 } })
    expect(costAt(44)).toMatchObject({ zone: 'low', centsOffMiddle: -100, cost: { offMiddle: 0.12, outOfRange: 0 } })
    expect(costAt(55)).toMatchObject({ zone: 'high', centsOffMiddle: 500, cost: { offMiddle: 3, outOfRange: 0 } })
    expect(costAt(38)).toMatchObject({
      zone: 'below-range',
      centsOutOfRange: -200,
      cost: { offMiddle: 3, outOfRange: 20 },
    })
    expect(costAt(56)).toMatchObject({ zone: 'above-range', cost: { offMiddle: 3, outOfRange: 15 } })
  })

  it('name each interval got and asked, and how far off it is', () => {
    const { intervals, split } = judgePlan(ANCHORED, notes({ floor16: 43 }))
    expect(intervals[1]).toMatchObject({
      ...{ upperId: 'tom12', lowerId: 'floor16', asked: [10], askedName: 'minor seventh' },
      ...{ got: 7, gotName: 'fifth', offSemitones: 3, cost: { interval: 3, order: 0 } },
    })
    expect(split.intervals).toBe(3)
  })

  it('leave out drums without a note; a fourth over two steps is then asked at once', () => {
    const judged = judgePlan(
      ANCHORED,
      new Map([
        ['tom10', { semitone: 55, cents: 0 }],
        ['floor16', { semitone: 40, cents: 0 }],
      ]),
    )
    expect(judged.drums.map(({ drumId }) => drumId)).toEqual(['tom10', 'floor16'])
    expect(judged.intervals).toMatchObject([{ asked: [15], got: 15, gotName: 'octave and minor third' }])
  })

  it('say which drums come too close, and which tom has the snare’s name', () => {
    const { clashes } = judgePlan(ANCHORED, notes({ snare: 52, tom12: 53 }))
    expect(clashes).toContainEqual({ kind: 'too-close', drumIds: ['tom12', 'snare'], semitones: 1, cost: 6 })
    expect(clashes).toContainEqual({ kind: 'shared-name', snareId: 'snare', tomId: 'floor16', cost: 2 })
  })

  it('may lie out of reach, where they only cost more', () => {
    expect(judgePlan(ANCHORED, notes({ floor16: 10 })).split.outOfRange).toBeCloseTo(10 + 5 * 22.3, 6)
  })
})

describe('the cost of moving a drum', () => {
  const { best } = planNotes(ANCHORED)
  const notes = new Map(best.drums.map(({ drumId, note }) => [drumId, note]))

  it('is given for every semitone of its range, and is the plan’s where it stands', () => {
    const moves = costOfMoving(ANCHORED, notes, 'floor16')
    expect(moves.map(({ note }) => note.semitone)).toEqual([33, 34, 35, 36, 37, 38, 39, 40, 41, 42, 43, 44, 45, 46, 47])
    expect(moves.find(({ note }) => note.semitone === 40)).toMatchObject({ cost: best.cost, replannedCost: null })
    expect(moves.filter(({ cost }) => cost > best.cost)).toHaveLength(14)
  })

  it('with the others replanned is that of the best plan with the drum locked there', () => {
    for (const { note, replannedCost } of costOfMoving(ANCHORED, notes, 'tom10', { replan: true })) {
      const locked = planNotes({ ...ANCHORED, drums: lock('tom10', note.semitone), alternatives: 0 })
      expect(replannedCost).toBe(locked.best.cost)
    }
  })

  it('lifts the anchor of the drum that is moved', () => {
    const moves = costOfMoving(ANCHORED, notes, 'tom12', { replan: true })
    expect(moves.find(({ note }) => note.semitone === 49)?.replannedCost).toBe(0)
  })
})

describe('bad input', () => {
  const locked = (note: { semitone: number; cents: number }) => KIT.map((each) => ({ ...each, lockedNote: note }))
  const ranged = (change: Partial<PlanDrum['range']>) =>
    KIT.map((each) => ({ ...each, range: { ...each.range, ...change } }))
  it.each<[string, Partial<NotePlanInput>]>([
    ['drums', { drums: [] }],
    ['drums', { drums: [...KIT, ...KIT] }],
    ['anchor', { anchor: { drumId: 'kick', note: D3 } }],
    ['anchor', { anchor: { drumId: 'gone', note: D3 } }],
    ['anchor', { drums: lock('tom12', 49) }],
    ['anchor', { anchor: { drumId: 'tom12', note: { semitone: 80, cents: 0 } } }],
    ['lockedNote', { drums: lock('kick', 60) }],
    ['semitone', { drums: locked({ semitone: 50.5, cents: 0 }) }],
    ['cents', { anchor: { drumId: 'tom12', note: { semitone: 50, cents: Number.NaN } } }],
    ['range', { drums: ranged({ low: Number.NaN }) }],
    ['range', { drums: ranged({ high: 20 }) }],
    ['diameterIn', { drums: KIT.map((each) => ({ ...each, diameterIn: 0.3048 })) }],
    ['tension', { drums: KIT.map((each) => ({ ...each, tension: { slackNPerM: 2000, chokedNPerM: 700 } })) }],
    ['apartSemitones', { apartSemitones: -1 }],
    ['alternatives', { alternatives: 2.5 }],
    ['semitones', { template: { ...template('fourths'), steps: { kind: 'per-pair', semitones: [] } } }],
  ])('is refused, naming %s', (field, change) => {
    expect(() => planNotes({ ...ANCHORED, ...change })).toThrow(expect.objectContaining({ field }))
  })

  it('a drum that is not of the kit cannot be moved', () => {
    expect(() => costOfMoving(ANCHORED, new Map(), 'gone')).toThrow(expect.objectContaining({ field: 'drumId' }))
  })
})
