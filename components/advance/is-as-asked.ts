import type { AdvanceLine } from '@/lib/contracts/advance'

/** Answered with all of it as asked, so that settling needs no thought. */
export function isAsAsked(line: AdvanceLine): boolean {
  return line.state === 'answered' && line.said?.content.asAsked === line.count
}
