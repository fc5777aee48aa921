import { db } from '@/db/client'
import { listPacksOfGrant } from '@/db/queries/dispatch'
import { findBlob } from '@/db/queries/file'
import { upgradePackDocument } from '@/lib/advance/pack-document'
import { AppError } from '@/lib/errors'
import type { Actor } from '@/lib/server/auth/actor'
import { assertLink } from '@/lib/server/auth/actor'
import { packFileName } from '@/lib/server/packs/pack-file-name'
import { blobStore } from '@/lib/server/storage/blob-store'

/** The very bytes that were mailed with a pack of this link. A pack that is not behind the link is not found. */
export async function readReplyPdf(actor: Actor, input: { packId: string }): Promise<{ bytes: Uint8Array; name: string }> {
  assertLink(actor, 'reply')
  const packs = await listPacksOfGrant(db(), actor, actor.grantId)
  const pack = packs.find((row) => row.packId === input.packId)
  if (!pack) throw new AppError('not-found', 'There is no such pack behind this link.')
  const blob = pack.pdfBlobId ? await findBlob(db(), actor, pack.pdfBlobId) : undefined
  if (!blob) throw new AppError('unavailable', 'The PDF is still being made. Please try again in a minute.')
  return { bytes: await blobStore().get(blob.sha256), name: packFileName(upgradePackDocument(pack.document)) }
}
