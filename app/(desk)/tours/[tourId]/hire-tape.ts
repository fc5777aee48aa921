import type { Route } from 'next'
import type { TourSpineProps } from '@/components/run/tour-spine'
import type { RunStripHire } from '@/components/signature/run-strip'
import type { RunHire } from '@/lib/server/tours/read-run'

const states: Partial<Record<string, RunStripHire['state']>> = {
  'not sent': 'none',
  settled: 'settled',
  'changed since': 'changed',
}

/** A hire as tape beneath the days it covers; none while nobody knows its days. */
export function hireTape(tourId: string, hire: RunHire): TourSpineProps['hires'][number][] {
  if (!hire.firstDate || !hire.lastDate) return []
  const standing = hire.standing?.standing ?? 'not sent'
  const words = hire.confirmedAt ? 'confirmed' : standing
  return [
    {
      id: hire.id,
      name: hire.supplierName,
      label: [`${hire.supplierName} hire`, hire.name, words].filter(Boolean).join(', '),
      firstDate: hire.firstDate,
      lastDate: hire.lastDate,
      state: hire.confirmedAt && standing !== 'changed since' ? 'settled' : (states[standing] ?? 'waiting'),
      href: `/tours/${tourId}/hires/${hire.id}/advance` as Route,
    },
  ]
}
