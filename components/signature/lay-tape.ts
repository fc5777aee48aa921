/** What tape needs to know of a hire: the days it covers, both ends included, as YYYY-MM-DD. */
interface Span {
  firstDate: string
  lastDate: string
}

export interface LaidTape<T extends Span> {
  hire: T
  /** Which row of tape beneath the days, from 0. */
  lane: number
  /** The first and last day covered, as places in the list of days. */
  fromColumn: number
  toColumn: number
  /** The hire begins before the first day shown, or ends after the last. */
  startsBefore: boolean
  endsAfter: boolean
}

/**
 * Lays each hire beneath the days it covers, in the first lane where it hides no other. A hire that covers none of the
 * days is left out.
 */
export function layTape<T extends Span>(hires: readonly T[], days: readonly string[]): LaidTape<T>[] {
  const laneEnds: number[] = []
  const inOrder = [...hires].sort(
    (a, b) => a.firstDate.localeCompare(b.firstDate) || a.lastDate.localeCompare(b.lastDate),
  )
  return inOrder.flatMap((hire) => {
    const covered = days.flatMap((day, index) => (day >= hire.firstDate && day <= hire.lastDate ? [index] : []))
    const fromColumn = covered[0]
    const toColumn = covered.at(-1)
    if (fromColumn === undefined || toColumn === undefined) return []
    const free = laneEnds.findIndex((end) => end < fromColumn)
    const lane = free === -1 ? laneEnds.length : free
    laneEnds[lane] = toColumn
    return {
      hire,
      lane,
      fromColumn,
      toColumn,
      startsBefore: hire.firstDate < (days[0] ?? hire.firstDate),
      endsAfter: hire.lastDate > (days.at(-1) ?? hire.lastDate),
    }
  })
}
