import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { inOrderTaken, standingReadings } from './readings'
import type { Reading } from './readings'

function reading(id: string, change: Partial<Reading> = {}): Reading {
  const base = {
    lug: 1,
    method: 'tap-typed',
    value: 250,
    unit: 'Hz',
    deviceId: 'phone',
    deviceSequence: 1,
    deviceAtMs: 1000,
  } as const
  return { id, ...base, ...change }
}

const ids = (readings: readonly Reading[]) => readings.map(({ id }) => id)

describe('order of readings', () => {
  it('trusts a device’s own numbering before its clock', () => {
    const first = reading('a', { deviceSequence: 1, deviceAtMs: 5000 })
    const afterClockSetBack = reading('b', { deviceSequence: 2, deviceAtMs: 1000 })
    expect(ids(inOrderTaken([afterClockSetBack, first]))).toEqual(['a', 'b'])
  })

  it('goes by the clock between devices', () => {
    const later = reading('a', { deviceId: 'phone', deviceAtMs: 2000 })
    const earlier = reading('b', { deviceId: 'desk', deviceAtMs: 1000 })
    expect(ids(inOrderTaken([later, earlier]))).toEqual(['b', 'a'])
  })

  it('a clock that runs ahead does not outrank what came after its arrival', () => {
    const ahead = reading('a', { deviceId: 'phone', deviceAtMs: 9_000_000, serverAtMs: 2000 })
    const after = reading('b', { deviceId: 'desk', deviceAtMs: 3000, serverAtMs: 3100 })
    expect(ids(inOrderTaken([after, ahead]))).toEqual(['a', 'b'])
  })

  it('is the same whatever order they arrived in', () => {
    const log = fc.uniqueArray(
      fc.record({
        id: fc.uuid(),
        deviceId: fc.constantFrom('a', 'b', 'c'),
        deviceSequence: fc.integer({ min: 1, max: 20 }),
        deviceAtMs: fc.integer({ min: 0, max: 50 }),
      }),
      { selector: ({ id }) => id, maxLength: 15 },
    )
    fc.assert(
      fc.property(log, fc.infiniteStream(fc.nat()), (entries, keys) => {
        const readings = entries.map(({ id, ...change }) => reading(id, change))
        const shuffled = readings
          .map((each) => ({ each, key: keys.next().value ?? 0 }))
          .sort((x, y) => x.key - y.key)
          .map(({ each }) => each)
        const ordered = ids(inOrderTaken(readings))
        expect(ids(inOrderTaken(shuffled))).toEqual(ordered)
        expect([...ordered].sort()).toEqual(ids(readings).sort())
      }),
    )
  })
})

describe('standing readings', () => {
  it('a correction strikes what it names and stands itself', () => {
    const [wrong, right] = [reading('a'), reading('b', { strikes: 'a', deviceSequence: 2 })]
    expect(ids(standingReadings([right, wrong]))).toEqual(['b'])
  })

  it('a corrected correction does not bring back the first', () => {
    const log = [
      reading('a'),
      reading('b', { strikes: 'a', deviceSequence: 2 }),
      reading('c', { strikes: 'b', deviceSequence: 3 }),
    ]
    expect(ids(standingReadings(log))).toEqual(['c'])
  })

  it('a reading cannot strike itself', () => {
    expect(ids(standingReadings([reading('a', { strikes: 'a' })]))).toEqual(['a'])
  })
})
