import { createHash } from 'node:crypto'
import { db } from '@/db/client'
import { listEntries } from '@/db/queries/kit'
import { findRigHead, lockRig } from '@/db/queries/revision'
import type { Kit } from '@/lib/contracts/kit'
import { entryInputSchema } from '@/lib/contracts/kit'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { noSuchRig } from '@/lib/server/plots/read-plot'
import { appendEntries } from './add-entries'
import { refusedField } from './entry-refusals'
import { notifyKit } from './notify-kit'

/** Copies the kit of another rig of the party behind what this one holds. The same copyId again copies nothing twice. */
export async function copyKit(actor: Actor, input: { rigId: string; copyId: string; fromRigId: string }): Promise<Kit> {
  assertCan(actor, 'kit:edit')
  const { rigId, copyId, fromRigId } = input
  return db().transaction(async (tx) => {
    if (!(await lockRig(tx, actor, rigId))) throw noSuchRig()
    if (fromRigId === rigId) throw refusedField('fromRigId', 'Choose another rig: this is the one to copy into')
    if (!(await findRigHead(tx, actor, fromRigId))) throw noSuchRig()
    const source = await listEntries(tx, actor, { rigId: fromRigId, removedToo: false })
    if (source.length === 0)
      throw new AppError('conflict', 'That rig’s kit is empty. Nothing was changed; choose another.')
    const made = await appendEntries(tx, actor, {
      rigId,
      entries: source.map((entry) => ({ id: copiedId(copyId, entry.id), entry: entryInputSchema.parse(entry) })),
    })
    if (made.length > 0) {
      await audit(tx, actor, 'kit.copied', { type: 'rig', id: rigId }, { fromRigId, ids: made.map(({ id }) => id) })
      await notifyKit(tx, actor, rigId)
    }
    return { rigId, entries: await listEntries(tx, actor, { rigId, removedToo: false }) }
  })
}

/** The id that one entry gets in one copy: the same both times when a request comes twice (RFC 9562, version 8). */
function copiedId(copyId: string, entryId: string): string {
  const hex = createHash('sha256').update(`${copyId} ${entryId}`).digest('hex')
  return [hex.slice(0, 8), hex.slice(8, 12), `8${hex.slice(13, 16)}`, `8${hex.slice(17, 20)}`, hex.slice(20, 32)].join(
    '-',
  )
}
