import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { AnswerContent, InsteadWhat } from './answer'
import { asAskedAnswer, insteadLugCounts } from './answer'
import type { LineState, SaidAnswer } from './answer-state'
import type { FrozenDrum, FrozenEntry } from './frozen-kit'
import { lineContent } from './line-content'
import { nightKit } from './night'
import type { RevisionLine } from './revision-document'

const tom: FrozenDrum = {
  id: 'entry-tom',
  position: 0,
  name: 'Tom 12',
  supply: 'rented',
  count: 1,
  remark: '',
  kind: 'drum',
  spec: {
    role: 'tom',
    diameterIn: 12,
    depthIn: 8,
    lugs: 6,
    shell: 'maple',
    ported: false,
    batter: { plyMils: [10], film: 'coated', coatingGPerM2: 0, damping: 'none', gauge: 75 },
    resonant: null,
    note: { semitone: 50, cents: 0 },
    noteLocked: true,
    headRelationCents: 0,
    toleranceCents: 10,
    muffling: 'ring',
    insteadOf: null,
  },
}
const crash: FrozenEntry = {
  id: 'entry-crash',
  position: 1,
  name: 'Crash',
  supply: 'venue',
  count: 2,
  remark: '',
  kind: 'cymbal',
  spec: { type: 'crash', diameterIn: 18 },
}
const kick: FrozenDrum = {
  ...tom,
  id: 'entry-kick',
  name: 'Kick',
  supply: 'carried',
  spec: { ...tom.spec, role: 'kick', diameterIn: 22, depthIn: 16, lugs: 8 },
}
const kit: FrozenEntry[] = [tom, crash, kick]

const lines: RevisionLine[] = [tom, crash].flatMap((entry, index) => {
  const content = lineContent(entry)
  return content ? [{ lineId: `line-${entry.id}`, hash: 'h1', entryId: entry.id, position: index + 1, content }] : []
})

function state(entryId: string, content: AnswerContent, kind: 'answered' | 'settled', lineHash = 'h1'): LineState {
  const answer: SaidAnswer = {
    id: 'a',
    sequence: 1,
    lineId: `line-${entryId}`,
    lineHash,
    content,
    remark: '',
    byName: 'Ib',
    via: 'link',
    taken: null,
    at: '2031-09-01T10:00:00Z',
  }
  const common = { lineId: answer.lineId, history: [answer], answer }
  if (kind === 'answered') return { ...common, state: kind }
  const decision = {
    id: 'd',
    sequence: 1,
    lineId: answer.lineId,
    answerEventId: 'a',
    decision: 'accept' as const,
    remark: '',
    byName: 'Tove',
    at: answer.at,
  }
  return { ...common, state: kind, decision }
}
const instead = (what: InsteadWhat, n = 1): AnswerContent => ({
  asAsked: 0,
  instead: [{ n, what }],
  notYet: [],
  cant: 0,
})
const thirteen: InsteadWhat = { kind: 'drum', diameterIn: 13, depthIn: 9, lugs: 8, words: 'birch' }
const plain = (entry: FrozenEntry) => ({ ...entry, instead: null, missing: 0 })

describe('nightKit', () => {
  it('is the revision itself while nothing is settled', () => {
    expect(nightKit({ kit, lines }, [])).toEqual(kit.map(plain))
    expect(nightKit({ kit, lines }, [state('entry-tom', instead(thirteen), 'answered')])).toEqual(kit.map(plain))
    expect(nightKit({ kit, lines }, [state('entry-tom', asAskedAnswer(1), 'settled')])).toEqual(kit.map(plain))
  })

  it('takes size and lugs of a settled drum, keeps its heads and note, and says what had been asked', () => {
    const [night, ...rest] = nightKit({ kit, lines }, [state('entry-tom', instead(thirteen), 'settled')])
    expect(night).toEqual({
      ...tom,
      spec: { ...tom.spec, diameterIn: 13, depthIn: 9, lugs: 8 },
      instead: { words: 'birch', askedSpec: tom.spec },
      missing: 0,
    })
    expect(rest).toEqual([plain(crash), plain(kick)])
  })

  it('takes a cymbal’s size only when all of them come so', () => {
    const twenty: InsteadWhat = { kind: 'cymbal', diameterIn: 20, words: '' }
    expect(nightKit({ kit, lines }, [state('entry-crash', instead(twenty, 2), 'settled')])[1]).toMatchObject({
      spec: { diameterIn: 20 },
    })
    const half = { ...instead(twenty), cant: 1 }
    expect(nightKit({ kit, lines }, [state('entry-crash', half, 'settled')])[1]).toMatchObject({
      spec: { diameterIn: 18 },
      instead: null,
      missing: 1,
    })
  })

  it('ignores what was settled for other words', () => {
    expect(nightKit({ kit, lines }, [state('entry-tom', instead(thirteen), 'settled', 'h0')])).toEqual(kit.map(plain))
  })

  it('never writes into the revision, and changes nothing of a drum but its three sizes', () => {
    const frozen = JSON.stringify({ kit, lines })
    const drum = fc.record({
      kind: fc.constant('drum' as const),
      diameterIn: fc.integer({ min: 24, max: 112 }).map((quarters) => quarters / 4),
      depthIn: fc.integer({ min: 12, max: 96 }).map((quarters) => quarters / 4),
      lugs: fc.constantFrom(...insteadLugCounts),
      words: fc.string(),
    })
    fc.assert(
      fc.property(drum, (what) => {
        const [night] = nightKit({ kit, lines }, [state('entry-tom', instead(what), 'settled')])
        if (night?.kind !== 'drum') throw new Error('the tom is a drum')
        expect({ ...night.spec, diameterIn: 12, depthIn: 8, lugs: 6 }).toEqual(tom.spec)
        expect([night.spec.diameterIn, night.spec.depthIn, night.spec.lugs]).toEqual([
          what.diameterIn,
          what.depthIn,
          what.lugs,
        ])
        expect(JSON.stringify({ kit, lines })).toBe(frozen)
      }),
    )
  })
})
