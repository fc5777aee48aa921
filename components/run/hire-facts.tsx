import { Facts } from '@/components/run/facts'
import type { Hire } from '@/lib/contracts/hire'
import { dateWords } from '@/lib/staging/calendar'
import { formatMoney } from '@/lib/staging/money'

function windowWords(date: string | null, from: string | null, until: string | null): string | null {
  if (!date) return null
  const times = from && until ? `, ${from} to ${until}` : from ? `, from ${from}` : until ? `, until ${until}` : ''
  return dateWords(date) + times
}

/** What was agreed of a hire; what is not known yet is said so where it matters. */
export function HireFacts({ hire, shows }: { hire: Hire; shows: readonly { id: string; label: string }[] }) {
  const zone = hire.zone ? `${hire.zone} time` : 'zone not known yet'
  return (
    <>
      <p className="mt-1">{shows.map((show) => show.label).join('; ')}</p>
      <Facts
        facts={[
          ['Delivery', windowWords(hire.deliveryDate, hire.deliveryFrom, hire.deliveryUntil) ?? 'not known yet'],
          [
            'Collection',
            windowWords(hire.collectionDate, hire.collectionFrom, hire.collectionUntil) ?? 'not known yet',
          ],
          ['Times are', zone],
          [
            'Answers due',
            hire.answersDue ? `${dateWords(hire.answersDue.date)}, ${hire.answersDue.time}` : 'no date set',
          ],
          ['Receiver', hire.receiver],
          ['Condition on return', hire.conditionOnReturn],
          ['PO number', hire.poNumber],
          ['Rate', `by the ${hire.rateBasis}`],
          [
            'Transport',
            hire.transportMinor === null || !hire.currency ? '' : formatMoney(hire.transportMinor, hire.currency),
          ],
          ['Tax', hire.taxBasisPoints === null ? '' : `${hire.taxBasisPoints / 100} %`],
          ['Quote valid until', hire.validUntil ? dateWords(hire.validUntil) : ''],
        ]}
      />
    </>
  )
}
