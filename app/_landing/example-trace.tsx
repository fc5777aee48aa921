import { Trace } from '@/components/signature/trace'
import { evenLugAngles, lugsFacing } from '@/lib/tuning/lug-angles'
import { traceOutline } from '@/lib/tuning/trace'

/** Cents from target at lugs 1 to 6. */
const readings = [15, -2, 3, 13, 1, -4]
const toleranceCents = 6
const radiusPerCent = 0.014

/** A head with two opposite lugs high, as its local tech sees it. */
export function ExampleTrace() {
  const lugs = lugsFacing('batter', evenLugAngles(6)).map(({ lug, seenRad }, index) => {
    const deviation = readings[index] ?? 0
    return { lug, seenRad, deviation, out: Math.abs(deviation) > toleranceCents }
  })
  return (
    <Trace
      label="The batter head of a 12 in tom inside its hoop of six lugs: lugs 1 and 4, opposite each other, are high, the rest are even."
      lugs={lugs.map(({ lug, seenRad, deviation, out }) => ({
        number: lug,
        angleRad: seenRad,
        offset: deviation,
        out,
      }))}
      outline={traceOutline(lugs, { radiusPerUnit: radiusPerCent })}
      bandInner={1 - toleranceCents * radiusPerCent}
      bandOuter={1 + toleranceCents * radiusPerCent}
      highlightLugs={lugs.filter(({ out }) => out).map(({ lug }) => ({ number: lug, turn: 'ease' }))}
      centre={
        <>
          <p className="name text-xl sm:text-2xl">Lugs 1 and 4 are high</p>
          <p className="mt-1 text-sm text-soft">by 15 and 13 cents</p>
        </>
      }
    />
  )
}
