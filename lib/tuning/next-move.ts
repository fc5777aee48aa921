import { requireQuantity } from '@/lib/acoustics/require-quantity'
import type { ReadingBasis } from './head-state'
import { lugOrder, requireLugs } from './lug-order'
import { believe } from './next-move-belief'
import type { Belief } from './next-move-belief'
import { cleanLog, READING_NOISE } from './next-move-log'
import type { CleanLog, HeadEvent } from './next-move-log'
import { facingLugs, outChance, planTurns, standing, TURN_SIXTEENTHS } from './next-move-plan'
import type { Plan } from './next-move-plan'
import { startingGain, waysToAnswer } from './next-move-response'
import type { KnownResponse } from './next-move-response'

export type HeadPhase = 'seat' | 'bring-up' | 'even' | 'fine'

export type NextMoveInput = {
  /** Evenly spaced lugs on the head, 4 to 12. */
  lugs: number
  /** Which readings to go by; those of the other basis are left out. */
  basis: ReadingBasis
  /** Every reading of this head and every turn, in the order in which they happened. */
  log: readonly HeadEvent[]
  /** Tap pitch wanted in Hz or, with the gauge, its reading in gauge units; null: even only. */
  target: number | null
  /** How far off a lug may be and still count as even: cents, or gauge units. */
  tolerance: number
  phase: HeadPhase
  /** Hoop and gain learned for this head or one like it (`learnHoop`), or null. */
  learned: KnownResponse | null
  /** Gauge units a cent of tap pitch here, where the gauge is calibrated; null otherwise. */
  gaugeUnitsPerCent: number | null
  /** Fifteen minutes: good enough is enough. */
  shortWay: boolean
}

export type TurnSize =
  'hair' | 'eighth' | 'eighth and a hair' | 'quarter' | 'quarter and a hair' | 'quarter and an eighth' | 'half'

export type LugTurn = { lug: number; size: TurnSize; /** Whole turns of the key, tighter positive. */ turns: number }

export type NextMoveKind = 'seat' | 'bring-up' | 'read' | 'turn' | 'not-sure' | 'done'

export type NextMoveReason =
  /** Seat: finger-tight comes first. */
  | 'seat-first'
  /** Bring-up: the next quarter turn of the round. */
  | 'bring-up'
  /** Bring-up or read: the whole head lies far under the target. */
  | 'far-under'
  /** Read: lugs without a reading, with a doubtful one only, turned since theirs, the rest after a turn, or one that decides. */
  | 'not-read-yet'
  | 'doubtful'
  | 'turned-since'
  | 'rest-of-pass'
  | 'would-decide'
  /** Turn: the head is over or under on the whole, a lug stands alone far under the rest, or the head is uneven. */
  | 'over'
  | 'under'
  | 'slipped'
  | 'uneven'
  /** Not sure: two readings of a lug contradict each other, one is far from anything expected, a lug gives no reading. */
  | 'contradictory'
  | 'surprising'
  | 'no-reading'
  /** Done: believed with 95 %, by a whole pass within tolerance, or good enough for the short way. */
  | 'believed-even'
  | 'pass-even'
  | 'good-enough'

/** One next step. Lugs are 1-based, in the order in which to take them. */
export type NextMove = {
  kind: NextMoveKind
  reason: NextMoveReason
  lugs: number[]
  direction: 'up' | 'down' | null
  /** The size of every turn, or null where they differ (see `turns`) or there is none. */
  size: TurnSize | null
  turns: LugTurn[]
  /** Arrive from below: on the way down go under and come up. True of every turn. */
  fromBelow: boolean
  /** Two keys at once, on lugs that face each other. */
  twoKeys: boolean
  /** Readings to expect when it is done, lug by lug, in Hz, cents or gauge units as they were read; null without any. */
  expected: number[] | null
  /** Lugs to read then; none while more turns of the pass follow. */
  thenRead: number[]
  /** Chance that every lug is within tolerance now, 0 to 1; null without readings. */
  evenChance: number | null
}

const SIZES: Readonly<Record<number, TurnSize>> = {
  1: 'hair',
  2: 'eighth',
  3: 'eighth and a hair',
  4: 'quarter',
  5: 'quarter and a hair',
  6: 'quarter and an eighth',
  8: 'half',
}

