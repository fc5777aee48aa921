import { intervalName, withArticle } from '@/lib/tuning/interval-name'
import type { JudgedPlan, PlanChange } from '@/lib/tuning/note-plan-model'
import { intervalReason } from '@/lib/tuning/note-plan-words'
import { splitWords } from './cost-words'
import { standingsOf } from './standing'
import type { NameOf } from './standing'

/** More would not be read. */
const sentencesAtMost = 2

/** Standings that a step's reason says already. */
const placesInRange = ['slack', 'low', 'high', 'choked']

/** How an alternative differs from the best plan, in words. */
export function changeWords(change: PlanChange, nameOf: NameOf): string {
  if (change.kind === 'shifted') {
    const size = withArticle(intervalName(change.semitones * 100))
    return `The same intervals ${size} ${change.semitones > 0 ? 'higher' : 'lower'}.`
  }
  const words = change.intervals.map(
    ({ upperId, lowerId, best, here }) =>
      `${intervalName(here * 100)} from ${nameOf(upperId)} to ${nameOf(lowerId)}, not ${withArticle(intervalName(best * 100))}`,
  )
  return sentence(words.join('; '))
}

/** What speaks against one of the ranked plans, and its whole cost where not all of it is said; that nothing does is said of the best one. */
export function planWhy(plan: JudgedPlan, change: PlanChange | null, nameOf: NameOf): string[] {
  const { said, unsaid } = against(plan, change, nameOf)
  return unsaid ? [...said, `In all it costs ${splitWords(plan.cost, plan.split)}.`] : said
}

/** What speaks against the plan as it is, and what it costs. */
export function planNow(plan: JudgedPlan, nameOf: NameOf): string[] {
  return [...against(plan, null, nameOf).said, `It costs ${splitWords(plan.cost, plan.split)}.`]
}

function against(plan: JudgedPlan, change: PlanChange | null, nameOf: NameOf): { said: string[]; unsaid: boolean } {
  const reasons = plan.intervals.flatMap((step) => {
    const words = intervalReason(step, nameOf)
    return words ? [{ ...step, words }] : []
  })
  const [asAsked, otherwise] = [
    reasons.filter(({ offSemitones }) => offSemitones === 0),
    reasons.filter(({ offSemitones }) => offSemitones > 0),
  ]
  const saidWhere = new Set(asAsked.map(({ lowerId }) => lowerId))
  const drums = plan.drums.flatMap(({ drumId }) =>
    standingsOf(plan, drumId, nameOf)
      .filter(({ tone, word }) => tone !== 'good' && !(saidWhere.has(drumId) && placesInRange.includes(word)))
      .map(({ words }) => `${nameOf(drumId)}: ${words}.`),
  )
  const steps = [...(change?.kind === 'intervals' ? [] : otherwise), ...asAsked].map(({ words }) => words)
  const all = [...steps, ...drums]
  const said = [
    ...(change ? [changeWords(change, nameOf)] : []),
    ...all.slice(0, sentencesAtMost),
    ...(change === null && all.length === 0 ? ['Every drum in the middle of its range, every interval as asked.'] : []),
  ]
  return { said, unsaid: all.length > sentencesAtMost }
}

function sentence(words: string): string {
  return `${words.charAt(0).toUpperCase()}${words.slice(1)}.`
}
