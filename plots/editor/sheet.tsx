'use client'

import { useDroppable } from '@dnd-kit/core'
import { useCallback, useMemo, useRef, type KeyboardEvent, type ReactNode } from 'react'
import { plotPoint, screenPoint, type PlotPoint } from '../geometry/point'
import { panBy, type PlotView } from '../geometry/view'
import type { PlotAction } from '../model/command'
import { pieceHeadingDeg } from '../model/heading'
import { fit as fitAction } from '../model/rebase'
import { pieceFootprint } from '../symbols/piece-footprint'
import { nudge } from '../tools/nudge'
import { TURN_DEG, turnBy } from '../tools/turn-pieces'
import type { EditorParts } from './editor-context'
import { placeWords, spokenPiece } from './piece-words'
import { SceneLayer } from './scene-layer'
import { ChosenMark, Guides, Tie, TurnHandle } from './sheet-marks'
import { useScene } from './use-scene'
import { useSheetGestures } from './use-sheet-gestures'
import { NOTE_PX, type SheetSize } from './use-view'

export const SHEET_ID = 'sheet'
const PAN_PX = 60

export interface SheetProps {
  parts: EditorParts
  view: PlotView
  setView: (change: (was: PlotView) => PlotView) => void
  size: SheetSize
  isWide: boolean
  attach: (node: HTMLElement | null) => (() => void) | undefined
  chosen: ReadonlySet<string>
  onChoose: (pieceIds: readonly string[]) => void
  isSnapping: boolean
  /** Something from the shelf is in hand: the next press puts it down. */
  isArmed: boolean
  onPress: (at: PlotPoint) => boolean
  onRemove: () => void
  onZoom: (factor: number) => void
  onFit: () => void
  children?: ReactNode
}