/** Seconds the plan weighs: a move and reading again, a lug left out, more the further. Set on simulated drums. */
export const COSTS = { move: 9, out: 20, outFurther: 8, unsure: 16, sureAt: 0.05, unsureSpan: 0.2 }
/** Seconds a pass must save before it is worth asking for. */
const WORTH_SECONDS = { usual: 1, short: 5 }
/** Chance of being even at which it is called so: at once, or after a whole pass that reads even. */
export const SURE = { atOnce: 0.88, afterPass: 0.65, short: 0.7 }
/** Relative spread of the gain under which a whole pass is turned before it is read again. */
const GAIN_KNOWN = 0.2
/** Readings after the last turn, beyond one a lug, past which turning is better than reading on. */
const TIRED_AFTER = 3
/** Spread of where readings may lie at all: many tolerances. */
const LEVEL_SPREAD = { gauge: 15, tap: 400 }
/** How unequally a bring-up leaves the rods, in turns (from memory), and what else unevens a head, in noises of a reading. */
const RODS_SPREAD = 0.14
const SEAT_SPREAD = 1.2
/** Deviations from what was expected past which a reading is asked for again. */
const SURPRISING = 5
/** A head that follows the model this little is read all round after every change. */
const DOUBTED = 0.5
/** A lug so many tolerances low, while the lowest of the rest is less than half as low, has slipped or is loose. */
const SLIPPED = 5

/**
 * The one next step for a head, by the rules of the trade (common practice) and, within them, the fewest seconds expected:
 * seat finger-tight first; bring up in quarter turns, two keys on facing lugs; read every lug before touching one; never one low
 * lug alone unless it has slipped or is loose; over on the whole nothing goes up, under on the whole nothing goes down; read what
 * was turned before it is turned again or the head is called even; arrive from below.
 * A head that does not follow what is expected of it is believed less and read more.
 * @throws AcousticsError naming `lugs`, `lug`, `value`, `unit`, `turns`, `target`, `tolerance` or `gaugeUnitsPerCent`
 */
export function nextMove(input: NextMoveInput): NextMove {
  const { basis, phase } = input
  const lugs = requireLugs(input.lugs)
  requireQuantity('tolerance', input.tolerance, { min: 0.05, max: 600, unit: basis === 'tap' ? 'cents' : '' })
  if (input.gaugeUnitsPerCent !== null) {
    requireQuantity('gaugeUnitsPerCent', input.gaugeUnitsPerCent, { min: 1e-4, max: 10, unit: '' })
  }
  const log = cleanLog(input.log, input)
  if (phase === 'seat') return step('seat', 'seat-first', { lugs: lugOrder(lugs) })
  if (log.contradictory.length > 0) return step('not-sure', 'contradictory', { lugs: ordinals(log.contradictory) })
  if (phase === 'bring-up') return bringUp(input, log)
  return evenOut(input, log)
}

/** Round by round a quarter turn on facing lugs; with a target, two facing lugs are read after every round. */
function bringUp(input: NextMoveInput, log: CleanLog): NextMove {
  const { lugs, basis } = input
  const pairs = keysRound(lugs)
  const turned = Array.from({ length: lugs }, () => 0)
  let readSince: number[] = []
  for (const event of log.events) {
    if (event.kind === 'read') readSince.push(event.value)
    else {
      event.turns.forEach((turns, lug) => (turned[lug]! += turns))
      readSince = []
    }
  }
  const least = Math.min(...turned)
  const next = pairs.find((pair) => pair.some((lug) => turned[lug]! < least + QUARTER / 2)) ?? pairs[0]!
  if (next === pairs[0] && log.target !== null && log.events.some(({ kind }) => kind === 'turn')) {
    if (readSince.length === 0) return step('read', 'far-under', { lugs: ordinals(next) })
    const { value } = startingGain(basis, input.learned, input.gaugeUnitsPerCent)
    const middle = readSince.reduce((sum, height) => sum + height, 0) / readSince.length
    if (middle > log.target - value * QUARTER) return evenOut(input, log)
  }
  return quarterUp('bring-up', next, [])
}

