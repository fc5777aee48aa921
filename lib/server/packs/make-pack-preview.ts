import { db } from '@/db/client'
import { findPack } from '@/db/queries/pack'
import type { MakePack, PackState } from '@/lib/contracts/pack'
import { AppError } from '@/lib/errors'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { enqueue } from '@/lib/server/jobs/enqueue'
import { packState } from './pack-state'
import { storePack } from './store-pack'

/** Makes a pack to look at: composed and kept like one that is sent, with no link in it. The same id again is the same preview. */
export async function makePackPreview(actor: Actor, input: MakePack): Promise<PackState> {
  assertCan(actor, 'pack:preview')
  return db().transaction(async (tx) => {
    const of = ofInput(input)
    const repeated = input.id ? await findPack(tx, actor, input.id) : undefined
    if (repeated) {
      if (repeated.showId !== (input.showId ?? null) || repeated.hireId !== (input.hireId ?? null)) {
        throw new AppError('conflict', 'This id belongs to another pack. Nothing was made.')
      }
      return packState(actor, repeated)
    }
    const { packId } = await storePack(tx, actor, {
      id: input.id,
      of,
      revisionId: input.revisionId,
      rigId: input.rigId,
    })
    await enqueue(
      tx,
      'make-pack-pdf',
      { packId, partyId: actor.partyId, mailId: null, replyTokenId: null, benchTokenId: null },
      { maxAttempts: 5, priority: 1 },
    )
    const made = await findPack(tx, actor, packId)
    if (!made) throw new Error('the pack was just written')
    return packState(actor, made)
  })
}

function ofInput({ showId, hireId }: MakePack): { showId: string } | { hireId: string } {
  if (showId) return { showId }
  if (hireId) return { hireId }
  throw new AppError('invalid', 'Name one show or one hire.', {
    details: { fields: { showId: 'name one show or one hire' } },
  })
}
