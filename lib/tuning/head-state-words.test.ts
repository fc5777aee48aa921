import { describe, expect, it } from 'vitest'
import { headState } from './head-state'
import { listed, outWords } from './head-state-words'
import type { Reading } from './readings'

const read = (unit: Reading['unit'], values: readonly number[]): Reading[] =>
  values.map((value, i) => ({
    ...{ id: `r${i}`, lug: i + 1, value, unit, method: unit === 'gauge' ? 'gauge' : 'tap-typed' },
    ...{ deviceId: 'd', deviceSequence: i + 1, deviceAtMs: i },
  }))

describe('outWords', () => {
  const taps = (values: readonly number[]) =>
    outWords(
      headState({ readings: read('cents', values), basis: 'tap', lugs: values.length, targetHz: 250, tolerance: 6 }),
    )

  it('names each lug that is out, the low ones first, with how far', () => {
    expect(taps([0, -12, 3, 0, -9, 14])).toBe('Lugs 2 and 5 are low by 12 and 9 cents; lug 6 is high by 14 cents')
    expect(taps([7, 0, 8, 0, 9, 0])).toBe('Lugs 1, 3 and 5 are high by 7, 8 and 9 cents')
    expect(taps([0, 0, 0, -11.6])).toBe('Lug 4 is low by 12 cents')
  })

  it('has nothing to say of a head within its tolerance', () => {
    expect(taps([6, -6, 0, 0])).toBeNull()
  })

  it('speaks of gauge readings against their own mean, in tenths', () => {
    // Mean 75.5; the last stands 2.5 over it, the others within 1.
    const readings = read('gauge', [74.5, 75, 74.5, 78])
    expect(outWords(headState({ readings, basis: 'gauge', lugs: 4, tolerance: 1 }))).toBe(
      'Lug 4 is high by 2.5 on the gauge',
    )
  })
})

describe('listed', () => {
  it('joins words as they are read out', () => {
    expect([listed([]), listed(['2']), listed(['2', '5']), listed(['1', '2', '5'])]).toEqual([
      '',
      '2',
      '2 and 5',
      '1, 2 and 5',
    ])
  })
})
