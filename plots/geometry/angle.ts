import { plotPoint, type PlotPoint } from './point'

/**
 * Headings are degrees clockwise as seen on the sheet (from above), 0 facing the audience. A quarter turn clockwise
 * from facing the audience faces stage right, which the sheet draws on the left.
 */

/** Folds an angle in degrees into [0, 360). Throws RangeError when it is not finite. */
export function normaliseDeg(angleDeg: number): number {
  if (!Number.isFinite(angleDeg)) throw new RangeError('An angle must be a finite number of degrees')
  const folded = angleDeg % 360
  const positive = folded < 0 ? folded + 360 : folded
  // A tiny negative angle folds to exactly 360 in floating point, and -0 would survive a round trip as 0.
  return positive >= 360 || positive === 0 ? 0 : positive
}

/** Turns a vector or point about `about` by `angleDeg` clockwise as seen on the sheet. */
export function turnClockwise(point: PlotPoint, angleDeg: number, about: PlotPoint = plotPoint(0, 0)): PlotPoint {
  const angle = (angleDeg * Math.PI) / 180
  const cos = Math.cos(angle)
  const sin = Math.sin(angle)
  const x = point.xM - about.xM
  const y = point.yM - about.yM
  return plotPoint(about.xM + x * cos + y * sin, about.yM - x * sin + y * cos)
}

/** Heading in degrees [0, 360) from one point to another; 0 when the points are the same. */
export function headingDeg(from: PlotPoint, to: PlotPoint): number {
  const x = to.xM - from.xM
  const y = to.yM - from.yM
  if (x === 0 && y === 0) return 0
  return normaliseDeg((Math.atan2(-x, -y) * 180) / Math.PI)
}
