'use client'

import { ThemeToggle } from '@/components/ui/theme-toggle'
import type { BenchPlace } from '@/lib/client/bench/bench-server'
import type { Bench } from '@/lib/contracts/bench'
import { DrumList } from './drum-list'
import { HeadPage } from './head-page'
import { SendState } from './send-state'
import { useBench, useKept, useOpenHead } from './use-bench'

export interface BenchAppProps {
  initial: Bench
  place: BenchPlace
  /** Whose kept readings these are on this device. */
  owner: string
  /** The signed-in person's name; null behind a link, where a name is asked for. */
  ownName: string | null
}

/** The bench: the night's drums, and one head at a time. Everything works without signal once the page is open. */
export function BenchApp({ initial, place, owner, ownName }: BenchAppProps) {
  const { session, state } = useBench(initial, place, owner)
  const open = useOpenHead()
  const [keptName, keepName] = useKept('hoopwright bench name', '')
  const { bench } = state
  const drum = bench.drums.find(({ entryId }) => entryId === open?.entryId)
  const head = drum?.heads.find(({ side }) => side === open?.side)
  return (
    <div className="thumb mx-auto max-w-xl px-4 pb-16">
      <header className="flex min-h-12 items-center justify-between gap-3">
        {drum && head ? (
          <a href="#" className="inline-flex min-h-12 items-center font-bold underline underline-offset-4">
            All drums
          </a>
        ) : (
          place.kind === 'link' && <span className="name text-lg">Hoopwright</span>
        )}
        {place.kind === 'link' && <ThemeToggle place="bench" />}
      </header>
      <SendState state={state} retry={session.retryNow} letGo={session.letGo} drums={bench.drums} />
      {drum && head ? (
        <HeadPage
          key={`${drum.entryId} ${head.side}`}
          {...{ bench, drum, head, session }}
          name={ownName ?? keptName}
          keepName={ownName === null ? keepName : null}
        />
      ) : (
        <DrumList bench={bench} name={keptName} keepName={ownName === null ? keepName : null} />
      )}
    </div>
  )
}
