import type { ReactNode } from 'react'
import { classes } from '@/components/ui/classes'
import type { Standing } from '@/lib/advance/standing'

/** Colour and shape; the shapes differ each from each, so that print and every eye can tell them apart. */
const looks: Record<Standing, { text: string; shape: ReactNode }> = {
  'not sent': { text: 'text-soft', shape: <circle cx="8" cy="8" r="5" fill="none" strokeDasharray="2.5 2" /> },
  out: { text: 'text-brass', shape: <path d="M2 8h11M9 4l4 4-4 4" fill="none" /> },
  'not delivered': { text: 'text-spike-text', shape: <path d="m3 3 10 10M13 3 3 13" fill="none" /> },
  overdue: { text: 'text-spike-text', shape: <path d="M8 2.5 14 13H2Z" fill="currentColor" /> },
  'part answered': {
    text: 'text-brass',
    shape: (
      <>
        <circle cx="8" cy="8" r="5" fill="none" />
        <path d="M8 3a5 5 0 0 0 0 10Z" fill="currentColor" stroke="none" />
      </>
    ),
  },
  answered: { text: 'text-brass', shape: <circle cx="8" cy="8" r="5" fill="currentColor" /> },
  settled: { text: 'text-reed', shape: <path d="m2.5 8.5 4 4 7-9" fill="none" strokeWidth="2.5" /> },
  'changed since': { text: 'text-plum', shape: <path d="M8 2l6 6-6 6-6-6Z" fill="currentColor" /> },
}

/** A recipient's standing: its word, with a shape and a colour. */
export function StandingBadge({ standing, className }: { standing: Standing; className?: string }) {
  const look = looks[standing]
  return (
    <span
      className={classes('inline-flex items-center gap-1.5 text-sm font-bold whitespace-nowrap', look.text, className)}
    >
      <svg aria-hidden viewBox="0 0 16 16" className="size-3.5 shrink-0" stroke="currentColor" strokeWidth="1.75">
        {look.shape}
      </svg>
      {standing}
    </span>
  )
}
