import type { Db, Scope } from '@/db/client'
import { countBench } from '@/db/queries/bench'
import { AppError } from '@/lib/errors'

/**
 * What one show's bench takes: far more than any night needs, and below what is read back of it at once, so that whoever
 * finds a printed code cannot bury what was logged.
 */
export const benchLimit = { readings: 10_000, signOffs: 1000 }

/** The bench must be locked. Throws conflict when it would hold too much. */
export async function assertRoomOnBench(
  tx: Db,
  scope: Scope,
  showId: string,
  more: { readings: number } | { signOffs: number },
): Promise<void> {
  const there = await countBench(tx, scope, showId)
  const full =
    'readings' in more
      ? there.readings + more.readings > benchLimit.readings
      : there.signOffs + more.signOffs > benchLimit.signOffs
  if (!full) return
  throw new AppError(
    'conflict',
    'This bench is full: it holds more than any night takes. Nothing more was kept; what is there stays.',
  )
}
