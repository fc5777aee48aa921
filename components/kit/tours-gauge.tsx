'use client'

import type { Route } from 'next'
import Link from 'next/link'
import { createContext, useContext, useMemo } from 'react'
import type { ReactNode } from 'react'
import type { FrozenGauge } from '@/lib/advance/frozen-gauge'
import type { DrumEntry, HeadSide } from '@/lib/contracts/kit'
import type { DrumEstimate } from '@/lib/tuning/drum-estimate'
import type { GaugeCalibration } from '@/lib/tuning/gauge-calibration'
import { gaugeOfHead, tryCalibration } from '@/lib/tuning/gauge-of-head'
import type { HeadGauge } from '@/lib/tuning/gauge-of-head'

const CalibrationContext = createContext<GaugeCalibration | null>(null)

export interface ToursGaugeProps {
  /** With its standing pairs; null when none was chosen. */
  gauge: FrozenGauge | null
  children: ReactNode
}

/** Foretells by the tour's gauge what every head beneath should read, and says which gauge that is. */
export function ToursGauge({ gauge, children }: ToursGaugeProps) {
  const tried = useMemo(() => gauge && tryCalibration(gauge), [gauge])
  return (
    <CalibrationContext value={tried?.calibration ?? null}>
      <p className="mt-1 max-w-prose text-sm text-soft">
        {gauge ? (
          <>
            {tried?.calibration ? 'Gauge readings are foretold by ' : 'Gauge readings are as noted: no curve yet from '}
            <Link
              href={`/party/gauges/${gauge.id}` as Route}
              className="inline-flex min-h-7 items-center text-ink underline underline-offset-4"
            >
              {gauge.name}
            </Link>
            {tried?.calibration ? ': 9 of 10 readings fall within the bounds.' : `. ${tried?.refusal.message ?? ''}`}
          </>
        ) : (
          <>
            Gauge readings are as noted. To have them foretold,{' '}
            <Link
              href={'/party/gauges' as Route}
              className="inline-flex min-h-7 items-center text-ink underline underline-offset-4"
            >
              choose a gauge that goes on tour
            </Link>
            .
          </>
        )}
      </p>
      {children}
    </CalibrationContext>
  )
}

/** What the tour's gauge should read on one head of a drum for its note; null where neither it nor the drum tech can say. */
export function useHeadGauge(
  { spec }: Pick<DrumEntry, 'spec'>,
  side: HeadSide,
  estimate: DrumEstimate | null,
): HeadGauge | null {
  const calibration = useContext(CalibrationContext)
  const head = spec[side]
  if (!head) return null
  const { diameterIn, depthIn } = spec
  const openShell = spec.ported || spec.resonant === null
  const { plyMils, coatingGPerM2, gauge } = head
  return gaugeOfHead(
    calibration,
    { diameterIn, depthIn, plyMils, coatingGPerM2, openShell },
    {
      tapHz: estimate?.tuning?.[side]?.tapHz.value ?? null,
      noted: gauge,
      temperatureC: estimate?.input.temperatureC ?? null,
    },
  )
}
