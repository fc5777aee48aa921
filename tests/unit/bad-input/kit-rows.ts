import { drumEstimate } from '@/lib/tuning/drum-estimate'
import type { TradeDrum } from '@/lib/tuning/drum-estimate'
import { headRelationWords, intervalName } from '@/lib/tuning/interval-name'
import { measuredTapRatio } from '@/lib/tuning/measured-tap-ratio'
import { judgePlan } from '@/lib/tuning/note-judge'
import { costOfMoving } from '@/lib/tuning/note-moves'
import { planNotes } from '@/lib/tuning/note-plan'
import type { NotePlanInput } from '@/lib/tuning/note-plan-model'
import { requireTemplate } from '@/lib/tuning/note-template'
import { planDrumOf } from '@/lib/tuning/plan-drum'
import { playableRange } from '@/lib/tuning/playable-range'
import { parseReading } from '@/lib/tuning/reading-limits'
import { row } from './refusal-table'
import type { Bad } from './refusal-table'

/** Metres and millimetres where inches are asked. */
export const SIZES: Bad[] = [
  ['diameterIn', 0.3048, 304.8, 0, -12],
  ['depthIn', 0.2032, 203.2, 0, -8],
]
/** Inches, millimetres and micrometres where mils are asked, no ply, five of them. */
export const PLIES: readonly unknown[] = [[0.01], [0.254], [254], [0], [-10], [], [3, 3, 3, 3, 3]]

const head = { plyMils: [10], coatingGPerM2: 40 }
const range = { slackNPerM: 700, chokedNPerM: 4500 }
/** What a drum's pitch hangs on. */
const pitched = {
  ...{ role: 'tom' as const, diameterIn: 12, depthIn: 8, ported: false, batter: { ...head, range }, resonant: head },
  ...{ headRelationCents: 100, measuredTapRatio: 1.74 },
}
const drum: TradeDrum = { ...pitched, lugs: 6, note: { semitone: 50, cents: 0 } }
const PITCHED: Bad[] = [
  ...SIZES,
  ['batter.plyMils', ...PLIES],
  ['resonant.plyMils', ...PLIES],
  ['batter.coatingGPerM2', -40, 4000],
  ['batter.range', { slackNPerM: 4500, chokedNPerM: 700 }, { slackNPerM: 0, chokedNPerM: 700 }],
  ['headRelationCents', 1300, -1300],
  ['measuredTapRatio', 0, 1, 174],
]
const TEMPERATURES: Bad = ['temperatureC', 68, 293.15]

const plan: NotePlanInput = {
  template: {
    ...{ id: 't', name: 'Fourths', steps: { kind: 'per-inch', semitonesPerInch: 2.5 } },
    ...{ resonantCents: 0, kickBelowLowestTom: [5, 7, 12] },
  },
  drums: [10, 12, 14].map((diameterIn, i) => {
    const low = 44 - 4 * i
    return {
      ...{ id: `tom${diameterIn}`, name: `Tom ${diameterIn}`, role: 'tom' as const, diameterIn, tension: range },
      range: { low, middleLow: low + 5, middleHigh: low + 10, high: low + 15 },
    }
  }),
  ...{ anchor: { drumId: 'tom12', note: { semitone: 48, cents: 0 } }, apartSemitones: 2 },
}
const PLANS: Bad[] = [
  ['drums', [], [plan.drums[0], plan.drums[0]]],
  ['drums.0.diameterIn', 0.254, 254, 0, -10],
  ['drums.0.range', { low: 59, middleLow: 54, middleHigh: 49, high: 44 }],
  ['drums.0.tension', { slackNPerM: 4500, chokedNPerM: 700 }, { slackNPerM: -1, chokedNPerM: 700 }],
  ['template.steps.semitonesPerInch', -1, 13],
  ['template.resonantCents', 1300],
  ['template.kickBelowLowestTom', [-5], [2.5], [37]],
  ['anchor.note.semitone', 48.5, -1, 128, 90],
  ['anchor.drumId', 'nobody'],
  ['apartSemitones', -1, 13],
]
const notes = new Map(plan.drums.map(({ id }, i) => [id, { semitone: 53 - 5 * i, cents: 0 }]))

