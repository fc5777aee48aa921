'use client'

import { useEffect } from 'react'

/** Ctrl+Z and Ctrl+Shift+Z (or Ctrl+Y) anywhere on the page but in a box that is typed in, which has an undo of its own. */
export function useUndoKeys(undo: () => void, redo: () => void, on: boolean): void {
  useEffect(() => {
    if (!on) return
    const heard = (event: KeyboardEvent) => {
      const typing =
        event.target instanceof HTMLElement && event.target.matches('input:not([type="checkbox"]), textarea, select')
      if (typing || event.altKey || !(event.ctrlKey || event.metaKey)) return
      const key = event.key.toLowerCase()
      if (key !== 'z' && key !== 'y') return
      event.preventDefault()
      if (key === 'y' || event.shiftKey) redo()
      else undo()
    }
    window.addEventListener('keydown', heard)
    return () => window.removeEventListener('keydown', heard)
  }, [undo, redo, on])
}
