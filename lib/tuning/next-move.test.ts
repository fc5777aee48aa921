import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { lugOrder } from './lug-order'
import { nextMove } from './next-move'
import type { NextMoveInput } from './next-move'
import type { HeadEvent } from './next-move-log'
import { facingLugs } from './next-move-plan'
import type { NextMove } from './next-move-step'
import { nextMoveWords } from './next-move-words'

const usual = {
  basis: 'gauge',
  target: null,
  tolerance: 1,
  phase: 'even',
  learned: null,
  gaugeUnitsPerCent: null,
  shortWay: false,
} as const

function gauge(lug: number, value: number | null, more: { doubtful?: boolean; struck?: boolean } = {}): HeadEvent {
  return { kind: 'reading', lug, method: 'gauge', unit: 'gauge', value, ...more }
}

function pass(values: readonly number[]): HeadEvent[] {
  return values.map((value, i) => gauge(i + 1, value))
}

/** Any head in any state: an uneven first pass about 75, then some moves and readings that may have nothing to do with them. */
const anyState = fc
  .record({
    lugs: fc.integer({ min: 4, max: 12 }),
    target: fc.constantFrom(null, 75, 70, 80),
    phase: fc.constantFrom('even', 'fine', 'bring-up') as fc.Arbitrary<NextMoveInput['phase']>,
    shortWay: fc.boolean(),
    spread: fc.constantFrom(0.2, 1, 4, 15),
  })
  .chain(({ lugs, spread, ...rest }) => {
    const value = fc.double({ min: -1, max: 1, noNaN: true }).map((v) => 75 + spread * v)
    const lug = fc.integer({ min: 1, max: lugs })
    const reading = fc.record({ lug, value }).map((of) => gauge(of.lug, of.value))
    const turn = fc
      .uniqueArray(fc.record({ lug, turns: fc.constantFrom(-0.25, -0.125, -0.0625, 0.0625, 0.125, 0.25) }), {
        selector: (turn) => turn.lug,
        minLength: 1,
        maxLength: 3,
      })
      .map((turns): HeadEvent => ({ kind: 'turn', turns }))
    return fc
      .record({
        first: fc.array(value, { minLength: lugs, maxLength: lugs }),
        later: fc.array(fc.oneof(reading, turn), { maxLength: 14 }),
        again: fc.integer({ min: 0, max: 4 }),
      })
      .map(({ first, later, again }): NextMoveInput => ({
        ...usual,
        ...rest,
        lugs,
        log: [...pass(first), ...later, ...Array.from({ length: again }, () => pass(first)).flat()],
      }))
  })

function lugsTurnedSinceRead({ lugs, log }: NextMoveInput): number[] {
  const open = new Set<number>()
  for (const event of log) {
    if (event.kind === 'reading') open.delete(event.lug)
    else for (const { lug } of event.turns) open.add(lug)
  }
  return [...open].filter((lug) => lug <= lugs)
}

function always(holds: (move: NextMove, input: NextMoveInput) => void, runs = 150) {
  const seen = { up: 0, down: 0, done: 0 }
  fc.assert(
    fc.property(anyState, (input) => {
      const move = nextMove(input)
      if (move.direction !== null) seen[move.direction]++
      if (move.kind === 'done') seen.done++
      holds(move, input)
    }),
    { numRuns: runs },
  )
  // A rule that is never put to the test holds of nothing: each kind of step comes up some twenty times in 150.
  for (const times of Object.values(seen)) expect(times).toBeGreaterThan(2)
}

