/** The pattern that finds a typed text anywhere; its own % and _ mean themselves. */
export function containing(text: string): string {
  return `%${text.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%`
}
