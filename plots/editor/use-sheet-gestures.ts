import { useRef, useState, type PointerEvent } from 'react'
import { distanceM, screenPoint, type PlotPoint, type ScreenPoint } from '../geometry/point'
import type { SnapGuide } from '../geometry/snap'
import { panBy, toPlot, zoomAt, type PlotView } from '../geometry/view'
import type { PlotAction } from '../model/command'
import { GRID_M } from '../render/stage-frame'
import type { Piece, PlotDocument } from '../model/document'
import type { KitById } from '../model/kit-piece'
import { movePieces } from '../tools/move-pieces'
import { pickPiece } from '../tools/pick-piece'
import { turnTowards } from '../tools/turn-pieces'

/** How far a pointer goes before a press is a drag, and how near a snap must be, pixels. */
const DRAG_PX = 3
const SNAP_PX = 9

type Gesture =
  | { kind: 'pan'; last: ScreenPoint; moved: boolean }
  | { kind: 'move'; from: ScreenPoint; document: PlotDocument; pieceIds: string[]; leadId: string; moved: boolean }
  | { kind: 'turn'; piece: Piece }
  | { kind: 'pinch'; gapPx: number; middle: ScreenPoint }

export interface Preview {
  readonly action: PlotAction
  readonly guides: readonly SnapGuide[]
}

export interface SheetGestureInput {
  readonly document: PlotDocument
  readonly kit: KitById
  readonly view: PlotView
  readonly setView: (change: (was: PlotView) => PlotView) => void
  readonly chosen: ReadonlySet<string>
  readonly mayEdit: boolean
  readonly isSnapping: boolean
  readonly onChoose: (pieceIds: readonly string[]) => void
  readonly onDone: (action: PlotAction) => void
  /** A press on the sheet while something from the shelf is in hand. Returns whether it was used. */
  readonly onPress: (at: PlotPoint) => boolean
}

