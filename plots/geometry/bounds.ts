import type { PlotPoint } from './point'

/** An upright box on the plot, in metres; min ≤ max on both axes. */
export interface Bounds {
  readonly minXM: number
  readonly minYM: number
  readonly maxXM: number
  readonly maxYM: number
}

/** The smallest box that holds all points, or null when there are none. */
export function boundsOfPoints(points: readonly PlotPoint[]): Bounds | null {
  const first = points[0]
  if (!first) return null
  let { xM: minXM, yM: minYM, xM: maxXM, yM: maxYM } = first
  for (const { xM, yM } of points) {
    minXM = Math.min(minXM, xM)
    minYM = Math.min(minYM, yM)
    maxXM = Math.max(maxXM, xM)
    maxYM = Math.max(maxYM, yM)
  }
  return { minXM, minYM, maxXM, maxYM }
}

/** The smallest box that holds all boxes, or null when there are none. */
export function boundsUnion(boxes: readonly Bounds[]): Bounds | null {
  return boundsOfPoints(
    boxes.flatMap((box) => [
      { xM: box.minXM, yM: box.minYM },
      { xM: box.maxXM, yM: box.maxYM },
    ]),
  )
}

/** The box grown by `byM` on every side. */
export function growBounds(box: Bounds, byM: number): Bounds {
  return { minXM: box.minXM - byM, minYM: box.minYM - byM, maxXM: box.maxXM + byM, maxYM: box.maxYM + byM }
}

/** Whether two boxes share some area; boxes that only touch do not. */
export function boundsOverlap(a: Bounds, b: Bounds): boolean {
  return a.minXM < b.maxXM && b.minXM < a.maxXM && a.minYM < b.maxYM && b.minYM < a.maxYM
}
