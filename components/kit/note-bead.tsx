import { useRef } from 'react'
import type { KeyboardEvent, PointerEvent } from 'react'
import { beadClasses, scalePercent } from '@/components/signature/range-bar'
import type { RangeScale } from '@/components/signature/range-bar'

export interface NoteBeadProps {
  scale: RangeScale
  /** The note on the A4 = 69 count, with fractions. */
  at: number
  /** The name of a note that is about there. */
  name: string
  /** The drum and the note with its frequency, for screen readers. */
  label: string
  valueText: string
  out: boolean
  /** Moves the note by whole semitones. */
  onMove: (semitones: number) => void
}

const keySteps: Record<string, number> = {
  ArrowRight: 1,
  ArrowUp: 1,
  ArrowLeft: -1,
  ArrowDown: -1,
  PageUp: 12,
  PageDown: -12,
}

/** A drum's note on its range: moved a semitone at a time by the arrow keys, or drawn along. */
export function NoteBead({ scale, at, name, label, valueText, out, onMove }: NoteBeadProps) {
  const held = useRef(false)
  const onKeyDown = (event: KeyboardEvent) => {
    const step = keySteps[event.key]
    if (step === undefined) return
    event.preventDefault()
    onMove(step)
  }
  const onPointerMove = (event: PointerEvent<HTMLSpanElement>) => {
    const track = event.currentTarget.parentElement?.getBoundingClientRect()
    if (!held.current || !track || track.width === 0) return
    const pitch = scale.from + ((event.clientX - track.left) / track.width) * (scale.to - scale.from)
    const steps = Math.round(pitch - at)
    if (steps !== 0) onMove(steps)
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
      className={`${beadClasses(out)} cursor-ew-resize touch-none select-none after:absolute after:-inset-2`}
      style={{ left: `${scalePercent(scale, at)}%` }}
      onKeyDown={onKeyDown}
      onPointerDown={(event) => {
        held.current = true
        event.currentTarget.setPointerCapture(event.pointerId)
      }}
      onPointerMove={onPointerMove}
      onPointerUp={() => (held.current = false)}
      onPointerCancel={() => (held.current = false)}
    >
      {name}
    </span>
  )
}
