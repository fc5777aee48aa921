import { GetObjectCommand, HeadObjectCommand, PutObjectCommand, S3Client } from '@aws-sdk/client-s3'
import { createHash, randomUUID } from 'node:crypto'
import { mkdir, readFile, rename, stat, writeFile } from 'node:fs/promises'
import { dirname, join } from 'node:path'
import type { Env } from '@/lib/env'
import { env } from '@/lib/env'

/** Bytes under the hash of what they are: a folder on one machine, an S3-compatible bucket beyond it. */
export type BlobStore = {
  has(sha256: string): Promise<boolean>
  put(sha256: string, bytes: Uint8Array, contentType: string): Promise<void>
  get(sha256: string): Promise<Uint8Array>
}

export function sha256Of(bytes: Uint8Array): string {
  return createHash('sha256').update(bytes).digest('hex')
}

function key(sha256: string): string {
  if (!/^[0-9a-f]{64}$/.test(sha256)) throw new Error('not a content hash')
  return `${sha256.slice(0, 2)}/${sha256}`
}

function folderStore(folder: string): BlobStore {
  return {
    has: (sha256) =>
      stat(join(folder, key(sha256))).then(
        () => true,
        () => false,
      ),
    async put(sha256, bytes) {
      const path = join(folder, key(sha256))
      await mkdir(dirname(path), { recursive: true })
      // Written beside and moved into place: a reader never sees half a file.
      const beside = `${path}.${randomUUID()}`
      await writeFile(beside, bytes)
      await rename(beside, path)
    },
    get: (sha256) => readFile(join(folder, key(sha256))),
  }
}

function bucketStore(settings: Env, bucket: string): BlobStore {
  const client = new S3Client({
    region: settings.S3_REGION,
    forcePathStyle: true,
    ...(settings.S3_ENDPOINT ? { endpoint: settings.S3_ENDPOINT } : {}),
    ...(settings.S3_ACCESS_KEY_ID && settings.S3_SECRET_ACCESS_KEY
      ? { credentials: { accessKeyId: settings.S3_ACCESS_KEY_ID, secretAccessKey: settings.S3_SECRET_ACCESS_KEY } }
      : {}),
  })
  return {
    has: (sha256) =>
      client.send(new HeadObjectCommand({ Bucket: bucket, Key: key(sha256) })).then(
        () => true,
        (error: unknown) => {
          if (error instanceof Error && error.name === 'NotFound') return false
          throw error
        },
      ),
    async put(sha256, bytes, contentType) {
      await client.send(new PutObjectCommand({ Bucket: bucket, Key: key(sha256), Body: bytes, ContentType: contentType }))
    },
    async get(sha256) {
      const answer = await client.send(new GetObjectCommand({ Bucket: bucket, Key: key(sha256) }))
      if (!answer.Body) throw new Error('the store gave no body')
      return answer.Body.transformToByteArray()
    },
  }
}

let made: BlobStore | undefined

export function blobStore(): BlobStore {
  const settings = env()
  made ??= settings.S3_BUCKET ? bucketStore(settings, settings.S3_BUCKET) : folderStore(settings.BLOB_DIR ?? '.local/blobs')
  return made
}
