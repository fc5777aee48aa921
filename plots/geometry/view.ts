import { plotPoint, screenPoint, type PlotPoint, type ScreenPoint } from './point'
import type { Bounds } from './bounds'

/** How the plot stands on the screen: pixels per metre, and where the plot's origin is drawn. */
export interface PlotView {
  readonly pxPerM: number
  readonly originXPx: number
  readonly originYPx: number
}

/** Zoom limits in pixels per metre: a 60 m stage on a phone up to a lug at arm's length. */
export const VIEW_PX_PER_M = { min: 4, max: 1200 } as const

/** Plot → screen. Stage left is drawn on the right and upstage at the top, so the audience is at the foot. */
export function toScreen(view: PlotView, point: PlotPoint): ScreenPoint {
  return screenPoint(view.originXPx + point.xM * view.pxPerM, view.originYPx - point.yM * view.pxPerM)
}

/** Screen → plot, the exact inverse of `toScreen`. */
export function toPlot(view: PlotView, point: ScreenPoint): PlotPoint {
  return plotPoint((point.xPx - view.originXPx) / view.pxPerM, (view.originYPx - point.yPx) / view.pxPerM)
}

/** Zooms by `factor` so that the place under `at` stays under it; the zoom is held to `VIEW_PX_PER_M`. */
export function zoomAt(view: PlotView, at: ScreenPoint, factor: number): PlotView {
  const pxPerM = Math.min(VIEW_PX_PER_M.max, Math.max(VIEW_PX_PER_M.min, view.pxPerM * factor))
  const ratio = pxPerM / view.pxPerM
  return {
    pxPerM,
    originXPx: at.xPx - (at.xPx - view.originXPx) * ratio,
    originYPx: at.yPx - (at.yPx - view.originYPx) * ratio,
  }
}

/** Shifts the drawing by a number of pixels. */
export function panBy(view: PlotView, dxPx: number, dyPx: number): PlotView {
  return { ...view, originXPx: view.originXPx + dxPx, originYPx: view.originYPx + dyPx }
}

/** The view that shows `bounds` as large as fits, centred, in a window of `widthPx` × `heightPx` with a margin. */
export function fitView(bounds: Bounds, widthPx: number, heightPx: number, marginPx: number): PlotView {
  const widthM = Math.max(bounds.maxXM - bounds.minXM, 0.5)
  const depthM = Math.max(bounds.maxYM - bounds.minYM, 0.5)
  const room = Math.min((widthPx - 2 * marginPx) / widthM, (heightPx - 2 * marginPx) / depthM)
  const pxPerM = Math.min(VIEW_PX_PER_M.max, Math.max(VIEW_PX_PER_M.min, room))
  return {
    pxPerM,
    originXPx: widthPx / 2 - ((bounds.minXM + bounds.maxXM) / 2) * pxPerM,
    originYPx: heightPx / 2 + ((bounds.minYM + bounds.maxYM) / 2) * pxPerM,
  }
}
