import type { ReactNode } from 'react'

export interface LiveRegionProps {
  /** `assertive` interrupts: only for what must not wait. */
  politeness?: 'polite' | 'assertive'
  /** Shown as well as read out. */
  visible?: boolean
  className?: string
  children: ReactNode
}

/** Text whose changes are read out. It must stay on the page, empty, before there is anything to say. */
export function LiveRegion({ politeness = 'polite', visible = false, className, children }: LiveRegionProps) {
  return (
    <div aria-live={politeness} aria-atomic="true" className={visible ? className : 'sr-only'}>
      {children}
    </div>
  )
}
