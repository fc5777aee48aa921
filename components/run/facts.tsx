import type { ReactNode } from 'react'

/** Facts with their names; those that say nothing are left out. */
export function Facts({ facts }: { facts: readonly (readonly [name: string, value: ReactNode])[] }) {
  return (
    <dl className="mt-2 grid gap-x-8 gap-y-1 sm:grid-cols-2 xl:grid-cols-3">
      {facts
        .filter(([, value]) => value !== '' && value !== null)
        .map(([name, value]) => (
          <div key={name} className="grid grid-cols-[9rem_minmax(0,1fr)] gap-x-3 border-b border-line py-1">
            <dt className="text-soft">{name}</dt>
            <dd>{value}</dd>
          </div>
        ))}
    </dl>
  )
}
