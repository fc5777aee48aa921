import { Fragment } from 'react'
import { classes } from '@/components/ui/classes'
import { RangeBar, scalePercent } from './range-bar'
import type { RangeBarProps, RangeScale } from './range-bar'

export interface RangeChartRow extends Omit<RangeBarProps, 'scale' | 'className' | 'ends'> {
  id: string
  name: string
  /** The interval down to the next row's note, named ("fourth"); null draws none. */
  interval: string | null
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

const rowHeightPx = 56
const barHeightPx = 32

/** Every drum's range on one scale, the intervals drawn from bead to bead. */
export function RangeChart({ scale, rows, marks }: RangeChartProps) {
  return (
    <div className="grid grid-cols-[max-content_minmax(0,1fr)] gap-x-3 sm:grid-cols-[minmax(4.5rem,8rem)_1fr]">
      <div aria-hidden className="pt-6">
        {rows.map((row) => (
          <div key={row.id} className="name flex items-center" style={{ height: rowHeightPx }}>
            {row.name}
          </div>
        ))}
      </div>
      <div className="relative mx-4 pt-6">
        {marks.map((mark) => (
          <Fragment key={mark.name}>
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
              <RangeBar {...row} scale={scale} className="w-full" />
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
  return (
    <>
      <svg
        aria-hidden
        viewBox="0 0 100 24"
        preserveAspectRatio="none"
        className="pointer-events-none absolute left-0 w-full text-spike"
        style={{ top: (rowHeightPx + barHeightPx) / 2 - 2, height: rowHeightPx - barHeightPx + 4 }}
      >
        <path
          d={`M${from} 0C${from} 14 ${to} 10 ${to} 24`}
          fill="none"
          stroke="currentColor"
          strokeWidth={1.75}
          vectorEffect="non-scaling-stroke"
        />
      </svg>
      <span
        className="absolute z-10 text-[0.75rem] whitespace-nowrap text-spike-text"
        style={{ left: `calc(${Math.max(from, to)}% + 0.375rem)`, top: (rowHeightPx + barHeightPx) / 2 + 1 }}
      >
        {row.interval}
      </span>
    </>
  )
}
