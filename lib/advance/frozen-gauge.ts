import type { GaugeProfile } from '@/lib/tuning/gauge-profile'

/** The tour's gauge as a revision keeps it: the pairs themselves, so that a sheet is worked out from the revision alone. */
export interface FrozenGauge extends GaugeProfile {
  readonly id: string
}