/** Pointer gestures on the sheet: choose, move, turn, look around, pinch. Nothing is done until the pointer is let go. */
export function useSheetGestures(input: SheetGestureInput) {
  const { document, kit, view, setView, chosen, mayEdit, isSnapping, onChoose, onDone, onPress } = input
  const [preview, setPreview] = useState<Preview | null>(null)
  const gesture = useRef<Gesture | null>(null)
  const pointers = useRef(new Map<number, ScreenPoint>())
  const latest = useRef<PlotAction | null>(null)

  const show = (next: Preview | null) => {
    latest.current = next?.action ?? null
    setPreview(next)
  }
  const placeOf = (event: PointerEvent<SVGSVGElement>) => {
    const box = event.currentTarget.getBoundingClientRect()
    return screenPoint(event.clientX - box.left, event.clientY - box.top)
  }

  function down(event: PointerEvent<SVGSVGElement>) {
    if (event.pointerType === 'mouse' && event.button > 1) return
    const at = placeOf(event)
    pointers.current.set(event.pointerId, at)
    event.currentTarget.setPointerCapture(event.pointerId)
    if (pointers.current.size === 2) {
      show(null)
      gesture.current = pinchOf(pointers.current)
      return
    }
    const point = toPlot(view, at)
    if (onPress(point)) return
    const turning = (event.target as Element).getAttribute('data-handle') === 'turn'
    const [only] = chosen
    const held = turning && only !== undefined ? document.pieces[only] : undefined
    if (held) {
      gesture.current = { kind: 'turn', piece: held }
      return
    }
    const slackM = (event.pointerType === 'mouse' ? 5 : 14) / view.pxPerM
    const piece = event.button === 1 ? null : pickPiece(document, kit, point, slackM, chosen)
    if (!piece) {
      gesture.current = { kind: 'pan', last: at, moved: false }
      return
    }
    const pieceIds = chosenAfterPress(chosen, piece.id, event.shiftKey)
    onChoose(pieceIds)
    gesture.current =
      mayEdit && pieceIds.includes(piece.id)
        ? { kind: 'move', from: at, document, pieceIds, leadId: piece.id, moved: false }
        : { kind: 'pan', last: at, moved: true }
  }

  function move(event: PointerEvent<SVGSVGElement>) {
    if (!pointers.current.has(event.pointerId)) return
    const at = placeOf(event)
    pointers.current.set(event.pointerId, at)
    const now = gesture.current
    switch (now?.kind) {
      case 'pan':
        if (!now.moved && Math.hypot(at.xPx - now.last.xPx, at.yPx - now.last.yPx) < DRAG_PX) return
        setView((was) => panBy(was, at.xPx - now.last.xPx, at.yPx - now.last.yPx))
        gesture.current = { ...now, last: at, moved: true }
        return
      case 'move': {
        if (!now.moved && Math.hypot(at.xPx - now.from.xPx, at.yPx - now.from.yPx) < DRAG_PX) return
        gesture.current = { ...now, moved: true }
        const snap = isSnapping && !event.altKey ? { reachM: SNAP_PX / view.pxPerM, gridM: gridFor(view) } : null
        const { action, guides } = movePieces({
          document: now.document,
          kit,
          pieceIds: now.pieceIds,
          leadId: now.leadId,
          byXM: (at.xPx - now.from.xPx) / view.pxPerM,
          byYM: -(at.yPx - now.from.yPx) / view.pxPerM,
          snap,
        })
        show(action ? { action, guides } : null)
        return
      }
      case 'turn': {
        const point = toPlot(view, at)
        if (distanceM(point, { xM: now.piece.xM, yM: now.piece.yM }) > 0.01)
          show({ action: turnTowards(now.piece, point, event.altKey), guides: [] })
        return
      }
      case 'pinch': {
        const next = pinchOf(pointers.current)
        if (!next) return
        setView((was) =>
          zoomAt(
            panBy(was, next.middle.xPx - now.middle.xPx, next.middle.yPx - now.middle.yPx),
            next.middle,
            next.gapPx / now.gapPx,
          ),
        )
        gesture.current = next
      }
    }
  }

  function up(event: PointerEvent<SVGSVGElement>) {
    if (!pointers.current.delete(event.pointerId)) return
    const now = gesture.current
    gesture.current = null
    const done = latest.current
    show(null)
    if (now?.kind === 'pan' && !now.moved) onChoose([])
    if ((now?.kind === 'move' && now.moved) || now?.kind === 'turn') if (done) onDone(done)
  }

  /** Lets go without doing: the browser took the pointer, or Escape was pressed. */
  function cancel() {
    pointers.current.clear()
    gesture.current = null
    show(null)
  }

  return {
    preview,
    cancel,
    handlers: { onPointerDown: down, onPointerMove: move, onPointerUp: up, onPointerCancel: cancel },
  }
}

function chosenAfterPress(chosen: ReadonlySet<string>, pieceId: string, isAdding: boolean): string[] {
  if (!isAdding) return chosen.has(pieceId) ? [...chosen] : [pieceId]
  return chosen.has(pieceId) ? [...chosen].filter((id) => id !== pieceId) : [...chosen, pieceId]
}

/** A twentieth of the drawn grid close by, a quarter of it from afar. */
function gridFor(view: PlotView): number {
  return view.pxPerM >= 120 ? GRID_M / 20 : GRID_M / 4
}

function pinchOf(pointers: ReadonlyMap<number, ScreenPoint>): Extract<Gesture, { kind: 'pinch' }> | null {
  const [a, b] = [...pointers.values()]
  if (!a || !b) return null
  return {
    kind: 'pinch',
    gapPx: Math.max(Math.hypot(a.xPx - b.xPx, a.yPx - b.yPx), 1),
    middle: screenPoint((a.xPx + b.xPx) / 2, (a.yPx + b.yPx) / 2),
  }
}
