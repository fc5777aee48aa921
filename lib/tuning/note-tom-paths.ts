import type { NoteChoice } from './note-choices'
import { insertInOrder, lowerNotesFirst } from './note-plan-key'
import type { TomGraph, TomLayer } from './note-tom-graph'

/** Notes for all toms, from the smallest to the largest. */
export type TomPath = { choices: readonly NoteChoice[]; pitches: readonly number[]; key: number }

/** What a question adds to the graph: the key of each choice of each tom, and of what follows the lowest tom's pitch (null without toms). */
export type PathKeys = { ofChoice: readonly Float64Array[]; ofEnd: (lowestPitch: number | null) => number }

/**
 * All ways to note the toms, the smallest key first, ties by lower notes first. Exact: dynamic programming from the largest tom
 * back, so that each place knows its best way on; then each further path is the best of those that leave an earlier one
 * at some tom (E. L. Lawler, Management Science 18, 1972).
 */
export function* tomPaths(graph: TomGraph, keys: PathKeys): Generator<TomPath> {
  const ways = waysThrough(graph, keys)
  const waiting = [pathBy([], 0)]
  for (let path = waiting.shift(); path; path = waiting.shift()) {
    yield path
    for (let tom = path.leftAt; tom < graph.length; tom++) {
      const nextRank = (path.ranks[tom] ?? 0) + 1
      if (!ways(tom, path.places[tom - 1], nextRank)) continue
      insertInOrder(waiting, pathBy([...path.ranks.slice(0, tom), nextRank], tom), pathOrder)
    }
  }

  /** By the given ranks as far as they go, then the best way on. */
  function pathBy(ranks: number[], leftAt: number): RankedPath {
    const path: RankedPath = { choices: [], pitches: [], key: 0, ranks, places: [], leftAt }
    let after = graph.length === 0 ? keys.ofEnd(null) : 0
    for (let tom = 0; tom < graph.length; tom++) {
      const way = ways(tom, path.places[tom - 1], (ranks[tom] ??= 0))
      if (!way) throw new Error('a path ends before the last tom')
      path.choices.push(way.choice)
      path.pitches.push(way.choice.pitch)
      path.places.push(way.place)
      path.key += way.key
      after = way.after
    }
    path.key += after
    return path
  }
}

/** A path with the rank of each of its ways among those from where it stood; it leaves another path at one tom. */
type RankedPath = {
  choices: NoteChoice[]
  pitches: number[]
  key: number
  ranks: number[]
  places: number[]
  leftAt: number
}

function pathOrder(a: RankedPath, b: RankedPath): number {
  return a.key - b.key || lowerNotesFirst(a.pitches, b.pitches)
}

/** A way on to a tom's note. `after`: the smallest key from there to the end. */
type Way = { choice: NoteChoice; place: number; key: number; after: number }

/** The way on to a tom from a place of the tom before (none for the first tom) by its rank, 0 the best; undefined past the last. */
function waysThrough(graph: TomGraph, keys: PathKeys) {
  const after = smallestKeysAfter(graph, keys)
  const sorted = graph.map(() => new Map<number, Way[]>())
  return (tom: number, placeBefore = 0, rank: number): Way | undefined => {
    const layer = graph[tom]
    const ownKeys = keys.ofChoice[tom]
    const keysAfter = after[tom]
    if (!layer || !ownKeys || !keysAfter) return undefined
    const there = sorted[tom]?.get(placeBefore)
    if (there) return there[rank]
    if (rank === 0) return bestWay(layer, placeBefore, ownKeys, keysAfter)
    const ways: Way[] = []
    for (let index = 0; index < layer.choices.length; index++) {
      const way = wayTo(layer, placeBefore, index, ownKeys, keysAfter)
      if (way) ways.push(way)
    }
    ways.sort((a, b) => a.key + a.after - b.key - b.after || a.choice.pitch - b.choice.pitch)
    sorted[tom]?.set(placeBefore, ways)
    return ways[rank]
  }
}

/** Of equal ones the lowest, as choices go from the lowest up. */
function bestWay(layer: TomLayer, placeBefore: number, ownKeys: Float64Array, keysAfter: Float64Array) {
  const { choices, placesFrom, stepKeys, stepRow } = layer
  const first = stepRow.length === 0
  const row = stepRow[placeBefore] ?? 0
  const placeRow = placeBefore * choices.length
  let best = Infinity
  let bestIndex = -1
  for (let index = 0; index < choices.length; index++) {
    const place = first ? index : (placesFrom[placeRow + index] ?? -1)
    // As in `smallestFrom`: past the first that is out of order all are.
    if (place < 0) break
    const key = (ownKeys[index] ?? 0) + (first ? 0 : (stepKeys[row + index] ?? 0)) + (keysAfter[place] ?? Infinity)
    if (key >= best) continue
    best = key
    bestIndex = index
  }
  return wayTo(layer, placeBefore, bestIndex, ownKeys, keysAfter)
}

function wayTo(
  { choices, placesFrom, stepKeys, stepRow }: TomLayer,
  placeBefore: number,
  index: number,
  ownKeys: Float64Array,
  keysAfter: Float64Array,
): Way | undefined {
  const first = stepRow.length === 0
  const place = first ? index : (placesFrom[placeBefore * choices.length + index] ?? -1)
  const [choice, after] = [choices[index], keysAfter[place] ?? Infinity]
  if (!choice || after === Infinity) return undefined
  const step = first ? 0 : (stepKeys[(stepRow[placeBefore] ?? 0) + index] ?? 0)
  return { choice, place, key: (ownKeys[index] ?? 0) + step, after }
}

/** For each place of each tom the smallest key of all that comes after it. */
function smallestKeysAfter(graph: TomGraph, { ofChoice, ofEnd }: PathKeys): Float64Array[] {
  const after: Float64Array[] = []
  const last = graph.length - 1
  for (let tom = last; tom >= 0; tom--) {
    const [layer, next, nextOwn, nextAfter] = [graph[tom], graph[tom + 1], ofChoice[tom + 1], after[tom + 1]]
    if (!layer) continue
    after[tom] =
      next && nextOwn && nextAfter
        ? smallestFrom(layer.lowestAt.length, next, nextOwn, nextAfter)
        : new Float64Array(layer.lowestAt.map(ofEnd))
  }
  return after
}

/** The loop that planning spends its time in: plain numbers only. */
function smallestFrom(
  places: number,
  { choices, placesFrom, stepKeys, stepRow }: TomLayer,
  ownKeys: Float64Array,
  keysAfter: Float64Array,
): Float64Array {
  const width = choices.length
  const smallest = new Float64Array(places)
  for (let place = 0; place < places; place++) {
    const row = stepRow[place] ?? 0
    const placeRow = place * width
    let best = Infinity
    for (let j = 0; j < width; j++) {
      const to = placesFrom[placeRow + j] ?? -1
      // Choices go from the lowest up: past the first that is out of order all are.
      if (to < 0) break
      const key = (stepKeys[row + j] ?? 0) + (ownKeys[j] ?? 0) + (keysAfter[to] ?? Infinity)
      if (key < best) best = key
    }
    smallest[place] = best
  }
  return smallest
}

/** The smallest key of any path. */
export function smallestPathKey(graph: TomGraph, keys: PathKeys): number {
  const [first] = graph
  if (!first) return keys.ofEnd(null)
  const [after] = smallestKeysAfter(graph, keys)
  return Math.min(...first.choices.map((_, j) => (keys.ofChoice[0]?.[j] ?? 0) + (after?.[j] ?? Infinity)))
}
