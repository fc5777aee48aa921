import type { ReactNode } from 'react'

export interface EmptyStateProps {
  /** What is not here yet ("No drums in this kit yet"). */
  title: ReactNode
  /** What to do first, and what then follows from it. */
  children: ReactNode
  action?: ReactNode
}

/** An empty place says what to do first. */
export function EmptyState({ title, children, action }: EmptyStateProps) {
  return (
    <div className="border border-dashed border-ink px-5 py-6">
      <p className="name text-xl">{title}</p>
      <div className="mt-1 max-w-prose text-soft">{children}</div>
      {action && <div className="mt-4 flex flex-wrap gap-2">{action}</div>}
    </div>
  )
}
