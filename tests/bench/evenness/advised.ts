import type { HeadEvent } from '@/lib/tuning/next-move-log'
import type { KnownResponse } from '@/lib/tuning/next-move-response'
import type { NextMove } from '@/lib/tuning/next-move-step'
import { nextMove } from '@/lib/tuning/next-move'
import type { Against, Game } from './game'
import { WANTED_READING } from './true-drum'

/** Does what the advice says, step by step, until the head is even. `learned`: what it is told of the head beforehand. */
export function followAdvice(game: Game, learned: KnownResponse | null): void {
  const log: HeadEvent[] = []
  const read = (lug: number) => log.push(gaugeReading(lug, game.read(lug)))
  const { lugs, against } = game
  while (!game.over()) {
    const step = advise(log, { lugs, against, tolerance: game.tolerance(), learned })
    if (step.kind === 'done') {
      game.call()
      if (!game.over()) for (let lug = 1; lug <= lugs; lug++) read(lug)
    } else if (step.reason === 'no-progress') {
      game.giveUp()
    } else if (step.turns.length > 0) {
      for (const { lug, turns } of step.turns) game.turn(lug, turns)
      log.push({ kind: 'turn', turns: step.turns })
    } else {
      for (const lug of step.lugs) read(lug)
    }
  }
}

export function advise(
  log: readonly HeadEvent[],
  {
    lugs,
    against,
    tolerance,
    learned,
  }: { lugs: number; against: Against; tolerance: number; learned: KnownResponse | null },
): NextMove {
  return nextMove({
    lugs,
    basis: 'gauge',
    log,
    target: against === 'target' ? WANTED_READING : null,
    tolerance,
    phase: 'even',
    learned,
    gaugeUnitsPerCent: null,
    shortWay: false,
  })
}

export function gaugeReading(lug: number, value: number): HeadEvent {
  return { kind: 'reading', lug, method: 'gauge', unit: 'gauge', value }
}
