import { useId } from 'react'
import type { ReactNode } from 'react'

export interface ProgressProps {
  /** What is counted, in words ("7 of 11 answered"). */
  label: ReactNode
  done: number
  total: number
}

/** How far something is, as a bar and in words. */
export function Progress({ label, done, total }: ProgressProps) {
  const id = useId()
  const share = total > 0 ? Math.min(1, Math.max(0, done / total)) : 0
  return (
    <div>
      <div
        role="progressbar"
        aria-labelledby={id}
        aria-valuemin={0}
        aria-valuemax={total}
        aria-valuenow={done}
        className="h-2 border border-ink bg-sheet"
      >
        <div className="h-full bg-reed" style={{ width: `${share * 100}%` }} />
      </div>
      <p id={id} className="mt-1 text-sm text-soft">
        {label}
      </p>
    </div>
  )
}
