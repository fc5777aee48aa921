import { describe, expect, it } from 'vitest'
import type { BenchDrum, BenchHead, BenchReading } from '@/lib/contracts/bench'
import { headStandingWords, headView, standingSignOff } from './head-view'

const head: BenchHead = {
  ...{ side: 'batter', words: '10 mil', note: null, rodPullN: null, gauge: null, cautions: [], without: null },
  tap: { hz: 250, name: 'B3', lowHz: 240, highHz: 260 },
}
const drum: BenchDrum = {
  ...{
    entryId: 'tom',
    name: 'Tom 12',
    role: 'tom',
    sizeWords: '12 in across, 8 deep',
    lugCount: 6,
    toleranceCents: 10,
    warbleLimitHz: 1,
  },
  lugAnglesRad: [0.5, 1.5, 2.5, 3.5, 4.5, 5.5].map((share) => (share * Math.PI) / 3),
  ...{ muffling: '', relationWords: null, instead: null, missing: false, heads: [head] },
}
let count = 0
function reading(lug: number, value: number, more: Partial<BenchReading> = {}): BenchReading {
  count += 1
  return {
    ...{ id: `r${count}`, entryId: 'tom', side: 'batter', lug, value, unit: 'Hz', method: 'tap-typed', targetHz: 250 },
    ...{ otherHead: 'damped', onStand: false, gauge: '', temperatureC: null, pass: 1, strikes: null },
    ...{ deviceId: 'phone', deviceSequence: count, deviceAt: new Date(count * 1000).toISOString(), serverAt: null },
    ...{ byName: 'Somebody', via: 'link' },
    ...more,
  }
}
const round = (pass: number, value = 250) => [1, 2, 3, 4, 5, 6].map((lug) => reading(lug, value, { pass }))

describe('headView', () => {
  it('leads round the head in the lug order and counts passes', () => {
    expect(headView([], drum, head)).toMatchObject({ pass: 1, nextLug: 1, outline: null, read: 0 })
    const two = [reading(1, 250), reading(4, 250)]
    expect(headView(two, drum, head)).toMatchObject({ pass: 1, nextLug: 2 })
    expect(headView(round(1), drum, head)).toMatchObject({ pass: 2, nextLug: 1 })
    expect(headView([...round(1), reading(1, 251, { pass: 2 })], drum, head)).toMatchObject({ pass: 2, nextLug: 4 })
  })

  it('begins another pass early when asked to', () => {
    expect(headView([reading(1, 250)], drum, head, { passFrom: 2 })).toMatchObject({ pass: 2, nextLug: 1 })
  })

  it('puts a corrected lug back into the pass by its correction only', () => {
    const slip = reading(1, 520)
    const view = headView([slip, reading(4, 250), reading(1, 252, { strikes: slip.id })], drum, head)
    expect(view.inPass.get(1)?.value).toBe(252)
    expect(view.read).toBe(2)
    expect(view.nextLug).toBe(2)
  })

  it('takes cents as the pitch they meant when they were typed', () => {
    // 100 cents over 200 Hz is 211.8926 Hz, which lies 286.3137 cents under 250 Hz.
    const view = headView([reading(1, 100, { unit: 'cents', targetHz: 200 })], drum, head)
    expect(view.state.lugs[0]?.value).toBeCloseTo(211.8926, 3)
    expect(view.state.lugs[0]?.fromTarget).toBeCloseTo(-286.3137, 3)
  })

  it('goes by the gauge when the latest reading did, and never mixes it with taps', () => {
    const tap = reading(2, 200)
    const gauge = reading(1, 75, { method: 'gauge', unit: 'gauge', targetHz: null })
    const view = headView([gauge, tap], drum, head)
    expect(view.basis).toBe('gauge')
    expect(view.state.missing).toEqual([2, 3, 4, 5, 6])
    expect(headView([gauge, tap], drum, head, { basis: 'tap' }).state.missing).toEqual([1, 3, 4, 5, 6])
  })

  it('does not let one gauge reading hide a whole pass of taps', () => {
    const taps = round(1)
    const gauge = reading(1, 75, { method: 'gauge', unit: 'gauge', targetHz: null })
    const view = headView([...taps, gauge], drum, head)
    expect(view.basis).toBe('tap')
    expect(view.state.missing).toEqual([])
  })

  it('leaves other heads and lugs that this head does not have out', () => {
    const others = [reading(1, 250, { side: 'resonant' }), reading(1, 250, { entryId: 'kick' }), reading(8, 250)]
    expect(headView(others, drum, head).read).toBe(0)
  })

  it('reads a snare side without judging it', () => {
    const side: BenchHead = { ...head, side: 'resonant' }
    const snare: BenchDrum = { ...drum, role: 'snare', heads: [side] }
    const uneven = round(1).map((one) => ({ ...one, side: 'resonant' as const, value: one.lug === 2 ? 200 : 250 }))
    const view = headView(uneven, snare, side)
    expect(view.judged).toBe(false)
    expect(view.lugs.some(({ out }) => out)).toBe(false)
    expect(headStandingWords(view, 6)).toBe('all read')
  })
})

describe('headStandingWords', () => {
  it('says how a head stands', () => {
    const words = (readings: BenchReading[]) => headStandingWords(headView(readings, drum, head), 6)
    expect(words([])).toBe('not read')
    expect(words([reading(1, 250)])).toBe('1 of 6 read')
    expect(words(round(1))).toBe('even')
    // 245 Hz lies 35 cents under 250 Hz, beyond the 10 allowed.
    expect(words([...round(1), reading(3, 245, { pass: 2 })])).toBe('1 lug out')
  })
})

describe('standingSignOff', () => {
  const sign = (id: string, decision: 'signed' | 'taken-back') => ({
    id,
    entryId: 'tom',
    decision,
    byName: 'Somebody',
    remark: '',
    at: null,
  })
  it('stands until it is taken back', () => {
    expect(standingSignOff({ signOffs: [sign('a', 'signed')] }, 'tom')?.id).toBe('a')
    expect(standingSignOff({ signOffs: [sign('a', 'signed'), sign('b', 'taken-back')] }, 'tom')).toBeUndefined()
    expect(standingSignOff({ signOffs: [sign('a', 'signed')] }, 'kick')).toBeUndefined()
  })
})
