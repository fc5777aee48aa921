/** The ids of all entries with two of them changed about; null when one is not there. */
export function swapNeighbours(
  entries: readonly { id: string }[],
  one: { id: string } | undefined,
  other: { id: string } | undefined,
): string[] | null {
  if (!one || !other) return null
  return entries.map(({ id }) => (id === one.id ? other.id : id === other.id ? one.id : id))
}
