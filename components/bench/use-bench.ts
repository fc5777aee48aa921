'use client'

import { useEffect, useState, useSyncExternalStore } from 'react'
import { createBenchQueue } from '@/lib/client/bench/bench-queue'
import type { BenchPlace } from '@/lib/client/bench/bench-server'
import { benchServer } from '@/lib/client/bench/bench-server'
import { createBenchSession } from '@/lib/client/bench/bench-session'
import { newId } from '@/lib/client/bench/new-id'
import type { Bench } from '@/lib/contracts/bench'

function deviceStorage(): Storage | null {
  try {
    return typeof window === 'undefined' ? null : window.localStorage
  } catch {
    return null
  }
}

/** The bench of this page: what the server tells, what waits here, and the way to log. */
export function useBench(initial: Bench, place: BenchPlace, owner: string) {
  const [session] = useState(() =>
    createBenchSession({
      initial,
      newId,
      server: benchServer(place),
      queue: createBenchQueue(deviceStorage(), `${owner} ${initial.show.id}`, newId),
    }),
  )
  const state = useSyncExternalStore(session.subscribe, session.state, session.state)
  useEffect(() => {
    session.start()
    // A phone that comes out of a pocket or back into signal does not wait for the next try.
    const again = () => {
      if (document.visibilityState === 'visible') session.retryNow()
    }
    window.addEventListener('online', again)
    document.addEventListener('visibilitychange', again)
    return () => {
      session.stop()
      window.removeEventListener('online', again)
      document.removeEventListener('visibilitychange', again)
    }
  }, [session])
  return { session, state }
}

function watchHash(changed: () => void) {
  window.addEventListener('hashchange', changed)
  return () => window.removeEventListener('hashchange', changed)
}

let openHash = ''

/** The last address after `#` that names a head or none: a jump to a place on the page (`#main`) changes no head. */
function headHash(): string {
  const hash = window.location.hash.slice(1)
  if (hash === '' || /^[^/]+\/(batter|resonant)$/.test(hash)) openHash = hash
  return openHash
}

/** Which head is open: the address after `#`, so that the back button works and nothing is fetched to change heads. */
export function useOpenHead(): { entryId: string; side: string } | null {
  const [entryId, side] = useSyncExternalStore(watchHash, headHash, () => '').split('/')
  return entryId && side ? { entryId, side } : null
}

/** A small choice that the device remembers from page to page. */
export function useKept(key: string, fallback: string): [string, (value: string) => void] {
  const [value, setValue] = useState<string | null>(null)
  const kept = useSyncExternalStore(
    watchNothing,
    () => readKept(key) ?? fallback,
    () => fallback,
  )
  return [
    value ?? kept,
    (next) => {
      setValue(next)
      try {
        deviceStorage()?.setItem(key, next)
      } catch {
        // It is remembered for as long as the page is open.
      }
    },
  ]
}

function watchNothing() {
  return () => undefined
}

function readKept(key: string): string | null {
  try {
    return deviceStorage()?.getItem(key) ?? null
  } catch {
    return null
  }
}
