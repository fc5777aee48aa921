'use client'

import { QueryClient, QueryClientProvider, useQueryClient } from '@tanstack/react-query'
import { useRouter } from 'next/navigation'
import type { ReactNode } from 'react'
import { createContext, useContext, useEffect, useState } from 'react'
import { AppError } from '@/lib/errors'
import { listenLive } from './live-events'

type Subscribe = (heard: (topics: string[]) => void) => () => void
const LiveContext = createContext<Subscribe>(() => () => undefined)

/** Refusals are answers: only a lost connection or a server fault is worth asking again. */
function mayRetry(count: number, error: Error): boolean {
  return count < 2 && !(error instanceof AppError && error.code !== 'unavailable' && error.code !== 'internal')
}

/** The desk's query cache and its one event stream. Query keys begin with a topic's two words, `[kind, id, …]`. */
export function DeskProviders({ children }: { children: ReactNode }) {
  const [client] = useState(
    () =>
      new QueryClient({
        defaultOptions: { queries: { staleTime: 30_000, retry: mayRetry }, mutations: { retry: false, networkMode: 'always' } },
      }),
  )
  const [listeners] = useState(() => new Set<(topics: string[]) => void>())
  const [subscribe] = useState(() => (heard: (topics: string[]) => void) => {
    listeners.add(heard)
    return () => listeners.delete(heard)
  })
  useEffect(
    () => listenLive('/api/live', (topics) => listeners.forEach((listener) => listener(topics))),
    [listeners],
  )
  return (
    <QueryClientProvider client={client}>
      <LiveContext value={subscribe}>
        <InvalidateOnLive />
        {children}
      </LiveContext>
    </QueryClientProvider>
  )
}

function useLiveTopics(heard: (topics: string[]) => void): void {
  const subscribe = useContext(LiveContext)
  useEffect(() => subscribe(heard), [subscribe, heard])
}

function InvalidateOnLive() {
  const client = useQueryClient()
  const [heard] = useState(() => (topics: string[]) => {
    if (topics.includes('resync')) return void client.invalidateQueries()
    for (const topic of topics) void client.invalidateQueries({ queryKey: topic.split(':') })
  })
  useLiveTopics(heard)
  return null
}

/** On a page that the server renders: reads it again when one of its topics changes. */
export function RefreshOnLive({ topics }: { topics: string[] }) {
  const router = useRouter()
  const wanted = topics.join(' ')
  const subscribe = useContext(LiveContext)
  useEffect(
    () =>
      subscribe((heard) => {
        if (heard.includes('resync') || heard.some((topic) => wanted.split(' ').includes(topic))) router.refresh()
      }),
    [subscribe, router, wanted],
  )
  return null
}
