import { describe, expect, it } from 'vitest'
import type { DrumEntry } from '@/lib/contracts/kit'
import { newDrum } from '@/lib/contracts/kit-defaults'
import type { JudgedPlan } from '@/lib/tuning/note-plan-model'
import { NOTE_TEMPLATES } from '@/lib/tuning/note-template'
import { splitWords } from './cost-words'
import { planDraft } from './plan-draft'
import { changeWords, planWhy } from './plan-why'
import { kickWords, readSemitones, semitonesText, stepsWords } from './template-words'

const nothing = { offMiddle: 0, outOfRange: 0, intervals: 0, order: 0, tooClose: 0, sharedNames: 0 }
const nameOf = (id: string) => ({ tom: 'Tom 12', floor: 'Floor 16' })[id] ?? id
const [template] = NOTE_TEMPLATES
if (!template) throw new Error('no templates')

describe('a template in words', () => {
  it('says what it asks of the toms', () => {
    // Common practice: 2.5 semitones an inch are a fourth for every 2 in.
    expect(stepsWords({ kind: 'per-inch', semitonesPerInch: 2.5 })).toBe('a fourth for every 2 in of width')
    expect(stepsWords({ kind: 'per-pair', semitones: [5, 4] })).toBe(
      'from the smallest tom down: fourth, major third, and on so',
    )
  })

  it('says where the kick goes', () => {
    expect(kickWords([5, 7, 12])).toBe('the kick a fourth, a fifth or an octave under the lowest tom')
    expect(kickWords([12])).toBe('the kick an octave under the lowest tom')
    expect(kickWords([])).toBe('the kick in the middle of its own range')
  })

  it('reads semitones as they are typed and writes them so again', () => {
    for (const text of ['5, 5, 4', '5 5 4', '5;5;4,']) expect(readSemitones(text)).toEqual([5, 5, 4])
    expect(readSemitones('')).toEqual([])
    expect(readSemitones('5, x')[1]).toBeNaN()
    expect(semitonesText([5, 5, 4])).toBe('5, 5, 4')
  })
})

describe('a plan in words', () => {
  it('splits its cost by reasons and leaves out what is nothing', () => {
    expect(splitWords(2.44, { ...nothing, intervals: 2, offMiddle: 0.44 })).toBe(
      '2.4: 2 for intervals, 0.4 off the middle',
    )
    expect(splitWords(2, { ...nothing, sharedNames: 2 })).toBe('2 for wires stirred')
    expect(splitWords(0, nothing)).toBe('nothing')
  })

  it('says how an alternative differs', () => {
    expect(changeWords({ kind: 'shifted', semitones: -2 }, nameOf)).toBe('The same intervals a tone lower.')
    expect(changeWords({ kind: 'shifted', semitones: 12 }, nameOf)).toBe('The same intervals an octave higher.')
    const intervals = [{ upperId: 'tom', lowerId: 'floor', best: 10, here: 9 }]
    expect(changeWords({ kind: 'intervals', intervals }, nameOf)).toBe(
      'Major sixth from Tom 12 to Floor 16, not a minor seventh.',
    )
  })

  it('says what speaks against it, or that nothing does', () => {
    const drum = (drumId: string, zone: 'middle' | 'low'): JudgedPlan['drums'][number] => ({
      ...{ drumId, note: { semitone: 50, cents: 0 }, origin: 'planned', zone },
      ...{ centsOffMiddle: zone === 'low' ? -80 : 0, centsOutOfRange: 0, cost: { offMiddle: 0, outOfRange: 0 } },
    })
    const plan = { cost: 0, split: nothing, intervals: [], clashes: [] }
    expect(planWhy({ ...plan, drums: [drum('tom', 'middle')] }, null, nameOf)).toEqual([
      'Every drum in the middle of its range, every interval as asked.',
    ])
    expect(planWhy({ ...plan, drums: [drum('tom', 'middle'), drum('floor', 'low')] }, null, nameOf)).toEqual([
      'Floor 16: low in its range, 80 cents under the middle.',
    ])
    const step: JudgedPlan['intervals'][number] = {
      ...{ kind: 'toms', upperId: 'tom', lowerId: 'floor', asked: [5], askedExact: 5, askedName: 'fourth' },
      ...{ got: 5, gotName: 'fourth', offSemitones: 0, cost: { interval: 0, order: 0 } },
      ifAsked: { zone: 'low', centsOffMiddle: -80, centsOutOfRange: 0 },
    }
    expect(planWhy({ ...plan, intervals: [step], drums: [drum('floor', 'low')] }, null, nameOf)).toEqual([
      'A fourth under Tom 12 leaves Floor 16 80 cents under its middle third.',
    ])
  })
})

describe('a plan as a draft', () => {
  const entry = (id: string, role: 'tom' | 'kick', spec: Partial<DrumEntry['spec']>): DrumEntry => {
    const made = newDrum(role, { diameterIn: role === 'tom' ? 12 : 22 })
    return { ...made, spec: { ...made.spec, ...spec }, id, rigId: 'rig', position: 0, version: 1, removed: false }
  }
  const drums = [
    entry('open', 'tom', { headRelationCents: 300 }),
    entry('held', 'tom', { headRelationCents: 300, noteLocked: true }),
    entry('kick', 'kick', { headRelationCents: -200 }),
  ]
  const plan = {
    ...{ cost: 0, split: nothing, intervals: [], clashes: [] },
    drums: drums.map(({ id }) => ({
      ...{ drumId: id, note: { semitone: 50, cents: -0 }, origin: 'planned' as const, zone: 'middle' as const },
      ...{ centsOffMiddle: 0, centsOutOfRange: 0, cost: { offMiddle: 0, outOfRange: 0 } },
    })),
  }

  it('takes the template’s relation of the heads for open toms only, and only where it is wanted', () => {
    const relations = (headsToo: boolean) =>
      Object.values(planDraft(plan, drums, { ...template, resonantCents: 100 }, headsToo)).map(
        ({ headRelationCents }) => headRelationCents,
      )
    expect(relations(true)).toEqual([100, 300, -200])
    expect(relations(false)).toEqual([300, 300, -200])
  })

  it('keeps locks, and writes a note in one way', () => {
    const draft = planDraft(plan, drums, template, true)
    expect(draft['held']?.noteLocked).toBe(true)
    expect(Object.is(draft['open']?.note?.cents, 0)).toBe(true)
  })
})
