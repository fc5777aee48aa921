export type ReadingMethod = 'gauge' | 'tap-typed' | 'tap-heard'
export type ReadingUnit = 'Hz' | 'cents' | 'gauge'

/**
 * One reading at one lug of one head, as logged. Nothing is ever edited: a correction is a new reading that `strikes` an
 * earlier one by its id, and the struck one stays in the log.
 */
export type Reading = {
  id: string
  /** 1-based, counted clockwise from the badge facing this head. */
  lug: number
  method: ReadingMethod
  /** Hz of the tap, cents from the target, or the gauge's own units, by `unit`. */
  value: number
  unit: ReadingUnit
  strikes?: string
  /** Which phone or desk logged it, and its running number there. */
  deviceId: string
  deviceSequence: number
  /** The device's clock, ms since 1970. */
  deviceAtMs: number
  /** The server's clock at arrival, ms since 1970; absent until it arrived. */
  serverAtMs?: number
}

/**
 * Readings in the order in which they were taken, the same on every device whatever order they arrived in.
 * A device's own numbering is trusted before its clock. Between devices the clock decides, but no reading counts as later
 * than its arrival, so a clock that runs ahead cannot outrank everyone else.
 */
export function inOrderTaken<R extends Reading>(readings: readonly R[]): R[] {
  const byDevice = new Map<string, R[]>()
  for (const reading of readings) byDevice.set(reading.deviceId, [...(byDevice.get(reading.deviceId) ?? []), reading])
  const timed: { reading: R; atMs: number }[] = []
  for (const ofDevice of byDevice.values()) {
    let latestMs = Number.NEGATIVE_INFINITY
    for (const reading of ofDevice.sort((a, b) => a.deviceSequence - b.deviceSequence || compare(a.id, b.id))) {
      latestMs = Math.max(latestMs, Math.min(reading.deviceAtMs, reading.serverAtMs ?? reading.deviceAtMs))
      timed.push({ reading, atMs: latestMs })
    }
  }
  return timed
    .sort(
      (a, b) =>
        a.atMs - b.atMs ||
        compare(a.reading.deviceId, b.reading.deviceId) ||
        a.reading.deviceSequence - b.reading.deviceSequence ||
        compare(a.reading.id, b.reading.id),
    )
    .map(({ reading }) => reading)
}

/** Readings that no other reading strikes, in the order taken. Once struck, always struck, even if the striking one is struck too. */
export function standingReadings<R extends Reading>(readings: readonly R[]): R[] {
  const struck = new Set(readings.filter(({ id, strikes }) => strikes !== id).map(({ strikes }) => strikes))
  return inOrderTaken(readings).filter(({ id }) => !struck.has(id))
}

function compare(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0
}