describe('the rules of the trade (common practice), in any state', () => {
  it('never brings one lug up alone unless it has slipped or is loose', () => {
    always((move) => {
      if (move.direction === 'up' && move.turns.length === 1) expect(move.reason).toBe('slipped')
    })
  })

  it('turns nothing up on a head that reads over on the whole, and nothing down on one that reads under', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 4, max: 12 }),
        fc.constantFrom(-1, 1),
        fc.infiniteStream(fc.double({ min: -2.5, max: 2.5, noNaN: true })),
        (lugs, side, offs) => {
          const values = Array.from({ length: lugs }, () => 75 + side * 4 + (offs.next().value ?? 0))
          const move = nextMove({ ...usual, lugs, target: 75, log: pass(values) })
          expect(move.direction).toBe(side > 0 ? 'down' : 'up')
        },
      ),
      { numRuns: 150 },
    )
  })

  it('reads a turned lug before turning it again and before calling the head even', () => {
    always((move, input) => {
      if (input.phase === 'bring-up') return
      const open = lugsTurnedSinceRead(input)
      if (move.kind === 'turn') for (const { lug } of move.turns) expect(open).not.toContain(lug)
      if (move.kind === 'done') expect(open).toEqual([])
    })
  })

  it('arrives from below, with turns of one direction, at lugs that are there, each once', () => {
    always((move, { lugs }) => {
      expect(new Set(move.lugs).size).toBe(move.lugs.length)
      for (const lug of [...move.lugs, ...move.thenRead]) expect(lug >= 1 && lug <= lugs).toBe(true)
      if (move.turns.length === 0) return
      expect(move.fromBelow).toBe(true)
      expect(move.turns.map(({ turns }) => Math.sign(turns))).toEqual(
        move.turns.map(() => (move.direction === 'up' ? 1 : -1)),
      )
      expect(move.turns.map(({ lug }) => lug)).toEqual(move.lugs)
    })
  })

  it('asks for a whole pass before any turn when any lug has no reading', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 4, max: 12 }),
        fc.nat(),
        fc.infiniteStream(fc.double({ min: 60, max: 90, noNaN: true })),
        (lugs, which, values) => {
          const missing = (which % lugs) + 1
          const log = pass(Array.from({ length: lugs }, () => values.next().value ?? 75)).filter(
            (event) => event.kind === 'turn' || event.lug !== missing,
          )
          expect(nextMove({ ...usual, lugs, log })).toMatchObject({ kind: 'read', lugs: [missing] })
        },
      ),
      { numRuns: 100 },
    )
  })

  it('seats finger-tight across the drum before anything else', () => {
    for (let lugs = 4; lugs <= 12; lugs++) {
      const move = nextMove({ ...usual, lugs, phase: 'seat', log: [] })
      expect(move).toMatchObject({ kind: 'seat', lugs: lugOrder(lugs), turns: [] })
    }
  })

  it('brings up a quarter turn at a time, two keys on facing lugs, every lug once a round', () => {
    for (let lugs = 4; lugs <= 12; lugs++) {
      const log: HeadEvent[] = []
      const touched: number[] = []
      while (touched.length < lugs) {
        const move = nextMove({ ...usual, lugs, phase: 'bring-up', log })
        expect(move).toMatchObject({ kind: 'bring-up', direction: 'up', size: 'quarter', twoKeys: true })
        expect(facingLugs(move.lugs[0]! - 1, lugs)).toContain(move.lugs[1]! - 1)
        log.push({ kind: 'turn', turns: move.turns })
        touched.push(...move.lugs)
      }
      expect([...touched].sort((a, b) => a - b)).toEqual(Array.from({ length: lugs }, (_, i) => i + 1))
    }
  })

  it('goes on bringing up, the low pair first, when the whole head is far under its target', () => {
    const move = nextMove({ ...usual, lugs: 6, target: 75, log: pass([52, 50, 55, 53, 50, 55]) })
    expect(move).toMatchObject({ kind: 'bring-up', reason: 'far-under', direction: 'up', lugs: [2, 5] })
  })

  it('brings up a slipped lug alone and says so', () => {
    const move = nextMove({ ...usual, lugs: 8, log: pass([75, 75.2, 66, 75, 74.9, 75.1, 74, 75]) })
    expect(move).toMatchObject({ kind: 'turn', direction: 'up', lugs: [3], reason: 'slipped' })
  })

  it('never speaks of warble: a snare side is uneven on purpose', () => {
    always((move, { lugs }) => expect(nextMoveWords(move, lugs)).not.toMatch(/warble/i))
  })
})

