/** An interval's name with its article: "a fourth", "an octave", "two octaves". */
export function withArticle(interval: string): string {
  if (/^(two|\d)/.test(interval)) return interval
  if (interval.startsWith('same note')) return `the ${interval}`
  return `${/^[aeiou]/.test(interval) ? 'an' : 'a'} ${interval}`
}