const QUARTER = 0.25

function quarterUp(reason: NextMoveReason, lugs: readonly number[], thenRead: number[]): NextMove {
  const turns = ordinals(lugs).map((lug): LugTurn => ({ lug, size: 'quarter', turns: QUARTER }))
  return step('bring-up', reason, {
    lugs: ordinals(lugs),
    direction: 'up',
    size: 'quarter',
    turns,
    twoKeys: true,
    thenRead,
  })
}

/** Lugs (0-based) taken together by two keys, once round: facing pairs, and of an odd count a last three. */
function keysRound(lugs: number): number[][] {
  const order = lugOrder(lugs).map((lug) => lug - 1)
  const pairs = Array.from({ length: Math.floor(lugs / 2) }, (_, i) => order.slice(2 * i, 2 * i + 2))
  if (lugs % 2 === 1) pairs.at(-1)?.push(order.at(-1)!)
  return pairs
}

function evenOut(input: NextMoveInput, log: CleanLog): NextMove {
  const { lugs, basis, tolerance } = input
  const history = readAndTurned(lugs, log)
  const unread = history.lastRead.flatMap((at, lug) => (at < 0 ? [lug] : []))
  const lost = unread.filter((lug) => log.missed[lug]! >= 2)
  if (unread.length > lost.length)
    return step('read', 'not-read-yet', { lugs: ordinals(unread.filter((lug) => !lost.includes(lug))) })
  if (lost.length > 0) return step('not-sure', 'no-reading', { lugs: ordinals(lost) })
  if (history.doubtful.length > 0) return step('read', 'doubtful', { lugs: ordinals(history.doubtful) })

  const noise = basis === 'gauge' ? READING_NOISE.gauge : READING_NOISE['tap-heard']
  const heights = log.events.flatMap((event) => (event.kind === 'read' ? [event.value] : []))
  const belief = believe(
    {
      lugs,
      hypotheses: waysToAnswer(lugs, basis, input.learned, noise),
      gain: startingGain(basis, input.learned, input.gaugeUnitsPerCent),
      level: { value: heights[0] ?? 0, spread: LEVEL_SPREAD[basis] },
      rods: RODS_SPREAD,
      seat: SEAT_SPREAD * noise,
    },
    log.events,
  )
  const { off, variance } = standing(belief, log.target)
  const out = Array.from(off, (value, lug) => outChance(value, variance[lug]!, tolerance))
  const evenChance = Math.max(0, 1 - out.reduce((sum, chance) => sum + chance, 0))
  const said = { evenChance }
  const last = log.events.at(-1)
  if (
    last?.kind === 'read' &&
    Math.abs(belief.lastSurprise) > SURPRISING &&
    history.readsSinceTurn[last.lug] === 1 &&
    history.lastTurned >= 0
  ) {
    return step('not-sure', 'surprising', { ...said, lugs: [last.lug + 1] })
  }

  const pending = history.lastRead.flatMap((at, lug) => (at < history.lastTurn[lug]! ? [lug] : []))
  const doubted = belief.doubt > DOUBTED
  const stale = history.lastRead.flatMap((at, lug) => (at < history.lastTurned ? [lug] : []))
  const known = !doubted && belief.gainSpread / belief.gain < GAIN_KNOWN
  if (pending.length === 0 || known) {
    const turn = planned(input, log, belief, {
      pending,
      tired: history.sinceTurn > lugs + TIRED_AFTER,
      known,
      off,
      said,
    })
    if (turn !== null) return turn
  }
  if (pending.length > 0)
    return step('read', 'turned-since', { ...said, lugs: inOrder(doubted ? stale : pending, lugs) })

  const passDone = stale.length === 0
  if (!doubted || passDone) {
    if (evenChance >= SURE.atOnce) return step('done', 'believed-even', said)
    if (passDone && evenChance >= SURE.afterPass && readsEven(history.latest, log.target, tolerance)) {
      return step('done', 'pass-even', said)
    }
  }
  if (input.shortWay && passDone && (evenChance >= SURE.short || history.passes >= 2)) {
    return step('done', 'good-enough', {
      ...said,
      lugs: ordinals(out.flatMap((chance, lug) => (chance > 0.5 ? [lug] : []))),
    })
  }
  const telling = mostTelling(belief, out, noise, stale.length > 0 ? stale : [...out.keys()])
  return step('read', stale.length > 0 ? 'rest-of-pass' : 'would-decide', { ...said, lugs: [telling + 1] })
}

