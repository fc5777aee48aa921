import { useRef } from 'react'
import type { KeyboardEvent, PointerEvent } from 'react'
import { beadClasses, scalePercent } from '@/components/signature/range-bar'
import type { RangeScale } from '@/components/signature/range-bar'

/** Where a note is moved to: by semitones with its cents kept, by cents, or to a place on the count of semitones. */
export type NoteMove = { by: number } | { byCents: number } | { to: number }

export interface NoteBeadProps {
  scale: RangeScale
  /** The note on the A4 = 69 count, with fractions. */
  at: number
  /** The name of a note that is about there. */
  name: string
  /** The drum, for screen readers. */
  label: string
  /** The note with its frequency and how it stands. */
  valueText: string
  /** The lowest and highest playable. */
  low: number
  high: number
  /** The one whose choices are shown. */
  chosen: boolean
  onChoose: () => void
  /** One step by a key. */
  onMove: (move: NoteMove) => void
  /** A note in hand: dragged, put down, or let go where it was. */
  onSlide: (move: NoteMove) => void
  onPutDown: () => void
  onLetGo: () => void
}

function moveOf({ key, altKey, shiftKey }: KeyboardEvent, low: number, high: number): NoteMove | null {
  const way = key === 'ArrowRight' || key === 'ArrowUp' ? 1 : key === 'ArrowLeft' || key === 'ArrowDown' ? -1 : 0
  if (way !== 0) return altKey ? { byCents: shiftKey ? way * 10 : way } : { by: shiftKey ? way * 12 : way }
  if (key === 'PageUp') return { by: 12 }
  if (key === 'PageDown') return { by: -12 }
  if (key === 'Home') return { to: Math.ceil(low) }
  if (key === 'End') return { to: Math.floor(high) }
  return null
}

/**
 * A drum's note on its range. Arrow keys move it a semitone, with Shift an octave, with Alt a cent; Home and End go to the edges of
 * the range. Dragged, it snaps to semitones, with Alt to cents; Escape lets it go.
 */
export function NoteBead(props: NoteBeadProps) {
  const { scale, at, name, label, valueText, low, high, chosen, onChoose, onMove, onSlide, onPutDown, onLetGo } = props
  const hand = useRef<{ fromX: number; fromAt: number; semitonesPerPx: number; slid: boolean } | null>(null)

  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'Escape' && hand.current) {
      hand.current = null
      return onLetGo()
    }
    const move = moveOf(event, low, high)
    if (!move || event.ctrlKey || event.metaKey) return
    event.preventDefault()
    onMove(move)
  }
  const onPointerDown = (event: PointerEvent<HTMLSpanElement>) => {
    const width = event.currentTarget.parentElement?.getBoundingClientRect().width
    if (event.button !== 0 || !width) return
    const semitonesPerPx = (scale.to - scale.from) / width
    hand.current = { fromX: event.clientX, fromAt: at, semitonesPerPx, slid: false }
    event.currentTarget.setPointerCapture(event.pointerId)
    event.currentTarget.focus({ preventScroll: true })
  }
  const onPointerMove = (event: PointerEvent) => {
    const held = hand.current
    if (!held) return
    const pitch = held.fromAt + (event.clientX - held.fromX) * held.semitonesPerPx
    const to = event.altKey ? Math.round(pitch * 100) / 100 : held.fromAt + Math.round(pitch - held.fromAt)
    if (to === at) return
    held.slid = true
    onSlide({ to })
  }
  const end = (finish: () => void) => {
    const slid = hand.current?.slid
    hand.current = null
    if (slid) finish()
  }
  return (
    <span
      role="slider"
      tabIndex={0}
      aria-label={label}
      aria-valuemin={12}
      aria-valuemax={96}
      aria-valuenow={Math.round(at)}
      aria-valuetext={valueText}
      data-part="note"
      className={`${beadClasses(at < low || at > high)} ${chosen ? 'z-20 ring-3 ring-spike' : 'z-10'} scroll-my-36 cursor-ew-resize touch-none select-none after:absolute after:-inset-2`}
      style={{ left: `${scalePercent(scale, at)}%` }}
      onFocus={onChoose}
      onKeyDown={onKeyDown}
      onPointerDown={onPointerDown}
      onPointerMove={onPointerMove}
      onPointerUp={() => end(onPutDown)}
      onPointerCancel={() => end(onLetGo)}
    >
      {name}
    </span>
  )
}
