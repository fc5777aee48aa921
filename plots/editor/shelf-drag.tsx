'use client'

import {
  KeyboardSensor,
  MouseSensor,
  pointerWithin,
  rectIntersection,
  TouchSensor,
  useSensor,
  useSensors,
  type Announcements,
  type CollisionDetection,
  type DragEndEvent,
  type DragStartEvent,
  type KeyboardCoordinateGetter,
} from '@dnd-kit/core'
import { snapCenterToCursor } from '@dnd-kit/modifiers'
import { useState } from 'react'
import { plotPoint, screenPoint, type ScreenPoint } from '../geometry/point'
import { footprintBounds } from '../geometry/footprint'
import { emptyDocument } from '../model/document'
import type { KitById } from '../model/kit-piece'
import { drawPiece } from '../symbols/draw-piece'
import { pieceFootprint } from '../symbols/piece-footprint'
import { pieceOf, type ShelfItem } from '../tools/shelf'
import { ShapeDrawing } from './shape-drawing'
import { SHEET_ID } from './sheet'

/** How far an arrow carries a piece from the shelf, pixels. */
const CARRY_PX = { plain: 20, shift: 80 } as const

const instructions = {
  draggable:
    'Enter puts it on free ground. Space picks it up; then arrows carry it over the plot, Space puts it down, Escape lets go.',
}

function itemOf(data: { current?: Record<string, unknown> | undefined }): ShelfItem | null {
  return (data.current?.['item'] as ShelfItem | undefined) ?? null
}

const announcements: Announcements = {
  onDragStart: ({ active }) => `${itemOf(active.data)?.name ?? 'Piece'} picked up`,
  onDragOver: ({ active, over }) =>
    over
      ? `${itemOf(active.data)?.name ?? 'Piece'} is over the plot`
      : `${itemOf(active.data)?.name ?? 'Piece'} is beside the plot`,
  onDragEnd: ({ active, over }) =>
    over
      ? `${itemOf(active.data)?.name ?? 'Piece'} put down`
      : `${itemOf(active.data)?.name ?? 'Piece'} went back to the shelf`,
  onDragCancel: ({ active }) => `${itemOf(active.data)?.name ?? 'Piece'} went back to the shelf`,
}

/** By the pointer where there is one; carried by keys, by where the piece is. */
const overSheet: CollisionDetection = (args) => (args.pointerCoordinates ? pointerWithin(args) : rectIntersection(args))

/** The first arrow carries a piece from the shelf to the middle of the plot; the next ones go step by step. */
const carryByKeys: KeyboardCoordinateGetter = (event, { currentCoordinates, context }) => {
  const sheet = context.droppableRects.get(SHEET_ID)
  const held = context.collisionRect
  if (!sheet || !held || !event.code.startsWith('Arrow')) return undefined
  event.preventDefault()
  const middle = { x: held.left + held.width / 2, y: held.top + held.height / 2 }
  const isOver = middle.x >= sheet.left && middle.x <= sheet.right && middle.y >= sheet.top && middle.y <= sheet.bottom
  if (!isOver)
    return {
      x: currentCoordinates.x + sheet.left + sheet.width / 2 - middle.x,
      y: currentCoordinates.y + sheet.top + sheet.height / 2 - middle.y,
    }
  const step = event.shiftKey ? CARRY_PX.shift : CARRY_PX.plain
  const x = event.code === 'ArrowLeft' ? -step : event.code === 'ArrowRight' ? step : 0
  const y = event.code === 'ArrowUp' ? -step : event.code === 'ArrowDown' ? step : 0
  return { x: currentCoordinates.x + x, y: currentCoordinates.y + y }
}

/** Dragging from the shelf to the sheet by mouse, touch and keys. `onDrop` gets the place within the sheet. */
export function useShelfDrag(input: { onDrop: (item: ShelfItem, at: ScreenPoint) => void; onPickUp: () => void }) {
  const [inHand, setInHand] = useState<ShelfItem | null>(null)
  const sensors = useSensors(
    useSensor(MouseSensor, { activationConstraint: { distance: 4 } }),
    useSensor(TouchSensor, { activationConstraint: { delay: 180, tolerance: 8 } }),
    useSensor(KeyboardSensor, {
      coordinateGetter: carryByKeys,
      keyboardCodes: { start: ['Space'], cancel: ['Escape'], end: ['Space', 'Enter'] },
    }),
  )
  function start({ active }: DragStartEvent) {
    setInHand(itemOf(active.data))
    input.onPickUp()
  }
  function end(event: DragEndEvent) {
    setInHand(null)
    const item = itemOf(event.active.data)
    if (!item || event.over?.id !== SHEET_ID) return
    const held = event.active.rect.current.translated
    if (!held) return
    const { left, top } = event.over.rect
    input.onDrop(item, screenPoint(held.left + held.width / 2 - left, held.top + held.height / 2 - top))
  }
  return {
    inHand,
    context: {
      sensors,
      collisionDetection: overSheet,
      modifiers: [snapCenterToCursor],
      accessibility: { announcements, screenReaderInstructions: instructions },
      onDragStart: start,
      onDragEnd: end,
      onDragCancel: () => setInHand(null),
    },
  }
}

/** What is carried, drawn at the size it will have on the sheet, about the middle of the shelf line that is dragged. */
export function PieceInHand({ item, kit, pxPerM }: { item: ShelfItem; kit: KitById; pxPerM: number }) {
  const piece = pieceOf(item, 'in-hand', plotPoint(0, 0), emptyDocument)
  const box = footprintBounds(pieceFootprint(emptyDocument, piece, kit))
  const shapes = drawPiece(emptyDocument, piece, kit)
  const pad = 0.05
  const widthM = box.maxXM - box.minXM + 2 * pad
  const depthM = box.maxYM - box.minYM + 2 * pad
  return (
    <svg
      aria-hidden
      width={widthM * pxPerM}
      height={depthM * pxPerM}
      viewBox={[(box.minXM - pad) * 1000, -(box.maxYM + pad) * 1000, widthM * 1000, depthM * 1000].join(' ')}
      className="absolute top-1/2 left-1/2 -translate-x-1/2 -translate-y-1/2 overflow-visible opacity-80"
    >
      {shapes.map((shape, index) => (
        <ShapeDrawing key={index} item={{ ...shape, pieceId: null }} />
      ))}
      {shapes.length === 0 && (
        <rect
          x={-200}
          y={-60}
          width={400}
          height={120}
          className="fill-none stroke-ink"
          strokeDasharray="40 30"
          strokeWidth={8}
        />
      )}
    </svg>
  )
}
