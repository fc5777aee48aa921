/** "1 drum", "5 drums". */
export function drumsWord(count: number): string {
  return count === 1 ? '1 drum' : `${count} drums`
}
