import { classes } from '@/components/ui/classes'
import { round } from './round'

/** Lines of one show by how they stand. */
export interface ShowBarCounts {
  settled: number
  waiting: number
  changed: number
}

const parts = [
  { key: 'settled', word: 'settled', look: 'bg-reed' },
  { key: 'waiting', word: 'waiting', look: 'bg-brass hatch' },
  { key: 'changed', word: 'changed', look: 'bg-plum dots' },
] as const

/** Settled, waiting and changed as shares of one bar: plain, hatched and dotted, and in words for a screen reader. */
export function ShowBar({ counts, className }: { counts: ShowBarCounts | null; className?: string }) {
  const total = counts ? counts.settled + counts.waiting + counts.changed : 0
  const words =
    counts && total > 0
      ? parts
          .filter(({ key }) => counts[key] > 0)
          .map(({ key, word }) => `${counts[key]} ${word}`)
          .join(', ')
      : 'nothing asked yet'
  return (
    <span title={words} className={classes('flex h-2 border border-soft bg-sheet', className)}>
      <span className="sr-only">{words}</span>
      {counts &&
        total > 0 &&
        parts.map(({ key, look }) =>
          counts[key] > 0 ? (
            <span
              key={key}
              data-part={key}
              className={look}
              style={{ width: `${round((counts[key] / total) * 100)}%` }}
            />
          ) : null,
        )}
    </span>
  )
}
