import type { ReactNode } from 'react'
import { turnClockwise } from '../geometry/angle'
import { footprintBounds, rectCorners, type Footprint } from '../geometry/footprint'
import { plotPoint, type PlotPoint, type ScreenPoint } from '../geometry/point'
import type { SnapGuide } from '../geometry/snap'
import { toScreen, type PlotView } from '../geometry/view'
import type { SheetSize } from './use-view'

/** How far the turning handle stands from the piece, pixels. */
const HANDLE_PX = 26

/** Where the turning handle of a piece stands: in front of it. */
export function handleAt(view: PlotView, footprint: Footprint, headingDeg: number): ScreenPoint {
  const reachM = (footprint.shape === 'circle' ? footprint.radiusM : footprint.depthM / 2) + HANDLE_PX / view.pxPerM
  const { xM, yM } = footprint.centre
  return toScreen(view, turnClockwise(plotPoint(xM, yM - reachM), headingDeg, footprint.centre))
}

/** The outline of a chosen piece, a little outside it. */
export function ChosenMark({ view, footprint }: { view: PlotView; footprint: Footprint }) {
  const centre = toScreen(view, footprint.centre)
  if (footprint.shape === 'circle')
    return (
      <Outline>
        <circle cx={centre.xPx} cy={centre.yPx} r={footprint.radiusM * view.pxPerM + 7} />
      </Outline>
    )
  const slackM = 6 / view.pxPerM
  const grown = { ...footprint, widthM: footprint.widthM + 2 * slackM, depthM: footprint.depthM + 2 * slackM }
  return (
    <Outline>
      <polygon points={pointsOf(view, rectCorners(grown))} />
    </Outline>
  )
}

function Outline({ children }: { children: ReactNode }) {
  return (
    <g className="fill-none stroke-spike" strokeWidth={1.5} strokeDasharray="4 3">
      {children}
    </g>
  )
}

/** The line and knob that turn a piece by dragging. */
export function TurnHandle({
  view,
  footprint,
  headingDeg,
}: {
  view: PlotView
  footprint: Footprint
  headingDeg: number
}) {
  const from = toScreen(view, footprint.centre)
  const at = handleAt(view, footprint, headingDeg)
  return (
    <g>
      <line x1={from.xPx} y1={from.yPx} x2={at.xPx} y2={at.yPx} className="stroke-spike" strokeWidth={1} />
      <circle cx={at.xPx} cy={at.yPx} r={14} className="cursor-grab fill-transparent" data-handle="turn" />
      <circle cx={at.xPx} cy={at.yPx} r={6} className="pointer-events-none fill-sheet stroke-spike" strokeWidth={2} />
    </g>
  )
}

/** Lines and rings that show what a moved piece has snapped to. */
export function Guides({ view, guides, size }: { view: PlotView; guides: readonly SnapGuide[]; size: SheetSize }) {
  return (
    <g className="pointer-events-none fill-none stroke-spike" strokeWidth={1}>
      {guides.map((guide, index) => {
        if (guide.kind === 'touch') {
          const at = toScreen(view, guide.centre)
          return <circle key={index} cx={at.xPx} cy={at.yPx} r={guide.radiusM * view.pxPerM} />
        }
        const at =
          guide.kind === 'upright' ? toScreen(view, plotPoint(guide.xM, 0)) : toScreen(view, plotPoint(0, guide.yM))
        return guide.kind === 'upright' ? (
          <line key={index} x1={at.xPx} x2={at.xPx} y1={0} y2={size.heightPx} />
        ) : (
          <line key={index} x1={0} x2={size.widthPx} y1={at.yPx} y2={at.yPx} />
        )
      })}
    </g>
  )
}

/** The line that ties a piece to its margin note. */
export function Tie({ view, footprint, to }: { view: PlotView; footprint: Footprint; to: ScreenPoint }) {
  const box = footprintBounds(footprint)
  const edge = toScreen(view, plotPoint(box.maxXM, footprint.centre.yM))
  if (edge.xPx >= to.xPx) return null
  return (
    <g className="pointer-events-none">
      <line x1={edge.xPx} y1={edge.yPx} x2={to.xPx} y2={to.yPx} className="stroke-ink" strokeWidth={1} />
      <circle cx={edge.xPx} cy={edge.yPx} r={2.5} className="fill-ink" />
    </g>
  )
}

function pointsOf(view: PlotView, points: readonly PlotPoint[]): string {
  return points
    .map((point) => toScreen(view, point))
    .map(({ xPx, yPx }) => `${xPx},${yPx}`)
    .join(' ')
}
