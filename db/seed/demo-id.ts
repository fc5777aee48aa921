import { createHash } from 'node:crypto'

/** The same id for the same words, so that seeding again makes the same rows and nothing twice. */
export function demoId(...words: string[]): string {
  const hex = createHash('sha256')
    .update(['demo', ...words].join(' / '))
    .digest('hex')
  // Version 8 of RFC 9562: a uuid whose bits are the maker's own.
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-8${hex.slice(13, 16)}-a${hex.slice(17, 20)}-${hex.slice(20, 32)}`
}
