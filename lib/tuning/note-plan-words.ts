import { intervalName, withArticle } from './interval-name'
import type { JudgedDrum, JudgedInterval } from './note-plan-model'

type Place = Pick<JudgedDrum, 'zone' | 'centsOffMiddle' | 'centsOutOfRange'>

/**
 * Why a step from drum to drum is as it is, in a sentence: an interval other than the one asked and where that would have put the
 * lower drum, or an interval as asked that takes the lower drum out of its middle. Null when there is nothing to say.
 */
export function intervalReason(interval: JudgedInterval, nameOf: (drumId: string) => string): string | null {
  const { asked, got, ifAsked, offSemitones } = interval
  if (!ifAsked || asked.length === 0) return null
  const [upper, lower] = [nameOf(interval.upperId), nameOf(interval.lowerId)]
  const nearest = asked.reduce((so, each) => (Math.abs(got - each) < Math.abs(got - so) ? each : so))
  const wanted = withArticle(intervalName(nearest * 100))
  if (offSemitones === 0) {
    return ifAsked.zone === 'middle'
      ? null
      : `${sentenceCase(wanted)} under ${upper} leaves ${lower} ${placeWords(ifAsked)}.`
  }
  const instead = `${upper} to ${lower} is ${withArticle(intervalName(got * 100))}, not ${wanted}`
  return ifAsked.zone === 'middle' ? `${instead}.` : `${instead}, which would leave ${lower} ${placeWords(ifAsked)}.`
}

function placeWords({ zone, centsOffMiddle, centsOutOfRange }: Place): string {
  const cents = (value: number) => `${Math.round(Math.abs(value))} cents`
  switch (zone) {
    case 'below-range':
      return `slack, ${cents(centsOutOfRange)} under its range`
    case 'above-range':
      return `choked, ${cents(centsOutOfRange)} over its range`
    case 'low':
      return `${cents(centsOffMiddle)} under its middle third`
    case 'high':
      return `${cents(centsOffMiddle)} over its middle third`
    case 'middle':
      return 'in its middle third'
  }
}

function sentenceCase(words: string): string {
  return `${words.charAt(0).toUpperCase()}${words.slice(1)}`
}
