import type { NotePlanInput, PlanDrum } from '@/lib/tuning/note-plan-model'

/** A way to note the toms with the cheapest notes for the others. Cost in thousandths. */
export type BrutePlan = { cost: number; notes: Record<string, number>; toms: number[] }

/**
 * Every plan of a small kit, tried one by one, by the rules of the note plan written a second time: for each way to note the
 * toms its best, the best of all first. For templates by whole pairs and free ones, notes without cents, toms of
 * different sizes, and at most two snares.
 */
export function bruteForcePlans({ drums, template, anchor, apartSemitones: apart = 2 }: NotePlanInput): BrutePlan[] {
  const of = (...roles: string[]) => drums.filter(({ role }) => roles.includes(role))
  const toms = of('tom', 'floor-tom').sort((a, b) => a.diameterIn - b.diameterIn)
  const [kicks, snares] = [of('kick'), of('snare')]
  const ordered = [...toms, ...kicks, ...snares]
  const { steps, kickBelowLowestTom } = template
  const asked = (i: number) => (steps.kind === 'per-pair' ? (steps.semitones[i] ?? steps.semitones.at(-1)) : undefined)

  const best = new Map<string, BrutePlan & { key: number[] }>()
  for (const pitches of everyWay(ordered.map((drum) => within(drum, anchor)))) {
    const tomPitches = pitches.slice(0, toms.length)
    const kickPitches = pitches.slice(toms.length, toms.length + kicks.length)
    const snarePitches = pitches.slice(toms.length + kicks.length)
    let cost = 0
    ordered.forEach((drum, i) => (cost += place(drum, pitches[i] ?? 0)))
    for (let i = 1; i < tomPitches.length; i++) {
      const down = (tomPitches[i - 1] ?? 0) - (tomPitches[i] ?? 0)
      const wanted = asked(i - 1)
      cost += (wanted === undefined ? 0 : Math.abs(down - wanted) * 1000) + (down < 0 ? 1e7 : 0) + close(down)
    }
    const lowest = Math.min(...tomPitches)
    for (const kick of toms.length > 0 ? kickPitches : []) {
      const down = lowest - kick
      const off = Math.min(...kickBelowLowestTom.map((wanted) => Math.abs(down - wanted)))
      cost += (kickBelowLowestTom.length > 0 ? off * 1000 : 0) + (down < 0 ? 1e7 : 0) + close(down)
    }
    for (const snare of snarePitches) {
      for (const kick of kickPitches) cost += close(snare - kick)
      for (const tom of tomPitches) cost += close(snare - tom) + ((snare - tom) % 12 === 0 ? 2000 : 0)
    }
    const name = tomPitches.join(' ')
    const there = best.get(name)
    if (there && cost > there.cost) continue
    const away = (some: PlanDrum[], at: number[]) =>
      some.reduce((sum, { range }, i) => {
        return sum + Math.round(Math.abs((at[i] ?? 0) - (range.middleLow + range.middleHigh) / 2) * 100)
      }, 0)
    const others = [...kickPitches, ...snarePitches]
    const key = [cost, away(toms, tomPitches), ...tomPitches, away([...kicks, ...snares], others), ...others]
    if (there && byKey(key, there.key) >= 0) continue
    const notes = Object.fromEntries(ordered.map(({ id }, i) => [id, pitches[i] ?? 0]))
    best.set(name, { cost, notes, toms: tomPitches, key })
  }
  return [...best.values()].sort((a, b) => byKey(a.key, b.key))

  function close(semitones: number): number {
    const distance = Math.abs(semitones)
    return distance < apart ? Math.round(4000 + 4000 * (1 - distance / apart)) : 0
  }
}

function place({ range: { low, middleLow, middleHigh, high } }: PlanDrum, pitch: number): number {
  const edge = (part: number) => Math.round(3000 * Math.min(1, part) ** 2)
  if (pitch < low) return 3000 + Math.round(10_000 + 5000 * (low - pitch))
  if (pitch > high) return 3000 + Math.round(10_000 + 5000 * (pitch - high))
  if (pitch < middleLow) return edge((middleLow - pitch) / (middleLow - low))
  return pitch > middleHigh ? edge((pitch - middleHigh) / (high - middleHigh)) : 0
}

function within({ id, range, lockedNote }: PlanDrum, anchor: NotePlanInput['anchor']): number[] {
  const held = lockedNote ?? (anchor?.drumId === id ? anchor.note : undefined)
  if (held) return [held.semitone]
  const from = Math.ceil(range.low - 12)
  return Array.from({ length: Math.floor(range.high + 12) - from + 1 }, (_, i) => from + i)
}

/** One list throughout, filled anew for each way. */
function* everyWay(rows: number[][], way: number[] = rows.map(() => 0), at = 0): Generator<number[]> {
  const row = rows[at]
  if (!row) {
    yield way
    return
  }
  for (const pitch of row) {
    way[at] = pitch
    yield* everyWay(rows, way, at + 1)
  }
}

function byKey(a: number[], b: number[]): number {
  const at = a.findIndex((part, i) => part !== b[i])
  return at < 0 ? 0 : (a[at] ?? 0) - (b[at] ?? 0)
}
