import type { PackDocument } from '@/lib/advance/pack-document'

/** A file name that every system takes: "Saltmarsh Radio, revision 7, Salle Nord.pdf". */
export function packFileName(pack: Pick<PackDocument, 'party' | 'revision' | 'recipient'>): string {
  const words = `${pack.party}, revision ${pack.revision.number}, ${pack.recipient.name}`
  const safe = words
    .replace(/[\p{Cc}/\\:*?"<>|]+/gu, ' ')
    .replace(/\s+/g, ' ')
    .trim()
  return `${safe.slice(0, 120)}.pdf`
}
