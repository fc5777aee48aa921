import { db } from '@/db/client'
import { findPack } from '@/db/queries/pack'
import type { PackDocument } from '@/lib/advance/pack-document'
import { upgradePackDocument } from '@/lib/advance/pack-document'
import type { PackState } from '@/lib/contracts/pack'
import { AppError } from '@/lib/errors'
import type { Actor, MemberActor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { blobStore } from '@/lib/server/storage/blob-store'
import { packFileName } from './pack-file-name'
import { mayOpenPdf, packState } from './pack-state'

async function findOwn(actor: MemberActor, packId: string) {
  const found = await findPack(db(), actor, packId)
  if (!found) throw new AppError('not-found', 'There is no such pack in this party.')
  return found
}

/** How far a pack is. */
export async function readPackState(actor: Actor, input: { packId: string }): Promise<PackState> {
  assertCan(actor, 'party:read')
  return packState(actor, await findOwn(actor, input.packId))
}

/** A pack to look at: what it says, of which tour and rig, and how far its PDF is. */
export async function readPack(
  actor: Actor,
  input: { packId: string },
): Promise<{ state: PackState; document: PackDocument; rigId: string; tourId: string }> {
  assertCan(actor, 'party:read')
  const found = await findOwn(actor, input.packId)
  return {
    state: packState(actor, found),
    document: upgradePackDocument(found.document),
    rigId: found.rigId,
    tourId: found.tourId,
  }
}

/** The very bytes of a pack's PDF. One that was sent is only for whoever may send. */
export async function readPackPdf(
  actor: Actor,
  input: { packId: string },
): Promise<{ bytes: Uint8Array; name: string }> {
  assertCan(actor, 'party:read')
  const found = await findOwn(actor, input.packId)
  if (!mayOpenPdf(actor, found)) assertCan(actor, 'advance:send')
  if (!found.pdfSha256) throw new AppError('conflict', 'This PDF is still being made. Try again in a moment.')
  return { bytes: await blobStore().get(found.pdfSha256), name: packFileName(upgradePackDocument(found.document)) }
}
