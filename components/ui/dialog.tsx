'use client'

import { Dialog as Radix } from 'radix-ui'
import type { ReactNode } from 'react'
import { Button } from './button'

export interface DialogProps {
  open: boolean
  onOpenChange: (open: boolean) => void
  title: ReactNode
  description?: ReactNode
  children?: ReactNode
  /** The buttons at the foot; "Close" is always there. */
  actions?: ReactNode
  /** The words of the button that leaves everything as it was. */
  closeLabel?: string
}

/** A sheet laid over the page; focus stays in it until it is closed and then goes back to where it was. */
export function Dialog({
  open,
  onOpenChange,
  title,
  description,
  children,
  actions,
  closeLabel = 'Close',
}: DialogProps) {
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 bg-ink/50" />
        <Radix.Content
          className="fixed inset-x-0 bottom-0 z-50 flex max-h-[92dvh] flex-col border-2 border-ink bg-sheet text-ink sm:inset-x-auto sm:top-1/2 sm:bottom-auto sm:left-1/2 sm:w-[36rem] sm:max-w-[calc(100vw-2rem)] sm:-translate-x-1/2 sm:-translate-y-1/2"
          {...(description === undefined ? { 'aria-describedby': undefined } : {})}
        >
          <div className="min-h-0 grow overflow-y-auto p-5">
            <Radix.Title className="text-2xl">{title}</Radix.Title>
            {description !== undefined && (
              <Radix.Description asChild>
                <div className="mt-1 text-soft">{description}</div>
              </Radix.Description>
            )}
            <div className="mt-4">{children}</div>
          </div>
          <div className="flex flex-wrap justify-end gap-2 border-t border-line p-4">
            <Radix.Close asChild>
              <Button kind="quiet">{closeLabel}</Button>
            </Radix.Close>
            {actions}
          </div>
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  )
}
