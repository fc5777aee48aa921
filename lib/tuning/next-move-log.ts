import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { centsBetween, shiftByCents } from '@/lib/acoustics/note'
import { requirePitchHz, requireQuantity, requireWhole } from '@/lib/acoustics/require-quantity'
import type { ReadingBasis } from './head-state'
import type { ReadingMethod, ReadingUnit } from './readings'

/** What happened at a head, in the order in which it happened. */
export type HeadEvent =
  | {
      kind: 'reading'
      /** 1-based. */
      lug: number
      method: ReadingMethod
      unit: ReadingUnit
      /** Hz, cents from the target, or gauge units; null where the lug was tried and gave no reading. */
      value: number | null
      /** Marked as uncertain by whoever or whatever read it: counts, but weakly. */
      doubtful?: boolean
      /** Struck by a later one: does not count. */
      struck?: boolean
    }
  | {
      kind: 'turn'
      /** Whole turns of the key, tighter positive, each up to two; several lugs are one move. */
      turns: readonly { lug: number; turns: number }[]
    }

/** One deviation of a reading: gauge units (common practice), cents (from memory). */
export const READING_NOISE: Readonly<Record<ReadingMethod, number>> = { gauge: 0.35, 'tap-typed': 5, 'tap-heard': 3 }
const DOUBTFUL_FACTOR = 3
/** Deviations by which two readings of one untouched lug may differ before they contradict each other. */
const CONTRADICTORY = 4.5

/** One reading or turn as the belief takes it in; lugs 0-based, heights in cents or gauge units, turns lug by lug. */
export type CleanEvent =
  | { kind: 'read'; lug: number; value: number; noise: number; doubtful: boolean }
  | { kind: 'turn'; turns: readonly number[] }

export type CleanLog = {
  events: CleanEvent[]
  /** Lugs (0-based) of which two readings contradict each other with nothing turned between, and no third to decide. */
  contradictory: number[]
  /** Times each lug was tried in vain since it was last read or turned. */
  missed: number[]
  /** A height (cents or gauge units) as a reading: Hz where taps were in Hz or have a target. */
  asReading: (height: number) => number
  /** The target as a height, or null. */
  target: number | null
}

/**
 * The readings of one basis, and all turns, on one scale of heights. Readings of the other basis are left out: the two never mix.
 * Where three or more readings of a lug with nothing turned between disagree, the larger party of like ones counts.
 * @throws AcousticsError naming `lug`, `value`, `unit`, `target` or `turns`
 */
export function cleanLog(
  log: readonly HeadEvent[],
  { lugs, basis, target }: { lugs: number; basis: ReadingBasis; target: number | null },
): CleanLog {
  if (target !== null) {
    if (basis === 'tap') requirePitchHz('target', target)
    else requireQuantity('target', target, { min: 0, max: 1000, unit: 'gauge units' })
  }
  const scale = scaleOf(log, basis, target)
  const events: CleanEvent[] = []
  const contradictory = new Set<number>()
  const missed = Array.from({ length: lugs }, () => 0)
  let still: Extract<CleanEvent, { kind: 'read' }>[] = []
  const settle = () => {
    for (let lug = 0; lug < lugs; lug++) {
      const readings = still.filter((reading) => reading.lug === lug)
      const agreed = largestParty(readings)
      if (readings.length > 1 && agreed.length * 2 <= readings.length) contradictory.add(lug)
      still = still.filter((reading) => reading.lug !== lug || agreed.includes(reading))
    }
    events.push(...still)
    still = []
  }
  for (const event of log) {
    if (event.kind === 'turn') {
      settle()
      const turns = turnsByLug(event.turns, lugs)
      turns.forEach((turned, lug) => {
        if (turned !== 0) contradictory.delete(lug)
        if (turned !== 0) missed[lug] = 0
      })
      if (turns.some((turned) => turned !== 0)) events.push({ kind: 'turn', turns })
      continue
    }
    const lug = requireWhole('lug', event.lug, { min: 1, max: lugs, unit: '' }) - 1
    if (event.struck === true || (event.method === 'gauge') !== (basis === 'gauge')) continue
    if (event.value === null) {
      missed[lug]!++
      continue
    }
    missed[lug] = 0
    contradictory.delete(lug)
    const doubtful = event.doubtful === true
    const noise = READING_NOISE[event.method] * (doubtful ? DOUBTFUL_FACTOR : 1)
    still.push({ kind: 'read', lug, value: scale.heightOf(event.unit, event.value), noise, doubtful })
  }
  settle()
  return {
    events,
    contradictory: [...contradictory].sort((a, b) => a - b),
    missed,
    asReading: scale.asReading,
    target: target === null ? null : scale.heightOf(basis === 'tap' ? 'Hz' : 'gauge', target),
  }
}

/** The most readings that all agree with one of them; of equally many, the later. */
function largestParty<R extends { value: number; noise: number }>(readings: readonly R[]): R[] {
  return readings
    .map((one) =>
      readings.filter(
        (other) => Math.abs(one.value - other.value) <= CONTRADICTORY * Math.hypot(one.noise, other.noise),
      ),
    )
    .reduce<R[]>((most, party) => (party.length >= most.length ? party : most), [])
}

function turnsByLug(turns: readonly { lug: number; turns: number }[], lugs: number): number[] {
  const byLug = Array.from({ length: lugs }, () => 0)
  for (const { lug, turns: turned } of turns) {
    const i = requireWhole('lug', lug, { min: 1, max: lugs, unit: '' }) - 1
    byLug[i]! += requireQuantity('turns', turned, { min: -2, max: 2, unit: 'turns' })
  }
  return byLug
}

/** Where heights of taps count from without a target; any pitch would do, since only differences are then used. */
const NO_TARGET_ZERO_HZ = 100

function scaleOf(log: readonly HeadEvent[], basis: ReadingBasis, target: number | null) {
  if (basis === 'gauge') {
    return {
      heightOf: (unit: ReadingUnit, value: number) => {
        if (unit !== 'gauge') throw new AcousticsError('unit', `A gauge reading cannot be in ${unit}.`)
        return requireQuantity('value', value, { min: 0, max: 1000, unit: 'gauge units' })
      },
      asReading: (height: number) => height,
    }
  }
  const units = new Set(
    log.flatMap((event) => (event.kind === 'reading' && event.method !== 'gauge' ? [event.unit] : [])),
  )
  if (target === null && units.has('cents') && units.has('Hz')) {
    throw new AcousticsError(
      'unit',
      'Readings in cents and in Hz stand side by side: a target pitch is needed to compare them.',
    )
  }
  const zeroHz = target ?? NO_TARGET_ZERO_HZ
  const onlyCents = target === null && units.has('cents')
  return {
    heightOf: (unit: ReadingUnit, value: number) => {
      if (unit === 'gauge') throw new AcousticsError('unit', 'A tap cannot be in gauge units.')
      return unit === 'cents'
        ? requireQuantity('value', value, { min: -2400, max: 2400, unit: 'cents' })
        : centsBetween(zeroHz, requirePitchHz('value', value))
    },
    asReading: (height: number) => (onlyCents ? height : shiftByCents(zeroHz, height)),
  }
}
