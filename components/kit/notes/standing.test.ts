import { describe, expect, it } from 'vitest'
import type { JudgedDrum, JudgedInterval, JudgedPlan, PlanClash } from '@/lib/tuning/note-plan-model'
import { intervalWords, standingsOf } from './standing'

const free = { offMiddle: 0, outOfRange: 0 }
const drum = (drumId: string, over: Partial<JudgedDrum> = {}): JudgedDrum => ({
  ...{ drumId, note: { semitone: 50, cents: 0 }, origin: 'set', zone: 'middle' },
  ...{ centsOffMiddle: 0, centsOutOfRange: 0, cost: free, ...over },
})
const plan = (drums: JudgedDrum[], clashes: PlanClash[] = [], intervals: JudgedInterval[] = []): JudgedPlan => ({
  ...{ cost: 0, drums, clashes, intervals },
  split: { offMiddle: 0, outOfRange: 0, intervals: 0, order: 0, tooClose: 0, sharedNames: 0 },
})
const step = (over: Partial<JudgedInterval>): JudgedInterval => ({
  ...{ kind: 'toms', upperId: 'tom', lowerId: 'floor', asked: [5], askedExact: 5, askedName: 'fourth' },
  ...{ got: 5, gotName: 'fourth', offSemitones: 0, ifAsked: null, cost: { interval: 0, order: 0 }, ...over },
})
const nameOf = (id: string) => ({ tom: 'Tom 12', floor: 'Floor 16', snare: 'Snare 14' })[id] ?? id
const told = (judged: JudgedPlan | null, id: string) =>
  standingsOf(judged, id, nameOf).map(({ tone, words }) => `${tone}: ${words}`)

describe('how a note stands', () => {
  it('says where in its range it lies', () => {
    const zones: [Partial<JudgedDrum>, string][] = [
      [{}, 'good: in the middle of its range'],
      [{ zone: 'low', centsOffMiddle: -40 }, 'watch: low in its range, 40 cents under the middle'],
      [{ zone: 'high', centsOffMiddle: 139.6 }, 'watch: high in its range, 140 cents over the middle'],
      [{ zone: 'below-range', centsOutOfRange: -30 }, 'wrong: 30 cents under its range: the head goes slack'],
      [{ zone: 'above-range', centsOutOfRange: 250 }, 'wrong: 250 cents over its range: the head chokes'],
    ]
    for (const [over, words] of zones) expect(told(plan([drum('tom', over)]), 'tom')).toEqual([words])
  })

  it('puts a clash with another drum before what is only off the middle', () => {
    const judged = plan(
      [drum('tom', { zone: 'low', centsOffMiddle: -40 }), drum('floor')],
      [{ kind: 'too-close', drumIds: ['tom', 'floor'], semitones: 0, cost: 8 }],
    )
    expect(told(judged, 'tom')).toEqual([
      'wrong: sounds the same note as Floor 16',
      'watch: low in its range, 40 cents under the middle',
    ])
    expect(told(judged, 'floor')[0]).toBe('wrong: sounds the same note as Tom 12')
    const near: PlanClash = { kind: 'too-close', drumIds: ['floor', 'tom'], semitones: 1, cost: 6 }
    expect(told(plan([drum('tom')], [near]), 'tom')[0]).toBe('watch: only 100 cents from Floor 16')
  })

  it('tells tom and snare of one note name, each from its own side, and nobody else', () => {
    const judged = plan(
      [drum('tom'), drum('snare'), drum('floor')],
      [{ kind: 'shared-name', snareId: 'snare', tomId: 'tom', cost: 2 }],
    )
    expect(told(judged, 'snare')[0]).toBe('watch: bears the note name of Tom 12, which will stir its wires')
    expect(told(judged, 'tom')[0]).toBe('watch: bears the note name of Snare 14 and will stir its wires')
    expect(told(judged, 'floor')).toEqual(['good: in the middle of its range'])
  })

  it('tells the larger drum that it sounds above the smaller', () => {
    const judged = plan([drum('tom'), drum('floor')], [], [step({ got: -2, gotName: 'tone', offSemitones: 7 })])
    expect(told(judged, 'floor')[0]).toBe('wrong: sounds above Tom 12, the smaller drum')
    expect(told(judged, 'tom')).toEqual(['good: in the middle of its range'])
  })

  it('has nothing to say of a drum without a note, nor without a plan', () => {
    expect(told(plan([drum('tom')]), 'floor')).toEqual([])
    expect(told(null, 'tom')).toEqual([])
  })

  it('names an interval, and the one that was asked where it is another', () => {
    expect(intervalWords(step({}))).toBe('fourth')
    expect(intervalWords(step({ gotName: 'major third', offSemitones: 1 }))).toBe('major third, not a fourth')
    expect(intervalWords(step({ gotName: 'fifth', offSemitones: 5, askedName: 'octave' }))).toBe('fifth, not an octave')
    expect(intervalWords(step({ gotName: 'tone', asked: [], askedName: null }))).toBe('tone')
  })
})
