import { StandingBadge } from '@/components/signature/standing-badge'
import type { Standing } from '@/lib/advance/standing'

const recipients: readonly [name: string, what: string, standing: Standing][] = [
  ['Salle Nord', 'house backline, 15 Oct', 'part answered'],
  ['Northline', 'hire, five shows', 'settled'],
  ['Kornhaus', 'house backline, 14 Oct', 'changed since'],
  ['Fjord Backline', 'hire, four shows', 'overdue'],
]

/** How four recipients of one revision stand. */
export function ExampleRecipients() {
  return (
    <ul className="border-t border-line">
      {recipients.map(([name, what, standing]) => (
        <li key={name} className="flex flex-wrap items-baseline justify-between gap-x-4 border-b border-line py-2">
          <span>
            <strong>{name}</strong>, <span className="text-soft">{what}</span>
          </span>
          <StandingBadge standing={standing} />
        </li>
      ))}
    </ul>
  )
}
