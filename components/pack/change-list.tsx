import type { SpecChanges } from '@/lib/advance/compare-specs'

interface Group {
  readonly title: string
  readonly detail: string
  readonly sentences: readonly string[]
}

function groupsOf(changes: SpecChanges): Group[] {
  const told = (lines: SpecChanges['changed']) =>
    lines.map(({ name, differences }) => `${name}: ${differences.join('; ')}`)
  return [
    { title: 'New lines', detail: 'asked for the first time', sentences: changes.added.map(({ words }) => words) },
    { title: 'Dropped lines', detail: 'no longer wanted', sentences: changes.dropped.map(({ words }) => words) },
    { title: 'Changed lines', detail: 'asked again', sentences: told(changes.changed) },
    {
      title: 'Tuning',
      detail: 'the sheets change, nobody is asked again',
      sentences: [...told(changes.tuning), ...changes.gauge],
    },
    {
      title: 'Plot and patch',
      detail: 'the drawing and the channel list change',
      sentences: [...changes.plot, ...changes.channels],
    },
  ].filter(({ sentences }) => sentences.length > 0)
}

/** What differs between two states of a rig, by what follows from it. */
export function ChangeList({ changes }: { changes: SpecChanges }) {
  const groups = groupsOf(changes)
  if (groups.length === 0) return <p className="text-soft">Only names or settings of the party changed.</p>
  return (
    <div className="flex flex-col gap-4">
      {groups.map(({ title, detail, sentences }) => (
        <div key={title} className="border-l-4 border-plum pl-3">
          <h3 className="text-lg">
            {title} <span className="text-base font-normal text-soft">{detail}</span>
          </h3>
          <ul className="mt-1 flex list-none flex-col gap-1">
            {sentences.map((sentence) => (
              <li key={sentence}>{sentence}</li>
            ))}
          </ul>
        </div>
      ))}
    </div>
  )
}