type History = {
  /** Place in the log of each lug's last reading and last turn, −1 for none; and of the last turn of any. */
  lastRead: number[]
  lastTurn: number[]
  lastTurned: number
  readsSinceTurn: number[]
  /** Readings since anything was turned. */
  sinceTurn: number
  /** Runs of turns with readings between. */
  passes: number
  latest: number[]
  /** Lugs with one reading since anything was turned, and that one doubtful. */
  doubtful: number[]
}

function readAndTurned(lugs: number, log: CleanLog): History {
  const none = Array.from({ length: lugs }, () => -1)
  const history: History = {
    lastRead: [...none],
    lastTurn: [...none],
    lastTurned: -1,
    readsSinceTurn: none.map(() => 0),
    sinceTurn: 0,
    passes: 0,
    latest: none.map(() => Number.NaN),
    doubtful: [],
  }
  log.events.forEach((event, at) => {
    if (event.kind === 'read') {
      history.lastRead[event.lug] = at
      history.readsSinceTurn[event.lug]!++
      history.latest[event.lug] = event.value
      history.sinceTurn++
      const once = history.readsSinceTurn[event.lug] === 1
      history.doubtful = history.doubtful.filter((lug) => lug !== event.lug)
      if (event.doubtful && once) history.doubtful.push(event.lug)
      return
    }
    if (log.events[at - 1]?.kind === 'read') history.passes++
    event.turns.forEach((turns, lug) => {
      if (turns !== 0) history.lastTurn[lug] = at
    })
    history.lastTurned = at
    history.readsSinceTurn.fill(0)
    history.doubtful = []
    history.sinceTurn = 0
  })
  return history
}

function planned(
  input: NextMoveInput,
  log: CleanLog,
  belief: Belief,
  at: { pending: number[]; tired: boolean; known: boolean; off: Float64Array; said: { evenChance: number } },
): NextMove | null {
  const { lugs, tolerance, phase, shortWay } = input
  const { pending, off } = at
  const middle = off.reduce((sum, value) => sum + value, 0) / lugs
  if (log.target !== null && pending.length === 0 && middle < -belief.gain * QUARTER) {
    const lowest = [...keysRound(lugs)].sort((a, b) => lowness(a, off) - lowness(b, off))[0]!
    return { ...quarterUp('far-under', lowest, inOrder(lowest, lugs)), evenChance: at.said.evenChance }
  }
  const lean = log.target === null ? 0 : middle > tolerance / 2 ? 1 : middle < -tolerance / 2 ? -1 : 0
  const slipped = slippedLugs(off, tolerance)
  const plan = planTurns({
    belief,
    target: log.target,
    tolerance,
    frozen: new Set(pending),
    sizes: phase === 'fine' ? TURN_SIXTEENTHS.filter((size) => size <= 2) : TURN_SIXTEENTHS,
    directions: { up: lean <= 0, down: lean >= 0 },
    loose: new Set(slipped),
    costs: at.tired ? { ...COSTS, out: 3 * COSTS.out } : COSTS,
  })
  if (plan.sixteenths.every((size) => size === 0)) return null
  if (plan.seconds > plan.secondsWithout - WORTH_SECONDS[shortWay ? 'short' : 'usual']) return null
  return firstOf(plan, { lugs, slipped, lean, known: at.known, asReading: log.asReading, pending, said: at.said })
}

