import type { Belief } from './next-move-belief'
import { outChance } from './next-move-out-chance'
import { sparseCorrections } from './next-move-sparse'

/** Sizes of a key turn that a hand can be told, in sixteenths: a hair, an eighth … half a turn. */
export const TURN_SIXTEENTHS = [1, 2, 3, 4, 5, 6, 8] as const

export type PlanInput = {
  belief: Belief
  /** Reading wanted at every lug, or null: all like their own mean. */
  target: number | null
  tolerance: number
  /** Lugs (0-based) that may not be turned now. */
  frozen: ReadonlySet<number>
  /** Sizes allowed, sixteenths of a turn. */
  sizes: readonly number[]
  directions: { up: boolean; down: boolean }
  /** Lugs that may be brought up alone. */
  loose: ReadonlySet<number>
  costs: PlanCosts
  /** Try every two lugs at every two sizes, not only facing ones alike. */
  everyPair?: boolean
}

/** Seconds. */
export type PlanCosts = {
  /** One lug turned and read again. */
  move: number
  /** A lug left out of tolerance: finding and turning it later. */
  out: number
  /** More of it for every tolerance by which it is out. */
  outFurther: number
  /** Reading on when it is not sure whether any lug is out: in full from `sureAt` + `unsureSpan` lugs expected out. */
  unsure: number
  sureAt: number
  unsureSpan: number
}

export type Plan = {
  /** Sixteenths of a turn, signed, lug by lug. */
  sixteenths: number[]
  /** Expected seconds with it, and with no turn at all. */
  seconds: number
  secondsWithout: number
  /** Readings after it, lug by lug. */
  expected: number[]
}

/** Where a head stands against what is wanted: each lug's expected deviation, and its variance. */
export type Standing = { off: Float64Array; variance: Float64Array }

export function standing(belief: Belief, target: number | null): Standing {
  const { lugs, mean, covariance } = belief
  const off = new Float64Array(lugs)
  const variance = new Float64Array(lugs)
  if (target !== null) {
    for (let i = 0; i < lugs; i++) {
      off[i] = mean[i]! - target
      variance[i] = covariance[i]![i]!
    }
    return { off, variance }
  }
  const middle = mean.reduce((sum, value) => sum + value, 0) / lugs
  const rows = Array.from(
    { length: lugs },
    (_, i) => covariance[i]!.slice(0, lugs).reduce((sum, value) => sum + value, 0) / lugs,
  )
  const all = rows.reduce((sum, value) => sum + value, 0) / lugs
  for (let i = 0; i < lugs; i++) {
    off[i] = mean[i]! - middle
    variance[i] = Math.max(1e-9, covariance[i]![i]! - 2 * rows[i]! + all)
  }
  return { off, variance }
}

/**
 * The turns of one pass that are expected to cost the fewest seconds in all: their own time and what is left out after them.
 * From no turn and from sparse least-squares corrections, it goes down by changing one lug, two lugs alike or swapping two, as
 * long as that helps; the best end is kept. One lug is never brought up alone unless it is loose.
 */
export function planTurns(input: PlanInput): Plan {
  const { target, frozen, sizes, directions, loose, costs, everyPair = false } = input
  const { lugs } = input.belief
  const effect = effectOfTurns(input)
  const levels = [
    0,
    ...sizes.flatMap((size) => [...(directions.up ? [size] : []), ...(directions.down ? [-size] : [])]),
  ]
  /** Seconds of the plan at hand with one or two lugs turned otherwise, or past `most`. */
  const secondsWith = (plan: Int8Array, one: number, oneSize: number, two: number, twoSize: number, most: number) => {
    let moves = 0
    let ups = 0
    let loosely = false
    for (let lug = 0; lug < lugs; lug++) {
      const size = lug === one ? oneSize : lug === two ? twoSize : plan[lug]!
      if (size === 0) continue
      moves++
      if (size < 0) continue
      ups++
      loosely = loose.has(lug)
    }
    if (ups === 1 && !loosely) return Infinity
    return effect.leftSeconds(plan, one, oneSize, two, twoSize, costs.move * moves, most)
  }
  const secondsOf = (plan: Int8Array) => {
    effect.take(plan)
    return secondsWith(plan, 0, plan[0]!, 0, plan[0]!, Infinity)
  }

  const descend = (start: Int8Array): { plan: Int8Array; seconds: number } => {
    const plan = Int8Array.from(start)
    let seconds = secondsOf(plan)
    for (let round = 0; round < MOST_ROUNDS; round++) {
      let [one, oneSize, two, twoSize] = [-1, 0, -1, 0]
      const attempt = (lug: number, size: number, other: number, otherSize: number) => {
        const cost = secondsWith(plan, lug, size, other, otherSize, seconds)
        if (cost >= seconds - 1e-6) return
        seconds = cost
        ;[one, oneSize, two, twoSize] = [lug, size, other, otherSize]
      }
      for (let lug = 0; lug < lugs; lug++) {
        if (frozen.has(lug)) continue
        for (const size of levels) if (size !== plan[lug]) attempt(lug, size, lug, size)
        for (let other = lug + 1; other < lugs; other++) {
          if (frozen.has(other)) continue
          if (plan[lug] !== plan[other]) attempt(lug, plan[other]!, other, plan[lug]!)
          else if (plan[lug] === 0 && everyPair) {
            for (const size of levels) for (const too of levels) attempt(lug, size, other, too)
          } else if (plan[lug] === 0 && facingLugs(lug, lugs).includes(other)) {
            for (const size of levels) if (size !== 0) attempt(lug, size, other, size)
          }
        }
      }
      if (one < 0) break
      plan[one] = oneSize
      plan[two] = twoSize
      effect.take(plan)
    }
    return { plan, seconds }
  }

  const { off } = standing(input.belief, target)
  const nothing = new Int8Array(lugs)
  const starts = [
    nothing,
    ...sparseCorrections({ off, shares: effect.shares, gain: input.belief.gain, frozen }).map((turns) =>
      Int8Array.from(turns, (turn) => nearest(turn, levels)),
    ),
  ]
  const best = starts
    .map((plan) => ({ plan, seconds: secondsOf(plan) }))
    .sort((a, b) => a.seconds - b.seconds)
    .slice(0, STARTS)
    .map(({ plan }) => descend(plan))
    .reduce((a, b) => (b.seconds < a.seconds ? b : a))
  return {
    sixteenths: [...best.plan],
    seconds: best.seconds,
    secondsWithout: secondsOf(nothing),
    expected: effect.expected(best.plan),
  }
}

