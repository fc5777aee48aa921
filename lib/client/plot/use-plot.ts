'use client'

import { useQuery } from '@tanstack/react-query'
import { useEffect, useState, useSyncExternalStore } from 'react'
import type { PlotAnswer } from '@/lib/contracts/plot'
import { createPlotSession, type PlotSession, type PlotSessionState } from './plot-session'
import { plotServer } from './plot-server'
import { browserUnsentStore } from './unsent-store'

/** The plot of a rig in hand: its state, and the session that changes, keeps and sends it. */
export function usePlot(input: { initial: PlotAnswer; personId: string }): {
  state: PlotSessionState
  session: PlotSession
} {
  const { initial, personId } = input
  const { rigId } = initial
  const [session] = useState(() =>
    createPlotSession({
      initial,
      server: plotServer(rigId),
      store: browserUnsentStore({ personId, rigId }, crypto.randomUUID()),
      newId: () => crypto.randomUUID(),
    }),
  )
  const state = useSyncExternalStore(session.subscribe, session.read, session.read)
  useEffect(() => {
    void session.start()
    const online = () => session.retryNow()
    window.addEventListener('online', online)
    return () => {
      window.removeEventListener('online', online)
      session.stop()
    }
  }, [session])
  // The live provider invalidates this key when the plot changed; fetching it is catching up.
  useQuery({
    queryKey: ['plot', rigId],
    queryFn: async () => {
      await session.catchUp()
      return session.read().unsentCount
    },
    staleTime: Infinity,
    refetchOnMount: 'always',
  })
  return { state, session }
}
