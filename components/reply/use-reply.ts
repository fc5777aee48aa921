'use client'

import { useEffect, useState, useSyncExternalStore } from 'react'
import { createReplySession } from '@/lib/client/reply/reply-session'
import type { Reply } from '@/lib/contracts/answer'

function deviceStorage(): Storage | null {
  try {
    return typeof window === 'undefined' ? null : window.localStorage
  } catch {
    return null
  }
}

/** The reply of this page: what the server tells, what waits on this device, and the way to answer. */
export function useReply(initial: Reply, token: string) {
  const [session] = useState(() => createReplySession({ initial, token, storage: deviceStorage() }))
  const state = useSyncExternalStore(session.subscribe, session.state, session.state)
  useEffect(() => session.start(), [session])
  return { session, state }
}

const nameKey = 'hoopwright reply name'
const nameListeners = new Set<() => void>()

function readName(): string {
  try {
    return deviceStorage()?.getItem(nameKey) ?? unkeptName
  } catch {
    return unkeptName
  }
}
let unkeptName = ''

function watchName(changed: () => void) {
  nameListeners.add(changed)
  return () => {
    nameListeners.delete(changed)
  }
}

/** Who answers on this phone: asked once, kept on the device. */
export function useAnswererName(): [string, (name: string) => void] {
  const name = useSyncExternalStore(watchName, readName, () => '')
  return [
    name,
    (next) => {
      unkeptName = next
      try {
        deviceStorage()?.setItem(nameKey, next)
      } catch {
        // Storage that keeps nothing: the name lasts as long as this page.
      }
      nameListeners.forEach((listener) => listener())
    },
  ]
}
