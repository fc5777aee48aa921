import { airDensityKgPerM3, soundSpeedMPerS } from '@/lib/acoustics/air'
import { airLoadFactor } from '@/lib/acoustics/air-load'
import { besselJ, besselJZero, besselSlopeZero } from '@/lib/acoustics/bessel-j'
import { coupledHeads, coupledTensionNPerM } from '@/lib/acoustics/coupled-heads'
import { drumModel } from '@/lib/acoustics/drum-model'
import type { Drum } from '@/lib/acoustics/drum-model'
import { drumTuning } from '@/lib/acoustics/drum-tuning'
import type { DrumTuningInput } from '@/lib/acoustics/drum-tuning'
import { explainDrumTuning } from '@/lib/acoustics/explain-drum-tuning'
import { filmArealDensityKgPerM2, filmStressPa, filmThicknessM } from '@/lib/acoustics/film'
import { headCautions } from '@/lib/acoustics/head-cautions'
import { cavityHeadRoot } from '@/lib/acoustics/head-on-cavity'
import type { HeadPair } from '@/lib/acoustics/head-pair'
import { hearingDose, hearingMinutes } from '@/lib/acoustics/hearing'
import { lugTapHz, lugTapTensionNPerM, undampedTapPairHz } from '@/lib/acoustics/lug-tap'
import { idealModeHz, idealTensionNPerM } from '@/lib/acoustics/membrane-mode'
import { beatsPerSecond, centsBetween, nearestNote, noteFrequencyHz, shiftByCents } from '@/lib/acoustics/note'
import { noteName } from '@/lib/acoustics/note-name'
import { openAirDensityKgPerM2 } from '@/lib/acoustics/open-air-head'
import { parsePitch } from '@/lib/acoustics/parse-pitch'
import { requirePitchHz, requireQuantity, requireTensionNPerM, requireWhole } from '@/lib/acoustics/require-quantity'
import { keyTorqueNm, rodPullN } from '@/lib/acoustics/rod'
import { shellAir } from '@/lib/acoustics/shell-air'
import { shellModes } from '@/lib/acoustics/shell-overlap'
import { middleTensionNPerM, rangePosition, requireTensionRange } from '@/lib/acoustics/tension-range'
import { loadedHeadKgPerM2, loadedPair, twoHeadModes } from '@/lib/acoustics/two-head-drum'
import { mostSlackeningNPerM } from '@/lib/acoustics/warm-up'
import { row } from './refusal-table'
import type { Bad } from './refusal-table'

/** Inches and millimetres where metres are asked. */
const DIAMETERS: Bad = ['diameterM', 12, 304.8, 0, -0.3048]
const DEPTHS: Bad = ['depthM', 8, 203.2, 0, -0.2032]
const RADII: Bad = ['radiusM', 6, 152.4, 0, -0.1524]
/** Fahrenheit and kelvin where degrees Celsius are asked. */
const TEMPERATURES: Bad = ['temperatureC', 68, 293.15, -41]
/** A pitch in kHz, none, one under nothing. */
const pitches = (place: string): Bad => [place, 0.147, 0, -147, 50_000]
/** Inches, millimetres and micrometres where mils are asked, no ply, five of them. */
const plies = (place: string): Bad => [place, [0.01], [0.254], [254], [0], [-10], [], [2, 2, 2, 2, 2]]
/** Grams where kilograms are asked. */
const coatings = (place: string): Bad => [place, 40, -0.04]
const ORDERS: Bad = ['m', -1, 0.5, 9]

const tenMil = { plyMils: [10], coatingKgPerM2: 0.04 }
const shell = { diameterM: 0.3048, depthM: 0.2032, temperatureC: 20 }
const FILMS = ['batter', 'resonant'].flatMap((head) => [plies(`${head}.plyMils`), coatings(`${head}.coatingKgPerM2`)])
const SHELLS = [DIAMETERS, DEPTHS, TEMPERATURES]

