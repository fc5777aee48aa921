import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { ReadingBasis } from './head-state'
import { HOOP_PRIORS, learnHoop } from './hoop-learning'
import type { LoggedMove } from './hoop-learning'
import { HOOP_LIMITS, lugResponse, readingChanges } from './lug-response'

/** Even random numbers, the same each run (Park and Miller 1988), and normal ones by Box and Muller. */
function chance(seed: number) {
  let state = seed
  const uniform = () => (state = (state * 48271) % 2147483647) / 2147483647
  const normal = () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform())
  return { uniform, normal }
}
type Chance = ReturnType<typeof chance>

type Drum = { lugs: number; basis: ReadingBasis; hoop: number; gain: number; noise: number }
const steel: Drum = { lugs: 8, basis: 'gauge', hoop: 0.05, gain: 26, noise: 0.35 }

/** Moves as a tech logs them: a quarter turn at one lug, at two facing ones, or once round with turns that differ, missed by a fifth, read with noise, a lug missing now and then. */
function moves(count: number, { lugs, basis, hoop, gain, noise }: Drum, { uniform, normal }: Chance): LoggedMove[] {
  const response = lugResponse({ lugs, basis, hoop })
  return Array.from({ length: count }, () => {
    const first = Math.floor(lugs * uniform())
    const kind = ['one', 'facing', 'round'][Math.floor(3 * uniform())]
    const size = uniform() < 0.7 ? 0.25 : -0.25
    const facing = (first + Math.floor(lugs / 2)) % lugs
    const turns = Array.from({ length: lugs }, (_, i) => {
      if (kind === 'round') return size * (0.2 + uniform())
      return i === first || (kind === 'facing' && i === facing) ? size : 0
    })
    const changes = readingChanges(
      response,
      turns.map((turn) => turn * (1 + 0.2 * normal())),
      gain,
    )
    const start = turns.map(() => 75 + 2 * normal())
    const seen = (value: number) => (uniform() < 0.05 ? null : value + noise * normal())
    return { turns, before: start.map(seen), after: start.map((value, i) => seen(value + (changes[i] ?? 0))) }
  })
}
const learnt = (drum: Drum, logged: readonly LoggedMove[]) =>
  learnHoop({ lugs: drum.lugs, basis: drum.basis, noise: drum.noise, moves: logged })
const widthOf = ({ low, high }: { low: number; high: number }) => Math.log(high / low)

