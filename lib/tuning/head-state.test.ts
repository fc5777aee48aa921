import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { headState } from './head-state'
import type { Reading, ReadingUnit } from './readings'

let sequence = 0
function tap(
  lug: number,
  value: number,
  unit: Exclude<ReadingUnit, 'gauge'> = 'Hz',
  change: Partial<Reading> = {},
): Reading {
  sequence += 1
  return { ...{ id: `r${sequence}`, lug, method: 'tap-typed', value, unit }, ...stamp(), ...change }
}
function gauge(lug: number, value: number): Reading {
  sequence += 1
  return { ...{ id: `r${sequence}`, lug, method: 'gauge', value, unit: 'gauge' }, ...stamp() }
}
function stamp() {
  return { deviceId: 'phone', deviceSequence: sequence, deviceAtMs: sequence * 1000 }
}

const six = (values: number[]) => values.map((value, i) => tap(i + 1, value))

describe('head state by taps', () => {
  it('deviation in cents from the target: 453 over 440 Hz is 50.4 (McGill MUMT 307 notes, published)', () => {
    const state = headState({
      readings: six([440, 453, 440, 440, 440, 440]),
      basis: 'tap',
      lugs: 6,
      targetHz: 440,
      tolerance: 10,
    })
    expect(state.lugs[1]?.fromTarget).toBeCloseTo(50.4, 1)
    expect(state.lugs[0]?.fromTarget).toBe(0)
    expect(state.out).toEqual([2])
    expect(state).toMatchObject({ against: 'target', unit: 'cents', even: false, missing: [] })
    expect(state.spread).toBeCloseTo(50.4, 1)
    expect(state.meanFromTarget).toBeCloseTo(50.4 / 6, 1)
  })

  it('cents and Hz agree: +1200 cents is twice the target', () => {
    const state = headState({
      readings: [tap(1, 1200, 'cents'), tap(2, 300)],
      basis: 'tap',
      lugs: 6,
      targetHz: 150,
      tolerance: 10,
    })
    expect(state.lugs[0]?.value).toBeCloseTo(300, 9)
    expect(state.lugs[1]?.fromTarget).toBeCloseTo(1200, 9)
  })

  it('without a target, lugs are judged against their own mean', () => {
    const state = headState({
      readings: [tap(1, 100), tap(2, 400), tap(3, 200), tap(4, 200)],
      basis: 'tap',
      lugs: 4,
      tolerance: 5,
    })
    // The mean is even in cents: of 100, 400, 200, 200 Hz it is 200.
    expect(state.mean).toBeCloseTo(200, 9)
    expect(state.lugs[0]?.fromMean).toBeCloseTo(-1200, 9)
    expect(state.lugs[0]?.fromTarget).toBeNull()
    expect(state).toMatchObject({ against: 'mean', out: [1, 2], meanFromTarget: null })
  })

  it('the latest standing reading of a lug counts; a struck one does not', () => {
    const wrongLug = tap(2, 300)
    const readings = [tap(1, 240), tap(1, 250), wrongLug, tap(3, 300, 'Hz', { strikes: wrongLug.id })]
    const state = headState({ readings, basis: 'tap', lugs: 4, targetHz: 250, tolerance: 10 })
    expect(state.lugs.map(({ value }) => (value === null ? null : Math.round(value)))).toEqual([250, null, 300, null])
    expect(state.missing).toEqual([2, 4])
  })

  it('a head is even only when every lug was read and none is out', () => {
    const given = { basis: 'tap', lugs: 4, targetHz: 250, tolerance: 10 } as const
    expect(headState({ ...given, readings: [tap(1, 250), tap(2, 250), tap(3, 250)] }).even).toBe(false)
    expect(headState({ ...given, readings: [tap(1, 250), tap(2, 250), tap(3, 250), tap(4, 251)] }).even).toBe(true)
  })

  it('a lug exactly at the tolerance is not out', () => {
    const given = { basis: 'tap', lugs: 4, targetHz: 250 } as const
    expect(headState({ ...given, readings: [tap(1, 10, 'cents')], tolerance: 10 }).out).toEqual([])
    expect(headState({ ...given, readings: [tap(1, 10.1, 'cents')], tolerance: 10 }).out).toEqual([1])
  })

  it('an empty log is nothing but missing', () => {
    const state = headState({ readings: [], basis: 'tap', lugs: 5, targetHz: 250, tolerance: 10 })
    expect(state).toMatchObject({
      mean: null,
      meanFromTarget: null,
      spread: null,
      missing: [1, 2, 3, 4, 5],
      out: [],
      even: false,
    })
  })

  it('a lower and a higher target shift every deviation alike and leave mean and spread', () => {
    const hz = fc.double({ min: 100, max: 400, noNaN: true })
    fc.assert(
      fc.property(fc.array(hz, { minLength: 6, maxLength: 6 }), (values) => {
        const at = (targetHz: number) =>
          headState({ readings: six(values), basis: 'tap', lugs: 6, targetHz, tolerance: 10 })
        const [low, high] = [at(150), at(300)]
        expect((low.lugs[0]?.fromTarget ?? 0) - (high.lugs[0]?.fromTarget ?? 0)).toBeCloseTo(1200, 6)
        expect(low.lugs[0]?.fromMean).toBeCloseTo(high.lugs[0]?.fromMean ?? Number.NaN, 6)
        expect(low.mean).toBeCloseTo(high.mean ?? Number.NaN, 6)
        expect(low.spread).toBeCloseTo(high.spread ?? Number.NaN, 6)
        expect(low.lugs.reduce((sum, { fromMean }) => sum + (fromMean ?? 0), 0)).toBeCloseTo(0, 6)
      }),
    )
  })

  it('cents without a target compare with each other, but never with Hz', () => {
    const given = { basis: 'tap', lugs: 4, tolerance: 5 } as const
    const state = headState({ ...given, readings: [tap(1, -10, 'cents'), tap(2, 10, 'cents')] })
    expect(state.mean).toBeNull()
    expect(state.lugs.map(({ value, fromMean }) => [value, fromMean]).slice(0, 2)).toEqual([
      [null, -10],
      [null, 10],
    ])
    expect(() => headState({ ...given, readings: [tap(1, -10, 'cents'), tap(2, 250)] })).toThrow(
      expect.objectContaining({ field: 'unit' }),
    )
  })
})