/** A tap and a note heard three times each. */
const heard = { tap: { count: 3, medianHz: 255, halfHz: 0.3 }, note: { count: 3, medianHz: 146, halfHz: 0.2 } }

export const kitRows = [
  row(
    'drumEstimate',
    ({ referenceHz, temperatureC, ...of }) => drumEstimate(of, { referenceHz, temperatureC }),
    { ...drum, referenceHz: 440, temperatureC: 20 },
    [
      ...[...PITCHED, TEMPERATURES],
      ['lugs', 3, 13, 6.5, 0, -6],
      ['note.semitone', 50.5, -1, 128],
      ['note.cents', 1300],
      ['referenceHz', 0, 44],
    ],
    (answer) => {
      const { tuning, refusal } = answer as { tuning: unknown; refusal: string | null }
      return tuning === null && refusal !== null && refusal !== ''
    },
  ),
  row(
    'playableRange',
    ({ temperatureC, ...of }) => playableRange(of, { temperatureC }),
    { ...pitched, temperatureC: 20 },
    [...PITCHED, TEMPERATURES],
  ),
  row(
    'planDrumOf',
    (of: typeof pitched) => planDrumOf('a', 'Tom 12', { ...of, note: null, noteLocked: false }),
    pitched,
    PITCHED,
  ),

  row('planNotes', planNotes, { ...plan, alternatives: 3 }, [...PLANS, ['alternatives', -1, 1.5, 41]]),
  row('judgePlan', (of: NotePlanInput) => judgePlan(of, notes), plan, PLANS),
  row('judgePlan', (note) => judgePlan(plan, new Map([['tom10', note]])), { semitone: 53, cents: 0 }, [
    ['semitone', -1, 128, 53.5],
    ['cents', 101, -101],
  ]),
  row('costOfMoving', ({ of, id }) => costOfMoving(of, notes, id), { of: plan, id: 'tom10' }, [
    ...PLANS.map(([place, ...values]): Bad => [`of.${place}`, ...values]),
    ['id', 'nobody'],
  ]),
  row(
    'requireTemplate',
    ({ semitones, resonantCents }) =>
      requireTemplate({ ...plan.template, resonantCents, steps: { kind: 'per-pair', semitones } }),
    { semitones: [5, 4], resonantCents: 0 },
    [
      ['semitones', [], [-1], [25]],
      ['resonantCents', 1300, -1300],
    ],
  ),
  row(
    'measuredTapRatio',
    ({ tap, note }) => measuredTapRatio(tap, note),
    heard,
    [
      ['tap', null, { count: 3, medianHz: -255, halfHz: 0.3 }, { count: 3, medianHz: 600, halfHz: 0.3 }],
      ['note', null, { count: 3, medianHz: 0, halfHz: 0.2 }, { count: 2, medianHz: 146, halfHz: 0.2 }],
      ['tap.halfHz', -0.3, 30],
    ],
    (answer) => (answer as { outcome: string }).outcome === 'unsure',
  ),
  row(
    'measuredTapRatio',
    ({ sign }) => measuredTapRatio({ ...heard.tap, medianHz: sign * 255 }, { ...heard.note, medianHz: sign * 146 }),
    { sign: 1 },
    // Two pitches under nothing make a ratio that looks right.
    [['sign', -1, 0]],
    (answer) => (answer as { outcome: string }).outcome === 'unsure',
  ),
  row('intervalName', ({ cents }) => intervalName(cents), { cents: 500 }),
  row('headRelationWords', ({ cents }) => headRelationWords(cents), { cents: 300 }),
  row(
    'parseReading',
    ({ typed }) => parseReading(typed, 'Hz'),
    { typed: '251.5' },
    [['typed', '', 'NaN', 'Infinity', '-251', '0', '0.2515', '25150', '1e3', '12 in']],
    (answer) => {
      const { value, fault } = answer as { value: unknown; fault: string | null }
      return value === null && fault !== null
    },
  ),
]
