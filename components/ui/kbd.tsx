import type { ReactNode } from 'react'

/** A key on the keyboard. */
export function Kbd({ children }: { children: ReactNode }) {
  return <kbd className="figures border border-b-2 border-ink bg-sheet px-1.5 text-[0.8125rem]">{children}</kbd>
}
