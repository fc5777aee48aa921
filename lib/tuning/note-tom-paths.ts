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

function wayOrder(a: Way, b: Way): number {
  return a.key + a.after - b.key - b.after || a.choice.pitch - b.choice.pitch
}

/** The way on to a tom from a place of the tom before (none for the first tom) by its rank, 0 the best; undefined past the last. */
function waysThrough(graph: TomGraph, keys: PathKeys) {
  const after = smallestKeysAfter(graph, keys)
  const known = graph.map(() => new Map<number, { ways: Way[]; best: Way | undefined; sorted: boolean }>())
  return (tom: number, placeBefore = 0, rank: number): Way | undefined => {
    let there = known[tom]?.get(placeBefore)
    if (!there) {
      const layer = graph[tom]
      const ways = layer ? waysOnTo(layer, placeBefore, graph[tom - 1], keys.ofChoice[tom], after[tom]) : []
      const best = ways.reduce<Way | undefined>((so, way) => (so && wayOrder(so, way) <= 0 ? so : way), undefined)
      there = { ways, best, sorted: false }
      known[tom]?.set(placeBefore, there)
    }
    if (rank === 0) return there.best
    if (!there.sorted) there.ways.sort(wayOrder)
    there.sorted = true
    return there.ways[rank]
  }
}

function waysOnTo(
  layer: TomLayer,
  placeBefore: number,
  before: TomLayer | undefined,
  ownKeys: Float64Array | undefined,
  after: Float64Array | undefined,
): Way[] {
  const { choices, placesFrom, stepKeys } = layer
  const firstStep = (before?.choiceAt[placeBefore] ?? 0) * choices.length
  const ways: Way[] = []
  choices.forEach((choice, j) => {
    const place = before ? (placesFrom[placeBefore * choices.length + j] ?? -1) : j
    const keyAfter = place < 0 ? Infinity : (after?.[place] ?? Infinity)
    if (keyAfter === Infinity) return
    const key = (ownKeys?.[j] ?? 0) + (before ? (stepKeys[firstStep + j] ?? 0) : 0)
    ways.push({ choice, place, key, after: keyAfter })
  })
  return ways
}

/** For each place of each tom the smallest key of all that comes after it. */
function smallestKeysAfter(graph: TomGraph, { ofChoice, ofEnd }: PathKeys): Float64Array[] {
  const after = graph.map(({ lowestAt }) => new Float64Array(lowestAt.length).fill(Infinity))
  const last = graph.length - 1
  graph[last]?.lowestAt.forEach((lowest, place) => {
    const own = after[last]
    if (own) own[place] = ofEnd(lowest)
  })
  for (let tom = last - 1; tom >= 0; tom--) {
    const [layer, next, own, ahead, nextKeys] = [
      graph[tom],
      graph[tom + 1],
      after[tom],
      after[tom + 1],
      ofChoice[tom + 1],
    ]
    if (!layer || !next || !own || !ahead || !nextKeys) continue
    const { placesFrom, stepKeys, choices } = next
    const width = choices.length
    for (let place = 0; place < own.length; place++) {
      const firstStep = (layer.choiceAt[place] ?? 0) * width
      let best = Infinity
      for (let j = 0; j < width; j++) {
        const to = placesFrom[place * width + j] ?? -1
        if (to < 0) continue
        const key = (stepKeys[firstStep + j] ?? 0) + (nextKeys[j] ?? 0) + (ahead[to] ?? Infinity)
        if (key < best) best = key
      }
      own[place] = best
    }
  }
  return after
}

/** The smallest key of any path. */
export function smallestPathKey(graph: TomGraph, keys: PathKeys): number {
  const [first] = graph
  if (!first) return keys.ofEnd(null)
  const [after] = smallestKeysAfter(graph, keys)
  return Math.min(...first.choices.map((_, j) => (keys.ofChoice[0]?.[j] ?? 0) + (after?.[j] ?? Infinity)))
}
