import type { Note } from '@/lib/acoustics/note'
import { cheapestChoice, noteChoices } from './note-choices'
import type { NoteChoice } from './note-choices'
import { sharedNameCost, tooCloseCost } from './note-cost'
import { kicksAlone, kicksBeside } from './note-kick-search'
import type { KickSearch } from './note-kick-search'
import { insertInOrder, lowerNotesFirst, planKey } from './note-plan-key'
import { pitchOf } from './note-plan-kit'
import type { PlanKit } from './note-plan-kit'
import type { PlanDrum } from './note-plan-model'
import { tomGraph } from './note-tom-graph'
import type { TomGraph } from './note-tom-graph'
import { smallestPathKey, tomPaths } from './note-tom-paths'
import type { TomPath } from './note-tom-paths'

/** Snares that are planned together with the toms: any that are locked, and so many more. */
const PLANNED_SNARES = 2

/** A note for every drum of a kit. */
export type FoundPlan = {
  notes: ReadonlyMap<string, Note>
  /** See `planKey`: the cost of all that is planned together, and how far the toms lie from the middles of their ranges. */
  key: number
  /** From the smallest to the largest. */
  tomPitches: readonly number[]
}

/**
 * For every way to note the toms the cheapest plan, the best of all first. Exact: with the snares' notes given, toms and kicks are a
 * chain that `tomPaths` solves; the snares' own costs plus the least that the toms can cost tell when no other notes of theirs
 * need be looked at. Snares beyond the second are not planned together: each takes the best note that is left.
 * Ties: nearest to the middle (toms, then kicks and snares), then lower notes first.
 */
export function* plansInOrder(kit: PlanKit): Generator<FoundPlan> {
  const graph = tomGraph(kit)
  const beside = besideSnares(kit, graph)
  const alone = kicksAlone(kit)
  const least = smallestPathKey(graph, {
    ofChoice: beside([]),
    ofEnd: (lowest) => planKey(alone(lowest).cost, 0),
  })
  const unopened = snareSets(kit)
  const open: Stream[] = []
  const given = new Set<string>()
  for (;;) {
    const [cheapest, first] = [unopened[0], open[0]]
    if (cheapest && (!first || least + planKey(cheapest.cost, 0) <= first.plan.key)) {
      unopened.shift()
      advance({ snares: cheapest, ...pathsBeside(cheapest) })
      continue
    }
    const stream = open.shift()
    if (!stream) return
    const toms = stream.plan.tomPitches.join(' ')
    if (!given.has(toms)) {
      given.add(toms)
      yield foundPlan(kit, stream.plan)
    }
    advance(stream)
  }

  function pathsBeside({ choices }: SnareSet): Pick<Stream, 'kicks' | 'paths'> {
    const pitches = choices.map(({ pitch }) => pitch)
    const kicks = kicksBeside(kit, pitches, alone)
    const keys = { ofChoice: beside(pitches), ofEnd: (lowest: number | null) => planKey(kicks(lowest).cost, 0) }
    return { kicks, paths: tomPaths(graph, keys) }
  }

  function advance(stream: Omit<Stream, 'plan'>) {
    const next = stream.paths.next()
    if (next.done) return
    insertInOrder(open, { ...stream, plan: planOf(next.value, stream) }, (a, b) => planOrder(a.plan, b.plan))
  }
}

/** Notes of the snares that are planned together. */
type SnareSet = { choices: readonly NoteChoice[]; cost: number }

/** All plans with one set of snare notes, the best first; `plan` is the next of them. */
type Stream = { snares: SnareSet; paths: Generator<TomPath>; kicks: KickSearch; plan: PlanInOrder }

type PlanInOrder = Pick<FoundPlan, 'key' | 'tomPitches'> & {
  /** Of toms, kicks and the snares that are planned together. */
  choices: readonly NoteChoice[]
  kickAndSnarePitches: readonly number[]
  /** Of kicks and snares, cents. */
  fromCentre: number
}

