import { canonicalJson } from './canonical-json'
import type { FrozenGauge } from './frozen-gauge'

/** What became of the tour's gauge between two states of a rig, in words; nothing when it is the same with the same pairs. */
export function gaugeChanges(before: FrozenGauge | null, after: FrozenGauge | null): string[] {
  if (canonicalJson(before) === canonicalJson(after)) return []
  if (!before || !after) return [`Gauge: ${before?.name ?? 'none'} → ${after?.name ?? 'none'}`]
  if (before.id !== after.id) return [`Gauge: ${before.name} → ${after.name}`]
  const pairsAlike = canonicalJson(before.pairs) === canonicalJson(after.pairs)
  const parts = [
    ...(before.name === after.name ? [] : [`called ${before.name} → ${after.name}`]),
    ...(canonicalJson(before.scale) === canonicalJson(after.scale)
      ? []
      : [`dial ${before.scale.min} to ${before.scale.max} → ${after.scale.min} to ${after.scale.max}`]),
    ...(pairsAlike ? [] : [`calibrated again, ${before.pairs.length} → ${after.pairs.length} pairs`]),
  ]
  return [`Gauge ${after.name}: ${parts.join('; ')}`]
}
