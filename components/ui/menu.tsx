'use client'

import type { Route } from 'next'
import Link from 'next/link'
import { DropdownMenu } from 'radix-ui'
import type { ReactNode } from 'react'
import { buttonClasses } from './button-classes'
import type { ButtonKind } from './button-classes'

export type MenuItem =
  | { key: string; label: ReactNode; href: Route; disabled?: boolean }
  | { key: string; label: ReactNode; onSelect: () => void; disabled?: boolean }

export interface MenuProps {
  /** The button's words. */
  label: ReactNode
  items: readonly MenuItem[]
  kind?: ButtonKind
  align?: 'start' | 'end'
}

const itemClasses =
  'flex min-h-control cursor-default items-center px-3 outline-none data-highlighted:bg-ink data-highlighted:text-paper data-disabled:text-soft'

/** A button that opens a short list of things to do. */
export function Menu({ label, items, kind = 'secondary', align = 'start' }: MenuProps) {
  return (
    <DropdownMenu.Root>
      <DropdownMenu.Trigger className={buttonClasses(kind)}>
        {label}
        <span
          aria-hidden
          className="ml-1 inline-block size-2 -translate-y-px rotate-45 border-r-2 border-b-2 border-current"
        />
      </DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content
          align={align}
          sideOffset={4}
          className="z-50 min-w-48 border border-ink bg-sheet py-1 text-ink"
        >
          {items.map((item) =>
            'href' in item ? (
              <DropdownMenu.Item key={item.key} disabled={item.disabled ?? false} asChild className={itemClasses}>
                <Link href={item.href}>{item.label}</Link>
              </DropdownMenu.Item>
            ) : (
              <DropdownMenu.Item
                key={item.key}
                disabled={item.disabled ?? false}
                onSelect={item.onSelect}
                className={itemClasses}
              >
                {item.label}
              </DropdownMenu.Item>
            ),
          )}
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  )
}
