'use client'

import { useState, useSyncExternalStore } from 'react'
import { createNoteSession } from './note-session'
import type { PlanChoices } from './note-session'

function deviceStorage(): Storage | null {
  try {
    return typeof window === 'undefined' ? null : window.localStorage
  } catch {
    return null
  }
}

/**
 * The plan of this page and the way to change it. The page begins with the kit's notes and then takes up what the device kept; who
 * only reads keeps nothing.
 */
export function useNoteSession(input: { rigId: string; choices: PlanChoices; keeps: boolean }) {
  const [session] = useState(() =>
    createNoteSession({
      ...input,
      shelf: input.keeps ? deviceStorage() : null,
      now: () => new Date(),
    }),
  )
  const state = useSyncExternalStore(session.subscribe, session.state, session.fresh)
  return { session, state }
}
