import { Bench as Timer } from 'tinybench'
import { newDrum } from '@/lib/contracts/kit-defaults'
import { costOfMoving } from '@/lib/tuning/note-moves'
import { planNotes } from '@/lib/tuning/note-plan'
import type { NotePlanInput, PlanDrum } from '@/lib/tuning/note-plan-model'
import { NOTE_TEMPLATES } from '@/lib/tuning/note-template'
import { planDrumOf } from '@/lib/tuning/plan-drum'
import { bruteForcePlans } from '@/tests/helpers/brute-force-plan'
import { compared, figure } from './bench-row'
import type { Bench } from './bench-row'

function drum(role: PlanDrum['role'], diameterIn: number): PlanDrum {
  const name = `${role} ${diameterIn}`
  return planDrumOf(name, name, newDrum(role, { diameterIn }).spec)
}

/** Eight toms, two kicks and two snares: as many as a big kit has. */
function twelveDrums(): PlanDrum[] {
  return [
    ...[drum('kick', 22), drum('kick', 20), drum('snare', 14), drum('snare', 13)],
    ...[6, 8, 10, 12, 13].map((size) => drum('tom', size)),
    ...[14, 16, 18].map((size) => drum('floor-tom', size)),
  ]
}

/** Three toms, their intervals given in pairs: small enough to try every plan. */
function smallSet(): NotePlanInput {
  const template = NOTE_TEMPLATES.find(({ steps }) => steps.kind === 'per-pair')
  if (!template) throw new Error('no template by pairs')
  return { template, drums: [drum('tom', 10), drum('tom', 12), drum('floor-tom', 16)] }
}

async function medianMs(work: () => unknown, timeMs = 500): Promise<number> {
  const timer = new Timer({ time: timeMs, warmupTime: 100 })
  timer.add('work', () => void work())
  const [task] = await timer.run()
  const result = task?.result
  if (!result || !('latency' in result)) throw new Error('nothing was timed')
  return result.latency.p50
}

/** Planning a kit's notes: time for twelve drums, and beside trying every plan of a small set. */
export const rows: Bench = async (say) => {
  const drums = twelveDrums()
  const found = []
  for (const template of NOTE_TEMPLATES) {
    say(`twelve drums, ${template.name}`)
    const value = await medianMs(() => planNotes({ template, drums }))
    found.push(
      figure({ case: `12 drums, ${template.name}`, metric: 'plan and 8 alternatives', value, unit: 'ms', goal: 50 }),
    )
  }
  say('moving one of twelve drums along its range')
  const [template] = NOTE_TEMPLATES
  if (!template) throw new Error('no templates')
  const input = { template, drums }
  const notes = new Map(planNotes(input).best.drums.map(({ drumId, note }) => [drumId, note]))
  const moving = (replan: boolean) => medianMs(() => costOfMoving(input, notes, 'tom 12', { replan }))
  const [fixed, replanned] = [await moving(false), await moving(true)]
  found.push(
    figure({ case: '12 drums, Fourths', metric: 'cost along a range, others fixed', value: fixed, unit: 'ms' }),
    figure({ case: '12 drums, Fourths', metric: 'cost along a range, others replanned', value: replanned, unit: 'ms' }),
  )
  say('three toms, every plan tried')
  const small = smallSet()
  const [planned, tried] = [await medianMs(() => planNotes(small)), await medianMs(() => bruteForcePlans(small), 1500)]
  const [first] = bruteForcePlans(small)
  const { best } = planNotes(small)
  found.push(
    compared({
      ...{ case: '3 toms', metric: 'plan and 8 alternatives', value: planned, unit: 'ms' },
      ...{ baseline: 'every plan tried', baselineValue: tried, goal: 1 },
    }),
    figure({
      ...{ case: '3 toms', metric: 'cost over the best of all plans tried', unit: '' },
      ...{ value: best.cost - (first?.cost ?? Number.NaN) / 1000, goal: 0 },
    }),
  )
  return found
}
