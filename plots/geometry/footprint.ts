import { turnClockwise } from './angle'
import { boundsOfPoints, type Bounds } from './bounds'
import { distanceM, plotPoint, type PlotPoint } from './point'

/** A round footprint: drums on their side heads, cymbals, thrones. */
export interface CircleFootprint {
  readonly shape: 'circle'
  readonly centre: PlotPoint
  readonly radiusM: number
}

/** A rectangular footprint about its centre: `widthM` across and `depthM` up the sheet before it is turned. */
export interface RectFootprint {
  readonly shape: 'rect'
  readonly centre: PlotPoint
  readonly widthM: number
  readonly depthM: number
  readonly rotationDeg: number
}

/** What a piece covers, seen from above, in metres. */
export type Footprint = CircleFootprint | RectFootprint

/** The corners of a rectangle, anticlockwise from its downstage stage-right corner before it is turned. */
export function rectCorners(rect: RectFootprint): PlotPoint[] {
  const halfW = rect.widthM / 2
  const halfD = rect.depthM / 2
  const { xM, yM } = rect.centre
  return [
    plotPoint(xM - halfW, yM - halfD),
    plotPoint(xM + halfW, yM - halfD),
    plotPoint(xM + halfW, yM + halfD),
    plotPoint(xM - halfW, yM + halfD),
  ].map((corner) => turnClockwise(corner, rect.rotationDeg, rect.centre))
}

/** The upright box round a footprint. */
export function footprintBounds(footprint: Footprint): Bounds {
  if (footprint.shape === 'circle') {
    const { centre, radiusM } = footprint
    return {
      minXM: centre.xM - radiusM,
      minYM: centre.yM - radiusM,
      maxXM: centre.xM + radiusM,
      maxYM: centre.yM + radiusM,
    }
  }
  const bounds = boundsOfPoints(rectCorners(footprint))
  if (!bounds) throw new RangeError('A rectangle has four corners')
  return bounds
}

/** Whether a point lies in the footprint grown by `slackM` (for a finger's width); the edge counts as inside. */
export function footprintContains(footprint: Footprint, point: PlotPoint, slackM = 0): boolean {
  if (footprint.shape === 'circle') return distanceM(footprint.centre, point) <= footprint.radiusM + slackM
  const local = turnClockwise(point, -footprint.rotationDeg, footprint.centre)
  return (
    Math.abs(local.xM - footprint.centre.xM) <= footprint.widthM / 2 + slackM &&
    Math.abs(local.yM - footprint.centre.yM) <= footprint.depthM / 2 + slackM
  )
}

/** Whether two footprints share area. Pieces that only touch (tangent drums, risers edge to edge) do not overlap. */
export function footprintsOverlap(a: Footprint, b: Footprint): boolean {
  // A tenth of a millimetre: less than a snapped position's rounding, far less than a tape measure.
  const toleranceM = 1e-4
  if (a.shape === 'circle' && b.shape === 'circle')
    return distanceM(a.centre, b.centre) < a.radiusM + b.radiusM - toleranceM
  if (a.shape === 'circle') return circleOverlapsRect(a, b as RectFootprint, toleranceM)
  if (b.shape === 'circle') return circleOverlapsRect(b, a, toleranceM)
  return !hasSeparatingAxis(a, b, toleranceM) && !hasSeparatingAxis(b, a, toleranceM)
}

function circleOverlapsRect(circle: CircleFootprint, rect: RectFootprint, toleranceM: number): boolean {
  const local = turnClockwise(circle.centre, -rect.rotationDeg, rect.centre)
  const outsideX = Math.max(Math.abs(local.xM - rect.centre.xM) - rect.widthM / 2, 0)
  const outsideY = Math.max(Math.abs(local.yM - rect.centre.yM) - rect.depthM / 2, 0)
  return Math.hypot(outsideX, outsideY) < circle.radiusM - toleranceM
}

function hasSeparatingAxis(rect: RectFootprint, other: RectFootprint, toleranceM: number): boolean {
  const corners = rectCorners(other).map((corner) => turnClockwise(corner, -rect.rotationDeg, rect.centre))
  const xs = corners.map((corner) => corner.xM - rect.centre.xM)
  const ys = corners.map((corner) => corner.yM - rect.centre.yM)
  return (
    Math.min(...xs) >= rect.widthM / 2 - toleranceM ||
    Math.max(...xs) <= -rect.widthM / 2 + toleranceM ||
    Math.min(...ys) >= rect.depthM / 2 - toleranceM ||
    Math.max(...ys) <= -rect.depthM / 2 + toleranceM
  )
}
