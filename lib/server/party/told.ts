type Detail = Readonly<Record<string, unknown>>

/** What a line of the trail kept, and how to read it. */
export interface Told {
  readonly detail: Detail
  /** The text or number at a key, a dot between steps ("from.name"); nothing kept: empty. */
  readonly text: (path: string) => string
  /** What the thing whose id stands at a key is called now; gone or never named: empty. */
  readonly named: (key: string) => string
  /** What the thing that was acted on is called now. */
  readonly itself: string
  /** The names of all things whose ids stand at a key, gone ones left out. */
  readonly allNamed: (key: string) => string
}

function at(detail: Detail, path: string): unknown {
  return path
    .split('.')
    .reduce<unknown>((value, key) => (value && typeof value === 'object' ? (value as Detail)[key] : undefined), detail)
}

export function tell(detail: unknown, subjectId: string, names: ReadonlyMap<string, string>): Told {
  const record: Detail = detail && typeof detail === 'object' ? (detail as Detail) : {}
  const text = (path: string) => {
    const value = at(record, path)
    return typeof value === 'string' || typeof value === 'number' ? String(value) : ''
  }
  const all = (key: string) => {
    const value = at(record, key)
    return Array.isArray(value) ? value.flatMap((id) => names.get(String(id)) ?? []) : []
  }
  return {
    detail: record,
    text,
    named: (key) => names.get(text(key)) ?? '',
    itself: names.get(subjectId) ?? '',
    allNamed: (key) => all(key).join(', '),
  }
}

/** Every id that a record keeps under the names that are read back: "showId", "entryIds". */
export function keptIds(detail: unknown): string[] {
  if (!detail || typeof detail !== 'object') return []
  return Object.entries(detail).flatMap(([key, value]) => {
    if (key.endsWith('Id') && typeof value === 'string') return [value]
    if (key.endsWith('Ids') && Array.isArray(value)) return value.map(String)
    return value && typeof value === 'object' && !Array.isArray(value) ? keptIds(value) : []
  })
}
