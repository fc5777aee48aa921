import type { ReactNode } from 'react'

/** The heading of a page at the door, with what it is for. */
export function DoorHeading({ title, children }: { title: string; children?: ReactNode }) {
  return (
    <div className="mb-6">
      <h1 className="text-4xl">{title}</h1>
      {children && <div className="mt-2 space-y-2 text-soft">{children}</div>}
    </div>
  )
}
