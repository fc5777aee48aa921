import type { AnswerContent } from '@/lib/advance/answer'
import { answerWords } from '@/lib/advance/answer'
import type { ReplyLine } from '@/lib/contracts/answer'
import { dateWords } from '@/lib/staging/calendar'
import type { StateName } from '../signature/state-words'

/** A line's edge and word for whoever answers it: all as asked is good, a can't wants another look. */
export function lineLook(line: Pick<ReplyLine, 'state' | 'answer' | 'askedAgain'>): { state: StateName; word: string } {
  const words = line.answer ? answerWords(line.answer.content, dateWords) : ''
  switch (line.state) {
    case 'unanswered':
      return line.askedAgain ? { state: 'changed', word: 'asked again' } : { state: 'none', word: 'to answer' }
    case 'changed since':
      return { state: 'changed', word: 'changed since you answered: please answer again' }
    case 'settled':
      return { state: 'settled', word: `settled: ${words}` }
    case 'answered':
      return { state: line.answer ? toneOf(line.answer.content) : 'waiting', word: words }
  }
}

function toneOf(content: AnswerContent): StateName {
  if (content.cant > 0) return 'act'
  return content.instead.length === 0 && content.notYet.length === 0 ? 'settled' : 'waiting'
}