function planOrder(a: PlanInOrder, b: PlanInOrder): number {
  return (
    a.key - b.key ||
    lowerNotesFirst(a.tomPitches, b.tomPitches) ||
    a.fromCentre - b.fromCentre ||
    lowerNotesFirst(a.kickAndSnarePitches, b.kickAndSnarePitches)
  )
}

function plannedSnares({ snares, fixed }: PlanKit): { together: PlanDrum[]; spare: PlanDrum[] } {
  const free = snares.filter(({ id }) => !fixed.has(id))
  const spare = free.slice(PLANNED_SNARES)
  return { together: snares.filter((snare) => !spare.includes(snare)), spare }
}

/** Every set of notes for those snares, the cheapest by their own ranges first. */
function snareSets(kit: PlanKit): SnareSet[] {
  const start: SnareSet[] = [{ choices: [], cost: 0 }]
  const sets = plannedSnares(kit).together.reduce((before, snare) => {
    const choices = noteChoices(kit, snare)
    return before.flatMap((set) =>
      choices.map((choice) => ({ choices: [...set.choices, choice], cost: set.cost + choice.cost })),
    )
  }, start)
  return sets.sort((a, b) => a.cost - b.cost)
}

/** The keys of the toms' notes beside snares at given pitches. */
function besideSnares(kit: PlanKit, graph: TomGraph): (snarePitches: readonly number[]) => Float64Array[] {
  const own = graph.map(({ choices }) =>
    Float64Array.from(choices, ({ cost, fromCentre }) => planKey(cost, fromCentre)),
  )
  const known = new Map<number, Float64Array[]>()
  const added = (snare: number) => {
    const there = known.get(snare)
    if (there) return there
    const keys = graph.map(
      ({ choices }) => new Float64Array(choices.map(({ pitch }) => planKey(besideTom(snare, pitch, kit), 0))),
    )
    known.set(snare, keys)
    return keys
  }
  return (snarePitches) => {
    const all = snarePitches.map(added)
    return own.map((keys, tom) => {
      const sums = keys.slice()
      for (const more of all) {
        const add = more[tom]
        for (let j = 0; j < sums.length; j++) sums[j] = (sums[j] ?? 0) + (add?.[j] ?? 0)
      }
      return sums
    })
  }
}

function besideTom(snarePitch: number, tomPitch: number, { apartSemitones }: PlanKit): number {
  return tooCloseCost(snarePitch - tomPitch, apartSemitones) + sharedNameCost(snarePitch, tomPitch)
}

function planOf(path: TomPath, { snares, kicks }: Omit<Stream, 'plan'>): PlanInOrder {
  const lowest = path.pitches.length === 0 ? null : Math.min(...path.pitches)
  const others = [...kicks(lowest).choices, ...snares.choices]
  return {
    choices: [...path.choices, ...others],
    key: path.key + planKey(snares.cost, 0),
    tomPitches: path.pitches,
    kickAndSnarePitches: others.map(({ pitch }) => pitch),
    fromCentre: others.reduce((sum, { fromCentre }) => sum + fromCentre, 0),
  }
}

/** The plan by drum, with the best note that is left for each further snare. */
function foundPlan(kit: PlanKit, { choices, key, tomPitches }: PlanInOrder): FoundPlan {
  const { together, spare } = plannedSnares(kit)
  const drums = [...kit.toms, ...kit.kicks, ...together]
  const notes = new Map(drums.flatMap(({ id }, i) => (choices[i] ? [[id, choices[i].note] as const] : [])))
  const kickPitches = kit.kicks.flatMap(({ id }) => notes.get(id) ?? []).map(pitchOf)
  for (const snare of spare) {
    const { choice } = cheapestChoice(noteChoices(kit, snare), ({ pitch }) => {
      const besideKicks = kickPitches.reduce((sum, kick) => sum + tooCloseCost(pitch - kick, kit.apartSemitones), 0)
      return tomPitches.reduce((sum, tom) => sum + besideTom(pitch, tom, kit), besideKicks)
    })
    notes.set(snare.id, choice.note)
  }
  return { notes, key, tomPitches }
}
