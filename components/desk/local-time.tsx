'use client'

import { useSyncExternalStore } from 'react'

const neverChanges = () => () => undefined
const readersZone = () => Intl.DateTimeFormat().resolvedOptions().timeZone

/** A moment as the reader's own clock shows it, with its zone; in UTC until the page has woken up. */
export function LocalTime({ iso }: { iso: string }) {
  const zone = useSyncExternalStore(neverChanges, readersZone, () => 'UTC')
  const words = new Intl.DateTimeFormat('en-GB', {
    weekday: 'short',
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    timeZone: zone,
  }).format(new Date(iso))
  return (
    <time dateTime={iso}>
      {words} <span className="text-soft">{zone}</span>
    </time>
  )
}
