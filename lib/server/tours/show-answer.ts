import type { ShowRow } from '@/db/queries/show'
import type { Show } from '@/lib/contracts/tour'
import { wallTimeOfInstant } from '@/lib/staging/wall-time'

/** A show as it is answered: the moment answers are due as an instant and as the wall at the place shows it. */
export function showAnswer(row: ShowRow): Show {
  const { answersDueAt, zone } = row
  return {
    ...row,
    answersDueAt: answersDueAt?.toISOString() ?? null,
    answersDue: answersDueAt && zone ? wallTimeOfInstant(answersDueAt, zone) : null,
  }
}
