import { intervalCost, orderCost, tooCloseCost } from './note-cost'
import { noteChoices } from './note-choices'
import type { NoteChoice } from './note-choices'
import { planKey } from './note-plan-key'
import type { PlanKit } from './note-plan-kit'

/** One tom of the graph. A place is a note of this tom together with the lowest pitch so far, on which the kicks depend. */
export type TomLayer = {
  choices: readonly NoteChoice[]
  /** By place: which choice it is, and the lowest pitch of the toms up to it. */
  choiceAt: readonly number[]
  lowestAt: readonly number[]
  /** By choice of the tom before and choice of this one: the key of the step between them. Empty for the first tom. */
  stepKeys: Float64Array
  /** By place of the tom before: where its row of `stepKeys` starts. */
  stepRow: Int32Array
  /** By place of the tom before and choice of this one: the place it leads to, −1 for none. Empty for the first tom. */
  placesFrom: Int32Array
}

/** Every way to note the toms from the smallest to the largest, worked out once for a kit. */
export type TomGraph = readonly TomLayer[]

export function tomGraph(kit: PlanKit): TomGraph {
  const { toms, asked, apartSemitones } = kit
  const choices = toms.map((tom) => noteChoices(kit, tom))
  // While every tom can keep under the next smaller one, no plan out of order can be the best: none is looked at.
  const orderHolds = canFallInOrder(choices)
  const layers: TomLayer[] = []
  choices.forEach((own, i) => {
    const before = layers.at(-1)
    const [from, to] = [asked.get(toms[i - 1]?.id ?? ''), asked.get(toms[i]?.id ?? '')]
    const askedDown = from && to ? [to.whole - from.whole] : []
    layers.push(before ? layerAfter(before, own, orderHolds, stepCost) : firstLayer(own))

    function stepCost(got: number): number {
      return intervalCost(got, askedDown) + orderCost(got) + tooCloseCost(got, apartSemitones)
    }
  })
  return layers
}

function canFallInOrder(choices: readonly (readonly NoteChoice[])[]): boolean {
  let ceiling = Infinity
  for (const each of choices) {
    ceiling = Math.max(...each.map(({ pitch }) => pitch).filter((pitch) => pitch <= ceiling))
    if (ceiling === -Infinity) return false
  }
  return true
}

function firstLayer(choices: readonly NoteChoice[]): TomLayer {
  return {
    ...{ choices, choiceAt: choices.map((_, index) => index), lowestAt: choices.map(({ pitch }) => pitch) },
    ...{ stepKeys: new Float64Array(), stepRow: new Int32Array(), placesFrom: new Int32Array() },
  }
}

function layerAfter(
  before: TomLayer,
  choices: readonly NoteChoice[],
  orderHolds: boolean,
  stepCost: (got: number) => number,
): TomLayer {
  const [choiceAt, lowestAt]: [number[], number[]] = [[], []]
  const stepKeys = new Float64Array(before.choices.length * choices.length)
  before.choices.forEach((from, i) =>
    choices.forEach((to, j) => (stepKeys[i * choices.length + j] = planKey(stepCost(from.pitch - to.pitch), 0))),
  )
  const known = choices.map(() => new Map<number, number>())
  const placesFrom = new Int32Array(before.choiceAt.length * choices.length)
  before.choiceAt.forEach((from, place) => {
    const [abovePitch, lowest] = [before.choices[from]?.pitch ?? 0, before.lowestAt[place] ?? 0]
    choices.forEach(({ pitch }, j) => {
      const at = place * choices.length + j
      placesFrom[at] = orderHolds && pitch > abovePitch ? -1 : placeOf(j, Math.min(lowest, pitch))
    })
  })
  const stepRow = Int32Array.from(before.choiceAt, (choice) => choice * choices.length)
  return { choices, choiceAt, lowestAt, stepKeys, stepRow, placesFrom }

  function placeOf(choice: number, lowest: number): number {
    const there = known[choice]?.get(lowest)
    if (there !== undefined) return there
    known[choice]?.set(lowest, choiceAt.length)
    choiceAt.push(choice)
    return lowestAt.push(lowest) - 1
  }
}
