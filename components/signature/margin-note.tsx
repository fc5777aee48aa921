import { useId } from 'react'
import type { ReactNode } from 'react'
import { classes } from '@/components/ui/classes'
import { round } from './round'

export interface MarginNoteProps {
  title: ReactNode
  subtitle?: ReactNode
  /** The particulars, a word and its value each; numbers align at the right. */
  rows: readonly { term: ReactNode; value: ReactNode }[]
  children?: ReactNode
  className?: string
}

/** A piece's particulars, standing in the margin beside it. `MarginTie` draws the line between the two. */
export function MarginNote({ title, subtitle, rows, children, className }: MarginNoteProps) {
  const id = useId()
  return (
    <aside aria-labelledby={id} className={classes('w-full max-w-64', className)}>
      <h2 id={id} className="text-2xl">
        {title}
      </h2>
      {subtitle && <p className="text-sm text-soft">{subtitle}</p>}
      <dl className="mt-2">
        {rows.map((row, index) => (
          <div key={index} className="flex items-baseline justify-between gap-4 border-b border-line py-1">
            <dt className="text-sm text-soft">{row.term}</dt>
            <dd className="figures text-right text-[0.9375rem] font-bold">{row.value}</dd>
          </div>
        ))}
      </dl>
      {children}
    </aside>
  )
}

export interface MarginTieProps {
  /** The piece's edge and the note's, in pixels from the top left of the nearest positioned box around both. */
  from: { x: number; y: number }
  to: { x: number; y: number }
}

/** The line from a piece to its margin note, laid over the box that holds both. */
export function MarginTie({ from, to }: MarginTieProps) {
  return (
    <svg aria-hidden className="pointer-events-none absolute inset-0 size-full overflow-visible text-ink">
      <line
        x1={round(from.x)}
        y1={round(from.y)}
        x2={round(to.x)}
        y2={round(to.y)}
        stroke="currentColor"
        strokeWidth={1}
      />
      <circle cx={round(from.x)} cy={round(from.y)} r={2.5} fill="currentColor" />
    </svg>
  )
}
