'use client'

import type { ReactNode } from 'react'
import { useEffect, useRef, useState } from 'react'
import { Button } from '@/components/ui/button'
import type { ButtonKind } from '@/components/ui/button-classes'

export interface OpenedFormProps {
  /** The words of the button that opens it ("Add a stage"). */
  action: string
  kind?: ButtonKind
  className?: string
  children: (close: () => void) => ReactNode
}

/** A button that gives way to its form; closing brings the button and its focus back. */
export function OpenedForm({ action, kind = 'secondary', className, children }: OpenedFormProps) {
  const [open, setOpen] = useState(false)
  const wasOpen = useRef(false)
  const button = useRef<HTMLButtonElement>(null)
  const sheet = useRef<HTMLDivElement>(null)
  useEffect(() => {
    if (open) sheet.current?.querySelector<HTMLElement>('input, select, textarea')?.focus()
    else if (wasOpen.current) button.current?.focus()
    wasOpen.current = open
  }, [open])
  if (!open) {
    return (
      <Button ref={button} kind={kind} onClick={() => setOpen(true)} {...(className ? { className } : {})}>
        {action}
      </Button>
    )
  }
  return (
    <div ref={sheet} className="w-full max-w-3xl border border-ink bg-sheet p-4">
      {children(() => setOpen(false))}
    </div>
  )
}
