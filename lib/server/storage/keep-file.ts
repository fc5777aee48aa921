import type { Db, Scope } from '@/db/client'
import { ensureBlob, insertFileReference } from '@/db/queries/file'
import { blobStore, sha256Of } from './blob-store'

/** Keeps bytes and says what for. The bytes go to the store first: a row never points at nothing. */
export async function keepFile(
  tx: Db,
  scope: Scope,
  file: { bytes: Uint8Array; contentType: string; name: string; audience: 'party' | 'recipient'; subject: { type: string; id: string } },
): Promise<{ blobId: string; sha256: string }> {
  const sha256 = sha256Of(file.bytes)
  if (!(await blobStore().has(sha256))) await blobStore().put(sha256, file.bytes, file.contentType)
  const blobId = await ensureBlob(tx, scope, { sha256, size: file.bytes.byteLength, contentType: file.contentType })
  await insertFileReference(tx, scope, {
    blobId,
    name: file.name,
    audience: file.audience,
    subjectType: file.subject.type,
    subjectId: file.subject.id,
  })
  return { blobId, sha256 }
}
