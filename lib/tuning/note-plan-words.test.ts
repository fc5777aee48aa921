import { describe, expect, it } from 'vitest'
import { judgePlan } from './note-judge'
import type { PlanDrum } from './note-plan-model'
import { intervalReason } from './note-plan-words'
import { NOTE_TEMPLATES } from './note-template'

const [fourths] = NOTE_TEMPLATES
if (!fourths) throw new Error('no templates')

const tension = { slackNPerM: 700, chokedNPerM: 4500 }
const drums: PlanDrum[] = [
  {
    ...{ id: 'tom', name: 'Tom 14', role: 'tom', diameterIn: 14, tension },
    range: { low: 35, middleLow: 40, middleHigh: 45, high: 50 },
  },
  {
    ...{ id: 'floor', name: 'Floor 16', role: 'floor-tom', diameterIn: 16, tension },
    range: { low: 33, middleLow: 38.41, middleHigh: 43.5, high: 48 },
  },
]

function reason(tom: number, floor: number): string | null | undefined {
  const notes = { tom: { semitone: tom, cents: 0 }, floor: { semitone: floor, cents: 0 } }
  const [interval] = judgePlan({ template: fourths ?? never(), drums }, new Map(Object.entries(notes))).intervals
  return interval && intervalReason(interval, (id) => drums.find((drum) => drum.id === id)?.name ?? id)
}
function never(): never {
  throw new Error('no template')
}

describe('why a step is as it is', () => {
  it.each<[number, number, string | null]>([
    [44, 39, null],
    [43, 38, 'A fourth under Tom 14 leaves Floor 16 41 cents under its middle third.'],
    [49, 44, 'A fourth under Tom 14 leaves Floor 16 50 cents over its middle third.'],
    [37, 32, 'A fourth under Tom 14 leaves Floor 16 slack, 100 cents under its range.'],
    [
      43,
      39,
      'Tom 14 to Floor 16 is a major third, not a fourth, which would leave Floor 16 41 cents under its middle third.',
    ],
    [
      54,
      48,
      'Tom 14 to Floor 16 is a tritone, not a fourth, which would leave Floor 16 choked, 100 cents over its range.',
    ],
    [44, 40, 'Tom 14 to Floor 16 is a major third, not a fourth.'],
  ])('%i over %i', (tom, floor, words) => {
    expect(reason(tom, floor)).toBe(words)
  })
})
