import { db } from '@/db/client'
import { listEntries, placeEntries } from '@/db/queries/kit'
import { lockRig } from '@/db/queries/revision'
import type { Kit } from '@/lib/contracts/kit'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { noSuchRig } from '@/lib/server/plots/read-plot'
import { notifyKit } from './notify-kit'

/** Puts the kit's entries in an order. It must name each of them once, or someone added or took out one meanwhile. */
export async function orderEntries(actor: Actor, input: { rigId: string; entryIds: string[] }): Promise<Kit> {
  assertCan(actor, 'kit:edit')
  const { rigId, entryIds } = input
  return db().transaction(async (tx) => {
    if (!(await lockRig(tx, actor, rigId))) throw noSuchRig()
    const before = await listEntries(tx, actor, { rigId, removedToo: false })
    const known = new Set(before.map(({ id }) => id))
    if (before.length !== entryIds.length || !entryIds.every((id) => known.has(id)))
      throw new AppError('conflict', 'The kit holds other entries by now. Nothing was changed; order it again.', {
        details: { current: { rigId, entries: before } },
      })
    await placeEntries(tx, actor, { rigId, ids: entryIds })
    await audit(
      tx,
      actor,
      'kit.ordered',
      { type: 'rig', id: rigId },
      { from: before.map(({ id }) => id), to: entryIds },
    )
    await notifyKit(tx, actor, rigId)
    return { rigId, entries: await listEntries(tx, actor, { rigId, removedToo: false }) }
  })
}
