import { intervalName } from '@/lib/tuning/interval-name'
import type { JudgedPlan, PlanChange } from '@/lib/tuning/note-plan-model'
import { splitWords } from './cost-words'
import { intervalWords, standingsOf } from './standing'
import type { NameOf } from './standing'
import { withArticle } from './with-article'

/** More would not be read. */
const sentencesAtMost = 2

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

/** What speaks against a plan, drum by drum and step by step; that nothing does is said of the best one. */
export function planWhy(plan: JudgedPlan, change: PlanChange | null, nameOf: NameOf): string[] {
  const steps = plan.intervals
    .filter(({ offSemitones }) => offSemitones > 0)
    .map((step) => `${nameOf(step.upperId)} to ${nameOf(step.lowerId)}: ${intervalWords(step)}.`)
  const drums = plan.drums.flatMap(({ drumId }) =>
    standingsOf(plan, drumId, nameOf)
      .filter(({ tone }) => tone !== 'good')
      .map(({ words }) => `${nameOf(drumId)}: ${words}.`),
  )
  const against = [...(change?.kind === 'intervals' ? [] : steps), ...drums]
  const shown = against.slice(0, sentencesAtMost)
  return [
    ...(change ? [changeWords(change, nameOf)] : []),
    ...shown,
    ...(against.length > shown.length ? [sentence(`in all it costs ${splitWords(plan.cost, plan.split)}`)] : []),
    ...(change === null && against.length === 0
      ? ['Every drum in the middle of its range, every interval as asked.']
      : []),
  ]
}

function sentence(words: string): string {
  return `${words.charAt(0).toUpperCase()}${words.slice(1)}.`
}
