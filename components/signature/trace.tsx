import type { ReactNode } from 'react'
import { classes } from '@/components/ui/classes'
import { clockPoint } from './clock-point'
import { round } from './round'
import type { TraceLug, TraceMove, TraceOutline } from './trace-lug'
import { TraceRod } from './trace-rod'

export interface TraceProps {
  /** The whole picture in words, for a screen reader ("Tom 12, batter: lugs 1 and 4 high, the rest even"). */
  label: string
  lugs: readonly TraceLug[]
  /** The head's readings as `traceOutline` gives them about a circle of radius 1; null before the first reading. */
  outline: TraceOutline | null
  /** The tolerance as radii in the same measure, inner below 1 and outer above. */
  bandInner: number
  bandOuter: number
  /** The words in the middle: the next move. */
  centre: ReactNode
  /** Lugs whose rods are to be turned now: a key is drawn on each. */
  highlightLugs?: readonly TraceMove[]
  /** The lug to read now: its number is ringed. */
  nowLug?: number | undefined
  /** Marks the badge, from which lugs are counted, at twelve o'clock. */
  badge?: boolean
  /** Lug numbers in the order in which they are gone round; drawn as steps from lug to lug while nothing was read. */
  order?: readonly number[]
  /** One of many side by side: larger lug numbers, and no words on the rods; the words stand beside it. */
  small?: boolean
  /** Paper prints in black and white; stage is for the dark. Inherits the page's theme if not given. */
  mode?: 'stage' | 'paper'
  className?: string
}

const targetRadius = 50
const headRadius = 66
const hoopRadius = 71

function points(line: readonly { x: number; y: number }[]): string {
  return line.map((point) => `${round(point.x * targetRadius)},${round(point.y * targetRadius)}`).join(' ')
}

/**
 * The head's readings inside its real hoop, with claws and rods: round means even. The band is the tolerance; a lug
 * outside it is marked by its shape and by a word.
 */
export function Trace(props: TraceProps) {
  const {
    label,
    lugs,
    outline,
    bandInner,
    bandOuter,
    centre,
    highlightLugs = [],
    nowLug,
    badge,
    order,
    small = false,
    mode,
    className,
  } = props
  const inner = round(bandInner * targetRadius)
  const outer = round(Math.min(bandOuter * targetRadius, headRadius))
  const steps =
    outline === null && order ? order.flatMap((number) => lugs.find((lug) => lug.number === number) ?? []) : []
  return (
    <div data-theme={mode} className={classes('mx-auto w-full max-w-md', className)}>
      <div className="relative aspect-square">
        <svg
          role="img"
          aria-label={label}
          viewBox={small ? '-116 -116 232 232' : '-134 -134 268 268'}
          className="block w-full"
        >
          <g fill="none" stroke="currentColor" className="text-ink">
            <circle r={hoopRadius} strokeWidth={1.6} />
            <circle r={hoopRadius - 4} strokeWidth={1.6} />
            <circle r={headRadius - 2} strokeWidth={0.5} className="fill-sheet stroke-line" />
          </g>
          <circle
            r={round((inner + outer) / 2)}
            strokeWidth={round(Math.max(1, outer - inner))}
            fill="none"
            className="stroke-reed opacity-30"
            data-part="band"
          />
          <circle r={targetRadius} strokeWidth={0.7} strokeDasharray="2 2" fill="none" className="stroke-soft" />
          {steps.length > 1 && (
            <polyline
              data-part="order"
              points={steps
                .map((lug) => clockPoint(lug.angleRad, headRadius - 5))
                .map((point) => `${point.x},${point.y}`)
                .join(' ')}
              fill="none"
              strokeWidth={0.7}
              className="stroke-soft"
            />
          )}
          {steps.length > 1 && <circle r={headRadius / 2} className="fill-sheet" />}
          {steps.map((lug, index) => {
            const at = clockPoint(lug.angleRad, headRadius - 9)
            return (
              <g key={lug.number}>
                <circle cx={at.x} cy={at.y} r={7} className="fill-sheet" />
                <text
                  x={at.x}
                  y={round(at.y + 2.6)}
                  textAnchor="middle"
                  fontSize={7.5}
                  className="figures fill-ink"
                >{`${index + 1}${ordinal(index + 1)}`}</text>
              </g>
            )
          })}
          {outline && (
            <g className="stroke-spike" fill="none" strokeWidth={2.4} strokeLinejoin="round" strokeLinecap="round">
              {outline.segments.map((segment, index) =>
                outline.closed ? (
                  <polygon key={index} data-part="curve" points={points(segment)} />
                ) : (
                  <polyline key={index} data-part="curve" points={points(segment)} />
                ),
              )}
              {outline.lugs.map((lug, index) => (
                <circle
                  key={index}
                  data-part="reading"
                  cx={round(lug.x * targetRadius)}
                  cy={round(lug.y * targetRadius)}
                  r={2}
                  className="fill-spike"
                />
              ))}
            </g>
          )}
          {badge && (
            <g data-part="badge" className="fill-soft">
              <path d={`M-5 ${-hoopRadius - 2}h10l-5 7Z`} />
              <text y={-hoopRadius - 6} textAnchor="middle" fontSize={8.5}>
                badge
              </text>
            </g>
          )}
          {lugs.map((lug) => (
            <TraceRod
              key={lug.number}
              lug={lug}
              now={lug.number === nowLug}
              small={small}
              hoopRadius={hoopRadius}
              move={highlightLugs.find((move) => move.number === lug.number)?.turn ?? null}
            />
          ))}
        </svg>
        <div
          data-part="centre"
          className="pointer-events-none absolute inset-0 m-auto flex size-[32%] flex-col items-center justify-center text-center leading-tight"
        >
          {centre}
        </div>
      </div>
    </div>
  )
}

function ordinal(step: number): string {
  if (step % 100 > 10 && step % 100 < 14) return 'th'
  return ['th', 'st', 'nd', 'rd'][step % 10] ?? 'th'
}