const MOST_ROUNDS = 24
const LARGEST_TURN = Math.max(...TURN_SIXTEENTHS)
/** Starts from which the descent is tried. */
const STARTS = 3

/**
 * The lugs across from a lug, 0-based: the one opposite or, of an odd count, the two that are nearest to opposite.
 */
export function facingLugs(lug: number, lugs: number): number[] {
  const half = Math.floor(lugs / 2)
  return lugs % 2 === 0 ? [(lug + half) % lugs] : [(lug + half) % lugs, (lug + half + 1) % lugs]
}

/** What turns are believed to do, and what it costs to leave the head so. */
function effectOfTurns({ belief, target, tolerance, costs }: PlanInput) {
  const { lugs, covariance, gain } = belief
  const { off, variance } = standing(belief, target)
  const shares = belief.shares.map((share) => share - (target === null ? 1 / lugs : 0))
  const gainVariance = belief.gainSpread ** 2
  const withGain = covariance.slice(0, lugs).map((row) => row[lugs]!)
  const common = target === null ? withGain.reduce((sum, value) => sum + value, 0) / lugs : 0
  const change = new Float64Array(lugs)
  const spread = new Float64Array(lugs)
  // Of the variance a turn adds: what grows with its square, and what any turn adds, by places on from the lug.
  const bySquare = shares.map((share, d) => gain ** 2 * ((belief.handError * share) ** 2 + belief.sharesVariance[d]!))
  const byTurning = shares.map((share) => (gain * belief.lostTurns * share) ** 2 + belief.restlessness ** 2)
  const added = Float64Array.from({ length: (LARGEST_TURN + 1) * lugs }, (_, at) => {
    const turns = Math.floor(at / lugs) / 16
    return turns === 0 ? 0 : bySquare[at % lugs]! * turns * turns + byTurning[at % lugs]!
  })
  const order = Array.from({ length: lugs }, (_, i) => i)

  return {
    shares,
    /** Makes this the plan at hand. */
    take: (plan: Int8Array) => {
      change.fill(0)
      spread.fill(0)
      for (let lug = 0; lug < lugs; lug++) {
        const size = plan[lug]!
        if (size === 0) continue
        for (let i = 0; i < lugs; i++) {
          const places = i < lug ? i - lug + lugs : i - lug
          change[i]! += (shares[places]! * size) / 16
          spread[i]! += added[Math.abs(size) * lugs + places]!
        }
      }
      // The lugs furthest out first, so that a worse plan is soon past the best.
      order.sort((a, b) => Math.abs(off[b]! + gain * change[b]!) - Math.abs(off[a]! + gain * change[a]!))
    },
    /** Seconds on top of `from` when one or two lugs of the plan at hand turn by other sizes; may stop early once past `most`. */
    leftSeconds: (
      plan: Int8Array,
      one: number,
      oneSize: number,
      two: number,
      twoSize: number,
      from: number,
      most: number,
    ) => {
      const oneMore = (oneSize - plan[one]!) / 16
      const twoMore = one === two ? 0 : (twoSize - plan[two]!) / 16
      const [oneNow, oneThen] = [Math.abs(plan[one]!) * lugs, Math.abs(oneSize) * lugs]
      const [twoNow, twoThen] = [Math.abs(plan[two]!) * lugs, Math.abs(twoSize) * lugs]
      let seconds = from
      let out = 0
      for (let at = 0; at < lugs && seconds < most; at++) {
        const i = order[at]!
        let moved = change[i]!
        let v = variance[i]! + spread[i]!
        if (oneMore !== 0) {
          const places = i < one ? i - one + lugs : i - one
          moved += shares[places]! * oneMore
          v += added[oneThen + places]! - added[oneNow + places]!
        }
        if (twoMore !== 0) {
          const places = i < two ? i - two + lugs : i - two
          moved += shares[places]! * twoMore
          v += added[twoThen + places]! - added[twoNow + places]!
        }
        const middle = off[i]! + gain * moved
        v += 2 * (withGain[i]! - common) * moved + gainVariance * moved * moved
        const chance = outChance(middle, Math.max(1e-9, v), tolerance)
        out += chance
        seconds += chance * (costs.out + costs.outFurther * Math.max(0, Math.abs(middle) / tolerance - 1))
      }
      return seconds + costs.unsure * Math.min(1, Math.max(0, out - costs.sureAt) / costs.unsureSpan)
    },
    /** Readings after the turns. */
    expected: (plan: Int8Array) =>
      belief.mean.map((value, i) => {
        let moved = 0
        for (let lug = 0; lug < lugs; lug++) moved += (belief.shares[(i - lug + lugs) % lugs]! * plan[lug]!) / 16
        return value + gain * moved
      }),
  }
}

/** The size nearest a turn. */
function nearest(turns: number, levels: readonly number[]): number {
  const wanted = turns * 16
  return levels.reduce((near, one) => (Math.abs(one - wanted) < Math.abs(near - wanted) ? one : near), 0)
}
