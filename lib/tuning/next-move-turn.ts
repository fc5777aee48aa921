import { keysRound, QUARTER, quarterUp } from './next-move-bring-up'
import type { Belief } from './next-move-belief'
import type { CleanLog } from './next-move-log'
import { facingLugs, planTurns, TURN_SIXTEENTHS } from './next-move-plan'
import type { Plan } from './next-move-plan'
import { inOrder, step } from './next-move-step'
import type { LugTurn, NextMove, TurnSize } from './next-move-step'

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
const COSTS = { move: 9, out: 20, outFurther: 24, unsure: 16, sureAt: 0.05, unsureSpan: 0.2 }
/** When more readings do not settle it, leaving a lug out weighs more. */
const TIRED_COSTS = { ...COSTS, out: 3 * COSTS.out, outFurther: 3 * COSTS.outFurther }
/** Seconds a pass must save before it is worth asking for. */
const WORTH_SECONDS = { usual: 1, short: 5 }
/** What counts when nothing else helps: the chance of being even, at what a call in vain costs. */
const NUDGE_COSTS = { move: 1, out: 60, outFurther: 10, unsure: 0, sureAt: 0, unsureSpan: 1 }
const NUDGE_SIXTEENTHS = [1, 2]
/** Seconds a nudge must save. */
const WORTH_NUDGING = 0.5
/** A lug so many tolerances low, while the lowest of the rest is less than half as low, has slipped or is loose. */
const SLIPPED = 5

export type TurnState = {
  /** Lugs (0-based) turned since they were last read. */
  pending: number[]
  /** So many readings since the last turn that more of them will not settle it. */
  tired: boolean
  /** The gain is known well enough to turn a whole pass before it is read. */
  known: boolean
  /** Expected deviation of each lug. */
  off: Float64Array
  said: { evenChance: number }
}

/** The turn that is worth more than it costs, or null. A head far under its target goes on being brought up, the low pair first. */
export function turnNext(
  { lugs, tolerance, fine, shortWay }: { lugs: number; tolerance: number; fine: boolean; shortWay: boolean },
  { target, asReading }: Pick<CleanLog, 'target' | 'asReading'>,
  belief: Belief,
  at: TurnState,
): NextMove | null {
  const { pending, off } = at
  const middle = off.reduce((sum, value) => sum + value, 0) / lugs
  if (target !== null && pending.length === 0 && middle < -belief.gain * QUARTER) {
    const lowest = [...keysRound(lugs)].sort((a, b) => lowness(a, off) - lowness(b, off))[0]!
    return { ...quarterUp('far-under', lowest, inOrder(lowest, lugs)), evenChance: at.said.evenChance }
  }
  const lean = leaning(off, target, tolerance)
  const slipped = slippedLugs(off, tolerance)
  const plan = planTurns({
    belief,
    target,
    tolerance,
    frozen: new Set(pending),
    sizes: fine ? TURN_SIXTEENTHS.filter((size) => size <= 2) : TURN_SIXTEENTHS,
    directions: { up: lean <= 0, down: lean >= 0 },
    loose: new Set(slipped),
    costs: at.tired ? TIRED_COSTS : COSTS,
  })
  if (plan.sixteenths.every((size) => size === 0)) return null
  if (plan.seconds > plan.secondsWithout - WORTH_SECONDS[shortWay ? 'short' : 'usual']) return null
  return firstOf(plan, { lugs, slipped, lean, known: at.known, asReading, pending, said: at.said })
}

/** The first step of a plan: turns in one direction, facing lugs together. */
/**
 * A small turn of one or two lugs that makes a head at the edge of its tolerance more likely to be even, or null: the last
 * resort when neither reading nor any turn of the usual plan settles it.
 */
export function nudge(
  { lugs, tolerance }: { lugs: number; tolerance: number },
  { target, asReading }: Pick<CleanLog, 'target' | 'asReading'>,
  belief: Belief,
  { off, said }: Pick<TurnState, 'off' | 'said'>,
): NextMove | null {
  const lean = leaning(off, target, tolerance)
  const plans = [lean <= 0, lean >= 0].flatMap((allowed, down) =>
    allowed
      ? [
          planTurns({
            belief,
            target,
            tolerance,
            frozen: new Set(),
            sizes: NUDGE_SIXTEENTHS,
            directions: { up: down === 0, down: down === 1 },
            loose: new Set(),
            costs: NUDGE_COSTS,
            everyPair: true,
          }),
        ]
      : [],
  )
  const plan = plans.reduce((a, b) => (b.seconds < a.seconds ? b : a))
  if (plan.seconds > plan.secondsWithout - WORTH_NUDGING) return null
  return firstOf(plan, { lugs, slipped: [], lean, known: false, asReading, pending: [], said })
}

/** 1 when the head is over on the whole, −1 when it is under, 0 between or without a target. */
function leaning(off: Float64Array, target: number | null, tolerance: number): number {
  const middle = off.reduce((sum, value) => sum + value, 0) / off.length
  return target === null ? 0 : middle > tolerance / 2 ? 1 : middle < -tolerance / 2 ? -1 : 0
}

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

function lowness(lugs: readonly number[], off: Float64Array): number {
  return lugs.reduce((sum, lug) => sum + off[lug]!, 0) / lugs.length
}