describe('head state by gauge', () => {
  it('judges against the mean in gauge units: readings within ±1 of it are even (common practice)', () => {
    const readings = [gauge(1, 75), gauge(2, 76), gauge(3, 74), gauge(4, 75), gauge(5, 75), gauge(6, 75)]
    const state = headState({ readings, basis: 'gauge', lugs: 6, tolerance: 1 })
    expect(state).toMatchObject({ mean: 75, spread: 2, even: true, unit: 'gauge', against: 'mean' })
    expect(state.lugs[1]?.fromMean).toBe(1)
  })

  it('taps and gauge never mix, whichever came last', () => {
    const readings = [gauge(1, 75), tap(1, 250), tap(2, 252)]
    expect(headState({ readings, basis: 'gauge', lugs: 4, tolerance: 1 }).missing).toEqual([2, 3, 4])
    expect(headState({ readings, basis: 'tap', lugs: 4, tolerance: 1 }).missing).toEqual([3, 4])
  })
})

describe('head state refuses', () => {
  const given = { readings: [] as Reading[], basis: 'tap', lugs: 6, targetHz: 250, tolerance: 10 } as const
  it.each<[string, () => unknown]>([
    ['lugs', () => headState({ ...given, lugs: 0 })],
    ['tolerance', () => headState({ ...given, tolerance: -1 })],
    ['targetHz', () => headState({ ...given, targetHz: Number.NaN })],
    ['lug', () => headState({ ...given, readings: [tap(7, 250)] })],
    ['lug', () => headState({ ...given, readings: [tap(1.5, 250)] })],
    ['value', () => headState({ ...given, readings: [tap(1, 0)] })],
    ['value', () => headState({ ...given, readings: [tap(1, Number.NaN, 'cents')] })],
    ['unit', () => headState({ ...given, readings: [{ ...gauge(1, 75), method: 'tap-typed' }] })],
  ])('what cannot be, naming %s', (field, act) => {
    expect(act).toThrow(expect.objectContaining({ field }))
  })
})
