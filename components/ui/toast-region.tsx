'use client'

import { useEffect, useState, useSyncExternalStore } from 'react'
import { Button } from './button'
import { dismissToast, toastStore } from './toast'
import type { Toast } from './toast'

const shownForMs = 10_000
const none: readonly Toast[] = []

/** Where toasts stand: once, in a layout. Each stays ten seconds, longer while it is pointed at or has focus. */
export function ToastRegion() {
  const toasts = useSyncExternalStore(toastStore.subscribe, toastStore.read, () => none)
  return (
    <div
      role="status"
      className="pointer-events-none fixed inset-x-0 bottom-0 z-50 flex flex-col items-center gap-2 p-4 print:hidden"
    >
      {toasts.map((toast) => (
        <ToastLine key={toast.id} toast={toast} />
      ))}
    </div>
  )
}

function ToastLine({ toast }: { toast: Toast }) {
  const [held, setHeld] = useState(false)
  useEffect(() => {
    if (held) return
    const timer = setTimeout(() => dismissToast(toast.id), shownForMs)
    return () => clearTimeout(timer)
  }, [held, toast.id])

  return (
    <div
      className="pointer-events-auto flex w-full max-w-xl flex-wrap items-center gap-x-4 gap-y-1 border-2 border-ink bg-sheet py-2 pr-2 pl-4"
      onPointerEnter={() => setHeld(true)}
      onPointerLeave={() => setHeld(false)}
      onFocus={() => setHeld(true)}
      onBlur={() => setHeld(false)}
    >
      <p className="min-w-0 grow basis-48">{toast.message}</p>
      {toast.undo && (
        <Button
          onClick={() => {
            toast.undo?.run()
            dismissToast(toast.id)
          }}
        >
          {toast.undo.label}
        </Button>
      )}
      <Button kind="quiet" onClick={() => dismissToast(toast.id)}>
        Close
      </Button>
    </div>
  )
}