const pair: HeadPair = {
  ...{ radiusM: 0.1524, depthM: 0.2032, tensionNPerM: [2000, 2500] },
  ...{ massKgPerM2: [0.6, 0.5], crossMassKgPerM2: 0.05 },
}
const PAIRS: Bad[] = [
  ...[RADII, DEPTHS],
  ['massKgPerM2', [0, 0.5], [-0.6, 0.5], [600, 500]],
  // Air that hands over more than it holds.
  ['crossMassKgPerM2', 0.6, -0.6],
]

const drum: Drum = { ...shell, batter: tenMil, resonant: tenMil, relationCents: 100, measuredTapRatio: 1.74 }
const DRUMS: Bad[] = [...SHELLS, ...FILMS, ['relationCents', 1300, -1300], ['measuredTapRatio', 1, 174, 0, -1.74]]
const withoutRatio: Drum = { ...shell, batter: tenMil, resonant: tenMil, relationCents: 100 }

const range = { slackNPerM: 700, chokedNPerM: 4500 }
const RANGES: Bad[] = [
  ['slackNPerM', 4500, 9000, 0, -700],
  ['chokedNPerM', 700, 0, -4500],
]
const input: DrumTuningInput = {
  ...drum,
  ...{ role: 'tom', lugs: 6, noteHz: 147, batter: { ...tenMil, range } },
}
const INPUTS: Bad[] = [
  ...[...DRUMS, pitches('noteHz')],
  ['lugs', 3, 13, 6.5, 0, -6],
  ['batter.range', { slackNPerM: 4500, chokedNPerM: 700 }],
  // A note that would tear the film.
  ['noteHz', 1500],
]

