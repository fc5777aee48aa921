'use client'

import type { ReactNode } from 'react'
import { useEffect, useRef, useState } from 'react'
import { Button } from '@/components/ui/button'
import type { ButtonKind } from '@/components/ui/button-classes'
import { FormSheet } from './form-sheet'

export interface OpenedFormProps {
  /** The words of the button that opens it ("Add a stage"). */
  action: string
  kind?: ButtonKind
  children: (close: () => void) => ReactNode
}

/** A button that gives way to its form; closing brings the button and its focus back. */
export function OpenedForm({ action, kind = 'secondary', children }: OpenedFormProps) {
  const [open, setOpen] = useState(false)
  const wasOpen = useRef(false)
  const button = useRef<HTMLButtonElement>(null)
  useEffect(() => {
    if (!open && wasOpen.current) button.current?.focus()
    wasOpen.current = open
  }, [open])
  if (!open) {
    return (
      <Button ref={button} kind={kind} onClick={() => setOpen(true)}>
        {action}
      </Button>
    )
  }
  return <FormSheet>{children(() => setOpen(false))}</FormSheet>
}