/** The plot to scale, worked by pointer and keys. */
export function Sheet(props: SheetProps) {
  const { parts, view, setView, size, isWide, attach, chosen, onChoose, isSnapping, isArmed } = props
  const { document, kit, units, mayEdit, act, nameOf } = parts
  const frame = useRef<HTMLDivElement | null>(null)
  const { setNodeRef } = useDroppable({ id: SHEET_ID })
  const hold = useCallback(
    (node: HTMLDivElement | null) => {
      frame.current = node
      setNodeRef(node)
      return attach(node)
    },
    [attach, setNodeRef],
  )

  const gestures = useSheetGestures({
    document,
    kit,
    view,
    setView,
    chosen,
    mayEdit,
    isSnapping,
    onChoose,
    onPress: props.onPress,
    onDone: (action) => act([action], saidOf(action)),
  })
  const { preview } = gestures
  const shown = useMemo(() => {
    if (!preview) return document
    const fitted = fitAction(document, preview.action)
    return fitted.action ? fitted.document : document
  }, [document, preview])
  const scene = useScene(shown, kit, parts.channelNumbers, units, view.pxPerM)

  function saidOf(action: PlotAction): string {
    const [pieceId] = chosen
    const piece = pieceId === undefined ? undefined : document.pieces[pieceId]
    if (!piece) return 'Moved'
    if (action.type === 'move') {
      const to = action.moves.find((move) => move.pieceId === piece.id)
      return to ? `${nameOf(piece)}: ${placeWords(to, units)}` : 'Moved'
    }
    return action.type === 'rotate'
      ? `${nameOf(piece)} turned to ${Math.round(action.turns[0]?.rotationDeg ?? 0)}°`
      : 'Done'
  }

  const ids = [...chosen].filter((id) => document.pieces[id])
  const [onlyId] = ids
  const only = ids.length === 1 && onlyId !== undefined ? shown.pieces[onlyId] : undefined
  const onlyFootprint = only && pieceFootprint(shown, only, kit)

  function keyDown(event: KeyboardEvent<HTMLDivElement>) {
    if (event.ctrlKey || event.metaKey) {
      if (event.key !== 'a') return
      event.preventDefault()
      onChoose(Object.keys(document.pieces))
      return
    }
    const action = mayEdit && ids.length > 0 ? keyAction(event) : null
    if (action) {
      event.preventDefault()
      act([action], saidOf(action))
      return
    }
    const pan: Record<string, readonly [number, number]> = {
      ArrowLeft: [PAN_PX, 0],
      ArrowRight: [-PAN_PX, 0],
      ArrowUp: [0, PAN_PX],
      ArrowDown: [0, -PAN_PX],
    }
    const by = pan[event.key]
    if (by && ids.length === 0) setView((was) => panBy(was, by[0], by[1]))
    else if (event.key === '+' || event.key === '=') props.onZoom(1.25)
    else if (event.key === '-') props.onZoom(0.8)
    else if (event.key === '0') props.onFit()
    else if ((event.key === 'Delete' || event.key === 'Backspace') && mayEdit && ids.length > 0) props.onRemove()
    else if (event.key === 'Escape') {
      gestures.cancel()
      onChoose([])
    } else return
    event.preventDefault()
  }

  function keyAction(event: KeyboardEvent): PlotAction | null {
    if (event.key === '[' || event.key === ']') {
      const stepDeg = event.altKey ? 1 : TURN_DEG
      return turnBy(document, ids, event.key === ']' ? stepDeg : -stepDeg)
    }
    return nudge(document, ids, event)
  }

  return (
    <div
      ref={hold}
      role="group"
      aria-label="Plot, seen from above, audience at the foot"
      aria-describedby="plot-keys"
      tabIndex={0}
      onKeyDown={keyDown}
      className="sticky top-0 z-10 order-1 h-[45dvh] min-h-72 overflow-hidden border border-line bg-paper lg:relative lg:z-auto lg:h-[calc(100dvh-20.5rem)] lg:min-h-[26rem]"
    >
      <p id="plot-keys" className="sr-only">
        Arrows move what is chosen 5 cm, with Shift 50, with Alt 1. Square brackets turn it. Delete takes it off. Plus,
        minus and nought zoom.
      </p>
      <svg
        width={size.widthPx}
        height={size.heightPx}
        className={`block size-full touch-none select-none ${isArmed ? 'cursor-crosshair' : 'cursor-default'}`}
        {...gestures.handlers}
        onPointerDown={(event) => {
          // So that the keys then work on what was pressed; a finger has no keys, and would only light the focus ring.
          if (event.pointerType === 'mouse') frame.current?.focus({ preventScroll: true })
          gestures.handlers.onPointerDown(event)
        }}
      >
        <g transform={`translate(${view.originXPx} ${view.originYPx}) scale(${view.pxPerM / 1000})`}>
          <SceneLayer
            scene={scene}
            pieces={shown.pieces}
            chosen={chosen}
            spoken={(piece) => spokenPiece(piece, kit, units)}
            onChoose={(pieceId, isAdding) => onChoose(isAdding ? [...ids, pieceId] : [pieceId])}
          />
        </g>
        {ids.map((id) => {
          const piece = shown.pieces[id]
          return piece && <ChosenMark key={id} view={view} footprint={pieceFootprint(shown, piece, kit)} />
        })}
        {only && onlyFootprint && mayEdit && !only.locked && only.aim === null && (
          <TurnHandle view={view} footprint={onlyFootprint} headingDeg={pieceHeadingDeg(shown, only)} />
        )}
        {preview && <Guides view={view} guides={preview.guides} size={size} />}
        {onlyFootprint && isWide && (
          <Tie view={view} footprint={onlyFootprint} to={screenPoint(size.widthPx - NOTE_PX + 12, 40)} />
        )}
      </svg>
      {props.children}
    </div>
  )
}

/** The middle of what the sheet shows, on the stage. */
export function middleOf(view: PlotView, size: SheetSize, isWide: boolean): PlotPoint {
  const roomPx = isWide ? size.widthPx - NOTE_PX : size.widthPx
  return plotPoint((roomPx / 2 - view.originXPx) / view.pxPerM, (view.originYPx - size.heightPx / 2) / view.pxPerM)
}