describe('what is learned of a hoop', () => {
  it.each(['gauge', 'tap'] as const)('without moves is the prior, by %s (derived: normal quantile 1.645)', (basis) => {
    const { hoop, gain, used } = learnHoop({ lugs: 8, basis, noise: 1, moves: [] })
    const prior = HOOP_PRIORS[basis]
    expect(used).toBe(0)
    expect(gain.value / prior.gain.median).toBeCloseTo(1, 6)
    expect(Math.log(gain.high / prior.gain.median)).toBeCloseTo(1.645 * 0.7, 1)
    expect(Math.log(gain.low / prior.gain.median)).toBeCloseTo(-1.645 * 0.7, 1)
    // The bounds of κ cut the prior's tails a little, no more.
    expect(Math.abs(Math.log(hoop.value / prior.hoop.median))).toBeLessThan(0.02)
    expect(Math.log(hoop.high / prior.hoop.median)).toBeCloseTo(1.645 * 1.2, 1)
  })

  it.each(['gauge', 'tap'] as const)(
    'holds the true figures nine times in ten on drums drawn from the prior, by %s',
    (basis) => {
      const source = chance(basis === 'gauge' ? 11 : 12)
      const prior = HOOP_PRIORS[basis]
      const drums = 150
      let [hoops, gains] = [0, 0]
      for (let trial = 0; trial < drums; trial++) {
        const drawn = Math.exp(Math.log(prior.hoop.median) + prior.hoop.spread * source.normal())
        const hoop = Math.min(HOOP_LIMITS.max, Math.max(HOOP_LIMITS.min, drawn))
        const gain = Math.exp(Math.log(prior.gain.median) + prior.gain.spread * source.normal())
        const drum = { lugs: 5 + (trial % 6), basis, hoop, gain, noise: basis === 'gauge' ? 0.35 : 4 }
        const made = learnt(drum, moves(1 + (trial % 12), drum, source))
        if (made.hoop.low <= hoop && hoop <= made.hoop.high) hoops += 1
        if (made.gain.low <= gain && gain <= made.gain.high) gains += 1
      }
      // Nine in ten of 150 is 135; four standard deviations (√(150·0.9·0.1) = 3.7) below it is 120.
      expect(hoops).toBeGreaterThan(120)
      expect(gains).toBeGreaterThan(120)
    },
  )

  it('narrows as consistent moves come in', () => {
    const logged = moves(6, { ...steel, noise: 0.2 }, chance(3))
    const widths = [1, 3, 9].map((times) => {
      const made = learnt(steel, Array.from({ length: times }, () => logged).flat())
      return [widthOf(made.hoop), widthOf(made.gain)]
    })
    for (const which of [0, 1]) {
      const [few = 0, more = 0, most = 0] = widths.map((pair) => pair[which] ?? 0)
      expect(more).toBeLessThan(few)
      expect(most).toBeLessThan(more)
    }
  })

  it('comes to the truth with many moves', () => {
    const made = learnt(steel, moves(50, steel, chance(5)))
    expect(made.used).toBe(50)
    expect(made.hoop.value / steel.hoop).toBeGreaterThan(0.75)
    expect(made.hoop.value / steel.hoop).toBeLessThan(1.33)
    // The hand misses by a fifth, so 50 moves leave about 0.2/√50 = 3 %.
    expect(made.gain.value / steel.gain).toBeGreaterThan(0.9)
    expect(made.gain.value / steel.gain).toBeLessThan(1.1)
  })

  it('one bad log moves it little and is named: turned the other way, or another lug than logged', () => {
    const source = chance(9)
    const good = moves(5, steel, source)
    const clean = learnt(steel, good)
    const turns = [0, 0.5, 0, 0, 0, 0, 0, 0]
    const changes = readingChanges(lugResponse(steel), turns, steel.gain)
    const logged = { turns, before: turns.map(() => 75), after: changes.map((change) => 75 + change) }
    const otherWay = { ...logged, turns: turns.map((turn) => -turn) }
    const otherLug = { ...logged, turns: [...turns.slice(-2), ...turns.slice(0, -2)] }
    for (const bad of [otherWay, otherLug]) {
      const made = learnt(steel, [...good.slice(0, 4), bad, ...good.slice(4)])
      expect(made.doubtful).toEqual([4])
      expect(Math.abs(Math.log(made.gain.value / clean.gain.value))).toBeLessThan(widthOf(clean.gain) / 2)
      expect(Math.abs(Math.log(made.hoop.value / clean.hoop.value))).toBeLessThan(widthOf(clean.hoop) / 2)
    }
  })

  it('a hand that misses by a fifth here and a fifth there, once round, is no slip', () => {
    const turns = Array.from({ length: 8 }, () => 0.25)
    const missed = [0.2, -0.2, 0.1, 0.2, -0.1, -0.2, 0.2, -0.2].map((miss) => 0.25 * (1 + miss))
    const changes = readingChanges(lugResponse(steel), missed, steel.gain)
    const round = { turns, before: turns.map(() => 75), after: changes.map((change) => 75 + change) }
    expect(learnHoop({ lugs: 8, basis: 'gauge', noise: 0.05, moves: [round] }).doubtful).toEqual([])
    expect(learnHoop({ lugs: 8, basis: 'gauge', noise: 0.05, handError: 0, moves: [round] }).doubtful).toEqual([0])
  })

  it('moves that say nothing change nothing', () => {
    const good = moves(3, steel, chance(21))
    const none = Array.from({ length: 8 }, () => null)
    const silent: LoggedMove[] = [
      { turns: Array(8).fill(0), before: Array(8).fill(75), after: Array(8).fill(80) },
      { turns: [0.25, 0, 0, 0, 0, 0, 0, 0], before: none, after: Array(8).fill(80) },
    ]
    expect(learnt(steel, [...silent, ...good])).toEqual(learnt(steel, good))
  })

  it('never leaves its bounds, whatever was logged', () => {
    const value = fc.oneof(fc.constant(null), fc.double({ min: -1e6, max: 1e6, noNaN: true }))
    const round = fc.array(value, { minLength: 6, maxLength: 6 })
    const turns = fc.array(fc.double({ min: -3, max: 3, noNaN: true }), { minLength: 6, maxLength: 6 })
    const log = fc.array(fc.record({ turns, before: round, after: round }), { maxLength: 5 })
    fc.assert(
      fc.property(log, fc.constantFrom<ReadingBasis>('gauge', 'tap'), (logged, basis) => {
        const { hoop, gain } = learnHoop({ lugs: 6, basis, noise: 0.35, moves: logged })
        const median = HOOP_PRIORS[basis].gain.median
        for (const { figure, min, max } of [
          { figure: hoop, ...HOOP_LIMITS },
          { figure: gain, min: median / 30, max: median * 30 },
        ]) {
          expect(figure.low).toBeGreaterThanOrEqual(min * (1 - 1e-9))
          expect(figure.value).toBeGreaterThanOrEqual(figure.low * (1 - 1e-9))
          expect(figure.high).toBeGreaterThanOrEqual(figure.value * (1 - 1e-9))
          expect(figure.high).toBeLessThanOrEqual(max * (1 + 1e-9))
        }
      }),
      { numRuns: 60 },
    )
  })

  it('is the same in whichever order the moves came, and wherever lug 1 is', () => {
    const logged = moves(5, steel, chance(31))
    const straight = learnt(steel, logged)
    const turned = logged.map((move) => {
      const by = <V>(values: readonly V[]) => [...values.slice(3), ...values.slice(0, 3)]
      return { turns: by(move.turns), before: by(move.before), after: by(move.after) }
    })
    for (const other of [learnt(steel, [...logged].reverse()), learnt(steel, turned)]) {
      for (const figure of ['hoop', 'gain'] as const) {
        expect(other[figure].value / straight[figure].value).toBeCloseTo(1, 9)
        expect(widthOf(other[figure]) / widthOf(straight[figure])).toBeCloseTo(1, 9)
      }
    }
  })
})

describe('bad input', () => {
  const six = [0, 0, 0, 0, 0, 0]
  const good = { turns: six, before: six, after: six }
  const learn = (change: Partial<Parameters<typeof learnHoop>[0]>) => () =>
    learnHoop({ lugs: 6, basis: 'gauge', noise: 0.35, moves: [], ...change })
  it.each([
    ['lugs', learn({ lugs: 13 })],
    ['noise', learn({ noise: 0 })],
    ['handError', learn({ handError: Number.NaN })],
    ['prior', learn({ prior: { ...HOOP_PRIORS.gauge, gain: { median: -1, spread: 1 } } })],
    ['turns', learn({ moves: [{ ...good, turns: [0.25] }] })],
    ['before', learn({ moves: [{ ...good, before: [Number.NaN, 0, 0, 0, 0, 0] }] })],
    ['after', learn({ moves: [{ ...good, after: [] }] })],
  ])('is refused, naming %s', (field, call) => {
    expect(call).toThrow(expect.objectContaining({ name: 'AcousticsError', field }))
  })
})
