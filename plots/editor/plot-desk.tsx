'use client'

import dynamic from 'next/dynamic'

/** The plot editor, fetched when a page shows it: pages that only draw a plot must not carry it. */
export const PlotDesk = dynamic(async () => (await import('./plot-editor')).PlotEditor, {
  loading: () => <p className="py-8 text-soft">Fetching the plot…</p>,
})
