import type { ReactNode } from 'react'
import { Trace } from '@/components/signature/trace'
import type { HeadView } from '@/lib/client/bench/head-view'
import { headStandingWords } from '@/lib/client/bench/head-view'
import type { BenchDrum, BenchHead } from '@/lib/contracts/bench'
import { outWords } from '@/lib/tuning/head-state-words'

/** The readings of a head inside its hoop. Lugs that were not read are gaps; a snare side has no band, for it is not judged. */
export function HeadTrace(props: {
  drum: BenchDrum
  head: BenchHead
  view: HeadView
  centre: ReactNode
  nowLug?: number
  /** One of many side by side, without the steps from lug to lug. */
  small?: boolean
  className?: string
}) {
  const { drum, head, view, centre, nowLug, small, className } = props
  const out = view.judged ? outWords(view.state) : null
  return (
    <Trace
      label={[`${drum.name}, ${head.side}: ${headStandingWords(view, drum.lugCount)}`, out].filter(Boolean).join('. ')}
      lugs={view.lugs}
      outline={view.outline}
      bandInner={view.judged ? view.bandInner : 1}
      bandOuter={view.judged ? view.bandOuter : 1}
      centre={centre}
      nowLug={nowLug}
      {...(small ? { small } : { order: view.order, badge: true })}
      {...(className ? { className } : {})}
    />
  )
}
