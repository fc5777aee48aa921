/** One figure of a benchmark. `ratio` is value over baseline in the same run, lower is better; `goal` is what the ratio or value should not pass. */
export type BenchRow = {
  case: string
  metric: string
  value: number
  unit: string
  /** What it stands beside in the same run; null when it stands alone. */
  baseline: string | null
  baselineValue: number | null
  ratio: number | null
  goal: number | null
}

/** A benchmark: a module in tests/bench/NAME.bench.ts exports `rows`. `say` shows progress while it works. */
export type Bench = (say: (line: string) => void) => Promise<BenchRow[]> | BenchRow[]

/** A row that stands alone. */
export function figure(of: Pick<BenchRow, 'case' | 'metric' | 'value' | 'unit'> & { goal?: number }): BenchRow {
  return { ...of, baseline: null, baselineValue: null, ratio: null, goal: of.goal ?? null }
}

/** A row beside its baseline. */
export function compared(
  of: Pick<BenchRow, 'case' | 'metric' | 'value' | 'unit'> & { baseline: string; baselineValue: number; goal?: number },
): BenchRow {
  return { ...of, ratio: of.value / of.baselineValue, goal: of.goal ?? null }
}
