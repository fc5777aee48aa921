import { distanceM, plotPoint, type PlotPoint } from './point'
import type { CircleFootprint } from './footprint'

/**
 * The centre nearest to `near` at which a circle of `radiusM` touches `fixed` from outside. When `near` is the fixed
 * circle's own centre the direction is undefined and upstage is taken.
 */
export function tangentCentre(fixed: CircleFootprint, radiusM: number, near: PlotPoint): PlotPoint {
  const reach = fixed.radiusM + radiusM
  const away = distanceM(fixed.centre, near)
  if (away === 0) return plotPoint(fixed.centre.xM, fixed.centre.yM + reach)
  const ratio = reach / away
  return plotPoint(
    fixed.centre.xM + (near.xM - fixed.centre.xM) * ratio,
    fixed.centre.yM + (near.yM - fixed.centre.yM) * ratio,
  )
}

/**
 * The centres at which a circle of `radiusM` touches both `a` and `b` from outside: none when they are too far apart
 * or one lies within the other, one when it fits exactly between them, otherwise two (mirrored about their line).
 * Closed form: the meeting points of circles of radii a.radiusM + radiusM and b.radiusM + radiusM.
 */
export function tangentCentresOfTwo(a: CircleFootprint, b: CircleFootprint, radiusM: number): PlotPoint[] {
  const ra = a.radiusM + radiusM
  const rb = b.radiusM + radiusM
  const d = distanceM(a.centre, b.centre)
  if (d === 0 || d > ra + rb || d < Math.abs(ra - rb)) return []
  const along = (d * d + ra * ra - rb * rb) / (2 * d)
  const across = Math.sqrt(Math.max(ra * ra - along * along, 0))
  const ux = (b.centre.xM - a.centre.xM) / d
  const uy = (b.centre.yM - a.centre.yM) / d
  const foot = plotPoint(a.centre.xM + ux * along, a.centre.yM + uy * along)
  if (across === 0) return [foot]
  return [
    plotPoint(foot.xM - uy * across, foot.yM + ux * across),
    plotPoint(foot.xM + uy * across, foot.yM - ux * across),
  ]
}
