import { scalePercent } from '@/components/signature/range-bar'
import type { RangeScale } from '@/components/signature/range-bar'

export interface FirstNoteProps {
  scale: RangeScale
  /** The middle of the drum's range. */
  at: number
  drumName: string
  onGive: (at: number) => void
}

/** Stands where a bead would, on a drum that has no note yet: gives it the one in the middle of its range. */
export function FirstNote({ scale, at, drumName, onGive }: FirstNoteProps) {
  return (
    <button
      type="button"
      className="absolute top-1/2 z-10 flex h-7 -translate-x-1/2 -translate-y-1/2 items-center border-2 border-dashed border-ink bg-sheet px-2 text-[0.75rem] font-bold whitespace-nowrap after:absolute after:-inset-2"
      style={{ left: `${scalePercent(scale, at)}%` }}
      onClick={() => onGive(at)}
    >
      Give it a note<span className="sr-only">: {drumName}</span>
    </button>
  )
}