describe('a head that does not follow', () => {
  /** What the advice ends with on a head that reads so whatever is turned. */
  const endOf = (values: readonly number[]) => {
    const lugs = values.length
    const log: HeadEvent[] = []
    let move = nextMove({ ...usual, lugs, log })
    while (move.kind !== 'done' && move.reason !== 'no-progress') {
      expect(log.length).toBeLessThan(100 * lugs)
      if (move.turns.length > 0) log.push({ kind: 'turn', turns: move.turns })
      else log.push(...move.lugs.map((lug) => gauge(lug, values[lug - 1]!)))
      move = nextMove({ ...usual, lugs, log })
    }
    return move
  }

  it('is called or given up, whatever it reads: turns that do nothing are not advised for ever', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 4, max: 7 }),
        fc.constantFrom(0.9, 1.3, 3),
        fc.infiniteStream(fc.double({ min: -1, max: 1, noNaN: true })),
        (lugs, spread, offs) => {
          const values = Array.from({ length: lugs }, () => 75 + spread * (offs.next().value ?? 0))
          expect(['done', 'not-sure']).toContain(endOf(values).kind)
        },
      ),
      { numRuns: 20 },
    )
  })

  it('is given up, and the lugs named, where one leans to one side or stands out for good', () => {
    expect(endOf([76.4, 75, 73.6, 75])).toMatchObject({ kind: 'not-sure', reason: 'no-progress', lugs: [1, 3] })
    expect(endOf([77, 75, 75, 75])).toMatchObject({ kind: 'not-sure', reason: 'no-progress', lugs: [1] })
  })

  it('is called with the lugs named that lie at the edge, when no turn moves them (derived: S_1 = 0)', () => {
    const log = Array.from({ length: 4 }, () => pass([76, 75, 74, 75])).flat()
    expect(nextMove({ ...usual, lugs: 4, log })).toMatchObject({ kind: 'done', reason: 'at-the-edge', lugs: [1, 3] })
  })
})

