/** The last day that a hire's link serves: its collection, or its last show while that is later or the only one known. */
export function lastDayOfHire(hire: { readonly collectionDate: string | null; readonly lastDate: string | null }): string | null {
  return [hire.collectionDate, hire.lastDate].filter((date) => date !== null).sort().at(-1) ?? null
}
