declare const plotBrand: unique symbol
declare const screenBrand: unique symbol

/**
 * A place on the stage, in metres. `xM` grows to stage left (the performer's left, facing the audience), `yM` grows
 * upstage from the downstage edge; x = 0 is the centre line. Source: the usual theatre drafting convention.
 */
export interface PlotPoint {
  readonly xM: number
  readonly yM: number
  readonly [plotBrand]?: never
}

/** A place on the screen, in CSS pixels from the drawing's top left corner, y downwards. */
export interface ScreenPoint {
  readonly xPx: number
  readonly yPx: number
  readonly [screenBrand]?: never
}

/** Makes a plot point from metres. */
export function plotPoint(xM: number, yM: number): PlotPoint {
  return { xM, yM }
}

/** Makes a screen point from CSS pixels. */
export function screenPoint(xPx: number, yPx: number): ScreenPoint {
  return { xPx, yPx }
}

/** Distance between two plot points, in metres. */
export function distanceM(a: PlotPoint, b: PlotPoint): number {
  return Math.hypot(b.xM - a.xM, b.yM - a.yM)
}
