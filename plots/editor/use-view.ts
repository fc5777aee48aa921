import { useCallback, useRef, useState } from 'react'
import type { Bounds } from '../geometry/bounds'
import { screenPoint } from '../geometry/point'
import { fitView, panBy, zoomAt, type PlotView } from '../geometry/view'

const MARGIN_PX = 28
/** Room the margin note takes on a wide sheet. */
export const NOTE_PX = 288
/** From this width the note stands on the sheet, beside the drawing. */
const WIDE_PX = 860
const WHEEL_STEP = 0.0016

export interface SheetSize {
  readonly widthPx: number
  readonly heightPx: number
}

/** How the plot stands in its window: measured, zoomed and shifted. `fit` starts over from some bounds. */
export function useView(first: Bounds) {
  const [size, setSize] = useState<SheetSize>({ widthPx: 960, heightPx: 600 })
  const [view, setView] = useState<PlotView>(() => fitted(first, { widthPx: 960, heightPx: 600 }))
  const sizeNow = useRef<SheetSize | null>(null)

  const attach = useCallback(
    (node: HTMLElement | null) => {
      if (!node) return
      const observer = new ResizeObserver(() => {
        const next = { widthPx: node.clientWidth, heightPx: node.clientHeight }
        const last = sizeNow.current
        sizeNow.current = next
        setSize(next)
        setView((was) =>
          last
            ? panBy(was, (next.widthPx - last.widthPx) / 2, (next.heightPx - last.heightPx) / 2)
            : fitted(first, next),
        )
      })
      observer.observe(node)
      // React's own wheel listener is passive and could not keep the page from scrolling.
      const wheel = (event: WheelEvent) => {
        event.preventDefault()
        const box = node.getBoundingClientRect()
        const at = screenPoint(event.clientX - box.left, event.clientY - box.top)
        const [dx, dy] =
          event.deltaMode === WheelEvent.DOM_DELTA_LINE
            ? [event.deltaX * 16, event.deltaY * 16]
            : [event.deltaX, event.deltaY]
        setView((was) =>
          event.shiftKey ? panBy(was, -(dx || dy), 0) : zoomAt(panBy(was, -dx, 0), at, Math.exp(-dy * WHEEL_STEP)),
        )
      }
      node.addEventListener('wheel', wheel, { passive: false })
      return () => {
        observer.disconnect()
        node.removeEventListener('wheel', wheel)
      }
    },
    [first],
  )

  const fit = useCallback(
    (bounds: Bounds) => setView(fitted(bounds, sizeNow.current ?? { widthPx: 960, heightPx: 600 })),
    [],
  )
  const zoom = useCallback((factor: number) => {
    const { widthPx, heightPx } = sizeNow.current ?? { widthPx: 960, heightPx: 600 }
    setView((was) => zoomAt(was, screenPoint(widthPx / 2, heightPx / 2), factor))
  }, [])
  return { view, setView, size, isWide: size.widthPx >= WIDE_PX, attach, fit, zoom }
}

function fitted(bounds: Bounds, { widthPx, heightPx }: SheetSize): PlotView {
  const room = widthPx >= WIDE_PX ? widthPx - NOTE_PX : widthPx
  return fitView(bounds, room, heightPx, MARGIN_PX)
}
