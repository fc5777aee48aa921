import type { ReactNode } from 'react'
import { classes } from '@/components/ui/classes'
import { round } from './round'

/** The stretch of pitch that a bar or a chart shows, and the places in it: any measure that runs evenly, such as semitones. */
export interface RangeScale {
  from: number
  to: number
}

export interface RangeBarProps {
  scale: RangeScale
  /** Lowest and highest playable. */
  low: number
  high: number
  /** The middle of the range, where the head is neither slack nor choked. */
  middleLow: number
  middleHigh: number
  /** Where the note lies, and its name; null: no note yet. */
  note: { at: number; name: string } | null
  /** The bar in words ("Tom 12: D3, in the middle of its range, A2 to F3"). */
  label: string
  /** Stands in place of the bead, where the note can be moved; it places itself by `scalePercent`. */
  bead?: ReactNode
  /** Another note to compare with, drawn as an empty ring behind the bead. */
  ghost?: number | null
  /** Writes "slack" and "choked" into the two ends, where there is room beside the bead. */
  ends?: boolean
  className?: string
}

/** A place on the scale as a percentage of its width, held to the scale's ends. */
export function scalePercent(scale: RangeScale, at: number): number {
  return round(Math.min(100, Math.max(0, ((at - scale.from) / (scale.to - scale.from)) * 100)))
}

/** The look of a note on its range: round inside it, square and spike outside. */
export function beadClasses(out: boolean): string {
  return classes(
    'figures absolute top-1/2 flex h-7 min-w-7 -translate-x-1/2 -translate-y-1/2 items-center justify-center px-1 text-[0.6875rem] font-bold',
    out ? 'bg-spike-text text-paper' : 'rounded-full bg-ink text-paper',
  )
}

/** Nearer than this to an end of the bar, in semitones, a bead covers the word that stands there. */
const endWordReach = 4

/** A drum's playable range with its middle shaded and the note as a bead. A bead outside the range is square and spike. */
export function RangeBar({
  scale,
  low,
  high,
  middleLow,
  middleHigh,
  note,
  label,
  bead,
  ghost = null,
  ends,
  className,
}: RangeBarProps) {
  const place = (from: number, to: number) => ({
    left: `${scalePercent(scale, from)}%`,
    width: `${round(scalePercent(scale, to) - scalePercent(scale, from))}%`,
  })
  const out = note !== null && (note.at < low || note.at > high)
  const clear = (end: number) =>
    [note?.at ?? null, ghost].every((at) => at === null || Math.abs(at - end) > endWordReach)
  return (
    <div role={bead ? 'group' : 'img'} aria-label={label} className={className}>
      <div className="relative h-8">
        <div
          className="absolute inset-y-2 flex items-center justify-between border border-line bg-wash px-1 text-[0.6875rem] leading-none text-soft"
          style={place(low, high)}
          data-part="range"
        >
          {ends && (
            <>
              <span className="max-sm:hidden">{clear(low) && 'slack'}</span>
              <span className="max-sm:hidden">{clear(high) && 'choked'}</span>
            </>
          )}
        </div>
        <div className="absolute inset-y-2 bg-reed/35" style={place(middleLow, middleHigh)} data-part="middle" />
        {ghost !== null && ghost !== note?.at && (
          <span
            data-part="ghost"
            className="absolute top-1/2 size-7 -translate-x-1/2 -translate-y-1/2 rounded-full border-2 border-dashed border-plum"
            style={{ left: `${scalePercent(scale, ghost)}%` }}
          />
        )}
        {bead}
        {note && !bead && (
          <span data-part="note" className={beadClasses(out)} style={{ left: `${scalePercent(scale, note.at)}%` }}>
            {note.name}
          </span>
        )}
      </div>
    </div>
  )
}
