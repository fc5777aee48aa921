import { compared, figure } from '@/tests/bench/bench-row'
import type { BenchRow } from '@/tests/bench/bench-row'
import type { PitchCase } from './pitch-cases'
import { DECAYS_S, SNRS_DB, SPLITS_HZ } from './pitch-cases'
import { rivals } from './rival'
import { overBound, quantile } from './spread'

/** What the median spread may be of the bound from 20 dB up. */
const BOUND_GOAL = 1.5

/** Rows of the pitch part: spread over the bound by level, split and decay, then ours beside each package on the same taps. */
export function pitchRows(cases: readonly PitchCase[]): BenchRow[] {
  return SNRS_DB.flatMap((snrDb) => {
    const at = cases.filter((one) => one.snrDb === snrDb)
    const goal = snrDb >= 20 ? { goal: BOUND_GOAL } : {}
    return [
      ...boundRows(`tap, ${snrDb} dB`, at, goal),
      ...SPLITS_HZ.map((splitHz) => {
        const name = splitHz === 0 ? 'even head' : `split ${splitHz} Hz`
        return medianRow(
          `tap, ${snrDb} dB, ${name}`,
          at.filter((one) => one.splitHz === splitHz),
        )
      }),
      ...DECAYS_S.map((decayT60S) =>
        medianRow(
          `tap, ${snrDb} dB, T60 ${decayT60S} s`,
          at.filter((one) => one.decayT60S === decayT60S),
        ),
      ),
      ...rivals.map((rival) => rivalRow(`tap, ${snrDb} dB`, at, rival.name)),
    ]
  })
}

function boundRows(name: string, cases: readonly PitchCase[], goal: { goal?: number }): BenchRow[] {
  const { median, p95 } = overBound(ratios(cases))
  return [
    figure({ case: name, metric: 'pitch spread over the bound, median', value: median, unit: '× bound', ...goal }),
    figure({ case: name, metric: 'pitch spread over the bound, 95th percentile', value: p95, unit: '× bound' }),
    figure({
      case: name,
      metric: 'refused',
      value: (100 * cases.filter(({ oursHz }) => oursHz === null).length) / cases.length,
      unit: '%',
    }),
  ]
}

function medianRow(name: string, cases: readonly PitchCase[]): BenchRow {
  const { median } = overBound(ratios(cases))
  return figure({ case: name, metric: 'pitch spread over the bound, median', value: median, unit: '× bound' })
}

/** Median error, both on the taps where the package named a pitch or not: none named counts as worse than any error. */
function rivalRow(name: string, cases: readonly PitchCase[], rival: string): BenchRow {
  const same = cases.filter(({ rivalsHz }) => rivalsHz !== null)
  const median = (errors: readonly (number | null)[]) =>
    quantile(
      errors.map((error) => error ?? Number.MAX_VALUE),
      0.5,
    )
  return compared({
    case: name,
    metric: 'median pitch error',
    value: median(same.map(({ oursHz }) => oursHz)),
    unit: 'Hz',
    baseline: rival,
    baselineValue: median(same.map(({ rivalsHz }) => rivalsHz?.get(rival) ?? null)),
    goal: 1,
  })
}

function ratios(cases: readonly PitchCase[]): number[] {
  return cases.flatMap(({ oursHz, boundHz }) => (oursHz === null ? [] : [oursHz / boundHz]))
}
