'use client'

import { useSyncExternalStore } from 'react'
import { Button } from './button'
import { themeKeys } from './theme-script'
import type { Theme } from './tokens'

function currentTheme(): Theme {
  const chosen = document.documentElement.dataset['theme']
  if (chosen === 'paper' || chosen === 'stage') return chosen
  return matchMedia('(prefers-color-scheme: dark)').matches ? 'stage' : 'paper'
}

function watchTheme(changed: () => void) {
  const observer = new MutationObserver(changed)
  observer.observe(document.documentElement, { attributes: true, attributeFilter: ['data-theme'] })
  const device = matchMedia('(prefers-color-scheme: dark)')
  device.addEventListener('change', changed)
  return () => {
    observer.disconnect()
    device.removeEventListener('change', changed)
  }
}

export interface ThemeToggleProps {
  /** Which of the device's two choices this switch sets. */
  place?: keyof typeof themeKeys
}

/** Changes between the paper theme for daylight and the stage theme for the dark; the device keeps the choice. */
export function ThemeToggle({ place = 'desk' }: ThemeToggleProps) {
  // The bench starts on the stage theme, so the server can say so before the page has woken up.
  const theme = useSyncExternalStore<Theme | null>(watchTheme, currentTheme, () => (place === 'bench' ? 'stage' : null))
  const other: Theme = theme === 'stage' ? 'paper' : 'stage'
  return (
    <Button
      kind="quiet"
      onClick={() => {
        document.documentElement.dataset['theme'] = other
        try {
          localStorage.setItem(themeKeys[place], other)
        } catch {
          // A device that stores nothing still changes for as long as the page is open.
        }
      }}
    >
      <ThemeMark theme={other} />
      {other === 'paper' ? 'Sun' : 'Dark stage'}
    </Button>
  )
}

function ThemeMark({ theme }: { theme: Theme }) {
  return (
    <svg aria-hidden viewBox="0 0 16 16" className="size-4" fill="none" stroke="currentColor" strokeWidth="1.5">
      {theme === 'paper' ? (
        <>
          <circle cx="8" cy="8" r="3.25" />
          <path d="M8 1v2M8 13v2M1 8h2M13 8h2M3 3l1.5 1.5M11.5 11.5 13 13M13 3l-1.5 1.5M4.5 11.5 3 13" />
        </>
      ) : (
        <>
          <circle cx="8" cy="8" r="6.25" />
          <path d="M8 1.75a6.25 6.25 0 0 1 0 12.5Z" fill="currentColor" />
        </>
      )}
    </svg>
  )
}
