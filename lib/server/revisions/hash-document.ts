import { createHash } from 'node:crypto'
import { canonicalJson } from '@/lib/advance/canonical-json'

/** SHA-256, in hex, of a document as canonical JSON: equal content has one hash, whatever the order of its keys. */
export function hashDocument(document: unknown): string {
  return createHash('sha256').update(canonicalJson(document)).digest('hex')
}
