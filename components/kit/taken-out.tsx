import { Button } from '@/components/ui/button'
import type { Entry } from '@/lib/contracts/kit'

/** What was taken out of the kit, each with the way back. */
export function TakenOut({
  entries,
  onPutBack,
}: {
  entries: readonly Entry[]
  onPutBack: ((entry: Entry) => void) | null
}) {
  if (entries.length === 0) return null
  return (
    <details className="mt-8 border-t border-line pt-3">
      <summary className="min-h-7 font-bold">Taken out ({entries.length})</summary>
      <ul className="mt-2">
        {entries.map((entry) => (
          <li
            key={entry.id}
            className="flex min-h-control flex-wrap items-center justify-between gap-3 border-b border-line py-1"
          >
            <span>{entry.name}</span>
            {onPutBack && <Button onClick={() => onPutBack(entry)}>Put {entry.name} back</Button>}
          </li>
        ))}
      </ul>
    </details>
  )
}
