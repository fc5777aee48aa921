import { deviations, largestDeviation } from './game'
import type { Game } from './game'

/** What both habits are given of the drum, true figures: units a turn moves the turned lug, and a whole round moves the mean. */
export type Gains = { own: number; whole: number }

/** A way to work at a head until it is even. */
export type Habit = (game: Game, gains: Gains) => void

/**
 * Worst lug first: read all, turn the lug that is furthest out by what the true gain says, read again by `again`, and so on
 * until the list is within tolerance; then a whole pass decides. `again`: 'turned' reads the turned lug only and leaves the rest
 * of the list as it was, 'facing' the lug across from it too, 'all' every lug.
 */
export function worstLugFirst(again: 'turned' | 'facing' | 'all'): Habit {
  return (game, gains) => {
    while (!game.over()) {
      const list = readAll(game)
      if (largestDeviation(list, game.against) <= game.tolerance()) {
        game.call()
        continue
      }
      while (!game.over()) {
        const off = deviations(list, game.against)
        const worst = off.reduce((found, value, i) => (Math.abs(value) > Math.abs(off[found] ?? 0) ? i : found), 0)
        if (Math.abs(off[worst] ?? 0) <= game.tolerance()) break
        game.turn(worst + 1, -(off[worst] ?? 0) / gains.own)
        if (again === 'all') list.splice(0, list.length, ...readAll(game))
        else list[worst] = game.read(worst + 1)
        if (again === 'facing') {
          const facing = (worst + Math.floor(game.lugs / 2)) % game.lugs
          list[facing] = game.read(facing + 1)
        }
      }
    }
  }
}

/**
 * Blind full passes: read all, go once round turning every lug that is out by more than `leave` units by its own deviation,
 * read all again. The common part is turned by the whole round's gain, the rest by the lug's own, times `share`.
 */
export function blindPasses({ leave, share }: { leave: number; share: number }): Habit {
  return (game, gains) => {
    while (!game.over()) {
      const list = readAll(game)
      if (largestDeviation(list, game.against) <= game.tolerance()) {
        game.call()
        continue
      }
      const off = deviations(list, game.against)
      const common = off.reduce((sum, value) => sum + value, 0) / off.length
      off.forEach((value, i) => {
        if (Math.abs(value) > leave) game.turn(i + 1, -share * ((value - common) / gains.own + common / gains.whole))
      })
    }
  }
}

function readAll(game: Game): number[] {
  return Array.from({ length: game.lugs }, (_, i) => game.read(i + 1))
}
