import type { Route } from 'next'
import Link from 'next/link'
import { StandingBadge } from '@/components/signature/standing-badge'
import type { Standing } from '@/lib/advance/standing'
import type { Show } from '@/lib/contracts/tour'
import { ShowTimes } from './show-times'

export interface ShowLineProps {
  tourId: string
  show: Show & { standing: { standing: Standing } | null }
}

/** One show of a day: where, by which rig and player, when, and how it stands. */
export function ShowLine({ tourId, show }: ShowLineProps) {
  return (
    <div className="border-l-4 border-ink py-1 pl-3">
      <div className="flex flex-wrap items-baseline gap-x-3">
        <Link
          href={`/tours/${tourId}/shows/${show.id}` as Route}
          className="name inline-flex min-h-7 items-center text-lg underline-offset-4 hover:underline"
        >
          {show.venueName}
          {show.town && `, ${show.town}`}
        </Link>
        {show.name && <span>{show.name}</span>}
        <StandingBadge standing={show.standing?.standing ?? 'not sent'} />
      </div>
      <p className="text-sm text-soft">
        {show.rigName}, {show.playerName}; <ShowTimes show={show} />
      </p>
    </div>
  )
}
