'use client'

import type { ReactNode } from 'react'
import { useEffect, useRef } from 'react'

/** The sheet that an opened form lies on; its first field takes the focus. */
export function FormSheet({ children }: { children: ReactNode }) {
  const sheet = useRef<HTMLDivElement>(null)
  useEffect(() => {
    // A menu that opened the sheet first gives the focus back to its own button; this comes after it.
    const turn = setTimeout(() => sheet.current?.querySelector<HTMLElement>('input, select, textarea')?.focus(), 50)
    return () => clearTimeout(turn)
  }, [])
  return (
    <div ref={sheet} className="w-full max-w-3xl border border-ink bg-sheet p-4">
      {children}
    </div>
  )
}
