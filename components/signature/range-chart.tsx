import { Fragment } from 'react'
import type { ReactNode } from 'react'
import { classes } from '@/components/ui/classes'
import { CostSteps } from './cost-steps'
import type { CostStep } from './cost-steps'
import { RangeBar, scalePercent } from './range-bar'
import type { RangeBarProps, RangeScale } from './range-bar'

export interface RangeChartRow extends Omit<RangeBarProps, 'scale' | 'className' | 'ends'> {
  id: string
  name: string
  /** The interval down to the next row's note, named ("fourth"); null draws none. */
  interval: string | null
  /** Whether the interval is another than the one wanted. */
  intervalOff?: boolean
  /** How the note stands, in a word or two under the name. */
  standing?: ReactNode
  /** What each choice along the bar costs; drawn over it. */
  costs?: readonly CostStep[] | null
}

export interface RangeMark {
  at: number
  name: string
  /** Left out where there is little room. */
  minor?: boolean
}

export interface RangeChartProps {
  scale: RangeScale
  rows: readonly RangeChartRow[]
  /** Named places on the scale, drawn as hairlines behind the bars. */
  marks: readonly RangeMark[]
}

const rowHeightPx = 64
const barHeightPx = 32
const bandHeightPx = 16
/** The width of a letter in a part of a chart that fits a phone. */
const percentPerLetter = 2.7

/** Every drum's range on one scale, the intervals drawn from bead to bead. */
export function RangeChart({ scale, rows, marks }: RangeChartProps) {
  return (
    <div className="grid grid-cols-[minmax(0,5.5rem)_minmax(0,1fr)] gap-x-2 sm:grid-cols-[minmax(4.5rem,9rem)_1fr] sm:gap-x-3">
      <div aria-hidden className="pt-6">
        {rows.map((row) => (
          <div key={row.id} className="flex flex-col justify-center" style={{ height: rowHeightPx }}>
            <span className="name leading-tight max-sm:text-sm max-sm:leading-tight">{row.name}</span>
            {row.standing}
          </div>
        ))}
      </div>
      <div className="relative mx-3.5 pt-6">
        {marks.map((mark) => (
          <Fragment key={mark.at}>
            <span
              className={classes(
                'figures absolute top-0 -translate-x-1/2 text-[0.75rem] text-soft',
                mark.minor && 'max-sm:hidden',
              )}
              style={{ left: `${scalePercent(scale, mark.at)}%` }}
            >
              {mark.name}
            </span>
            <span
              aria-hidden
              className={classes('absolute top-6 bottom-0 w-px bg-line', mark.minor && 'max-sm:hidden')}
              style={{ left: `${scalePercent(scale, mark.at)}%` }}
            />
          </Fragment>
        ))}
        <ul className="relative">
          {rows.map((row, index) => (
            <li key={row.id} className="relative flex items-center" style={{ height: rowHeightPx }}>
              {row.costs && (
                <div className="absolute inset-x-0 top-1" style={{ height: (rowHeightPx - bandHeightPx) / 2 - 4 }}>
                  <CostSteps scale={scale} steps={row.costs} at={row.note?.at ?? null} />
                </div>
              )}
              <RangeBar {...row} scale={scale} ends className="w-full" />
              <Interval scale={scale} row={row} next={rows[index + 1]} />
            </li>
          ))}
        </ul>
      </div>
    </div>
  )
}

function Interval(props: { scale: RangeScale; row: RangeChartRow; next: RangeChartRow | undefined }) {
  const { scale, row, next } = props
  if (!row.note || !next?.note || !row.interval) return null
  const from = scalePercent(scale, row.note.at)
  const to = scalePercent(scale, next.note.at)
  const left = Math.min(from, to)
  const right = Math.max(from, to)
  // The words stand past the curve, or before it where they would run over the right edge of a narrow chart.
  const after = 100 - right >= Math.min(row.interval.length * percentPerLetter, left)
  return (
    <>
      <svg
        aria-hidden
        viewBox="0 0 100 36"
        preserveAspectRatio="none"
        className="pointer-events-none absolute left-0 w-full text-spike"
        style={{ top: (rowHeightPx + barHeightPx) / 2 - 2, height: rowHeightPx - barHeightPx + 4 }}
      >
        <path
          d={`M${from} 0C${from} 21 ${to} 15 ${to} 36`}
          fill="none"
          stroke="currentColor"
          strokeWidth={1.75}
          strokeDasharray={row.intervalOff ? '5 3' : undefined}
          vectorEffect="non-scaling-stroke"
        />
      </svg>
      <span
        className={classes(
          'pointer-events-none absolute z-10 text-[0.75rem] leading-4 whitespace-nowrap',
          row.intervalOff ? 'text-brass' : 'text-spike-text',
        )}
        style={{
          top: (rowHeightPx + barHeightPx) / 2 - 1,
          ...(after ? { left: `calc(${right}% + 0.375rem)` } : { right: `calc(${100 - left}% + 0.375rem)` }),
        }}
      >
        {row.interval}
      </span>
    </>
  )
}
