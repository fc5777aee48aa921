import { gaugeEvenness } from '@/lib/tuning/evenness-by-gauge'
import { tapEvenness } from '@/lib/tuning/evenness-by-taps'
import { headState } from '@/lib/tuning/head-state'
import { learnHoop } from '@/lib/tuning/hoop-learning'
import { evenLugAngles, lugsFacing } from '@/lib/tuning/lug-angles'
import { lugOrder } from '@/lib/tuning/lug-order'
import * as response from '@/lib/tuning/lug-response'
import { nextMove } from '@/lib/tuning/next-move'
import type { NextMoveInput } from '@/lib/tuning/next-move'
import type { Reading } from '@/lib/tuning/readings'
import { traceOutline } from '@/lib/tuning/trace'
import { observableFromTaps, unevennessOfWarble, warbleHz } from '@/lib/tuning/warble'
import { warbleForecast } from '@/lib/tuning/warble-forecast'
import { row } from './refusal-table'
import type { Bad } from './refusal-table'

const LUGS: Bad = ['lugs', 3, 13, 6.5, 0, -6]

const angles = Array.from({ length: 6 }, (_, i) => (Math.PI * (2 * i + 1)) / 6)
const heights = [252, 251, 249, 252, 251, 249]
/** A head a little uneven, its lugs' labels left out: they are carried along and nothing is worked out from them. */
const read = angles.map((seenRad, i) => ({ seenRad, value: heights[i] ?? 0, trust: 1 }))
const labelled = <Lug extends object>(given: readonly Lug[]) => given.map((each, i) => ({ lug: i + 1, ...each }))
const READ: Bad[] = [
  ['lugs.1.seenRad', 0, -1, 99],
  ['lugs', [], read.slice(0, 3), read.map((each) => ({ ...each, value: null }))],
  ['lugs.0.trust', -0.1, 1.1],
]
const notRead = (answer: unknown) => (answer as { kind: string }).kind !== 'read'

const byTaps = response.lugResponse({ lugs: 6, basis: 'tap' })
const ones = Array.from({ length: 6 }, () => 1)
/** Not one for each lug. */
const WRONG_COUNT: readonly unknown[] = [[], [1, 1, 1], [...ones, 1]]
const GAINS: Bad = ['gain', 0, -700]

const logged = (given: readonly { lug: number; value: number }[]) =>
  given.map((each, i): Reading => ({
    ...each,
    ...{ id: `r${i}`, method: 'tap-typed', unit: 'Hz', deviceId: 'd', deviceSequence: i, deviceAtMs: 0 },
  }))

const log: NextMoveInput['log'] = [
  ...heights.map((value, i) => ({
    ...{ kind: 'reading' as const, lug: i + 1, method: 'tap-typed' as const, unit: 'Hz' as const, value },
  })),
  { kind: 'turn', turns: [{ lug: 1, turns: -0.125 }] },
]
const move: NextMoveInput = {
  ...{
    lugs: 6,
    basis: 'tap',
    target: 250,
    tolerance: 10,
    phase: 'even',
    gaugeUnitsPerCent: 0.03,
    shortWay: false,
    log,
  },
  learned: { hoop: { value: 0.02, low: 0.01, high: 0.05 }, gain: { value: 700, low: 400, high: 1200 } },
}