/** The first step of a plan: turns in one direction, facing lugs together. */
function firstOf(
  plan: Plan,
  {
    lugs,
    slipped,
    lean,
    known,
    asReading,
    pending,
    said,
  }: {
    lugs: number
    slipped: number[]
    lean: number
    known: boolean
    asReading: (height: number) => number
    pending: number[]
    said: { evenChance: number }
  },
): NextMove {
  const of = (sign: number) => plan.sixteenths.flatMap((size, lug) => (size * sign > 0 ? [lug] : []))
  const effort = (some: number[]) => some.reduce((sum, lug) => sum + Math.abs(plan.sixteenths[lug]!), 0)
  const [ups, downs] = [of(1), of(-1)]
  const loose = ups.filter((lug) => slipped.includes(lug))
  const up = loose.length > 0 || effort(ups) >= effort(downs)
  const side = up ? ups : downs
  const first = loose.length > 0 ? loose : together(side, plan.sixteenths, lugs, up)
  const turns = inOrder(first, lugs).map((lug): LugTurn => {
    const sixteenths = plan.sixteenths[lug - 1]!
    return { lug, size: SIZES[Math.abs(sixteenths)]!, turns: sixteenths / 16 }
  })
  const more = known && ups.length + downs.length > first.length
  const sizes = new Set(turns.map(({ size }) => size))
  return step('turn', loose.length > 0 ? 'slipped' : lean > 0 ? 'over' : lean < 0 ? 'under' : 'uneven', {
    ...said,
    lugs: turns.map(({ lug }) => lug),
    direction: up ? 'up' : 'down',
    size: sizes.size === 1 ? turns[0]!.size : null,
    turns,
    twoKeys: first.length === 2 && facingLugs(first[0]!, lugs).includes(first[1]!),
    expected: plan.expected.map(asReading),
    thenRead: more ? [] : inOrder([...new Set([...pending, ...first])], lugs),
  })
}

/** The two of one side that go first: a facing pair if there is one, else the two largest; never one left over to go up alone. */
function together(side: readonly number[], sixteenths: readonly number[], lugs: number, up: boolean): number[] {
  if (side.length <= 2 || (up && side.length === 3)) return [...side]
  const size = (lug: number) => Math.abs(sixteenths[lug]!)
  const pairs = side.flatMap((one, i) => side.slice(i + 1).map((other) => [one, other] as const))
  const facing = ([one, other]: readonly [number, number]) => (facingLugs(one, lugs).includes(other) ? 100 : 0)
  const rank = (pair: readonly [number, number]) => facing(pair) + size(pair[0]) + size(pair[1])
  return [...pairs.reduce((best, pair) => (rank(pair) > rank(best) ? pair : best))]
}

function slippedLugs(off: Float64Array, tolerance: number): number[] {
  const order = [...off.keys()].sort((a, b) => off[a]! - off[b]!)
  const [lowest, second] = [off[order[0]!]!, off[order[1]!]!]
  return lowest < -SLIPPED * tolerance && second > lowest / 2 ? [order[0]!] : []
}

function readsEven(latest: readonly number[], target: number | null, tolerance: number): boolean {
  const level = target ?? latest.reduce((sum, value) => sum + value, 0) / latest.length
  return latest.every((value) => Math.abs(value - level) <= tolerance)
}

/** The lug whose reading would tell most of the lugs that may be out. */
function mostTelling(belief: Belief, out: readonly number[], noise: number, among: readonly number[]): number {
  const tells = (lug: number) => {
    const row = belief.covariance[lug]!
    return out.reduce((sum, chance, other) => sum + (chance * row[other]! ** 2) / (row[lug]! + noise ** 2), 0)
  }
  return among.reduce((best, lug) => (tells(lug) > tells(best) ? lug : best))
}

function lowness(lugs: readonly number[], off: Float64Array): number {
  return lugs.reduce((sum, lug) => sum + off[lug]!, 0) / lugs.length
}

/** 0-based lugs as 1-based ones in the order of turning. */
function inOrder(some: readonly number[], lugs: number): number[] {
  return lugOrder(lugs).filter((lug) => some.includes(lug - 1))
}

function ordinals(some: readonly number[]): number[] {
  return some.map((lug) => lug + 1)
}

function step(kind: NextMoveKind, reason: NextMoveReason, of: Partial<NextMove>): NextMove {
  return {
    kind,
    reason,
    lugs: [],
    direction: null,
    size: null,
    turns: [],
    fromBelow: of.turns !== undefined,
    twoKeys: false,
    expected: null,
    thenRead: [],
    evenChance: null,
    ...of,
  }
}
