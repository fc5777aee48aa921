import type { ReadingBasis } from './head-state'
import { lugOrder } from './lug-order'
import type { CleanLog } from './next-move-log'
import { startingGain } from './next-move-response'
import type { KnownResponse } from './next-move-response'
import { ordinals, step } from './next-move-step'
import type { LugTurn, NextMove, NextMoveReason } from './next-move-step'

export const QUARTER = 0.25

export type BringUpInput = {
  lugs: number
  basis: ReadingBasis
  learned: KnownResponse | null
  gaugeUnitsPerCent: number | null
}

/**
 * Round by round a quarter turn on facing lugs; with a target, two facing lugs are read after every round. Null once
 * they are within a quarter turn of it.
 */
export function bringUp({ lugs, basis, learned, gaugeUnitsPerCent }: BringUpInput, log: CleanLog): NextMove | null {
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
    const { value } = startingGain(basis, learned, gaugeUnitsPerCent)
    const middle = readSince.reduce((sum, height) => sum + height, 0) / readSince.length
    if (middle > log.target - value * QUARTER) return null
  }
  return quarterUp('bring-up', next, [])
}

/** A quarter turn up on these lugs (0-based), with two keys. */
export function quarterUp(reason: NextMoveReason, lugs: readonly number[], thenRead: number[]): NextMove {
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
export function keysRound(lugs: number): number[][] {
  const order = lugOrder(lugs).map((lug) => lug - 1)
  const pairs = Array.from({ length: Math.floor(lugs / 2) }, (_, i) => order.slice(2 * i, 2 * i + 2))
  if (lugs % 2 === 1) pairs.at(-1)?.push(order.at(-1)!)
  return pairs
}
