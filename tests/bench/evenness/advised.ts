import type { HeadEvent } from '@/lib/tuning/next-move-log'
import type { KnownResponse } from '@/lib/tuning/next-move-response'
import { nextMove } from '@/lib/tuning/next-move'
import type { Game } from './game'
import { WANTED_READING } from './true-drum'

/** Does what the advice says, step by step, until the head is even. `learned`: what it is told of the head beforehand. */
export function followAdvice(game: Game, learned: KnownResponse | null): void {
  const log: HeadEvent[] = []
  const read = (lug: number) =>
    log.push({ kind: 'reading', lug, method: 'gauge', unit: 'gauge', value: game.read(lug) })
  while (!game.over()) {
    const step = nextMove({
      lugs: game.lugs,
      basis: 'gauge',
      log,
      target: game.against === 'target' ? WANTED_READING : null,
      tolerance: game.tolerance(),
      phase: 'even',
      learned,
      gaugeUnitsPerCent: null,
      shortWay: false,
    })
    if (step.kind === 'done') {
      game.call()
      if (!game.over()) for (let lug = 1; lug <= game.lugs; lug++) read(lug)
    } else if (step.turns.length > 0) {
      for (const { lug, turns } of step.turns) game.turn(lug, turns)
      log.push({ kind: 'turn', turns: step.turns })
    } else {
      for (const lug of step.lugs) read(lug)
    }
  }
}
