'use client'

import { useEffect, useRef } from 'react'
import type { ReactNode } from 'react'

/** A box that scrolls sideways and brings what is current in it (`aria-current`) to its middle. */
export function KeepInView({ className, children }: { className?: string; children: ReactNode }) {
  const box = useRef<HTMLDivElement>(null)
  useEffect(() => {
    const current = box.current?.querySelector<HTMLElement>('[aria-current]')
    if (!box.current || !current) return
    const { left, width } = current.getBoundingClientRect()
    const frame = box.current.getBoundingClientRect()
    box.current.scrollLeft += left + width / 2 - (frame.left + frame.width / 2)
  }, [children])
  return (
    <div ref={box} className={className}>
      {children}
    </div>
  )
}
