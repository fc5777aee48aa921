import { useId } from 'react'
import { lugOneRule } from '@/lib/advance/tuning-method'
import type { SheetHead } from '@/lib/advance/tuning-sheet'

const size = 132
const middle = size / 2
const hoop = middle * 0.7

/** A head as its tuner faces it: badge at the top, lugs numbered, and the way from lug to lug in the order, the first with an arrow. */
export function LugOrderDrawing({ head }: { head: SheetHead }) {
  const arrow = useId()
  const inOrder = [...head.lugs].sort((a, b) => a.turn - b.turn)
  const at = ({ x, y }: { x: number; y: number }, radius: number) => ({
    x: middle + x * radius,
    y: middle + y * radius,
  })
  return (
    <svg
      viewBox={`0 0 ${size} ${size}`}
      className="size-33 shrink-0"
      role="img"
      aria-label={`Lug order ${head.order.join(', ')}. ${lugOneRule}`}
    >
      <defs>
        <marker id={arrow} viewBox="0 0 8 8" refX="7" refY="4" markerWidth="6" markerHeight="6" orient="auto">
          <path d="M0 0 8 4 0 8z" className="fill-ink" />
        </marker>
      </defs>
      {inOrder.slice(1).map((lug, index) => {
        const from = at(inOrder[index] ?? lug, hoop * 0.86)
        const to = at(lug, hoop * 0.86)
        return (
          <line
            key={lug.lug}
            {...{ x1: from.x, y1: from.y, x2: to.x, y2: to.y }}
            className={index === 0 ? 'stroke-ink' : 'stroke-soft'}
            strokeWidth={index === 0 ? 2 : 1}
            {...(index === 0 ? { markerEnd: `url(#${arrow})` } : { strokeDasharray: '3 2' })}
          />
        )
      })}
      <circle cx={middle} cy={middle} r={hoop} className="fill-none stroke-ink" strokeWidth={2} />
      <circle cx={middle} cy={middle} r={hoop * 0.94} className="fill-none stroke-ink" strokeWidth={1} />
      <path d={`M${middle - 8} ${middle - hoop * 1.14}h16l-3 6h-10z`} className="fill-ink" />
      {head.lugs.map((lug) => {
        const inner = at(lug, hoop)
        const outer = at(lug, hoop * 1.08)
        const number = at(lug, middle * 0.9)
        return (
          <g key={lug.lug}>
            <line {...{ x1: inner.x, y1: inner.y, x2: outer.x, y2: outer.y }} className="stroke-ink" strokeWidth={3} />
            <text x={number.x} y={number.y + 4} textAnchor="middle" className="figures fill-ink text-xs font-bold">
              {lug.lug}
            </text>
          </g>
        )
      })}
    </svg>
  )
}
