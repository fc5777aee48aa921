import type { RevisionSummary } from '@/lib/contracts/revision'

/** A revision as lists and answers show it. */
export function revisionSummary(row: {
  id: string
  rigId: string
  rigName: string
  tourId: string
  number: number
  note: string
  issuedAt: Date
  issuedById: string
  issuedByName: string
  lines: number
}): RevisionSummary {
  const { id, rigId, rigName, tourId, number, note, lines } = row
  return {
    ...{ id, rigId, rigName, tourId, number, note, lines },
    issuedAt: row.issuedAt.toISOString(),
    issuedBy: { id: row.issuedById, name: row.issuedByName },
  }
}