describe('what it makes of readings', () => {
  it('calls a head even whose readings, twice round, all lie within a fifth of the tolerance', () => {
    const round = [75.1, 74.9, 75, 75.2, 74.9, 75]
    expect(nextMove({ ...usual, lugs: 6, log: [...pass(round), ...pass(round)] })).toMatchObject({
      kind: 'done',
      turns: [],
    })
  })

  it('brings the high facing pair down on a head with two lugs high across from each other', () => {
    const move = nextMove({ ...usual, lugs: 8, target: 75, log: pass([79.5, 76, 75.5, 76, 79.4, 76, 75.6, 76]) })
    expect(move).toMatchObject({ kind: 'turn', direction: 'down', lugs: [1, 5], reason: 'over', twoKeys: true })
  })

  it('is not sure of a lug whose two readings contradict each other, and takes the majority of three', () => {
    const log = [...pass([75, 75, 75, 75, 75, 75]), gauge(3, 79)]
    expect(nextMove({ ...usual, lugs: 6, log })).toMatchObject({ kind: 'not-sure', reason: 'contradictory', lugs: [3] })
    expect(nextMove({ ...usual, lugs: 6, log: [...log, gauge(3, 75.1)] }).reason).not.toBe('contradictory')
  })

  it('does not count struck readings, and asks for them again', () => {
    const log = [...pass([75, 75, 75, 75, 75]), gauge(6, 20, { struck: true })]
    expect(nextMove({ ...usual, lugs: 6, log })).toMatchObject({ kind: 'read', reason: 'not-read-yet', lugs: [6] })
  })

  it('never calls a head even with a lug that gives no reading', () => {
    const log = [...pass([75, 75, 75, 75, 75]), gauge(6, null), gauge(6, null)]
    expect(nextMove({ ...usual, lugs: 6, log })).toMatchObject({ kind: 'not-sure', reason: 'no-reading', lugs: [6] })
  })

  it('turns on a clear reading, and reads again where the same one is doubtful', () => {
    const log = (doubtful: boolean) => [...pass([75.1, 74.9, 75, 75.2, 74.9]), gauge(6, 77, { doubtful })]
    expect(nextMove({ ...usual, lugs: 6, log: log(false) }).kind).toBe('turn')
    expect(nextMove({ ...usual, lugs: 6, log: log(true) })).toMatchObject({ kind: 'read', lugs: [6] })
  })

  it('asks again for a reading far from what the last turn can have done', () => {
    const log: HeadEvent[] = [
      ...pass([75, 77, 75, 75, 77, 75]),
      { kind: 'turn', turns: [{ lug: 2, turns: -0.0625 }] },
      gauge(2, 99),
    ]
    expect(nextMove({ ...usual, lugs: 6, log })).toMatchObject({ kind: 'not-sure', reason: 'surprising', lugs: [2] })
  })

  it('takes taps in Hz, with expected pitches in Hz', () => {
    const log = [230, 240, 230, 230, 240, 230].map((value, i): HeadEvent => ({
      kind: 'reading',
      lug: i + 1,
      method: 'tap-typed',
      unit: 'Hz',
      value,
    }))
    const move = nextMove({ ...usual, basis: 'tap', tolerance: 15, lugs: 6, log })
    expect(move.kind).toBe('turn')
    for (const hz of move.expected ?? []) expect(hz > 200 && hz < 260).toBe(true)
  })

  it('says that no turn helps where taps show a pattern that turns do not move (three high, three low)', () => {
    const taps = [240, 232, 240, 232, 240, 232].map((value, i): HeadEvent => ({
      kind: 'reading',
      lug: i + 1,
      method: 'tap-heard',
      unit: 'Hz',
      value,
    }))
    const move = nextMove({ ...usual, basis: 'tap', tolerance: 10, lugs: 6, log: [...taps, ...taps] })
    expect(move).toMatchObject({ kind: 'not-sure', reason: 'no-turn-helps', turns: [] })
  })

  it('is the same head wherever lug 1 is: turning the labels by a half turns the advice', () => {
    const values = [75.1, 78.9, 74.2, 73.1, 77.8, 74.4]
    const shifted = values.map((_, i) => values[(i + 3) % 6]!)
    const a = nextMove({ ...usual, lugs: 6, log: pass(values) })
    const b = nextMove({ ...usual, lugs: 6, log: pass(shifted) })
    expect(new Set(b.lugs.map((lug) => ((lug + 2) % 6) + 1))).toEqual(new Set(a.lugs))
  })
})

describe('bad input', () => {
  const cases: [string, Partial<NextMoveInput>, string][] = [
    ['3 lugs', { lugs: 3 }, 'lugs'],
    ['13 lugs', { lugs: 13 }, 'lugs'],
    ['NaN lugs', { lugs: Number.NaN }, 'lugs'],
    ['a reading at a lug that is not there', { log: [gauge(7, 75)] }, 'lug'],
    ['a reading that is not a number', { log: [gauge(1, Number.NaN)] }, 'value'],
    ['an infinite reading', { log: [gauge(1, Number.POSITIVE_INFINITY)] }, 'value'],
    ['a gauge reading in Hz', { log: [{ kind: 'reading', lug: 1, method: 'gauge', unit: 'Hz', value: 75 }] }, 'unit'],
    ['a turn of 40 turns', { log: [{ kind: 'turn', turns: [{ lug: 1, turns: 40 }] }] }, 'turns'],
    ['a turn at a lug that is not there', { log: [{ kind: 'turn', turns: [{ lug: 0, turns: 0.1 }] }] }, 'lug'],
    ['no tolerance', { tolerance: 0 }, 'tolerance'],
    ['a target that is not a number', { target: Number.NaN }, 'target'],
    ['a slope of nothing', { gaugeUnitsPerCent: 0 }, 'gaugeUnitsPerCent'],
  ]
  it.each(cases)('refuses %s', (_, bad, field) => {
    const refused = () => nextMove({ ...usual, lugs: 6, log: [], ...bad })
    expect(refused).toThrow(AcousticsError)
    expect(refused).toThrow(expect.objectContaining({ field }))
  })
})