export const acousticsRows = [
  row(
    'noteFrequencyHz',
    ({ referenceHz, ...note }) => noteFrequencyHz(note, referenceHz),
    { semitone: 50, cents: 20, referenceHz: 440 },
    [
      ['semitone', -1, 128, 50.5],
      ['cents', 1201, -1201],
      ['referenceHz', 0, -440, 0.44, 414, 467],
    ],
  ),
  row('nearestNote', ({ hz, referenceHz }) => nearestNote(hz, referenceHz), { hz: 147, referenceHz: 440 }, [
    ['hz', 0, -147, 50_000],
    ['referenceHz', 0, -440, 44],
  ]),
  row('centsBetween', ({ from, to }) => centsBetween(from, to), { from: 440, to: 453 }, [
    ['from', 0, -440],
    ['to', 0, -453],
  ]),
  row('shiftByCents', ({ hz, cents }) => shiftByCents(hz, cents), { hz: 440, cents: 50 }, [
    ['hz', 0, -440],
    ['cents', 12_001, -12_001],
  ]),
  row('beatsPerSecond', ({ first, second }) => beatsPerSecond(first, second), { first: 438, second: 442 }, [
    ['first', 0, -438],
    ['second', 0, -442],
  ]),
  row('noteName', ({ semitone }) => noteName(semitone), { semitone: 69 }, [['semitone', -1, 128, 69.5]]),
  row(
    'parsePitch',
    ({ text, referenceHz }) => parsePitch(text, { referenceHz }),
    { text: 'D3', referenceHz: 440 },
    [
      ['text', '', 'NaN', 'Infinity', '-147', '0', '9', '5001', 'H9', 'D3 +', '12 in', '1e3'],
      ['referenceHz', 0, -440, 0.44],
    ],
    (answer) => answer === null,
  ),
  row('requireQuantity', ({ value }) => requireQuantity('x', value, { min: 1, max: 2, unit: 'm' }), { value: 1.5 }, [
    ['value', 0.9, 2.1, '1.5', null, undefined],
  ]),
  row('requireWhole', ({ value }) => requireWhole('x', value, { min: 1, max: 3, unit: '' }), { value: 2 }, [
    ['value', 1.5, 0, 4],
  ]),
  row('requirePitchHz', ({ hz }) => requirePitchHz('hz', hz), { hz: 147 }, [pitches('hz')]),
  row('requireTensionNPerM', ({ tension }) => requireTensionNPerM(tension), { tension: 2000 }, [
    ['tension', 0, -2000, 2e6],
  ]),
  row('airDensityKgPerM3', ({ temperatureC }) => airDensityKgPerM3(temperatureC), { temperatureC: 20 }, [TEMPERATURES]),
  row('soundSpeedMPerS', ({ temperatureC }) => soundSpeedMPerS(temperatureC), { temperatureC: 20 }, [TEMPERATURES]),
  row('airLoadFactor', ({ m }) => airLoadFactor(m), { m: 1 }, [ORDERS]),
  row('shellModes', ({ m }) => shellModes(m), { m: 1 }, [ORDERS]),
  row('besselJ', ({ order, x }) => besselJ(order, x), { order: 2, x: 3 }, [
    ['order', -1, 1.5, 41],
    ['x', -1, 1e5],
  ]),
  row('besselJZero', ({ order, index }) => besselJZero(order, index), { order: 1, index: 1 }, [
    ['order', -1, 1.5, 21],
    ['index', 0, -1, 1.5, 61],
  ]),
  row('besselSlopeZero', ({ order, index }) => besselSlopeZero(order, index), { order: 1, index: 1 }, [
    ['order', -1, 1.5, 9],
    ['index', 0, -1, 1.5, 61],
  ]),
  row('filmThicknessM', ({ plyMils }) => filmThicknessM(plyMils), { plyMils: [7, 7] }, [plies('plyMils')]),
  row('filmArealDensityKgPerM2', filmArealDensityKgPerM2, tenMil, [plies('plyMils'), coatings('coatingKgPerM2')]),
  row('filmStressPa', ({ tension, plyMils }) => filmStressPa(tension, plyMils), { tension: 2000, plyMils: [10] }, [
    ['tension', -1, 2e6],
    plies('plyMils'),
  ]),
  row(
    'mostSlackeningNPerM',
    ({ plyMils, warmingK }) => mostSlackeningNPerM(plyMils, warmingK),
    { plyMils: [10], warmingK: 10 },
    [plies('plyMils'), ['warmingK', 293.15, -61]],
  ),
  row(
    'idealModeHz',
    ({ mode, head }) => idealModeHz(mode, head),
    {
      mode: { m: 0, n: 1 },
      head: { diameterM: 0.3048, arealDensityKgPerM2: 0.35306, tensionNPerM: 2000 },
    },
    [
      ['mode.m', -1, 0.5, 21],
      ['mode.n', 0, -1, 1.5],
      ['head.diameterM', 12, 304.8, 0, -0.3],
      ['head.arealDensityKgPerM2', 0, -0.35, 353],
      ['head.tensionNPerM', 0, -2000],
    ],
  ),
  row(
    'idealTensionNPerM',
    ({ hz, head }) => idealTensionNPerM({ m: 0, n: 1 }, hz, head),
    {
      hz: 100,
      head: { diameterM: 0.3048, arealDensityKgPerM2: 0.35306 },
    },
    [pitches('hz'), ['head.diameterM', 12, 304.8], ['head.arealDensityKgPerM2', 0, 353]],
  ),
  row(
    'openAirDensityKgPerM2',
    ({ m, ...head }) => openAirDensityKgPerM2(m, head),
    { m: 1, ...tenMil, diameterM: 0.3048, temperatureC: 20 },
    [...[ORDERS, DIAMETERS, TEMPERATURES, plies('plyMils'), coatings('coatingKgPerM2')]],
  ),
  row('shellAir', ({ m, ...of }) => shellAir(m, of), { m: 1, ...shell }, [ORDERS, ...SHELLS]),
  row('loadedHeadKgPerM2', ({ m, film, ...of }) => loadedHeadKgPerM2(m, film, of), { m: 1, film: tenMil, ...shell }, [
    ...[ORDERS, ...SHELLS, plies('film.plyMils'), coatings('film.coatingKgPerM2')],
  ]),
  row('loadedPair', ({ m, ...of }) => loadedPair(m, of), { m: 1, ...shell, batter: tenMil, resonant: tenMil }, [
    ...[ORDERS, ...SHELLS, ...FILMS],
  ]),
  row(
    'twoHeadModes',
    ({ tension, ...of }) => twoHeadModes(of, tension),
    {
      ...shell,
      ...{ batter: tenMil, resonant: tenMil, tension: { batterNPerM: 2000, resonantNPerM: 2500 } },
    },
    [...[...SHELLS, ...FILMS], ['tension.batterNPerM', 0, -2000, 2e6], ['tension.resonantNPerM', 0, -2500, 2e6]],
  ),
  row('coupledHeads', coupledHeads, pair, [...PAIRS, ['tensionNPerM', [0, 2500], [-2000, 2500], [2e6, 2500]]]),
  row('undampedTapPairHz', undampedTapPairHz, pair, [...PAIRS, ['tensionNPerM', [0, 2500], [-2000, 2500]]]),
  row(
    'coupledTensionNPerM',
    ({ hz, ratio, ...of }) => coupledTensionNPerM(hz, ratio, of),
    {
      ...{ hz: 147, ratio: 1.2, radiusM: 0.1524, depthM: 0.2032 },
      ...{ massKgPerM2: [0.6, 0.5] as const, crossMassKgPerM2: 0.05 },
    },
    [...PAIRS, pitches('hz'), ['ratio', 0, -1, 2000]],
  ),
  row(
    'lugTapHz',
    ({ tension, mass, radiusM }) => lugTapHz(tension, mass, radiusM),
    { tension: 2000, mass: 0.6, radiusM: 0.1524 },
    [['tension', 0, -2000], ['mass', 0, -0.6, 600], RADII],
  ),
  row(
    'lugTapTensionNPerM',
    ({ tapHz, mass, radiusM }) => lugTapTensionNPerM(tapHz, mass, radiusM),
    { tapHz: 255, mass: 0.6, radiusM: 0.1524 },
    [pitches('tapHz'), ['mass', 0, -0.6, 600], RADII],
  ),
  row('cavityHeadRoot', ({ b }) => cavityHeadRoot(b), { b: 5 }, [['b', -1, 1e10]]),
  row('drumModel', (of: Drum) => drumModel(of).noteHz(2000), drum, DRUMS),
  ...[
    ...[drum, withoutRatio, { ...withoutRatio, ported: true }].flatMap((of) => {
      const model = drumModel(of)
      return [
        row('drumModel', ({ tension }) => [model.noteHz(tension), model.batterTapHz(tension)], { tension: 2000 }, [
          ['tension', 0, -2000, 2e6],
        ]),
        row('drumModel', ({ hz }) => model.batterNPerM(hz), { hz: 147 }, [pitches('hz')]),
      ]
    }),
  ],
  row('drumTuning', drumTuning, input, INPUTS),
  row('explainDrumTuning', explainDrumTuning, input, INPUTS),
  row('rangePosition', ({ tension, ...of }) => rangePosition(tension, of), { tension: 2000, ...range }, [
    ...[...RANGES],
    ['tension', 0, -2000],
  ]),
  row('middleTensionNPerM', middleTensionNPerM, range, RANGES),
  row('requireTensionRange', requireTensionRange, range, RANGES),
  row(
    'headCautions',
    ({ stress }) => headCautions({ role: 'tom', side: 'batter' }, { zone: 'middle' }, stress),
    { stress: 8e6 },
    [['stress', -8e6]],
  ),
  row(
    'rodPullN',
    ({ tension, diameterM, lugs }) => rodPullN(tension, diameterM, lugs),
    { tension: 2000, diameterM: 0.3048, lugs: 6 },
    [['tension', 0, -2000], DIAMETERS, ['lugs', 3, 13, 6.5, 0, -6]],
  ),
  row('keyTorqueNm', ({ pull }) => keyTorqueNm(pull), { pull: 1000 }, [['pull', -1000, 1e6]]),
  row('hearingMinutes', ({ level }) => hearingMinutes(level), { level: 94 }, [['level', 0, -94, 39, 141]]),
  row('hearingDose', ({ exposures }) => hearingDose(exposures), { exposures: [{ levelDba: 94, minutes: 120 }] }, [
    ['exposures.0.levelDba', 0, 200],
    ['exposures.0.minutes', -1, 1441],
  ]),
]