export const headRows = [
  row(
    'tapEvenness',
    ({ lugs, noiseCents }) => tapEvenness({ lugs: labelled(lugs), noiseCents }),
    { lugs: read, noiseCents: 4 },
    [
      ...READ,
      ['lugs.0.value', 0, -250, 0.25],
      // One lug a third higher than all others: no film in balance sounds so.
      ['lugs', read.map((each, i) => ({ ...each, value: i === 2 ? 315 : 250 }))],
      ['noiseCents', 0, -4],
    ],
    notRead,
  ),
  row(
    'gaugeEvenness',
    ({ lugs, noise, tapHz }) =>
      gaugeEvenness({ lugs: labelled(lugs), noise, film: { tapHz, tensionAt: (reading) => 8 * reading } }),
    { lugs: read, noise: 0.35, tapHz: 255 },
    [...READ, ['lugs.0.value', -1, 1001], ['noise', 0, -1], ['tapHz', 0, -255, 50_000]],
    notRead,
  ),
  row(
    'gaugeEvenness',
    // A calibration gone wrong: the film's part is left out.
    ({ tension }) =>
      gaugeEvenness({ lugs: labelled(read), film: { tapHz: 255, tensionAt: (reading) => tension * reading } }),
    { tension: 8 },
    [['tension', 0, -8]],
    (answer) => (answer as { film: unknown }).film === null,
  ),
  row(
    'warbleForecast',
    ({ side, lugs }) => warbleForecast({ role: 'snare', side, evenness: tapEvenness({ lugs: labelled(lugs) }) }),
    { side: 'batter' as 'batter' | 'resonant', lugs: read },
    // Snare beds: no advice.
    [['side', 'resonant'], ...READ],
    (answer) => !('beatsPerS' in (answer as object)),
  ),
  row('warbleHz', ({ unevenness, tapHz }) => warbleHz(unevenness, tapHz), { unevenness: 0.02, tapHz: 300 }, [
    ['unevenness', -0.1, 1.1],
    ['tapHz', 0, -300],
  ]),
  row('unevennessOfWarble', ({ warble, tapHz }) => unevennessOfWarble(warble, tapHz), { warble: 3, tapHz: 300 }, [
    ['warble', -3, 301],
    ['tapHz', 0, -300],
  ]),
  row('observableFromTaps', ({ lugs }) => observableFromTaps(lugs), { lugs: 6 }, [LUGS]),

  row('edgeStiffness', ({ k, ratio }) => response.edgeStiffness(k, ratio), { k: 2, ratio: 0.38 }, [
    ['k', -1, 1.5, 401],
    ['ratio', -0.1, 0.6, 38],
  ]),
  row(
    'lugResponse',
    ({ lugs, hoop }) => response.lugResponse({ lugs, basis: 'gauge', hoop }),
    { lugs: 6, hoop: 0.02 },
    [LUGS, ['hoop', 0, -0.02, 2]],
  ),
  row('readingChanges', ({ turns, gain }) => response.readingChanges(byTaps, turns, gain), { turns: ones, gain: 700 }, [
    ['turns', ...WRONG_COUNT],
    GAINS,
  ]),
  row(
    'predictReadings',
    (of: { readings: number[]; turns: number[]; gain: number }) => response.predictReadings(byTaps, of),
    { readings: ones, turns: ones, gain: 700 },
    [['readings', ...WRONG_COUNT], ['turns', ...WRONG_COUNT], GAINS],
  ),
  row(
    'turnsFor',
    (of: { change: number[]; gain: number; floor: number }) => response.turnsFor(byTaps, of),
    { change: ones, gain: 700, floor: 0.05 },
    [['change', ...WRONG_COUNT], GAINS, ['floor', 0, -1, 2]],
  ),
  row('requireEvenLugs', ({ seen }) => response.requireEvenLugs(seen), { seen: angles }, [
    ['seen', [], [0, 1, 2], [0, 1, 2, 3, 4, 5.9]],
  ]),
  row(
    'learnHoop',
    (of: Omit<Parameters<typeof learnHoop>[0], 'basis'>) => learnHoop({ basis: 'gauge', ...of }),
    {
      ...{ lugs: 6, noise: 0.35, handError: 0.2 },
      moves: [{ turns: [0.25, 0, 0, 0, 0, 0], before: ones.map(() => 70), after: [75, 70, 70, 70, 70, 70] }],
      prior: { hoop: { median: 0.02, spread: 1.2 }, gain: { median: 20, spread: 0.7 } },
    },
    [
      LUGS,
      ['noise', 0, -0.35],
      ['handError', -0.1, 1.1],
      ['prior.gain.median', 0, -20],
      ['prior.hoop.spread', 0, -1],
      ...['turns', 'before', 'after'].map((list): Bad => [`moves.0.${list}`, ...WRONG_COUNT]),
    ],
  ),

  row('lugOrder', ({ lugs }) => lugOrder(lugs), { lugs: 6 }, [LUGS]),
  row('evenLugAngles', ({ lugs }) => evenLugAngles(lugs), { lugs: 6 }, [LUGS]),
  row('lugsFacing', ({ seen }) => lugsFacing('batter', seen), { seen: angles }, [
    ['seen', [], [0, 1, 2], [0, 0, 1, 2, 3]],
  ]),
  row(
    'traceOutline',
    ({ lugs, radiusPerUnit }) => traceOutline(labelled(lugs), { radiusPerUnit }),
    { lugs: angles.map((seenRad) => ({ seenRad, deviation: 2 })), radiusPerUnit: 0.01 },
    [
      ['lugs', [], angles.slice(0, 2).map((seenRad) => ({ seenRad, deviation: 2 }))],
      ['radiusPerUnit', -1],
    ],
  ),
  row(
    'headState',
    ({ readings, ...of }) => headState({ ...of, basis: 'tap', readings: logged(readings) }),
    { lugs: 6, targetHz: 250, tolerance: 10, readings: heights.map((value, i) => ({ lug: i + 1, value })) },
    [
      LUGS,
      ['tolerance', -1, 601],
      ['targetHz', 0, -250, 0.25],
      ['readings.0.lug', 0, 7, 1.5],
      ['readings.0.value', 0, -250, 0.25],
    ],
  ),
  row(
    'nextMove',
    nextMove,
    move,
    [
      LUGS,
      ['target', 0, -250, 0.25],
      ['tolerance', 0, -10, 601],
      ['gaugeUnitsPerCent', 0, -1],
      ['learned.gain', { value: 700, low: 1200, high: 400 }],
      ['log.0.lug', 0, 7, 1.5],
      ['log.0.value', 0, -250, 0.25],
      ['log.0.unit', 'gauge'],
      ['log.6.turns', [{ lug: 7, turns: 0.25 }], [{ lug: 1, turns: 3 }]],
      // Two readings of one lug, a third apart, nothing turned between.
      ['log', [...log.slice(0, 6), { ...log[0], value: 315 }]],
    ],
    (answer) => (answer as { kind: string }).kind === 'not-sure',
  ),
]
